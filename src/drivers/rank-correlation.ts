import type { JointSpace } from "../probability/marginal.ts";
import { fillNormals, streamBlock } from "../probability/streams.ts";
import type { LimitStates } from "../reliability/limit-states.ts";

export interface RankCorrelation {
  readonly value: number;
  /** 95 %, by Fisher's transformation. */
  readonly interval: readonly [number, number];
}

/**
 * Spearman's rank correlation of every unknown with the factor of safety, from one plain sample.
 *
 * Ranks of a value are ranks of its standard normal, so no value need be computed; tied factors (at 0 or at the cap) share
 * their mean rank. The variance of Fisher's transform is 1.06/(n − 3).
 *
 * @returns per limit state, one per unknown; 0 with the interval [−1, 1] where nothing moves the factor
 * @source C. Spearman (1904); E. C. Fieller, H. O. Hartley and E. S. Pearson (1957), Biometrika 44, 470–481
 */
export function rankCorrelations(
  states: LimitStates,
  space: JointSpace,
  seed: string,
  samples = 4096,
): readonly (readonly RankCorrelation[])[] {
  const n = Math.min(samples, streamBlock);
  const { capacity, names } = states;
  const z = states.keys.map((key) => {
    const column = new Float64Array(n);
    fillNormals(seed, "rank correlation", key, 0, column, n);
    return column;
  });
  const columns = names.map(() => new Float64Array(n));
  const factors = names.map(() => new Float64Array(capacity));
  const marks = new Uint8Array(capacity);
  for (let start = 0; start < n; start += capacity) {
    const count = Math.min(capacity, n - start);
    states.evaluate(
      z.map((column) => column.subarray(start, start + count)),
      count,
      factors,
      marks,
      false,
    );
    for (let k = 0; k < names.length; k++) columns[k].set(factors[k].subarray(0, count), start);
  }
  const ranksOfUnknowns = space.rows.map((row) => {
    const u = new Float64Array(n);
    for (let j = 0; j < row.length; j++) if (row[j] !== 0) for (let i = 0; i < n; i++) u[i] += row[j] * z[j][i];
    return ranksOf(u);
  });
  return columns.map((column) => {
    const ranks = ranksOf(column);
    return ranksOfUnknowns.map((own) => withInterval(correlation(own, ranks), n));
  });
}

/** Ranks from 1; equal values share the mean of theirs. */
export function ranksOf(values: Float64Array): Float64Array {
  const order = Uint32Array.from(values, (_, i) => i).sort((a, b) => values[a] - values[b]);
  const ranks = new Float64Array(values.length);
  for (let start = 0; start < order.length; ) {
    let end = start + 1;
    while (end < order.length && values[order[end]] === values[order[start]]) end++;
    for (let i = start; i < end; i++) ranks[order[i]] = 0.5 * (start + end + 1);
    start = end;
  }
  return ranks;
}

function correlation(a: Float64Array, b: Float64Array): number {
  const middle = 0.5 * (a.length + 1);
  let [ab, aa, bb] = [0, 0, 0];
  for (let i = 0; i < a.length; i++) {
    ab += (a[i] - middle) * (b[i] - middle);
    aa += (a[i] - middle) ** 2;
    bb += (b[i] - middle) ** 2;
  }
  return aa > 0 && bb > 0 ? ab / Math.sqrt(aa * bb) : Number.NaN;
}

function withInterval(value: number, n: number): RankCorrelation {
  if (Number.isNaN(value)) return { value: 0, interval: [-1, 1] };
  const half = 1.959963984540054 * Math.sqrt(1.06 / (n - 3));
  const transformed = Math.atanh(Math.min(Math.max(value, -1 + 1e-12), 1 - 1e-12));
  return { value, interval: [Math.tanh(transformed - half), Math.tanh(transformed + half)] };
}
