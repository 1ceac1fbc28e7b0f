/** Everything about a study that one value alone cannot tell: checks between values, then notes on plausibility. */

import type { TreeReader } from "./build-study.ts";
import { checkContext } from "./check-context.ts";
import { checkDecision, checkEvidence, type TryChange } from "./check-decision.ts";
import { checkGround } from "./check-ground.ts";
import { checkModel } from "./check-model.ts";
import { checkCorrelations } from "./check-unknowns.ts";
import { checkWall } from "./check-wall.ts";
import { notePlausibility } from "./plausibility.ts";
import type { Study } from "./study.ts";

/**
 * @param changed the study was changed from outside: what lost its object is left aside
 * @param tryChange reads the study with changes; throws what is wrong with it
 * @returns the study without correlations that have no effect
 */
export function crossCheck(study: Study, read: TreeReader, changed: boolean, tryChange: TryChange): Study {
  const context = checkContext(study, read, changed);
  checkWall(context);
  checkGround(context);
  checkModel(context);
  const correlations = checkCorrelations(context);
  if (!changed) {
    checkEvidence(context, tryChange);
    checkDecision(context, tryChange);
  }
  if (read.findings.problems.length === 0) notePlausibility(context);
  return { ...study, correlations };
}
