import { expect, test } from "vitest";
import { buildModel } from "../../../src/model.ts";
import { firstOrderSecondMoment } from "../../../src/reliability/second-moment.ts";
import { readStudy } from "../../../src/study/read-study.ts";

const study = readStudy(`
title: Reference wall, dry
wall:
  stem: { height: 5.0, crest_width: 0.4, foot_width: 0.4 }
  base: { toe: 0.8, heel: 2.0, thickness: 0.5 }
  unit_weight: 25
  sliding_friction: { angle: { normal: { mean: 25, cov: 0.10 } } }
soils:
  fill:
    unit_weight: { normal: { mean: 18, cov: 0.05 } }
    friction_angle: { normal: { mean: 34, cov: 0.10 } }
  below: { unit_weight: 18, friction_angle: 30 }
ground:
  behind: { layers: [ { soil: fill } ] }
  below: { soil: below }
assessment: { limit_states: [sliding] }
`);

test("the engine finds the second moments of the sliding factor that the closed form gives", () => {
  const { states, space } = buildModel(study);
  const [found] = firstOrderSecondMoment(states, space, () => 0);
  // printed with six decimals: half a unit in the last, and a hair for ties
  const close = (value: number, expected: number): void => expect(Math.abs(value - expected)).toBeLessThan(0.51e-6);
  close(found.mean, 1.63576);
  close(found.sd, 0.301991);
  close(found.sd / found.mean, 0.184618);
  close(found.reliabilityIndexNormal, 2.105228);
  expect(Math.abs(found.probabilityNormal - 1.76357e-2)).toBeLessThan(0.51e-7);
  close(found.reliabilityIndexLognormal, 2.596497);
  // 4.70898e-3 is printed to six figures: half a unit in the last
  expect(Math.abs(found.probabilityLognormal - 4.70898e-3)).toBeLessThan(0.51e-8);
  const half = {
    "soils.fill.unit_weight": -0.054662,
    "soils.fill.friction_angle": 0.471826,
    "wall.sliding_friction.angle": 0.373077,
  };
  for (const [path, difference] of Object.entries(half))
    expect(found.contributions[path]).toBeCloseTo((difference / 2) ** 2 / 0.301991 ** 2, 5);
});
