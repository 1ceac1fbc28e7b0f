import { describe, expect, test } from "vitest";
import { normalUpper } from "../../src/numeric/normal.ts";
import { findDesignPoints } from "../../src/reliability/design-points.ts";
import { type ImportanceEstimate, importanceSampling } from "../../src/reliability/importance-sampling.ts";
import type { LimitStates } from "../../src/reliability/limit-states.ts";
import { fourBranches } from "./four-branches.ts";
import { standardSpace, statesOfMargins, straightLine } from "./straight-line.ts";

const order = { precision: 0.05, samples: 1_000_000 };

function estimate(states: LimitStates, seed: string): ImportanceEstimate {
  const space = standardSpace(states.dimension);
  const { states: found, evaluations } = findDesignPoints(states, space, seed);
  const points = found.flatMap((state) => state.points);
  return importanceSampling(states, space, points, { ...order, seed }, evaluations);
}

describe.each([
  ["one in a million, ten unknowns", straightLine(4.753424308822899, 10), 1e-6],
  ["twenty unknowns", straightLine(3.5, 20), normalUpper(3.5)],
  [
    "two design points",
    statesOfMargins(5, { either: (u) => Math.min(3 - u[0], 3.5 + u[0]) }),
    normalUpper(3) + normalUpper(3.5),
  ],
  // Waarts (2000): four design points; the exact value is in tests/outside/series-systems
  ["four branches", fourBranches(6), 4.457331e-3],
])("%s", (_, states, expected) => {
  const runs = Array.from({ length: 40 }, (_, seed) => estimate(states, `importance ${seed}`));

  test("95 % intervals cover", () => {
    const covered = runs.filter(({ interval: [low, high] }) => low <= expected && expected <= high).length;
    expect(covered).toBeGreaterThanOrEqual(32); // of 40; an honest interval fails once in 25 000
  });

  test("reaches a coefficient of variation near 5 % with at most 8000 evaluations in the median", () => {
    const spreads = runs.map(({ probability, standardError }) => standardError / probability).sort((a, b) => a - b);
    const evaluations = runs.map((run) => run.evaluations).sort((a, b) => a - b);
    expect(spreads[20]).toBeLessThan(0.05);
    expect(spreads[39]).toBeLessThan(0.06);
    expect(evaluations[20]).toBeLessThan(8000);
    expect(evaluations[39]).toBeLessThan(20_000);
  });
});

test("a region that the search is not told of is found by the wide part of the mixture", () => {
  const states = statesOfMargins(2, { either: (u) => Math.min(2.6 - u[0], 2.5 + u[0]) });
  const space = standardSpace(2);
  const [known] = findDesignPoints(states, space, "missed").states[0].points.filter(({ point }) => point[0] > 0);
  const found = importanceSampling(states, space, [known], { ...order, seed: "missed" });
  expect(found.centres).toHaveLength(2);
  expect(Math.abs(found.probability - normalUpper(2.6) - normalUpper(2.5))).toBeLessThan(5 * found.standardError);
});

test("without points it says so, and knows nothing", () => {
  const found = importanceSampling(straightLine(3), standardSpace(2), [], { ...order, seed: "none" });
  expect(found).toMatchObject({ probability: 0, interval: [0, 1], doubts: ["no design point was found"] });
});

test("too few samples for the precision leave a doubt", () => {
  const states = straightLine(4, 10);
  const space = standardSpace(10);
  const points = findDesignPoints(states, space, "few").states[0].points;
  const found = importanceSampling(states, space, points, { precision: 0.01, samples: 2000, seed: "few" });
  expect(found.doubts.join()).toContain("where 1 % was asked for");
});

test("the same seed gives the same bits", () => {
  expect(estimate(straightLine(4, 3), "bits")).toEqual(estimate(straightLine(4, 3), "bits"));
});
