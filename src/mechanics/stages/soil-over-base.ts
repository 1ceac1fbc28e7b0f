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
    const area = b.formula("area of a layer over the heel", difference, [above.area, below.area]);
    b.step(
      "Weights",
      area,
      `A_heel,${place + 1}`,
      `area of ${layer.soil.name} over the heel`,
      "between {a} and {b}",
      { a: bottom, b: topLevel },
      "m²",
    );
    b.step(
      "Weights",
      part.area,
      `W_heel,${place + 1}`,
      `weight of ${layer.soil.name} over the heel`,
      water === undefined ? "{γ}·{A}" : "{γ}·A above water + {γs}·A below water, A = {A}",
      { γ: layer.soil.moist, γs: layer.soil.saturated, A: area },
      "kN/m",
    );
    b.step(
      "Weights",
      part.momentX,
      `M_heel,${place + 1}`,
      "its moment about the toe",
      "{W} × arm of its centroid",
      { W: part.area },
      "kNm/m",
    );
    above = below;
    topLevel = bottom;
  });
}

const difference = (a: number, b: number): number => a - b;

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
      b.step(
        "Weights",
        part.area,
        "W_toe",
        "weight of the soil over the toe",
        "{γ}·A above water + {γs}·A below water, A = {A}",
        { γ: soil.moist, γs: soil.saturated, A: ground.area },
        "kN/m",
      );
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
    "9.81·({w} − {g})",
    { w: water.area, g: ground.area },
    "kN/m",
  );
}

/** Free water stands above the ground up to the water level: γw (water − ground), not below 0. */
const freeWater = (water: number, ground: number): number => waterUnitWeight * Math.max(water - ground, 0);
