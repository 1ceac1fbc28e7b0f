import type { DeepSeatedGround, DeepSeatedLayer, DeepSeatedSoil } from "./ground.ts";

/**
 * Horizontal layers of one stretch of ground, from the top down; the first has no top, the last no bottom.
 *
 * Weights are counted from z = 0: Γ(z) = ∫₀ᶻ γ dζ and M(z) = ∫₀ᶻ γ ζ dζ, negative and positive below it. Within layer i
 * they are Γ = start + γ z and M = momentStart + γ z²/2, once with the moist unit weight and once with the saturated one.
 */
export interface Zone {
  readonly count: number;
  /** −∞ for the last. */
  readonly bottom: Float64Array;
  readonly moist: Float64Array;
  readonly saturated: Float64Array;
  readonly moistStart: Float64Array;
  readonly saturatedStart: Float64Array;
  readonly moistMomentStart: Float64Array;
  readonly saturatedMomentStart: Float64Array;
  readonly cohesion: Float64Array;
  readonly tanFriction: Float64Array;
}

export function zoneOf(layers: readonly DeepSeatedLayer[]): Zone {
  const count = layers.length;
  const make = (value: (soil: DeepSeatedSoil) => number): Float64Array =>
    Float64Array.from(layers, ({ soil }) => value(soil));
  const bottom = new Float64Array(count);
  let above = Number.POSITIVE_INFINITY;
  layers.forEach((layer, i) => {
    above = i === count - 1 ? Number.NEGATIVE_INFINITY : Math.min(layer.bottom ?? Number.NEGATIVE_INFINITY, above);
    bottom[i] = above;
  });
  const moist = make((soil) => soil.unitWeight);
  const saturated = make((soil) => soil.saturatedUnitWeight);
  return {
    count,
    bottom,
    moist,
    saturated,
    moistStart: starts(bottom, moist, (z) => z),
    saturatedStart: starts(bottom, saturated, (z) => z),
    moistMomentStart: starts(bottom, moist, (z) => (z * z) / 2),
    saturatedMomentStart: starts(bottom, saturated, (z) => (z * z) / 2),
    cohesion: make((soil) => soil.cohesion),
    tanFriction: make((soil) => Math.tan(soil.frictionAngle)),
  };
}

/** Constants that make start + γ·power(z) continuous over the boundaries and 0 at z = 0. */
function starts(bottom: Float64Array, unitWeight: Float64Array, power: (z: number) => number): Float64Array {
  const count = bottom.length;
  const start = new Float64Array(count);
  const home = layerIn(bottom, count, 0);
  for (let i = home; i > 0; i--)
    start[i - 1] = start[i] + (unitWeight[i] - unitWeight[i - 1]) * power(Math.max(bottom[i - 1], 0));
  for (let i = home; i < count - 1; i++)
    start[i + 1] = start[i] + (unitWeight[i] - unitWeight[i + 1]) * power(Math.min(bottom[i], 0));
  return start;
}

function layerIn(bottom: Float64Array, count: number, z: number): number {
  let i = 0;
  while (i < count - 1 && z <= bottom[i]) i++;
  return i;
}

/** The layer that a level lies in; on a boundary the lower one. */
export function layerAt(zone: Zone, z: number): number {
  return layerIn(zone.bottom, zone.count, z);
}

/** Γ(z) where the ground is saturated below the level `water` (−∞: dry), kPa. */
export function weightTo(zone: Zone, z: number, water: number): number {
  const wet = (level: number): number => at(zone, level, zone.saturated, zone.saturatedStart);
  const dry = (level: number): number => at(zone, level, zone.moist, zone.moistStart);
  if (z <= water) return wet(z);
  return water === Number.NEGATIVE_INFINITY ? dry(z) : wet(water) + dry(z) - dry(water);
}

/** M(z) likewise, kN/m per metre. */
export function momentTo(zone: Zone, z: number, water: number): number {
  const of = (level: number, unitWeight: Float64Array, start: Float64Array): number => {
    const i = layerAt(zone, level);
    return start[i] + (unitWeight[i] * level * level) / 2;
  };
  const wet = (level: number): number => of(level, zone.saturated, zone.saturatedMomentStart);
  const dry = (level: number): number => of(level, zone.moist, zone.moistMomentStart);
  if (z <= water) return wet(z);
  return water === Number.NEGATIVE_INFINITY ? dry(z) : wet(water) + dry(z) - dry(water);
}

function at(zone: Zone, level: number, unitWeight: Float64Array, start: Float64Array): number {
  const i = layerAt(zone, level);
  return start[i] + unitWeight[i] * level;
}

export interface Zones {
  readonly front: Zone;
  readonly under: Zone;
  readonly behind: Zone;
}

/**
 * In front: the front soil above the underside, `below` under it. Under the base: `below`. Behind: the layers of `behind`,
 * the last of which gives way to `below` at the underside where its top is at or above it, and goes on where it is not.
 */
export function zonesOf(ground: DeepSeatedGround): Zones {
  const { behind, below, front } = ground;
  const last = behind.layers.length - 1;
  const topOfLast = Math.min(...behind.layers.slice(0, last).map(({ bottom }) => bottom ?? Number.POSITIVE_INFINITY));
  const under = below.map((layer) =>
    layer.bottom === undefined ? layer : { soil: layer.soil, bottom: Math.min(layer.bottom, 0) },
  );
  return {
    front: zoneOf([{ soil: front.soil, bottom: 0 }, ...under]),
    under: zoneOf(under),
    behind: zoneOf(
      topOfLast < 0
        ? behind.layers
        : [...behind.layers.slice(0, last), { soil: behind.layers[last].soil, bottom: 0 }, ...under],
    ),
  };
}
