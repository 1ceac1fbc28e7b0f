import { normalQuantile } from "../numeric/normal.ts";
import { type SobolSequence, scrambledSobolSequence, sobolDimensions } from "../probability/sobol-sequence.ts";
import { fillNormals } from "../probability/streams.ts";
import { evaluationsOf } from "./design-points.ts";
import type { LimitStates } from "./limit-states.ts";
import { createFailureCount, replicateEstimate } from "./replicates.ts";
import type { SamplingEstimate, SamplingOrder } from "./sampling-estimate.ts";

const replicates = 16;
const firstPoints = 256;

/**
 * Sampling by scrambled Sobol' sequences: 16 replicates, their points doubled until the precision asked for is reached or the
 * samples are used up.
 *
 * The stop looks at the wider of the two errors (see `replicateEstimate`), so a spread that is small by luck among few failures
 * stops nothing. Coordinates beyond the sequence's dimensions are drawn at random.
 */
export function sobolSampling(states: LimitStates, order: SamplingOrder): SamplingEstimate {
  const before = evaluationsOf(states);
  const { keys } = states;
  const count = createFailureCount(states);
  const even = keys.slice(0, sobolDimensions);
  const sequences = Array.from({ length: replicates }, (_, r) =>
    scrambledSobolSequence(even, order.seed, "sobol sampling", r),
  );
  const failures = new Array<number>(replicates).fill(0);
  let points = 0;
  for (let blockNumber = 0; ; blockNumber++) {
    const add = Math.max(firstPoints, points);
    if (points > 0 && (points + add) * replicates > order.samples) break;
    sequences.forEach((sequence, r) => {
      failures[r] += failuresAmong(sequence, add, `${r}, ${blockNumber}`);
    });
    points += add;
    const { probability, standardError, failures: total } = replicateEstimate(failures, points);
    if (order.precision > 0 && total >= 20 && standardError <= order.precision * probability) break;
  }
  const { failures: total, ...estimate } = replicateEstimate(failures, points);
  return {
    method: "sobol",
    ...estimate,
    evaluations: evaluationsOf(states) - before,
    doubts: total === 0 ? ["no sample failed"] : [],
  };

  function failuresAmong(sequence: SobolSequence, points: number, part: string): number {
    const size = Math.min(points, 4096);
    const z = keys.map(() => new Float64Array(size));
    let failed = 0;
    for (let start = 0; start < points; start += size) {
      sequence.fill(z.slice(0, even.length), size);
      keys.forEach((key, j) => {
        if (j < even.length) for (let i = 0; i < size; i++) z[j][i] = normalQuantile(z[j][i]);
        else fillNormals(order.seed, `sobol sampling, ${part}`, key, start / size, z[j], size);
      });
      failed += count(z, size);
    }
    return failed;
  }
}
