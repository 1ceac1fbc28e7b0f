/** What plain sampling draws from: the study as it is believed, or with its evidence as it is believed afterwards. */
import { conditionOnResults } from "./decision/condition-on-results.ts";
import type { DecisionProblem } from "./decision/decision-problem.ts";
import { agreementOf, settledProblem } from "./decision/posterior-states.ts";
import { decisionModel } from "./decision-model.ts";
import { buildModel, type Model } from "./model.ts";
import type { JointSpace } from "./probability/marginal.ts";
import type { Agreement } from "./reliability/block-tally.ts";
import type { LimitStates } from "./reliability/limit-states.ts";
import type { Study } from "./study/study.ts";

export interface SampledModel {
  readonly states: LimitStates;
  /** The study's unknowns over the coordinates that are drawn. */
  readonly space: JointSpace;
  /** The next two only where the study has evidence. Samples are drawn, moved, and kept where they agree. */
  readonly agrees?: Agreement;
  /** The study as it stands after all results, over independent standard normals; what is left to weigh is something survived. */
  readonly problem?: DecisionProblem;
}

/**
 * Results of tests set the coordinates anew; what was survived, and what the likelihood of results on variables that are not
 * normal still has to say, decides which samples agree.
 *
 * @throws StudyError where correlations or shares of knowledge have no joint distribution
 */
export function sampledModel(study: Study, model: Model = buildModel(study)): SampledModel {
  if (study.evidence.length === 0) return { states: model.states, space: model.space };
  const { problem: prior, results } = decisionModel({ ...study, decision: undefined });
  const updated = conditionOnResults(prior, results);
  const settled = settledProblem(updated);
  const { problem } = settled;
  // samples are moved before they are looked at: the limit states and the unknowns are then those before the move
  const seen = settled.move === undefined ? problem : updated;
  const images = new Map(seen.variables.map(({ path, image }) => [path, image]));
  const imageOf = (path: string) => {
    const image = images.get(path);
    if (image === undefined) throw new RangeError(`the decision model has no variable ${path}`);
    return image;
  };
  const { unknowns } = model.space;
  return {
    states: seen.options[0].states,
    space: {
      unknowns,
      coordinates: problem.keys.map((key, j) => ({
        key,
        part: problem.roles[j] === "knowledge" ? "knowledge" : "nature",
        yearly: problem.roles[j] === "yearly",
      })),
      rows: unknowns.map(({ path }) => imageOf(path).row),
      offsets: unknowns.map(({ path }) => imageOf(path).offset),
    },
    agrees: agreementOf(updated, settled),
    problem,
  };
}
