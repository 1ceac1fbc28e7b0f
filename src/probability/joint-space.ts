import { type Problem, StudyError } from "../errors.ts";
import type { Correlation, Notice } from "../study/study.ts";
import { splitSpace } from "./knowledge-and-nature.ts";
import type { JointSpace } from "./marginal.ts";
import {
  correlationMatrix,
  factorByName,
  normalCorrelations,
  type StatedUnknown,
  worstPair,
} from "./normal-correlations.ts";

export type { StatedUnknown } from "./normal-correlations.ts";

export interface SpaceWithNotices extends JointSpace {
  /** Correlation of the standard normals, unknowns × unknowns. */
  readonly correlation: readonly Float64Array[];
  readonly notices: readonly Notice[];
}

/**
 * The joint distribution of all unknowns as rows over independent standard normals, u = rows · z.
 *
 * @param split false: one coordinate for an unknown, only the correlation of u counts, and no study is refused for its
 *   shares of knowledge. True: knowledge and nature have coordinates of their own (knowledge-and-nature.ts); for evidence,
 *   the value of investigations, and yearly values
 * @throws StudyError with every correlation that cannot be, by `correlations.N` and its pair
 */
export function jointSpace(
  unknowns: readonly StatedUnknown[],
  correlations: readonly Correlation[],
  split: boolean,
): SpaceWithNotices {
  const { pairs, problems, notices } = normalCorrelations(unknowns, correlations);
  if (problems.length > 0) throw new StudyError(problems);
  const correlation = correlationMatrix(unknowns.length, pairs);
  const factored = factorByName(
    correlation,
    unknowns.map(({ path }) => path),
  );
  if ("direction" in factored) throw new StudyError([noJointDistribution(unknowns, pairs, factored.direction)]);
  if (split) {
    const space = splitSpace(unknowns, pairs, correlation);
    return { ...space, correlation, notices: [...notices, ...space.notices] };
  }
  return {
    unknowns: unknowns.map(({ path, marginal, knowledge, yearly }) => ({
      path,
      marginal,
      knowledge: knowledge ?? (yearly ? 0 : 1),
      yearly,
    })),
    coordinates: unknowns.map(({ path }) => ({ key: path, part: "knowledge", yearly: false })),
    rows: factored.rows,
    correlation,
    notices,
  };
}

function noJointDistribution(
  unknowns: readonly StatedUnknown[],
  pairs: ReturnType<typeof normalCorrelations>["pairs"],
  direction: ArrayLike<number>,
): Problem {
  const involved = pairs.filter((pair) => direction[pair.first] !== 0 && direction[pair.second] !== 0);
  const worst = worstPair(involved, direction) ?? pairs[0];
  const name = (i: number): string => unknowns[i].path;
  const others = involved
    .filter((pair) => pair !== worst)
    .map((pair) => `${name(pair.first)} with ${name(pair.second)} ${pair.stated}`);
  return {
    path: worst.path,
    message: `${name(worst.first)} and ${name(worst.second)} cannot have a correlation of ${worst.stated} beside the others: ${others.join(", ")}`,
    hint: "pairs that are not given are uncorrelated; give the pair in between, or a weaker correlation",
  };
}
