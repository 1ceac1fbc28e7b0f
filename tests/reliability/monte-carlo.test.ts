import { expect, test } from "vitest";
import { normalUpper } from "../../src/numeric/normal.ts";
import { streamBlock } from "../../src/probability/streams.ts";
import { type BlockTally, createBlockCounter, type SamplingPlan } from "../../src/reliability/block-tally.ts";
import { localRunner } from "../../src/reliability/local-runner.ts";
import {
  type BlockRunner,
  histogramEdges,
  histogramOf,
  type MonteCarloOptions,
  type MonteCarloRun,
  monteCarlo,
  monteCarloResult,
  spread,
} from "../../src/reliability/monte-carlo.ts";
import { standardSpace, straightLine } from "./straight-line.ts";

const plan = (samples: number, seed = "monte-carlo"): SamplingPlan => ({
  seed,
  purpose: "plain sampling",
  samples,
  centres: [1],
  edges: [histogramEdges(2, 0.5)],
});

const counterFor = (index: number, of: SamplingPlan) => createBlockCounter(straightLine(index), standardSpace(2), of);

const runOf = (index: number, samples: number, options: MonteCarloOptions, seed?: string): Promise<MonteCarloRun> => {
  const of = plan(samples, seed);
  return monteCarlo(of, localRunner(counterFor(index, of)), options);
};

/** Blocks that several workers would bring back late and out of order. */
function shuffledRunner(tally: (block: number) => BlockTally, ahead: number): BlockRunner {
  return {
    ahead,
    async tally(block) {
      for (let turn = 0; turn < ((block * 7) % 5) + 1; turn++) await Promise.resolve();
      return tally(block);
    },
  };
}

test("plain sampling finds the probability of a straight-line limit state", async () => {
  const n = 400_000;
  const expected = normalUpper(2);
  const run = await runOf(2, n, { precision: 0 });
  const result = monteCarloResult(run, run.states[0], 1);
  const standardError = Math.sqrt((expected * (1 - expected)) / n);
  // a correct sampler fails one seed in a million
  expect(Math.abs(result.probability - expected)).toBeLessThan(4.89 * standardError);
  expect(result.standardError).toBeCloseTo(standardError, 5);
  expect(result.samples).toBe(n);
  expect(result.reliabilityIndex).toBeCloseTo(2, 1);
  expect(run.complete).toBe(true);
});

test("the merged run is the same whatever the order in which blocks come back", async () => {
  const of = plan(9 * streamBlock + 100);
  const counter = counterFor(1.5, of);
  const alone = await monteCarlo(of, localRunner(counter), { precision: 0 });
  for (const ahead of [1, 2, 5]) {
    const many = await monteCarlo(
      of,
      shuffledRunner((block) => counter.tally(block), ahead),
      { precision: 0 },
    );
    expect(many).toEqual(alone);
  }
});

test("a run stopped at a precision equals a fixed run of that size, for any number of workers", async () => {
  const of = plan(64 * streamBlock);
  const counter = counterFor(2.5, of);
  const stopped = await monteCarlo(of, localRunner(counter), { precision: 0.05 });
  expect(stopped.samples).toBeLessThan(of.samples);
  expect(Number.isInteger(Math.log2(stopped.samples / streamBlock))).toBe(true);
  expect(spread(stopped.system.failures, stopped.samples)).toBeLessThanOrEqual(0.05);
  const workers = await monteCarlo(
    of,
    shuffledRunner((block) => counter.tally(block), 5),
    { precision: 0.05 },
  );
  expect(workers).toEqual(stopped);
  const fixed = await runOf(2.5, stopped.samples, { precision: 0 });
  expect(fixed).toEqual(stopped);
});

test("sampling goes on past a checkpoint that has not reached the precision", async () => {
  const run = await runOf(2.5, 64 * streamBlock, { precision: 0.05 });
  const before = run.system.convergence.find((point) => point.samples === run.samples / 2);
  expect(before).toBeDefined();
  const failures = Math.round(before!.probability * before!.samples);
  expect(spread(failures, before!.samples)).toBeGreaterThan(0.05);
});

test("stopped from outside, it keeps the blocks merged so far, and equals a run of that many samples", async () => {
  const stop = new AbortController();
  const run = await runOf(2, 40 * streamBlock, {
    precision: 0,
    signal: stop.signal,
    onProgress: (done) => {
      if (done >= 9 * streamBlock) stop.abort();
    },
  });
  expect(run.complete).toBe(false);
  expect(run.samples).toBe(9 * streamBlock);
  const { complete: _, ...fixed } = await runOf(2, run.samples, { precision: 0 });
  const { complete: __, ...kept } = run;
  expect(kept).toEqual(fixed);
});

test("progress rises to the number of samples", async () => {
  const seen: number[] = [];
  await runOf(2, 2 * streamBlock + 5, { precision: 0, onProgress: (done, of) => seen.push(done / of) });
  expect(seen).toEqual([streamBlock / (2 * streamBlock + 5), (2 * streamBlock) / (2 * streamBlock + 5), 1]);
});

test("an error in a block ends the run with that error", async () => {
  const broken: BlockRunner = { ahead: 3, tally: (block) => Promise.reject(new Error(`block ${block} broke`)) };
  await expect(monteCarlo(plan(5 * streamBlock), broken, { precision: 0 })).rejects.toThrow("block 0 broke");
});

test("no failures give probability 0 with the upper limit of the interval, and no index", async () => {
  const run = await runOf(9, streamBlock, { precision: 0.05 });
  const result = monteCarloResult(run, run.system);
  expect(result.probability).toBe(0);
  expect(result.reliabilityIndex).toBeNull();
  expect(result.interval[0]).toBe(0);
  expect(result.interval[1]).toBeCloseTo(1 - 0.025 ** (1 / streamBlock), 12);
});

test("nothing but failures gives probability 1 and no index", async () => {
  const run = await runOf(-9, streamBlock, { precision: 0.05 });
  const result = monteCarloResult(run, run.system);
  expect(result.probability).toBe(1);
  expect(result.reliabilityIndex).toBeNull();
  expect(result.interval[1]).toBe(1);
});

test("mean and standard deviation of the factor are those of its distribution", async () => {
  // ln F is normal with mean 2 and standard deviation 1
  const n = 40 * streamBlock;
  const run = await runOf(2, n, { precision: 0 });
  const { factorMean, factorSd } = monteCarloResult(run, run.states[0], 1);
  const mean = Math.exp(2.5);
  const sd = mean * Math.sqrt(Math.E - 1);
  // a correct sampler fails one seed in a million; the spread of a lognormal's sd by its fourth moment (111 sd⁴, about)
  expect(Math.abs(factorMean! - mean)).toBeLessThan((4.89 * sd) / Math.sqrt(n));
  expect(Math.abs(factorSd! - sd) / sd).toBeLessThan((4.89 * Math.sqrt(111)) / (2 * Math.sqrt(n)));
});

test("the system has no factor of its own", async () => {
  const run = await runOf(1, streamBlock, { precision: 0 });
  expect(monteCarloResult(run, run.system)).toMatchObject({ factorMean: null, factorSd: null });
});

test("the convergence ends at the result", async () => {
  const run = await runOf(1, 20 * streamBlock + 3, { precision: 0 });
  const { convergence } = run.system;
  expect(convergence.at(-1)!.samples).toBe(run.samples);
  expect(convergence.at(-1)!.probability).toBe(run.system.failures / run.samples);
  expect(convergence.map((point) => point.samples)).toEqual(
    [...new Set(convergence.map((point) => point.samples))].sort((a, b) => a - b),
  );
});

test("histogram edges lie in whole steps from 1 and cover the likely range", () => {
  for (const [mean, sd] of [
    [1.5, 0.2],
    [3, 0.9],
    [0.9, 0.1],
    [2, 0],
  ]) {
    const edges = histogramEdges(mean, sd);
    expect(edges.length).toBe(61);
    expect(edges[60]).toBeGreaterThan(mean);
    expect(edges[0]).toBeLessThan(mean);
    const steps = (1 - edges[0]) / (edges[1] - edges[0]);
    expect(Math.abs(steps - Math.round(steps))).toBeLessThan(1e-6);
  }
});

test("the histogram of a run holds all its samples", async () => {
  const run = await runOf(1, 2 * streamBlock, { precision: 0 });
  const histogram = histogramOf(run.states[0], plan(1).edges[0]);
  const { counts, below, above } = histogram;
  expect(counts.reduce((sum, count) => sum + count, below + above)).toBe(run.samples);
});
