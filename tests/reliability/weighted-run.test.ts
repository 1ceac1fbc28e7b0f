import { expect, test } from "vitest";
import { normalUpper } from "../../src/numeric/normal.ts";
import { mixtureOf, wholeMove } from "../../src/reliability/failure-mixture.ts";
import { weightedRun } from "../../src/reliability/weighted-run.ts";
import { statesOfMargins, straightLine } from "./straight-line.ts";

const around = (...z: number[]): ReturnType<typeof mixtureOf> =>
  mixtureOf([{ point: Float64Array.from(z), share: 1 }], wholeMove);
const order = { seed: "weighted", purpose: "test", samples: 4000 };

test("finds a probability of one in ten million within five standard errors", () => {
  const index = 5.2;
  const side = index / Math.SQRT2;
  const run = weightedRun(straightLine(index, 2), around(side, side), order);
  const { probability, standardError } = run.system;
  expect(Math.abs(probability - normalUpper(index))).toBeLessThan(5 * standardError); // one seed in two million
  expect(standardError / probability).toBeLessThan(0.05);
});

test("gives every limit state from the same samples, and the system as their union", () => {
  const states = statesOfMargins(2, { far: (u) => 4 - u[0], near: (u) => 3.5 - u[0] });
  const { system, states: each } = weightedRun(states, around(3.5, 0), order);
  expect(system).toEqual(each[1]);
  expect(Math.abs(each[0].probability - normalUpper(4))).toBeLessThan(5 * each[0].standardError);
});

test("the same order gives the same bits; another purpose another draw", () => {
  const run = (purpose: string): number =>
    weightedRun(straightLine(3, 2), around(2.1, 2.1), { ...order, purpose }).system.probability;
  expect(run("a")).toBe(run("a"));
  expect(run("b")).not.toBe(run("a"));
});

test("hands back the heaviest and the nearest failing samples where they are asked for", () => {
  const run = weightedRun(straightLine(3, 2), around(2.1, 2.1), { ...order, keep: 3 });
  expect(run.standing.length).toBeGreaterThanOrEqual(3);
  expect(run.standing.length).toBeLessThanOrEqual(6);
  const heaviest = Math.max(...run.standing.map(({ weight }) => weight));
  expect(heaviest / (run.system.probability * run.samples)).toBeCloseTo(run.largestShare, 12);
  expect(weightedRun(straightLine(3, 2), around(2.1, 2.1), order).standing).toEqual([]);
});

test("without a failure everything is 0 and not NaN", () => {
  const run = weightedRun(statesOfMargins(2, { never: (u) => 30 - u[0] }), around(3, 0), order);
  expect(run).toMatchObject({ failures: 0, largestShare: 0, system: { probability: 0, standardError: 0 } });
});
