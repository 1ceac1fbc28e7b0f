import { normalCdf } from "../numeric/normal.ts";
import type { JointSpace } from "../probability/marginal.ts";
import { pictureEdges } from "../reliability/block-tally.ts";
import type { StateTotals } from "../reliability/monte-carlo.ts";
import type { FailurePicture } from "../results.ts";

/** Shares of the prior in the bins of u: known exactly, the outermost bins open. */
const priorShares: readonly number[] = pictureEdges.slice(1).map((edge, bin) => {
  const upper = bin === pictureEdges.length - 2 ? 1 : normalCdf(edge);
  return upper - (bin === 0 ? 0 : normalCdf(pictureEdges[bin]));
});

/** For every variable its distribution among the failures beside its prior, on common edges. Empty without failures. */
export function failurePicture(space: JointSpace, state: StateTotals): readonly FailurePicture[] {
  const { picture } = state;
  if (picture.failures === 0) return [];
  return space.unknowns.map(({ path, marginal }, v) => {
    const shift = picture.sums[v].value / picture.failures;
    const square = picture.squares[v].value / picture.failures - shift * shift;
    return {
      path,
      edges: pictureEdges.map((u) => marginal.quantileOfNormal(u)),
      prior: priorShares,
      givenFailure: picture.bins[v].map((count) => count / picture.failures),
      meanGivenFailure: marginal.mean + shift,
      sdGivenFailure: Math.sqrt(Math.max(square, 0)),
      failures: picture.failures,
    };
  });
}
