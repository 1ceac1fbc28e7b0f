import { fillNormals, streamBlock } from "../probability/streams.ts";
import { balanceWeights, type MixturePart, moveSample } from "../reliability/failure-mixture.ts";
import type { LimitStates } from "../reliability/limit-states.ts";

/** Failing samples with weights: the probability of anything among the failures is the sum of its weights over `drawn`. */
export interface FailureSample {
  /** Standard normal coordinates: one column per coordinate, one entry per failing sample. */
  readonly z: readonly Float64Array[];
  readonly weights: Float64Array;
  /** Bit k is set where limit state k fails. */
  readonly failed: Uint32Array;
  /** Samples drawn, failing or not. */
  readonly drawn: number;
}

/**
 * Draws samples and keeps those that fail, whatever the limit state.
 *
 * @param parts the mixture to draw from, as for importance sampling; empty for plain sampling (all weights 1)
 */
export function failureSample(
  states: LimitStates,
  parts: readonly MixturePart[],
  order: { readonly seed: string; readonly samples: number },
): FailureSample {
  const { capacity, names, keys, dimension } = states;
  const plain: MixturePart = { share: 1, sd: 1, moves: [{ places: [], centre: [] }] };
  const wanted = parts.length === 0 ? [plain] : parts;
  const counts = wanted.map(({ share }) => Math.max(2, Math.round(share * order.samples)));
  const drawn = counts.reduce((sum, count) => sum + count, 0);
  const exact = wanted.map((part, k) => ({ ...part, share: counts[k] / drawn }));
  const z = keys.map(() => new Float64Array(capacity));
  const block = keys.map(() => new Float64Array(streamBlock));
  const factors = names.map(() => new Float64Array(capacity));
  const marks = new Uint8Array(capacity);
  const weights = new Float64Array(capacity).fill(1);
  const kept: number[][] = keys.map(() => []);
  const keptWeights: number[] = [];
  const keptFailed: number[] = [];
  exact.forEach((part, k) => {
    for (let start = 0; start < counts[k]; start += capacity) {
      const within = start % streamBlock;
      if (within === 0)
        keys.forEach((key, j) => {
          const count = Math.min(streamBlock, counts[k] - start);
          fillNormals(order.seed, `failures, part ${k}`, key, start / streamBlock, block[j], count);
        });
      const n = Math.min(capacity, counts[k] - start);
      for (let j = 0; j < dimension; j++) z[j].set(block[j].subarray(within, within + n));
      for (let i = 0; i < n; i++) moveSample(z, i, part.sd, part.moves[(start + i) % part.moves.length]);
      if (parts.length > 0) balanceWeights(exact, z, n, weights);
      states.evaluate(z, n, factors, marks, false);
      for (let i = 0; i < n; i++) {
        let bits = 0;
        for (let s = 0; s < names.length; s++) if (factors[s][i] < 1) bits |= 1 << s;
        if (bits === 0) continue;
        for (let j = 0; j < dimension; j++) kept[j].push(z[j][i]);
        keptWeights.push(weights[i]);
        keptFailed.push(bits);
      }
    }
  });
  return {
    z: kept.map((column) => Float64Array.from(column)),
    weights: Float64Array.from(keptWeights),
    failed: Uint32Array.from(keptFailed),
    drawn,
  };
}

/** Whether a failing sample belongs to an event. */
export function belongs(bits: number, event: number | "system"): boolean {
  return event === "system" || ((bits >>> event) & 1) === 1;
}
