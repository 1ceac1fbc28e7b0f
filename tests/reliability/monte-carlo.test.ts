import { describe, expect, test } from "vitest";
import { clopperPearson } from "../../src/numeric/clopper-pearson.ts";
import { normalCdf } from "../../src/numeric/normal.ts";
import { type BlockTally, createBlockCounter, type SamplingPlan } from "../../src/reliability/block-tally.ts";
import { localRunner } from "../../src/reliability/local-runner.ts";
import { type BlockRunner, histogramEdges, histogramOf, monteCarlo, type MonteCarloRun, monteCarloResult, spread } from "../../src/reliability/monte-carlo.ts";
import { type Problem, problemOf, straightLine } from "./straight-line.ts";

const planOf = (problem: Problem, plan: Partial<SamplingPlan> = {}): SamplingPlan => ({
  seed: "straight-line",
  purpose: "test",
  samples: 100_000,
  centres: problem.states.names.map(() => 1),
  edges: problem.states.names.map(() => histogramEdges(1, 0.001)),
  ...plan,
});

const runOf = (problem: Problem, plan: Partial<SamplingPlan> = {}, precision = 0): Promise<MonteCarloRun> => {
  const whole = planOf(problem, plan);
  return monteCarlo(whole, localRunner(createBlockCounter(problem.states, problem.space, whole)), { precision });
};

/** Blocks answered late and out of order, several in hand: what workers do. */
function scrambled(counter: { tally(block: number): BlockTally }, ahead: number): BlockRunner & { readonly asked: number[] } {
  const asked: number[] = [];
  return {
    ahead,
    asked,
    async tally(block) {
      asked.push(block);
      await new Promise((resolve) => setTimeout(resolve, (7 * block) % 5));
      return counter.tally(block);
    },
  };
}

describe("plain Monte Carlo sampling", () => {
  test("finds the probability of a straight-line limit state with reliability index 2", async () => {
    const run = await runOf(straightLine(2), { samples: 200_000 });
    const expected = 0.0227501319481792; // 1 − Φ(2), tests/outside/normal-tail
    const standardError = Math.sqrt((expected * (1 - expected)) / run.samples);
    const found = monteCarloResult(run, run.system);
    expect(Math.abs(found.probability - expected)).toBeLessThan(4.89 * standardError); // a correct sampler fails one seed in a million
    expect(found.interval).toEqual(clopperPearson(found.failures, 200_000));
    expect(found.standardError).toBeCloseTo(standardError, 4);
  });

  test("gives the same run whatever the number of blocks in hand and the order they come back in", async () => {
    const problem = straightLine(2);
    const plan = planOf(problem);
    const one = await runOf(problem);
    for (const ahead of [2, 5]) {
      const other = await monteCarlo(plan, scrambled(createBlockCounter(problem.states, problem.space, plan), ahead), { precision: 0 });
      expect(monteCarloResult(other, other.states[0], 1)).toEqual(monteCarloResult(one, one.states[0], 1));
      expect(other.system.picture).toEqual(one.system.picture);
      expect(other.system.convergence).toEqual(one.system.convergence);
    }
  });

  test("counts a partial last block, and refuses a block outside the run", async () => {
    const problem = straightLine(1);
    const run = await runOf(problem, { samples: 20_001 });
    expect(run.samples).toBe(20_001);
    const counter = createBlockCounter(problem.states, problem.space, planOf(problem, { samples: 20_001 }));
    expect(counter.tally(1).samples).toBe(20_001 - 16_384);
    expect(() => counter.tally(2)).toThrow("block 2 lies outside a run of 20001 samples");
  });

  test("keeps what was merged when it is stopped, equal to a run of that many samples", async () => {
    const problem = straightLine(2);
    const plan = planOf(problem, { samples: 200_000 });
    const stop = new AbortController();
    const run = await monteCarlo(plan, localRunner(createBlockCounter(problem.states, problem.space, plan)), {
      precision: 0,
      signal: stop.signal,
      onProgress: (done) => {
        if (done >= 3 * 16_384) stop.abort();
      },
    });
    expect(run.complete).toBe(false);
    expect(run.samples).toBe(3 * 16_384);
    const fixed = await runOf(problem, { samples: 3 * 16_384 });
    expect(monteCarloResult(run, run.states[0], 1)).toEqual(monteCarloResult(fixed, fixed.states[0], 1));
  });

  test("leaves factors at the cap and at 0 out of mean and standard deviation, and counts marks", async () => {
    const problem = problemOf({ "a.u": { kind: "uniform", from: 0, to: 1 } }, { bearing: ([u]) => (u < 0.25 ? 0 : u > 0.75 ? 1000 : 2) }, ([u]) => (u < 0.25 ? 2 : u > 0.75 ? 4 | 1 : 8));
    const run = await runOf(problem, { samples: 16_384, edges: [histogramEdges(2, 0.5)], centres: [2] });
    const found = monteCarloResult(run, run.states[0], 2);
    expect(found.factorMean).toBe(2);
    expect(found.factorSd).toBe(0);
    expect(found.counts.lostContact).toBe(found.failures);
    expect(found.counts.capped).toBe(found.counts.slopeUnstable);
    expect(found.counts.lostContact + found.counts.capped + found.counts.outOfRange).toBe(16_384);
    // none of the failures is on an unstable slope, and a quarter of the samples are
    expect(found.probabilityAmongStable).toBeCloseTo(found.failures / (16_384 - found.counts.slopeUnstable), 15);
  });

  test("says nothing about an index without failures, or with nothing but failures", async () => {
    const never = await runOf(straightLine(30), { samples: 1000 });
    const always = await runOf(straightLine(-30), { samples: 1000 });
    expect(monteCarloResult(never, never.system).reliabilityIndex).toBeNull();
    expect(monteCarloResult(never, never.system).interval[1]).toBeCloseTo(1 - 0.025 ** (1 / 1000), 10);
    expect(monteCarloResult(always, always.system)).toMatchObject({ probability: 1, reliabilityIndex: null });
  });

  test("sorts every sample into the histogram or beside it, with an edge at 1", async () => {
    const problem = straightLine(1);
    const edges = histogramEdges(1.001, 0.001);
    expect(edges.some((edge) => Math.abs(edge - 1) < 1e-12)).toBe(true);
    const run = await runOf(problem, { edges: [edges] });
    const { counts, below, above } = histogramOf(run.states[0], edges);
    expect(counts.reduce((sum, count) => sum + count, 0) + below + above).toBe(run.samples);
    const failing = counts.filter((_, bin) => edges[bin + 1] <= 1 + 1e-12).reduce((sum, count) => sum + count, 0) + below;
    expect(failing).toBe(run.states[0].failures);
  });
});

describe("the stop rule", () => {
  test("looks at 1, 2, 4, … blocks and stops at the first whose coefficient of variation is small enough", async () => {
    const run = await runOf(straightLine(2), { samples: 10_000_000 }, 0.03);
    // √((1 − p)/(n p)) ≤ 0.03 needs about 47 700 samples: 4 blocks
    expect(run.samples).toBe(4 * 16_384);
    expect(run.complete).toBe(true);
    expect(spread(run.system.failures, run.samples)).toBeLessThanOrEqual(0.03);
    const before = await runOf(straightLine(2), { samples: 2 * 16_384 });
    expect(spread(before.system.failures, before.samples)).toBeGreaterThan(0.03);
  });

  test("throws away and does not count what ran ahead of a stop", async () => {
    const problem = straightLine(2);
    const plan = planOf(problem, { samples: 10_000_000 });
    const runner = scrambled(createBlockCounter(problem.states, problem.space, plan), 5);
    const ahead = await monteCarlo(plan, runner, { precision: 0.03 });
    const alone = await runOf(problem, { samples: 10_000_000 }, 0.03);
    expect(runner.asked.length).toBeGreaterThan(4);
    expect(monteCarloResult(ahead, ahead.states[0], 1)).toEqual(monteCarloResult(alone, alone.states[0], 1));
  });

  test("never stops on no failures", () => {
    expect(spread(0, 1e9)).toBe(Number.POSITIVE_INFINITY);
  });
});

describe("the honesty of the interval", () => {
  test("the 95 % interval covers the truth in at least 95 % of 1000 seeds, less the binomial tolerance", () => {
    // Plain sampling of p = 0.0228 with n = 8192: 186 failures expected. The failures of a seed are those of a block.
    const problem = straightLine(2);
    const truth = 1 - normalCdf(2);
    let covered = 0;
    for (let seed = 0; seed < 1000; seed++) {
      const plan = planOf(problem, { seed: `coverage ${seed}`, samples: 8192 });
      const { system } = createBlockCounter(problem.states, problem.space, plan).tally(0);
      const [low, high] = clopperPearson(system.failures, 8192);
      if (low <= truth && truth <= high) covered++;
    }
    // With a true coverage of 95 % the count falls below 950 − 4.26·√(1000·0.95·0.05) = 921 once in 100 000.
    expect(covered).toBeGreaterThanOrEqual(921);
  });
});
