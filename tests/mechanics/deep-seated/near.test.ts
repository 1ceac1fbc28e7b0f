import { expect, test } from "vitest";
import { deepSeated } from "../../../src/mechanics/deep-seated/deep-seated.ts";
import type { DeepSeatedGround, DeepSeatedLayer } from "../../../src/mechanics/deep-seated/ground.ts";
import { deepSeatedNear, kinOf, knownPlaces } from "../../../src/mechanics/deep-seated/near.ts";
import { dice, drained, ordinaryGround, randomGround } from "./random-ground.ts";

/** A sample around a ground: friction 10 %, cohesion 25 %, unit weight 5 %, loads 30 %, levels 0.1 h, boundaries 0.25 m (sd). */
function sampleOf(ground: DeepSeatedGround, roll: () => number): DeepSeatedGround {
  // near enough to normal: the sum of twelve
  const normal = (): number => Array.from({ length: 12 }, roll).reduce((a, b) => a + b) - 6;
  const times = (cov: number): number => Math.max(1 + cov * normal(), 0.2);
  const layers = (list: readonly DeepSeatedLayer[]): DeepSeatedLayer[] =>
    list.map(({ soil, bottom }) => ({
      soil: soilOf(soil),
      ...(bottom === undefined ? {} : { bottom: bottom + 0.25 * normal() }),
    }));
  const soilOf = (soil: DeepSeatedLayer["soil"]): DeepSeatedLayer["soil"] => {
    const heavier = times(0.05);
    return {
      unitWeight: soil.unitWeight * heavier,
      saturatedUnitWeight: soil.saturatedUnitWeight * heavier,
      frictionAngle: Math.min(soil.frictionAngle * times(0.1), 1.04),
      cohesion: soil.cohesion * times(0.25),
    };
  };
  const { stemHeight } = ground.wall;
  const { behind, front } = ground.water;
  return {
    ...ground,
    behind: { ...ground.behind, layers: layers(ground.behind.layers) },
    below: layers(ground.below),
    front: { ...ground.front, soil: soilOf(ground.front.soil) },
    water: {
      ...(behind === undefined ? {} : { behind: behind + 0.1 * stemHeight * normal() }),
      ...(front === undefined ? {} : { front: front + 0.05 * stemHeight * normal() }),
    },
    loads: {
      surcharge: ground.loads.surcharge * times(0.3),
      strips: ground.loads.strips.map((strip) => ({ ...strip, pressure: strip.pressure * times(0.3) })),
      lines: ground.loads.lines.map((line) => ({ ...line, force: line.force * times(0.3) })),
    },
  };
}

test("near the known circles the factor is that of a full search: its error over 3 random walls", () => {
  const roll = dice(17);
  const errors: number[] = [];
  for (let i = 0; i < 3; i++) {
    const ground = randomGround(roll);
    const places = knownPlaces([ground]);
    for (let k = 0; k < 4; k++) {
      const sample = sampleOf(ground, roll);
      errors.push(deepSeatedNear(sample, places).factor / deepSeated(sample).factor - 1);
    }
  }
  errors.sort((a, b) => a - b);
  // a part of what was measured at length: see the doc comment of deepSeatedNear
  expect(errors[Math.floor(0.9 * errors.length)]).toBeLessThan(0.003);
  expect(errors[0]).toBeGreaterThan(-0.02);
});

test("it tries a small part of the circles of a full search", () => {
  const ground = ordinaryGround();
  const full = deepSeated(ground);
  const near = deepSeatedNear(ground, knownPlaces([ground]));
  expect(near.factor).toBeLessThanOrEqual(full.factor * (1 + 1e-6));
  expect(near.evaluations).toBeLessThan(full.evaluations / 8);
});

test("where none of the known circles is allowed it searches in full", () => {
  const ground = ordinaryGround();
  expect(deepSeatedNear(ground, []).factor).toBe(deepSeated(ground).factor);
});

test("a ground's kin differ from it in one thing each", () => {
  const ground = ordinaryGround({ below: [{ soil: drained(28, 5) }] });
  const kin = kinOf(ground);
  // three soils (the front's is that of the layer behind it) weaker and stronger, two waters up and down, loads gone and doubled
  expect(kin).toHaveLength(1 + 6 + 4 + 2);
  expect(kin[0]).toBe(ground);
  const weaker = kin.find((one) => one.below[0].soil.cohesion === 3);
  expect(weaker?.behind).toEqual(ground.behind);
  expect(Math.tan(weaker?.below[0].soil.frictionAngle ?? 0)).toBeCloseTo(0.6 * Math.tan((28 * Math.PI) / 180), 12);
});
