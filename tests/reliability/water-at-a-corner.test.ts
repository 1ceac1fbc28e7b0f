// The index where water stands at a corner (the surface of the ground, beyond which it rises no further), beside brute force.
import { expect, test } from "vitest";
import { buildModel, type Model } from "../../src/model.ts";
import { findDesignPoints } from "../../src/reliability/design-points.ts";
import { firstOrderResult } from "../../src/reliability/first-order.ts";
import { pointEvaluator } from "../../src/reliability/point-evaluator.ts";
import { readStudy } from "../../src/study/read-study.ts";

const wall = (heel: number, level: { mean: number; sd: number }): Model =>
  buildModel(
    readStudy(`
title: Water up to the surface (invented)
wall:
  stem: { height: 5.0, crest_width: 0.3, foot_width: 0.5 }
  base: { toe: 0.8, heel: ${heel}, thickness: 0.5 }
  unit_weight: 24
  sliding_friction: { ratio: 0.85 }
soils:
  fill: { unit_weight: 19, saturated_unit_weight: 21, friction_angle: 36 }
  sand: { unit_weight: 18, friction_angle: { normal: { mean: 34, sd: 2.2 } } }
ground:
  behind: { layers: [ { soil: fill, bottom: 1 }, { soil: sand } ] }
  below: { soil: sand }
  front: { level: 1.0 }
water: { behind: { level: { normal: { mean: ${level.mean}, sd: ${level.sd} } } } }
assessment: { limit_states: [sliding, bearing] }
`),
  );

/** The least distance over 7200 directions, each by bisection (these walls, once failed, stay so farther out). */
function leastDistance(model: Model, place: number): number {
  const evaluator = pointEvaluator(model.states);
  const margin = (angle: number, radius: number): number =>
    evaluator.margins(place, [Float64Array.of(radius * Math.cos(angle), radius * Math.sin(angle))])[0];
  let best = 8;
  for (let k = 0; k < 7200; k++) {
    const angle = (k * Math.PI) / 3600;
    if (margin(angle, best) >= 0) continue;
    let [safe, failed] = [0, best];
    while (failed - safe > 1e-6) {
      const middle = 0.5 * (safe + failed);
      if (margin(angle, middle) < 0) failed = middle;
      else safe = middle;
    }
    best = failed;
  }
  return best;
}

test.each([
  [4.2, { mean: 4.9, sd: 0.3 }],
  [4.4, { mean: 4.7, sd: 0.4 }],
])(
  "heel %s m, level %o: the index of bearing is that of brute force to 2e-3, and the point is a corner",
  (heel, level) => {
    const model = wall(heel, level);
    const place = model.states.names.indexOf("bearing");
    const search = findDesignPoints(model.states, model.space, "corner").states[place];
    const found = firstOrderResult(model.states, model.space, search);
    expect(Math.abs(found.reliabilityIndex! - leastDistance(model, place))).toBeLessThan(2e-3);
    expect(found.status).toBe("corner");
    expect(found.designPoint["water.behind.level"]).toBeCloseTo(5.5, 3);
  },
);
