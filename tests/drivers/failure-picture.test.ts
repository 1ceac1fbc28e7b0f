import { expect, test } from "vitest";
import { failurePicture } from "../../src/drivers/failure-picture.ts";
import { createBlockCounter } from "../../src/reliability/block-tally.ts";
import { localRunner } from "../../src/reliability/local-runner.ts";
import { monteCarlo } from "../../src/reliability/monte-carlo.ts";
import { lowAndHigh, pictureOf } from "./low-and-high.ts";

test("moves the mean of each unknown to where the straight line says it lies given failure", async () => {
  // Along the unit normal of the margin, E[t | t < −√2] = −φ(√2)/Φ(−√2) = −1.8642…; each of x and y takes 1/√2 of it.
  const beta = Math.SQRT2;
  const phi = Math.exp(-(beta * beta) / 2) / Math.sqrt(2 * Math.PI);
  const upper = 0.0786496035251426; // 1 − Φ(√2) = erfc(1)/2, Abramowitz and Stegun (1964), table 7.1, from memory; rederived
  const expected = phi / upper / Math.SQRT2;
  const [x, y, z] = await pictureOf(lowAndHigh);
  const tolerance = 4.9 / Math.sqrt(x.failures); // sd given failure is below 1: one seed in a million fails
  expect(x.failures).toBe(4 * 256);
  expect(Math.abs(x.meanGivenFailure + expected)).toBeLessThan(tolerance);
  expect(Math.abs(y.meanGivenFailure - expected)).toBeLessThan(tolerance);
  expect(Math.abs(z.meanGivenFailure - 5)).toBeLessThan(2 * tolerance);
});

test("gives shares that sum to 1 on common edges, prior and given failure alike", async () => {
  for (const one of await pictureOf(lowAndHigh)) {
    expect(one.edges).toHaveLength(one.prior.length + 1);
    expect(one.prior.reduce((sum, share) => sum + share, 0)).toBeCloseTo(1, 12);
    expect(one.givenFailure.reduce((sum, share) => sum + share, 0)).toBeCloseTo(1, 12);
  }
});

test("is empty without failures", async () => {
  const { states, space } = lowAndHigh;
  const plan = { seed: "few", purpose: "test", samples: 2, centres: [1], edges: [[0, 2]] };
  const run = await monteCarlo(plan, localRunner(createBlockCounter(states, space, plan)), { precision: 0 });
  expect(run.states[0].failures).toBe(0);
  expect(failurePicture(space, run.states[0])).toEqual([]);
});
