import { describe, expect, test } from "vitest";
import { cautiousValues, driverTable } from "../../src/drivers/driver-table.ts";
import { failurePicture } from "../../src/drivers/failure-picture.ts";
import { tornado } from "../../src/drivers/tornado.ts";
import { createBlockCounter } from "../../src/reliability/block-tally.ts";
import { localRunner } from "../../src/reliability/local-runner.ts";
import { histogramEdges, monteCarlo } from "../../src/reliability/monte-carlo.ts";
import { problemOf } from "../reliability/known-problems.ts";

const normal = (mean: number, sd: number) => ({ kind: "normal", mean, sd }) as const;
// F = 1 + margin/100, margin = x − y + 2: fails where x is low and y is high; z plays no part.
const problem = problemOf(
  { "a.x": normal(0, 1), "b.y": normal(0, 1), "c.z": normal(5, 2) },
  { sliding: ([x, y]) => 1 + (x - y + 2) / 100 },
);

async function picture() {
  const plan = { seed: "drivers", purpose: "test", samples: 60_000, centres: [1], edges: [histogramEdges(1, 0.01)] };
  const run = await monteCarlo(plan, localRunner(createBlockCounter(problem.states, problem.space, plan)), {
    precision: 0,
  });
  return failurePicture(problem.space, run.states[0]);
}

describe("the failure picture", () => {
  test("moves the mean of each unknown to where the straight line says it lies given failure", async () => {
    // Along the unit normal of the margin, E[t | t < −√2] = −φ(√2)/Φ(−√2) = −1.8642…; each of x and y takes 1/√2 of it.
    const beta = Math.SQRT2;
    const phi = Math.exp(-(beta * beta) / 2) / Math.sqrt(2 * Math.PI);
    const upper = 0.0786496035251426; // 1 − Φ(√2) = erfc(1)/2, Abramowitz and Stegun (1964), table 7.1, from memory; rederived
    const expected = phi / upper / Math.SQRT2;
    const [x, y, z] = await picture();
    const tolerance = 4.9 / Math.sqrt(x.failures); // sd given failure is below 1: one seed in a million fails
    expect(x.failures).toBe(4 * 256);
    expect(Math.abs(x.meanGivenFailure + expected)).toBeLessThan(tolerance);
    expect(Math.abs(y.meanGivenFailure - expected)).toBeLessThan(tolerance);
    expect(Math.abs(z.meanGivenFailure - 5)).toBeLessThan(2 * tolerance);
  });

  test("gives shares that sum to 1 on common edges, prior and given failure alike", async () => {
    for (const one of await picture()) {
      expect(one.edges).toHaveLength(one.prior.length + 1);
      expect(one.prior.reduce((sum, share) => sum + share, 0)).toBeCloseTo(1, 12);
      expect(one.givenFailure.reduce((sum, share) => sum + share, 0)).toBeCloseTo(1, 12);
    }
  });
});

describe("the tornado and the table of drivers", () => {
  test("put the widest bar first and find the harmful end", async () => {
    const [bars] = tornado(problem.states, problem.space);
    expect(bars.at(-1)).toEqual({ path: "c.z", factorAt5: 1.02, factorAt95: 1.02 });
    expect(bars[0].factorAt95 - bars[0].factorAt5).toBeCloseTo(
      ((bars[0].path === "a.x" ? 1 : -1) * 2 * 1.6448536269514722) / 100,
      12,
    );
    const table = driverTable(problem.space, {
      shares: { "a.x": 0.5, "b.y": 0.5, "c.z": 0 },
      tornado: bars,
      picture: await picture(),
    });
    expect(Object.fromEntries(table.map((row) => [row.path, row.adverse]))).toEqual({
      "a.x": "low",
      "b.y": "high",
      "c.z": "unclear",
    });
    expect(table.at(-1)?.path).toBe("c.z");
  });

  test("takes the end from the tornado where no sample failed", () => {
    const [bars] = tornado(problem.states, problem.space);
    const table = driverTable(problem.space, { tornado: bars, picture: [] });
    expect(table.map((row) => row.shiftGivenFailure)).toEqual([null, null, null]);
    expect(Object.fromEntries(table.map((row) => [row.path, row.adverse]))).toMatchObject({
      "a.x": "low",
      "b.y": "high",
    });
  });

  test("cautious values stand at the adverse 5 % fractile, what does not matter at its mean", () => {
    const [bars] = tornado(problem.states, problem.space);
    const values = cautiousValues(problem.space, bars);
    expect(values["a.x"]).toBeCloseTo(-1.6448536269514722, 12);
    expect(values["b.y"]).toBeCloseTo(1.6448536269514722, 12);
    expect(values["c.z"]).toBe(5);
  });
});
