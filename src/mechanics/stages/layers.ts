import type { Study } from "../../study/study.ts";
import { columnwise } from "../columnwise.ts";
import { type Slot, waterUnitWeight } from "../kernel.ts";
import type { KernelBuilder } from "../kernel-builder.ts";

/** Columns of one soil, shared wherever the soil occurs. */
export interface SoilSlots {
  readonly name: string;
  readonly key: string;
  readonly moist: Slot;
  readonly saturated: Slot;
  /** rad; 0 for an undrained soil, whose cohesion is its undrained strength. */
  readonly frictionAngle: Slot;
  readonly cohesion: Slot;
  readonly undrained: boolean;
  readonly overconsolidationRatio: Slot;
  readonly hasCohesion: boolean;
}

/** A layer behind the wall, clamped to the plane it is counted on. */
export interface LayerSlots {
  readonly soil: SoilSlots;
  /** Local level of its bottom as given, 0 for the last. */
  readonly givenBottom?: Slot;
}

const plusTwo = (unitWeight: number): number => unitWeight + 2;
const localLevel = (level: number, underside: number): number => level - underside;

export function prepareSoil(b: KernelBuilder, study: Study, key: string): SoilSlots {
  const soil = study.soils[key];
  const at = (field: string): string => `soils.${key}.${field}`;
  const undrained = soil.drainage === "undrained";
  const moist = b.input(at("unit_weight"));
  const cohesion = undrained ? b.input(at("undrained_strength")) : b.input(at("cohesion"));
  return {
    name: soil.name,
    key,
    moist,
    saturated:
      b.has(at("saturated_unit_weight")) && soil.saturatedUnitWeight !== undefined
        ? b.input(at("saturated_unit_weight"))
        : b.formula(`saturated unit weight ${key}`, plusTwo, [moist]),
    frictionAngle: undrained ? b.constant(0) : b.input(at("friction_angle")),
    cohesion,
    undrained,
    overconsolidationRatio:
      soil.overconsolidationRatio === undefined ? b.constant(1) : b.input(at("overconsolidation_ratio")),
    hasCohesion: b.constantOf(cohesion) !== 0,
  };
}

export function prepareLayers(
  b: KernelBuilder,
  study: Study,
  soilOf: (key: string) => SoilSlots,
): readonly LayerSlots[] {
  const underside = b.input("wall.underside_level");
  const { layers } = study.ground.behind;
  return layers.map((layer, place) => {
    const soil = soilOf(layer.soil);
    if (place === layers.length - 1) return { soil };
    const path = `ground.behind.layers.${place}.bottom`;
    return { soil, givenBottom: b.formula(`bottom of layer ${place}`, localLevel, [b.input(path), underside]) };
  });
}

/** clamp(x, lowest, highest) for lowest ≤ highest. */
export const clamp = (x: number, lowest: number, highest: number): number => Math.min(Math.max(x, lowest), highest);

/** Vertical effective stress gained per metre of depth below water: γ_sat − γw (1 − i). */
export const buoyantUnitWeight = (saturated: number, gradient: number): number =>
  saturated - waterUnitWeight * (1 - gradient);

// Loops written out one by one, so that each is compiled for its own formula.
columnwise(plusTwo, (y, n, a) => {
  for (let i = 0; i < n; i++) y[i] = plusTwo(a[i]);
});
columnwise(localLevel, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = localLevel(a[i], b[i]);
});
columnwise(clamp, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = clamp(a[i], b[i], c[i]);
});
columnwise(buoyantUnitWeight, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = buoyantUnitWeight(a[i], b[i]);
});
