import { columnwise } from "../columnwise.ts";
import type { Slot } from "../kernel.ts";
import type { KernelBuilder } from "../kernel-builder.ts";
import { addWeight, type Ledger } from "./ledger.ts";
import type { Outline } from "./outline.ts";

/** Weights of stem, base slab and shear key with their moments: unit weight times areas that mostly never vary. */
export function prepareWallWeight(b: KernelBuilder, ledger: Ledger, o: Outline): void {
  const unitWeight = b.input("wall.unit_weight");
  prepareStem(b, ledger, o, unitWeight);
  if (o.hasBase)
    prepareBlock(b, ledger, {
      name: "Base slab",
      symbol: "base",
      unitWeight,
      width: o.width,
      height: o.thickness,
      from: b.constant(0),
      bottom: b.constant(0),
    });
  if (!b.has("wall.shear_key.depth")) return;
  const [height, width, from] = [
    b.input("wall.shear_key.depth"),
    b.input("wall.shear_key.width"),
    b.input("wall.shear_key.from_toe"),
  ];
  const bottom = b.formula("tip of the key", negative, [height]);
  Object.assign(b.places, { keyDepth: height, keyWidth: width, keyFromToe: from });
  prepareBlock(b, ledger, { name: "Shear key", symbol: "key", unitWeight, width, height, from, bottom });
}

/** Area of the stem, m²: a middle of the crest's width and two triangles, one for each batter. */
export function stemArea(height: number, middle: number, front: number, back: number): number {
  return height * (middle + 0.5 * (front + back));
}

/** First moment of that area about x = 0, m³. */
export function stemMomentX(height: number, middle: number, front: number, back: number, toe: number): number {
  const start = toe + front;
  return (
    height *
    (0.5 * front * (toe + (2 / 3) * front) + middle * (start + 0.5 * middle) + 0.5 * back * (start + middle + back / 3))
  );
}

/** First moment of that area about z = 0, m³. */
export function stemMomentZ(height: number, middle: number, front: number, back: number, thickness: number): number {
  return height * (0.5 * (front + back) * (thickness + height / 3) + middle * (thickness + 0.5 * height));
}

function prepareStem(b: KernelBuilder, ledger: Ledger, o: Outline, unitWeight: Slot): void {
  const middle = b.formula("width of the stem's middle", middleOfStem, [o.footWidth, o.backRun, o.frontRun]);
  const shape = [o.stemHeight, middle, o.frontRun, o.backRun];
  const area = b.formula("stem area", stemArea, shape);
  const areaX = b.formula("stem area x", stemMomentX, [...shape, o.toe]);
  const areaZ = b.formula("stem area z", stemMomentZ, [...shape, o.thickness]);
  weigh(b, ledger, { name: "Stem", symbol: "stem", unitWeight, area, areaX, areaZ });
}

const middleOfStem = (foot: number, backRun: number, frontRun: number): number =>
  Math.max(foot - backRun - frontRun, 0);

interface Block {
  readonly name: string;
  readonly symbol: string;
  readonly unitWeight: Slot;
  readonly width: Slot;
  readonly height: Slot;
  readonly from: Slot;
  readonly bottom: Slot;
}

function prepareBlock(b: KernelBuilder, ledger: Ledger, block: Block): void {
  const { name, symbol, unitWeight, width, height, from, bottom } = block;
  const area = b.formula("block area", product, [width, height]);
  const areaX = b.formula("block area x", fromMiddle, [area, from, width]);
  const areaZ = b.formula("block area z", fromMiddle, [area, bottom, height]);
  weigh(b, ledger, { name, symbol, unitWeight, area, areaX, areaZ });
}

interface Shape {
  readonly name: string;
  readonly symbol: string;
  readonly unitWeight: Slot;
  readonly area: Slot;
  readonly areaX: Slot;
  readonly areaZ: Slot;
}

function weigh(b: KernelBuilder, ledger: Ledger, shape: Shape): void {
  const { name, symbol, unitWeight } = shape;
  const of = (slot: Slot): Slot => b.formula("weight of a part of the wall", product, [unitWeight, slot]);
  const [weight, momentX, momentZ] = [of(shape.area), of(shape.areaX), of(shape.areaZ)];
  addWeight(b, ledger, { name, group: "weight", weight, momentX, momentZ, shakes: true });
  const heading = "Weights";
  const words = name.toLowerCase();
  const arm = b.formula("arm of a part of the wall", ratio, [shape.areaX, shape.area]);
  b.step(heading, shape.area, `A_${symbol}`, `area of the ${words}`, "by the outline", {}, "m²");
  b.step(
    heading,
    weight,
    `W_${symbol}`,
    `weight of the ${words}`,
    `{γ_wall}·{A_${symbol}}`,
    { γ_wall: unitWeight, [`A_${symbol}`]: shape.area },
    "kN/m",
  );
  b.step(heading, arm, `x_${symbol}`, "distance of its centroid from the toe", "by the outline", {}, "m");
  b.step(
    heading,
    momentX,
    `M_${symbol}`,
    "its moment about the toe",
    `{W_${symbol}}·{x_${symbol}}`,
    { [`W_${symbol}`]: weight, [`x_${symbol}`]: arm },
    "kNm/m",
  );
}

const product = (a: number, b: number): number => a * b;
const ratio = (a: number, b: number): number => (b === 0 ? 0 : a / b);
const negative = (x: number): number => -x;
const fromMiddle = (area: number, from: number, length: number): number => area * (from + 0.5 * length);

// Loops written out one by one, so that each is compiled for its own formula.
columnwise(stemArea, (y, n, a, b, c, d) => {
  for (let i = 0; i < n; i++) y[i] = stemArea(a[i], b[i], c[i], d[i]);
});
columnwise(stemMomentX, (y, n, a, b, c, d, e) => {
  for (let i = 0; i < n; i++) y[i] = stemMomentX(a[i], b[i], c[i], d[i], e[i]);
});
columnwise(stemMomentZ, (y, n, a, b, c, d, e) => {
  for (let i = 0; i < n; i++) y[i] = stemMomentZ(a[i], b[i], c[i], d[i], e[i]);
});
columnwise(product, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = a[i] * b[i];
});
columnwise(fromMiddle, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = fromMiddle(a[i], b[i], c[i]);
});
