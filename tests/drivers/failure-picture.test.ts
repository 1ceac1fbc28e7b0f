import { expect, test } from "vitest";
import { failurePicture, weightedFailurePicture } from "../../src/drivers/failure-picture.ts";
import { failureSample } from "../../src/drivers/failure-sample.ts";
import { normalCdf, normalPdf } from "../../src/numeric/normal.ts";
import { createBlockCounter } from "../../src/reliability/block-tally.ts";
import { findDesignPoints } from "../../src/reliability/design-points.ts";
import { failureCentres, mixtureOf, wholeMove } from "../../src/reliability/failure-mixture.ts";
import { localRunner } from "../../src/reliability/local-runner.ts";
import { monteCarlo } from "../../src/reliability/monte-carlo.ts";
import { problemOf } from "../reliability/known-problems.ts";
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

test("weighted samples give the picture of a failure that counting never sees", () => {
  // one in a million: −Φ⁻¹(1e-6) = 4.7534
  const index = 4.753424308822899;
  const rare = problemOf(
    { "a.x": { kind: "normal", mean: 0, sd: 1 }, "b.y": { kind: "normal", mean: 3, sd: 2 } },
    { sliding: ([x]) => Math.exp((index - x) / 5) },
  );
  const { points } = findDesignPoints(rare.states, rare.space, "rare").states[0];
  const parts = mixtureOf(failureCentres(points), wholeMove);
  const sample = failureSample(rare.states, parts, { seed: "rare", samples: 20_000 });
  const [x, y] = weightedFailurePicture(rare.space, sample, 0);
  const expected = normalPdf(index) / normalCdf(-index);
  // sd given failure is about 0.2 for x and 2 for y: one seed in a million fails
  expect(Math.abs(x.meanGivenFailure - expected)).toBeLessThan((4.9 * 0.21) / Math.sqrt(x.failures));
  expect(Math.abs(y.meanGivenFailure - 3)).toBeLessThan((4.9 * 2) / Math.sqrt(y.failures));
  expect(Math.abs(y.sdGivenFailure - 2)).toBeLessThan((4.9 * 2) / Math.sqrt(y.failures));
  expect(x.failures).toBeGreaterThan(1000);
  expect(x.givenFailure.reduce((sum, share) => sum + share, 0)).toBeCloseTo(1, 12);
  expect(weightedFailurePicture(rare.space, { ...sample, failed: sample.failed.fill(0) }, 0)).toEqual([]);
});
