import { columnwise } from "../columnwise.ts";
import { heelArea, heelMomentX, heelMomentZ, toeArea, toeMomentX, toeMomentZ } from "../formulas/heel-area.ts";
import { type Slot, waterUnitWeight } from "../kernel.ts";
import type { KernelBuilder } from "../kernel-builder.ts";
import { clamp, type LayerSlots, type SoilSlots } from "./layers.ts";
import { addWeight, type Ledger } from "./ledger.ts";
import type { Outline } from "./outline.ts";
import type { Ponds } from "./water.ts";

/** Area and first moments of a region up to a level: rising functions of the level, so a clamp of the level is a clamp of each. */
interface UpTo {
  readonly area: Slot;
  readonly momentX: Slot;
  readonly momentZ: Slot;
}

/** γ (above − wet) + γ_sat (wet − below), wet held between below and above. */
const soaked = (moist: number, saturated: number, above: number, below: number, water: number): number => {
  const wet = clamp(water, below, Math.max(above, below));
  return moist * (above - wet) + saturated * (wet - below);
};
const dry = (moist: number, above: number, below: number): number => moist * (above - below);

function partWeight(
  b: KernelBuilder,
  name: string,
  soil: SoilSlots,
  above: UpTo,
  below: UpTo,
  water: UpTo | undefined,
): Record<keyof UpTo, Slot> {
  const of = (key: keyof UpTo): Slot =>
    water === undefined
      ? b.formula(`${name}, ${key}`, dry, [soil.moist, above[key], below[key]])
      : b.formula(`${name}, ${key}`, soaked, [soil.moist, soil.saturated, above[key], below[key], water[key]]);
  return { area: of("area"), momentX: of("momentX"), momentZ: of("momentZ") };
}

/** Soil between the wall's back and the virtual back, layer by layer, the sloping wedge with the top layer. */
export function prepareHeelSoil(
  b: KernelBuilder,
  ledger: Ledger,
  o: Outline,
  layers: readonly LayerSlots[],
  ponds: Ponds,
): void {
  if (!o.hasBase && b.isCertainly("wall.stem.back_run", 0)) return;
  const shape = [o.thickness, o.crestLevel, o.footX, o.width, o.backTangent, o.slopeTangent];
  const upTo = (level: Slot): UpTo => ({
    area: b.formula("heel area", heelArea, [level, ...shape]),
    momentX: b.formula("heel moment x", heelMomentX, [level, ...shape]),
    momentZ: b.formula("heel moment z", heelMomentZ, [level, ...shape]),
  });
  const water = ponds.behind === undefined ? undefined : upTo(ponds.behind);
  let topLevel = o.virtualTop;
  let above = upTo(topLevel);
  layers.forEach((layer, place) => {
    const bottom =
      layer.givenBottom === undefined
        ? o.thickness
        : b.formula("bottom over the heel", clamp, [layer.givenBottom, o.thickness, topLevel]);
    const below = upTo(bottom);
    const name = `Soil over the heel, ${layer.soil.name}`;
    const part = partWeight(b, `${name} (${place})`, layer.soil, above, below, water);
    addWeight(b, ledger, {
      name,
      group: "weight",
      weight: part.area,
      momentX: part.momentX,
      momentZ: part.momentZ,
      shakes: true,
    });
    listSoil(b, {
      symbol: `heel,${place + 1}`,
      text: `${layer.soil.name} over the heel`,
      soil: layer.soil,
      part,
      above,
      below,
      water,
    });
    above = below;
    topLevel = bottom;
  });
}

const difference = (a: number, b: number): number => a - b;
const wetArea = (above: number, below: number, water: number): number =>
  clamp(water, below, Math.max(above, below)) - below;
const armOf = (moment: number, weight: number): number => (weight === 0 ? 0 : moment / weight);

interface SoilLines {
  readonly symbol: string;
  readonly text: string;
  readonly soil: SoilSlots;
  readonly part: Record<keyof UpTo, Slot>;
  readonly above: UpTo;
  readonly below: UpTo;
  readonly water: UpTo | undefined;
}

/** Lines of the sheet for soil over the base: its area above and below water, weight, arm. */
function listSoil(b: KernelBuilder, { symbol, text, soil, part, above, below, water }: SoilLines): void {
  const heading = "Weights";
  const unless: readonly [Slot, Slot] = [above.area, below.area];
  const add = (
    slot: Slot,
    name: string,
    words: string,
    formula: string,
    of: Record<string, Slot>,
    unit: string,
  ): void => {
    b.steps.push({ heading, slot, symbol: `${name}_${symbol}`, text: `${words} ${text}`, formula, of, unit, unless });
  };
  const area = b.formula("area of a layer over the base", difference, [above.area, below.area]);
  const weight = `W_${symbol}`;
  if (water === undefined) {
    add(area, "A", "area of", "by the outline", {}, "m²");
    add(part.area, "W", "weight of", "{γ}·{A}", { γ: soil.moist, A: area }, "kN/m");
  } else {
    const wet = b.formula("area below water", wetArea, [above.area, below.area, water.area]);
    const moist = b.formula("area above water", difference, [area, wet]);
    add(moist, "A", "area, above water, of", "by the outline", {}, "m²");
    add(wet, "A_wet", "area, below water, of", "by the outline", {}, "m²");
    add(
      part.area,
      "W",
      "weight of",
      "{γ}·{A} + {γ_sat}·{A_wet}",
      { γ: soil.moist, A: moist, γ_sat: soil.saturated, A_wet: wet },
      "kN/m",
    );
  }
  const arm = b.formula("arm of a soil over the base", armOf, [part.momentX, part.area]);
  add(arm, "x", "distance from the toe of the centroid of", "by the outline", {}, "m");
  add(part.momentX, "M", "moment about the toe of", `{${weight}}·{x}`, { [weight]: part.area, x: arm }, "kNm/m");
}

/** Soil over the toe and free water above it, or above the slab where that soil is left out. */
export function prepareToeSoil(
  b: KernelBuilder,
  ledger: Ledger,
  o: Outline,
  soil: SoilSlots,
  ponds: Ponds,
  frontLevel: Slot,
  counted: boolean,
): void {
  const noWidth = !o.hasBase && b.constantOf(o.frontRun) === 0;
  if (noWidth) return;
  const shape = [o.thickness, o.crestLevel, o.toe, o.frontTangent];
  const upTo = (level: Slot): UpTo => ({
    area: b.formula("toe area", toeArea, [level, ...shape]),
    momentX: b.formula("toe moment x", toeMomentX, [level, ...shape]),
    momentZ: b.formula("toe moment z", toeMomentZ, [level, ...shape]),
  });
  const ground = upTo(counted ? frontLevel : o.thickness);
  const water = ponds.front === undefined ? undefined : upTo(ponds.front);
  if (counted) {
    const floor = upTo(o.thickness);
    const part = partWeight(b, "Soil over the toe", soil, ground, floor, water);
    if (b.constantOf(part.area) !== 0) {
      addWeight(b, ledger, {
        name: "Soil over the toe",
        group: "weight",
        weight: part.area,
        momentX: part.momentX,
        momentZ: part.momentZ,
        shakes: false,
      });
      listSoil(b, { symbol: "toe", text: `${soil.name} over the toe`, soil, part, above: ground, below: floor, water });
    }
  }
  if (water === undefined) return;
  const of = (key: keyof UpTo): Slot => b.formula(`Water over the toe, ${key}`, freeWater, [water[key], ground[key]]);
  const weight = of("area");
  if (b.constantOf(weight) === 0) return;
  addWeight(b, ledger, {
    name: "Water over the toe",
    group: "water",
    weight,
    momentX: of("momentX"),
    momentZ: of("momentZ"),
    shakes: false,
  });
  b.step(
    "Weights",
    weight,
    "W_wt",
    "weight of the free water over the toe",
    "9.81·({A_w} − {A_g}), areas up to the water and up to the ground",
    { A_w: water.area, A_g: ground.area },
    "kN/m",
  );
}

/** Free water stands above the ground up to the water level: γw (water − ground), not below 0. */
const freeWater = (water: number, ground: number): number => waterUnitWeight * Math.max(water - ground, 0);

// Loops written out one by one, so that each is compiled for its own formula.
columnwise(dry, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = dry(a[i], b[i], c[i]);
});
columnwise(soaked, (y, n, a, b, c, d, e) => {
  for (let i = 0; i < n; i++) y[i] = soaked(a[i], b[i], c[i], d[i], e[i]);
});
columnwise(difference, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = difference(a[i], b[i]);
});
columnwise(wetArea, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = wetArea(a[i], b[i], c[i]);
});
columnwise(armOf, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = armOf(a[i], b[i]);
});
columnwise(freeWater, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = freeWater(a[i], b[i]);
});
columnwise(heelArea, (y, n, a, b, c, d, e, f, g) => {
  for (let i = 0; i < n; i++) y[i] = heelArea(a[i], b[i], c[i], d[i], e[i], f[i], g[i]);
});
columnwise(heelMomentX, (y, n, a, b, c, d, e, f, g) => {
  for (let i = 0; i < n; i++) y[i] = heelMomentX(a[i], b[i], c[i], d[i], e[i], f[i], g[i]);
});
columnwise(heelMomentZ, (y, n, a, b, c, d, e, f, g) => {
  for (let i = 0; i < n; i++) y[i] = heelMomentZ(a[i], b[i], c[i], d[i], e[i], f[i], g[i]);
});
columnwise(toeArea, (y, n, a, b, c, d, e) => {
  for (let i = 0; i < n; i++) y[i] = toeArea(a[i], b[i], c[i], d[i], e[i]);
});
columnwise(toeMomentX, (y, n, a, b, c, d, e) => {
  for (let i = 0; i < n; i++) y[i] = toeMomentX(a[i], b[i], c[i], d[i], e[i]);
});
columnwise(toeMomentZ, (y, n, a, b, c, d, e) => {
  for (let i = 0; i < n; i++) y[i] = toeMomentZ(a[i], b[i], c[i], d[i], e[i]);
});
