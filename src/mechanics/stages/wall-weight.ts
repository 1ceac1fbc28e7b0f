import type { Slot } from "../kernel.ts";
import type { KernelBuilder } from "../kernel-builder.ts";
import { addWeight, type Ledger } from "./ledger.ts";
import type { Outline } from "./outline.ts";

/** Weights of stem, base slab and shear key with their moments about the tip of the toe. */
export function prepareWallWeight(b: KernelBuilder, ledger: Ledger, o: Outline): void {
  const unitWeight = b.input("wall.unit_weight");
  stemWeight(b, ledger, o, unitWeight);
  if (o.hasBase) baseWeight(b, ledger, o, unitWeight);
  if (b.has("wall.shear_key.depth")) keyWeight(b, ledger, unitWeight);
}

/** The stem as a middle of the crest's width and two triangles, one for each batter. */
function stemWeight(b: KernelBuilder, ledger: Ledger, o: Outline, unitWeight: Slot): void {
  const [weight, momentX, momentZ] = [b.slot("stem weight"), b.slot("stem moment x"), b.slot("stem moment z")];
  const middle = b.formula("width of the stem's middle", middleOfStem, [o.footWidth, o.backRun, o.frontRun]);
  const at = { ...o, middle, unitWeight };
  b.stage({
    name: "weight of the stem",
    reads: [at.unitWeight, at.stemHeight, at.middle, at.frontRun, at.backRun, at.toe, at.thickness],
    writes: [weight, momentX, momentZ],
    run(c, count) {
      const [g, h, m, f, r, toe, t] = [
        c[at.unitWeight],
        c[at.stemHeight],
        c[at.middle],
        c[at.frontRun],
        c[at.backRun],
        c[at.toe],
        c[at.thickness],
      ];
      const [w, mx, mz] = [c[weight], c[momentX], c[momentZ]];
      for (let i = 0; i < count; i++) {
        const front = 0.5 * f[i] * h[i] * g[i];
        const body = m[i] * h[i] * g[i];
        const back = 0.5 * r[i] * h[i] * g[i];
        const start = toe[i] + f[i];
        w[i] = front + body + back;
        mx[i] = front * (toe[i] + (2 / 3) * f[i]) + body * (start + 0.5 * m[i]) + back * (start + m[i] + r[i] / 3);
        mz[i] = (front + back) * (t[i] + h[i] / 3) + body * (t[i] + 0.5 * h[i]);
      }
    },
  });
  addWeight(b, ledger, { name: "Stem", group: "weight", weight, momentX, momentZ, shakes: true });
  b.step(
    "Weights",
    weight,
    "W_stem",
    "weight of the stem",
    "{γ}·{h}·({b_middle} + {front run}/2 + {back run}/2)",
    { γ: unitWeight, h: o.stemHeight, b_middle: middle, "front run": o.frontRun, "back run": o.backRun },
    "kN/m",
  );
  b.step(
    "Weights",
    momentX,
    "M_stem",
    "its moment about the toe",
    "{W_stem} × arm of its centroid",
    { W_stem: weight },
    "kNm/m",
  );
}

const middleOfStem = (foot: number, backRun: number, frontRun: number): number =>
  Math.max(foot - backRun - frontRun, 0);

function baseWeight(b: KernelBuilder, ledger: Ledger, o: Outline, unitWeight: Slot): void {
  const weight = b.formula("base weight", block, [unitWeight, o.width, o.thickness]);
  const momentX = b.formula("base moment x", atHalf, [weight, o.width]);
  const momentZ = b.formula("base moment z", atHalf, [weight, o.thickness]);
  addWeight(b, ledger, { name: "Base slab", group: "weight", weight, momentX, momentZ, shakes: true });
  b.step(
    "Weights",
    weight,
    "W_base",
    "weight of the base slab",
    "{γ}·{B}·{t}",
    { γ: unitWeight, B: o.width, t: o.thickness },
    "kN/m",
  );
  b.step(
    "Weights",
    momentX,
    "M_base",
    "its moment about the toe",
    "{W_base}·{B}/2",
    { W_base: weight, B: o.width },
    "kNm/m",
  );
}

function keyWeight(b: KernelBuilder, ledger: Ledger, unitWeight: Slot): void {
  const [depth, width, fromToe] = [
    b.input("wall.shear_key.depth"),
    b.input("wall.shear_key.width"),
    b.input("wall.shear_key.from_toe"),
  ];
  const weight = b.formula("key weight", block, [unitWeight, width, depth]);
  const momentX = b.formula("key moment x", keyMoment, [weight, fromToe, width]);
  const momentZ = b.formula("key moment z", belowAtHalf, [weight, depth]);
  Object.assign(b.places, { keyDepth: depth, keyWidth: width, keyFromToe: fromToe });
  addWeight(b, ledger, { name: "Shear key", group: "weight", weight, momentX, momentZ, shakes: true });
  b.step(
    "Weights",
    weight,
    "W_key",
    "weight of the shear key",
    "{γ}·{b}·{d}",
    { γ: unitWeight, b: width, d: depth },
    "kN/m",
  );
}

const block = (unitWeight: number, width: number, height: number): number => unitWeight * width * height;
const atHalf = (weight: number, length: number): number => 0.5 * weight * length;
const belowAtHalf = (weight: number, depth: number): number => -0.5 * weight * depth;
const keyMoment = (weight: number, fromToe: number, width: number): number => weight * (fromToe + 0.5 * width);
