import { expect, test } from "vitest";
import { createBlockCounter } from "../../../src/reliability/block-tally.ts";
import { localRunner } from "../../../src/reliability/local-runner.ts";
import { histogramEdges, monteCarlo } from "../../../src/reliability/monte-carlo.ts";
import type { Distribution } from "../../../src/study/study.ts";
import { problemOf } from "../../reliability/known-problems.ts";

const normal = (mean: number, sd: number): Distribution => ({ kind: "normal", mean, sd });
const lognormal = (mean: number, cov: number): Distribution => ({ kind: "lognormal", mean, sd: mean * cov, shift: 0 });
const hyperplane = (n: number): Record<string, Distribution> =>
  Object.fromEntries(Array.from({ length: n }, (_, i) => [`u.${i}`, normal(0, 1)]));

test.each([
  [
    "normal resistance and load",
    { "r.r": normal(15, 2), "s.s": normal(10, 1.5) },
    ([r, s]: readonly number[]) => (s > 0 ? r / s : 1000),
    2.275013e-2,
  ],
  [
    "lognormal resistance and load",
    { "r.r": lognormal(20, 0.2), "s.s": lognormal(10, 0.25) },
    ([r, s]: readonly number[]) => r / s,
    1.295728e-2,
  ],
  [
    "a hyperplane in 12 dimensions, index 2",
    hyperplane(12),
    (u: readonly number[]) => 1 + (2 - u.reduce((sum, x) => sum + x, 0) / Math.sqrt(12)) / 100,
    2.275013e-2,
  ],
])("sampling finds the probability of %s", async (_, distributions, factor, expected) => {
  const { states, space } = problemOf(distributions as Record<string, Distribution>, { sliding: factor });
  const plan = {
    seed: "closed form",
    purpose: "test",
    samples: 150_000,
    centres: [1],
    edges: [histogramEdges(1, 0.5)],
  };
  const run = await monteCarlo(plan, localRunner(createBlockCounter(states, space, plan)), { precision: 0 });
  const found = run.states[0].failures / run.samples;
  expect(Math.abs(found - expected)).toBeLessThan(4.89 * Math.sqrt((expected * (1 - expected)) / run.samples));
});
