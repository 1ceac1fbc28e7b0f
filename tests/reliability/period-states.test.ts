import { expect, test } from "vitest";
import { normalCdf, normalUpper } from "../../src/numeric/normal.ts";
import type { JointSpace } from "../../src/probability/marginal.ts";
import { findDesignPoints } from "../../src/reliability/design-points.ts";
import { failureCentres, mixtureOf } from "../../src/reliability/failure-mixture.ts";
import { periodStates } from "../../src/reliability/period-states.ts";
import { weightedRun } from "../../src/reliability/weighted-run.ts";
import { standardSpace, statesOf } from "./straight-line.ts";

/** x1 is the ground, x2 the load of the year. */
const space: JointSpace = {
  ...standardSpace(2),
  coordinates: [
    { key: "x1", part: "knowledge", yearly: false },
    { key: "x2", part: "nature", yearly: true },
  ],
};
const states = statesOf(space, { sliding: ([ground, load]) => Math.exp(4 + 0.6 * ground - 0.8 * load) });

/** E[1 − (1 − p(ground))^T], by the trapezium rule on the ground, which converges at once for a normal. */
function exactly(years: number): number {
  let sum = 0;
  for (let k = -800; k <= 800; k++) {
    const ground = k / 100;
    const yearly = normalUpper((4 + 0.6 * ground) / 0.8);
    sum +=
      (0.01 * Math.exp((-ground * ground) / 2) * -Math.expm1(years * Math.log1p(-yearly))) / Math.sqrt(2 * Math.PI);
  }
  return sum;
}

test("a period keeps its ground and draws each year anew", () => {
  const period = periodStates(states, space, 3);
  expect(period.keys).toEqual(["x1", "x2, year 0", "x2, year 1", "x2, year 2"]);
  const z = [0, 1, 5.2, 2].map((value) => Float64Array.of(value));
  const factors = [new Float64Array(1)];
  period.evaluate(z, 1, factors, new Uint8Array(1), true);
  expect(factors[0][0]).toBeCloseTo(Math.exp(4 - 0.8 * 5.2), 12);
});

test("a point of one year lies in each of the years, with its ground once", () => {
  expect(periodStates(states, space, 2).movesOf(Float64Array.of(-1, 3))).toEqual([
    { places: [0, 1], centre: [-1, 3] },
    { places: [0, 2], centre: [-1, 3] },
  ]);
});

test.each([1, 50])("sampling around the points of one year finds the probability of %i years", (years) => {
  const period = periodStates(states, space, years);
  const { points } = findDesignPoints(states, space, "period").states[0];
  const run = weightedRun(period, mixtureOf(failureCentres(points), period.movesOf), {
    seed: "period",
    purpose: "test",
    samples: 4000,
  });
  const expected = exactly(years);
  if (years === 1) expect(expected).toBeCloseTo(normalCdf(-4), 9);
  expect(Math.abs(run.system.probability - expected)).toBeLessThan(5 * run.system.standardError); // one seed in two million
  expect(run.system.standardError).toBeLessThan(0.1 * expected);
});

test("a period has no single set of values", () => {
  const nothing = new Uint8Array(1);
  expect(() => periodStates(states, space, 2).evaluateAt([], 1, [], nothing)).toThrow(RangeError);
});
