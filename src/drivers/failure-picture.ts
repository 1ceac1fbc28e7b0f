import { normalCdf } from "../numeric/normal.ts";
import type { JointSpace } from "../probability/marginal.ts";
import { pictureEdges } from "../reliability/block-tally.ts";
import type { StateTotals } from "../reliability/monte-carlo.ts";
import { dot, type FailureEvent } from "../reliability/point-evaluator.ts";
import type { FailurePicture } from "../results.ts";
import { belongs, type FailureSample } from "./failure-sample.ts";
import { lazyTable } from "./lazy-table.ts";

/** Shares of the prior in the bins of u: known exactly, the outermost bins open. */
const priorShares: readonly number[] = pictureEdges.slice(1).map((edge, bin) => {
  const upper = bin === pictureEdges.length - 2 ? 1 : normalCdf(edge);
  return upper - (bin === 0 ? 0 : normalCdf(pictureEdges[bin]));
});

/**
 * For every variable its distribution among the failures beside that over all samples, on common edges. Empty without failures.
 *
 * @param believed samples that agree with what has been seen; absent without evidence, where the shares are known exactly
 */
export function failurePicture(
  space: JointSpace,
  state: StateTotals,
  believed?: StateTotals["picture"],
): readonly FailurePicture[] {
  const { picture } = state;
  if (picture.failures === 0) return [];
  return space.unknowns.map(({ path, marginal }, v) => {
    const shift = picture.sums[v].value / picture.failures;
    const square = picture.squares[v].value / picture.failures - shift * shift;
    return {
      path,
      edges: pictureEdges.map((u) => marginal.quantileOfNormal(u)),
      prior: believed === undefined ? priorShares : believed.bins[v].map((count) => count / believed.failures),
      givenFailure: picture.bins[v].map((count) => count / picture.failures),
      meanGivenFailure: marginal.mean + shift,
      sdGivenFailure: Math.sqrt(Math.max(square, 0)),
      failures: picture.failures,
    };
  });
}

/**
 * The same from weighted failing samples, for failures too rare to be counted.
 *
 * `failures` is the number that plain sampling would need for the same error: (Σ w)²/Σ w².
 */
export function weightedFailurePicture(
  space: JointSpace,
  sample: FailureSample,
  event: FailureEvent,
): readonly FailurePicture[] {
  const chosen = Array.from(sample.weights, (_, s) => s).filter((s) => belongs(sample.failed[s], event));
  const total = chosen.reduce((sum, s) => sum + sample.weights[s], 0);
  if (total === 0) return [];
  const squares = chosen.reduce((sum, s) => sum + sample.weights[s] ** 2, 0);
  const z = new Float64Array(sample.z.length);
  return space.unknowns.map(({ path, marginal }, v) => {
    const bins = new Array<number>(pictureEdges.length - 1).fill(0);
    let [shift, square] = [0, 0];
    const valueAt = lazyTable(marginal, marginal.quantileOfNormal);
    for (const s of chosen) {
      for (let j = 0; j < z.length; j++) z[j] = sample.z[j][s];
      const u = dot(space.rows[v], z);
      const share = sample.weights[s] / total;
      const off = valueAt(u) - marginal.mean;
      shift += share * off;
      square += share * off * off;
      bins[Math.min(Math.max(Math.floor((u - pictureEdges[0]) * 4), 0), bins.length - 1)] += share;
    }
    return {
      path,
      edges: pictureEdges.map((u) => marginal.quantileOfNormal(u)),
      prior: priorShares,
      givenFailure: bins,
      meanGivenFailure: marginal.mean + shift,
      sdGivenFailure: Math.sqrt(Math.max(square - shift * shift, 0)),
      failures: Math.round((total * total) / squares),
    };
  });
}
