import { fillNormals, streamBlock } from "../probability/streams.ts";
import { balanceWeights, type MixturePart, moveSample } from "./failure-mixture.ts";
import type { LimitStates } from "./limit-states.ts";
import type { Point } from "./point-evaluator.ts";

/** A failing sample that stands out. */
export interface FailingSample {
  readonly point: Point;
  readonly weight: number;
}

/** Estimate and standard error from a weighted sample. */
export interface WeightedEstimate {
  readonly probability: number;
  readonly standardError: number;
}

export interface WeightedRun {
  /** Samples drawn: the number asked for, rounded up so that every part of the mixture has its whole share. */
  readonly samples: number;
  readonly system: WeightedEstimate;
  /** One per limit state. */
  readonly states: readonly WeightedEstimate[];
  readonly failures: number;
  /** Share of the failing weight that the heaviest sample carries. */
  readonly largestShare: number;
  /** The heaviest and the nearest failing samples, where they are asked for. */
  readonly standing: readonly FailingSample[];
}

/**
 * Weighted sampling from a mixture with a fixed number of samples in each part (stratified), balance weights.
 *
 *   p = (1/n) Σ w·[failure],  se² = (1/n²) Σ_parts n_k s_k²
 *
 * The same seed, purpose and size give the same bits.
 *
 * @param keep how many of the heaviest, and of the nearest, failing samples to hand back
 */
export function weightedRun(
  states: LimitStates,
  parts: readonly MixturePart[],
  order: { readonly seed: string; readonly purpose: string; readonly samples: number; readonly keep?: number },
): WeightedRun {
  const { dimension, capacity, names, keys } = states;
  const counts = parts.map(
    ({ share, moves }) => Math.max(2, Math.ceil((share * order.samples) / moves.length)) * moves.length,
  );
  const samples = counts.reduce((sum, count) => sum + count, 0);
  // the shares that were drawn, so that the weights are exact
  const drawn = parts.map((part, k) => ({ ...part, share: counts[k] / samples }));
  const block = keys.map(() => new Float64Array(streamBlock));
  const z = keys.map(() => new Float64Array(capacity));
  const factors = names.map(() => new Float64Array(capacity));
  const marks = new Uint8Array(capacity);
  const weights = new Float64Array(capacity);
  const events = names.length + 1;
  const totals = new Float64Array(events);
  const variances = new Float64Array(events);
  const standing = new Standing(order.keep ?? 0);
  let [failures, heaviest] = [0, 0];
  drawn.forEach((part, k) => {
    const sums = new Float64Array(events);
    const squares = new Float64Array(events);
    for (let start = 0; start < counts[k]; start += capacity) {
      const within = start % streamBlock;
      if (within === 0)
        for (let j = 0; j < dimension; j++) {
          const n = Math.min(streamBlock, counts[k] - start);
          fillNormals(order.seed, `${order.purpose}, part ${k}`, keys[j], start / streamBlock, block[j], n);
        }
      const n = Math.min(capacity, counts[k] - start);
      for (let j = 0; j < dimension; j++) z[j].set(block[j].subarray(within, within + n));
      for (let i = 0; i < n; i++) moveSample(z, i, part.sd, part.moves[(start + i) % part.moves.length]);
      balanceWeights(drawn, z, n, weights);
      states.evaluate(z, n, factors, marks, false);
      for (let i = 0; i < n; i++) {
        let failed = false;
        const weight = weights[i];
        for (let s = 0; s < names.length; s++) {
          if (!(factors[s][i] < 1)) continue;
          failed = true;
          sums[s] += weight;
          squares[s] += weight * weight;
        }
        if (!failed) continue;
        sums[names.length] += weight;
        squares[names.length] += weight * weight;
        failures++;
        if (weight > heaviest) heaviest = weight;
        standing.offer(z, i, weight);
      }
    }
    for (let s = 0; s < events; s++) {
      totals[s] += sums[s];
      variances[s] += (squares[s] - sums[s] ** 2 / counts[k]) * (counts[k] / (counts[k] - 1));
    }
  });
  const estimate = (s: number): WeightedEstimate => ({
    probability: totals[s] / samples,
    standardError: Math.sqrt(Math.max(variances[s], 0)) / samples,
  });
  return {
    samples,
    system: estimate(names.length),
    states: names.map((_, s) => estimate(s)),
    failures,
    largestShare: totals[names.length] > 0 ? heaviest / totals[names.length] : 0,
    standing: standing.all,
  };
}

/** Keeps the heaviest and the nearest failing samples it is offered. */
class Standing {
  private readonly keep: number;
  private readonly heavy: FailingSample[] = [];
  private readonly close: { readonly sample: FailingSample; readonly square: number }[] = [];

  constructor(keep: number) {
    this.keep = keep;
  }

  get all(): readonly FailingSample[] {
    return [...new Set([...this.heavy, ...this.close.map(({ sample }) => sample)])];
  }

  offer(z: readonly Float64Array[], i: number, weight: number): void {
    if (this.keep === 0) return;
    let square = 0;
    for (let j = 0; j < z.length; j++) square += z[j][i] * z[j][i];
    const heavy = this.heavy.length < this.keep || weight > this.heavy[this.keep - 1].weight;
    const close = this.close.length < this.keep || square < this.close[this.keep - 1].square;
    if (!heavy && !close) return;
    const sample = { point: Float64Array.from(z, (column) => column[i]), weight };
    if (heavy) insert(this.heavy, sample, this.keep, (a, b) => b.weight - a.weight);
    if (close) insert(this.close, { sample, square }, this.keep, (a, b) => a.square - b.square);
  }
}

function insert<T>(list: T[], item: T, most: number, order: (a: T, b: T) => number): void {
  list.push(item);
  list.sort(order);
  if (list.length > most) list.pop();
}
