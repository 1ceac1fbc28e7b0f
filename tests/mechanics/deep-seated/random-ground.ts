import type { DeepSeatedGround, DeepSeatedLayer, DeepSeatedSoil } from "../../../src/mechanics/deep-seated/ground.ts";

/** A small repeatable source of numbers in [0, 1) (a linear congruence of 32 bits); good enough to scatter test walls. */
export function dice(seed: number): () => number {
  let state = (seed * 2654435761) >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return (state >>> 8) / 2 ** 24;
  };
}

const radians = (degrees: number): number => (degrees * Math.PI) / 180;

/** A wall as it might be built, over any ground: layers, water on either side, key, batter, slope, loads, earthquake. */
export function randomGround(roll: () => number): DeepSeatedGround {
  const within = (from: number, to: number): number => from + (to - from) * roll();
  const chance = (p: number): boolean => roll() < p;
  const soil = (): DeepSeatedSoil => {
    const unitWeight = within(15, 21);
    const wet = unitWeight + within(0, 2.5);
    if (chance(0.25)) return { unitWeight, saturatedUnitWeight: wet, frictionAngle: 0, cohesion: within(15, 120) };
    const cohesion = chance(0.5) ? 0 : within(0, 20);
    return { unitWeight, saturatedUnitWeight: wet, frictionAngle: radians(within(18, 42)), cohesion };
  };
  const stemHeight = within(1.5, 8);
  const thickness = chance(0.2) ? 0 : within(0.08, 0.12) * stemHeight;
  const slab = thickness > 0;
  const crestWidth = within(0.2, 0.5);
  const backRun = chance(0.6) ? 0 : within(0, 0.15) * stemHeight;
  const footWidth = crestWidth + backRun + within(0, slab ? 0.05 : 0.4) * stemHeight;
  const toe = slab ? within(0, 0.2) * stemHeight : 0;
  const heel = slab ? within(0.1, 0.7) * stemHeight : 0;
  const width = toe + footWidth + heel;
  const top = stemHeight + thickness;
  const keyWidth = within(0.2, 0.5);
  const layers = (count: number, from: number, to: number): DeepSeatedLayer[] => {
    const bottoms = Array.from({ length: count - 1 }, () => within(from, to)).sort((a, b) => b - a);
    return [...bottoms.map((bottom) => ({ soil: soil(), bottom })), { soil: soil() }];
  };
  return {
    wall: {
      stemHeight,
      crestWidth,
      footWidth,
      backRun,
      toe,
      heel,
      thickness,
      unitWeight: within(22, 25),
      ...(chance(0.3)
        ? { key: { fromToe: within(0, Math.max(width - keyWidth, 0)), width: keyWidth, depth: within(0.2, 0.8) } }
        : {}),
    },
    behind: {
      slope: chance(0.5) ? 0 : radians(within(0, 25)),
      layers: layers(1 + Math.floor(3 * roll()), chance(0.3) ? -0.5 * top : 0, top),
    },
    below: layers(1 + Math.floor(3 * roll()), -top, 0),
    ...(chance(0.5) ? {} : { firmLevel: -within(0.3, 1.5) * top }),
    front: {
      level: chance(0.2) ? 0 : within(0, 0.3) * top,
      ignoreTop: chance(0.5) ? 0 : within(0, 0.1) * top,
      toeSoil: chance(0.7),
      soil: soil(),
    },
    water: {
      ...(chance(0.6) ? { behind: within(-0.5, 0.9) * top } : {}),
      ...(chance(0.6) ? { front: within(-0.5, 0.4) * top } : {}),
    },
    loads: {
      surcharge: chance(0.5) ? 0 : within(0, 30),
      strips: chance(0.7) ? [] : [{ pressure: within(5, 80), from: within(0, top), width: within(0.5, 4) }],
      lines: chance(0.8) ? [] : [{ force: within(5, 80), at: within(0, 1.5 * top) }],
    },
    earthquake: chance(0.7) ? { kh: 0, kv: 0 } : { kh: within(0, 0.2), kv: within(-0.1, 0.1) },
  };
}

/** A wall that an office might send: two soils, water, surcharge; the start of many tests. */
export function ordinaryGround(change: Partial<DeepSeatedGround> = {}): DeepSeatedGround {
  const sand = { unitWeight: 18, saturatedUnitWeight: 20, frictionAngle: radians(33), cohesion: 0 };
  const fill = { unitWeight: 19, saturatedUnitWeight: 21, frictionAngle: radians(36), cohesion: 0 };
  return {
    wall: {
      stemHeight: 5,
      crestWidth: 0.3,
      footWidth: 0.5,
      backRun: 0,
      toe: 0.8,
      heel: 2.4,
      thickness: 0.5,
      unitWeight: 24,
    },
    behind: { slope: 0, layers: [{ soil: fill, bottom: 2 }, { soil: sand }] },
    below: [{ soil: sand }],
    front: { level: 1, ignoreTop: 0.3, toeSoil: true, soil: sand },
    water: { behind: 1, front: 0.5 },
    loads: { surcharge: 10, strips: [], lines: [] },
    earthquake: { kh: 0, kv: 0 },
    ...change,
  };
}

export const undrained = (strength: number, unitWeight = 18): DeepSeatedSoil => ({
  unitWeight,
  saturatedUnitWeight: unitWeight,
  frictionAngle: 0,
  cohesion: strength,
});

export const drained = (frictionAngleDeg: number, cohesion = 0, unitWeight = 18): DeepSeatedSoil => ({
  unitWeight,
  saturatedUnitWeight: unitWeight + 2,
  frictionAngle: radians(frictionAngleDeg),
  cohesion,
});
