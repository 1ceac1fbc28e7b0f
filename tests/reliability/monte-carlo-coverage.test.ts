// Apart from monte-carlo.test.ts because it takes seconds.
import { expect, test } from "vitest";
import { clopperPearson } from "../../src/numeric/clopper-pearson.ts";
import { normalUpper } from "../../src/numeric/normal.ts";
import { createBlockCounter } from "../../src/reliability/block-tally.ts";
import { spread } from "../../src/reliability/monte-carlo.ts";
import { standardSpace, straightLine } from "./straight-line.ts";

const repeats = 1000;
const probability = normalUpper(2);

const line = straightLine(2, 1);

function failuresOf(seed: string, count: number): number {
  const plan = { seed, purpose: "plain sampling", samples: count, centres: [1], edges: [[0, 1]] };
  return createBlockCounter(line, standardSpace(1), plan).tally(0).system.failures;
}

/** Four standard errors of a count of hits at 95 %: a correct interval fails 3 sets of seeds in 100 000. */
const tolerance = 4 * Math.sqrt(repeats * 0.95 * 0.05);

test("stopping at a precision, seen at doublings alone, costs the interval little of its coverage", () => {
  // Doublings of 250 to 16 000 samples, stop at a coefficient of variation of 0.1 (about 100 failures)
  let covered = 0;
  let biased = 0;
  for (let repeat = 0; repeat < repeats; repeat++) {
    let count = 250;
    let failures = failuresOf(`stop ${repeat}`, count);
    while (spread(failures, count) > 0.1 && count < 16_000) {
      count *= 2;
      failures = failuresOf(`stop ${repeat}`, count);
    }
    const [low, high] = clopperPearson(failures, count);
    if (low <= probability && probability <= high) covered++;
    biased += failures / count;
  }
  expect(covered).toBeGreaterThanOrEqual(0.94 * repeats - tolerance);
  expect(biased / repeats / probability).toBeGreaterThan(0.98);
  expect(biased / repeats / probability).toBeLessThan(1.04);
});
