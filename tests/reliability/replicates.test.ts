import { expect, test } from "vitest";
import { clopperPearson } from "../../src/numeric/clopper-pearson.ts";
import { createFailureCount, fewFailures, replicateEstimate } from "../../src/reliability/replicates.ts";
import { statesOfMargins } from "./straight-line.ts";

test("failures of the system are counted over more points than one call takes", () => {
  const states = statesOfMargins(1, { above: (u) => 1 - u[0], below: (u) => u[0] });
  const column = Float64Array.from({ length: 1500 }, (_, i) => (i % 3) - 0.5); // −0.5, 0.5, 1.5
  expect(createFailureCount(states)([column], 1500)).toBe(1000);
});

test("many failures: Student's t from the replicates", () => {
  const found = replicateEstimate([50, 52, 48, 50], 1000);
  expect(found.failures).toBe(200);
  expect(found.probability).toBeCloseTo(0.05, 12);
  const standardError = Math.sqrt(8 / 3 / 4) / 1000;
  expect(found.standardError).toBeCloseTo(standardError, 12);
  expect(found.interval[1]).toBeCloseTo(0.05 + 3.182446305284263 * standardError, 9); // t(0.975, 3), from memory
});

test("few failures that happen to be alike: the wider Clopper–Pearson interval", () => {
  const found = replicateEstimate([2, 2, 2, 2], 1000);
  expect(found.failures).toBeLessThan(fewFailures);
  expect(found.interval).toEqual(clopperPearson(8, 4000));
  expect(found.standardError).toBeCloseTo(Math.sqrt((0.002 * 0.998) / 4000), 12);
});

test("no failure at all: an upper limit, and no NaN", () => {
  expect(replicateEstimate([0, 0, 0], 100).interval).toEqual(clopperPearson(0, 300));
});
