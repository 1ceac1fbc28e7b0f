import { normalQuantile } from "../numeric/normal.ts";
import { fillUniforms } from "../probability/streams.ts";
import { evaluationsOf } from "./design-points.ts";
import type { LimitStates } from "./limit-states.ts";
import { createFailureCount, replicateEstimate } from "./replicates.ts";
import type { SamplingEstimate, SamplingOrder } from "./sampling-estimate.ts";

const points = 1024;
const together = 16;

/**
 * Latin hypercube sampling: replicates of 1024 points, each coordinate cut into 1024 equally likely parts with one point in
 * each, 16 replicates to begin with and doubled until the precision asked for is reached or the samples are used up.
 *
 * @source M. D. McKay, R. J. Beckman and W. J. Conover (1979), Technometrics 21, 239–245
 */
export function latinHypercube(states: LimitStates, order: SamplingOrder): SamplingEstimate {
  const before = evaluationsOf(states);
  const count = createFailureCount(states);
  const z = states.keys.map(() => new Float64Array(points));
  const failures: number[] = [];
  for (;;) {
    const add = Math.max(together, failures.length);
    if (failures.length > 0 && (failures.length + add) * points > order.samples) break;
    for (let k = 0; k < add; k++) {
      const replicate = failures.length;
      states.keys.forEach((key, j) => {
        fillStratified(order.seed, key, replicate, z[j]);
      });
      failures.push(count(z, points));
    }
    const { probability, standardError, failures: total } = replicateEstimate(failures, points);
    if (order.precision > 0 && total >= 20 && standardError <= order.precision * probability) break;
  }
  const { failures: total, ...estimate } = replicateEstimate(failures, points);
  return {
    method: "latin_hypercube",
    ...estimate,
    evaluations: evaluationsOf(states) - before,
    doubts: total === 0 ? ["no sample failed"] : [],
  };
}

const order = new Uint32Array(points);
const uniforms = new Float64Array(points);

/** One normal in each of equally likely parts, in random order (R. A. Fisher and F. Yates's shuffle). */
function fillStratified(seed: string, key: string, replicate: number, out: Float64Array): void {
  fillUniforms(seed, "latin hypercube, order", key, replicate, uniforms, points);
  for (let i = 0; i < points; i++) order[i] = i;
  for (let i = points - 1; i > 0; i--) {
    const other = Math.floor(uniforms[i] * (i + 1));
    const part = order[i];
    order[i] = order[other];
    order[other] = part;
  }
  fillUniforms(seed, "latin hypercube, place", key, replicate, uniforms, points);
  for (let i = 0; i < points; i++) out[i] = normalQuantile((order[i] + uniforms[i]) / points);
}
