import { normalCdf, normalQuantile } from "../numeric/normal.ts";
import { fillNormals, streamBlock } from "../probability/streams.ts";
import { createSurvivalMargin } from "./after-survival.ts";
import type { DecisionOption, DecisionProblem } from "./decision-problem.ts";
import { mixtureWeight, type Stratum, stratumSizes } from "./mixture.ts";
import type { StratifiedSample } from "./stratified-sample.ts";
import { applyPeriod } from "./years-to-failure.ts";

/**
 * Samples in which some option fails, weighted, with what failure costs in each option. One sample serves all options and
 * all investigations: their differences are then far sharper than their values.
 */
export interface FailureSample extends StratifiedSample {
  /** By option: expected number of periods' first failures, 0 where it does not fail; its weighted sum is the probability. */
  readonly failure: readonly Float64Array[];
  /** By option: the same times the cost of the dearest limit state that fails. */
  readonly cost: readonly Float64Array[];
  readonly drawn: number;
  /** Evaluations of limit states, all options together. */
  readonly evaluations: number;
}

export interface SamplePlan {
  readonly seed: string;
  readonly purpose: string;
  readonly samples: number;
  readonly folds: number;
}

/**
 * Draws from the mixture and keeps the failures. Weights are φ/h times the likelihood, not divided by its mean: with evidence
 * the sums are numerators, and the chance of the evidence (belief-sample.ts) is their denominator.
 */
export function drawFailures(problem: DecisionProblem, strata: readonly Stratum[], plan: SamplePlan): FailureSample {
  const { keys, options, survivals } = problem;
  const dimension = keys.length;
  const capacity = Math.min(...options.map((o) => o.states.capacity), ...survivals.map((s) => s.capacity));
  const { blocks, perBlock, sizes } = blocksOf(strata, plan.samples);
  const drawn = perBlock * blocks;
  const weightOf = mixtureWeight(strata, sizes);
  const columns = keys.map(() => new Float64Array(perBlock));
  const kept = createStore(dimension, options.length, drawn);
  const judges = options.map((option) => createJudge(option, problem.failureCosts));
  const margin = createSurvivalMargin(survivals);
  const [least, likelihood, point] = [
    new Float64Array(capacity),
    new Float64Array(capacity),
    new Float64Array(dimension),
  ];
  let evaluations = 0;
  for (let block = 0; block < blocks; block++) {
    keys.forEach((key, j) => {
      fillNormals(plan.seed, plan.purpose, key, block, columns[j], perBlock);
    });
    placeStrata(strata, sizes, columns, block, blocks);
    for (let start = 0; start < perBlock; start += capacity) {
      const n = Math.min(capacity, perBlock - start);
      const tile = columns.map((column) => column.subarray(start, start + n));
      for (const judge of judges) judge.evaluate(tile, n);
      evaluations += n * (options.length + survivals.length);
      if (survivals.length > 0) margin(tile, n, least, false);
      likelihood.fill(1, 0, n);
      problem.likelihood?.(tile, n, likelihood);
      for (let i = 0; i < n; i++) {
        if (survivals.length > 0 && least[i] < 1) continue;
        if (!judges.some((judge) => judge.failed[i] === 1)) continue;
        for (let j = 0; j < dimension; j++) point[j] = tile[j][i];
        const weight = (weightOf(point) * likelihood[i]) / drawn;
        kept.add(point, weight, (block * perBlock + start + i) >> 1, plan.folds, judges, i);
      }
    }
  }
  const sample = { ...kept.close(), folds: plan.folds, drawn };
  return { ...sample, evaluations: evaluations + applyPeriod(problem, sample, plan) };
}

/** Blocks of equal make-up: how many, of how many samples, and how many of these belong to each stratum. */
export function blocksOf(
  strata: readonly Stratum[],
  samples: number,
): { readonly blocks: number; readonly perBlock: number; readonly sizes: readonly number[] } {
  const blocks = Math.max(1, Math.ceil(samples / streamBlock));
  const perBlock = Math.min(streamBlock, Math.max(2 * Math.ceil(samples / blocks / 2), 2 * strata.length));
  return { blocks, perBlock, sizes: stratumSizes(strata, perBlock) };
}

/**
 * Turns independent standard normals into samples of the strata, one stratum after the other.
 *
 * Along its preferred direction each of a stratum's samples, those of all blocks together, comes from its own of as many equally
 * likely parts: where failure is mainly a matter of that direction, most of the variance goes.
 */
export function placeStrata(
  strata: readonly Stratum[],
  sizes: readonly number[],
  columns: readonly Float64Array[],
  block: number,
  blocks: number,
): void {
  let from = 0;
  strata.forEach(({ centre, spread, along }, s) => {
    const to = from + sizes[s];
    if (along !== undefined) spreadEvenly(columns, along, from, to, block, blocks);
    columns.forEach((column, j) => {
      if (centre[j] === 0 && spread === 1) return;
      for (let i = from; i < to; i++) column[i] = centre[j] + spread * column[i];
    });
    from = to;
  });
}

function spreadEvenly(
  columns: readonly Float64Array[],
  along: Float64Array,
  from: number,
  to: number,
  block: number,
  blocks: number,
): void {
  const entries = [...along.keys()].filter((j) => along[j] !== 0);
  const parts = (to - from) * blocks;
  for (let i = from; i < to; i++) {
    let place = 0;
    for (const j of entries) place += along[j] * columns[j][i];
    const part = (i - from) * blocks + block;
    const below = (part + normalCdf(place)) / parts;
    const above = (parts - part - normalCdf(place)) / parts;
    const shift = (below <= 0.5 ? normalQuantile(below) : -normalQuantile(above)) - place;
    for (const j of entries) columns[j][i] += shift * along[j];
  }
}

interface Judge {
  evaluate(z: readonly Float64Array[], n: number): void;
  readonly failed: Uint8Array;
  readonly cost: Float64Array;
}

/** Failure and its cost, that of the dearest limit state that fails. */
export function createJudge(option: Pick<DecisionOption, "states">, costs: Readonly<Record<string, number>>): Judge {
  const { states } = option;
  const factors = states.names.map(() => new Float64Array(states.capacity));
  const marks = new Uint8Array(states.capacity);
  const failed = new Uint8Array(states.capacity);
  const cost = new Float64Array(states.capacity);
  const prices = states.names.map((name) => costs[name] ?? 0);
  return {
    failed,
    cost,
    evaluate(z, n) {
      states.evaluate(z, n, factors, marks, false);
      failed.fill(0, 0, n);
      cost.fill(0, 0, n);
      factors.forEach((column, k) => {
        for (let i = 0; i < n; i++) {
          if (column[i] >= 1) continue;
          failed[i] = 1;
          if (prices[k] > cost[i]) cost[i] = prices[k];
        }
      });
    },
  };
}

function createStore(dimension: number, options: number, most: number) {
  const columns = (count: number): Float64Array[] => Array.from({ length: count }, () => new Float64Array(most));
  const z = columns(dimension);
  const [failure, cost] = [columns(options), columns(options)];
  const weight = new Float64Array(most);
  const fold = new Uint8Array(most);
  const pair = new Uint32Array(most);
  let count = 0;
  return {
    add(point: Float64Array, w: number, p: number, folds: number, judges: readonly Judge[], i: number): void {
      for (let j = 0; j < dimension; j++) z[j][count] = point[j];
      weight[count] = w;
      pair[count] = p;
      fold[count] = p % folds;
      for (let o = 0; o < options; o++) {
        failure[o][count] = judges[o].failed[i];
        cost[o][count] = judges[o].cost[i];
      }
      count++;
    },
    close() {
      const cut = (column: Float64Array): Float64Array => column.slice(0, count);
      return {
        count,
        z: z.map(cut),
        weight: cut(weight),
        pair: pair.slice(0, count),
        fold: fold.slice(0, count),
        failure: failure.map(cut),
        cost: cost.map(cut),
      };
    },
  };
}
