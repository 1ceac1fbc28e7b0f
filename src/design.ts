/** A wall with the user's own partial factors, beside its plain check. */
import { check } from "./check.ts";
import { designCheck } from "./mechanics/design-check.ts";
import { baseGroundOf } from "./mechanics/design-resistance.ts";
import { designStudy } from "./mechanics/design-values.ts";
import type { PartialFactors } from "./mechanics/partial-factors.ts";
import type { CheckResult } from "./results.ts";
import type { DesignResult } from "./results-design.ts";
import type { Study } from "./study/study.ts";

/**
 * Design resistance over design action for every limit state, at the values of a plain check.
 *
 * Strengths are brought to their design values and the wall is computed with them; its forces then take the factors of actions, and
 * its resistances those of resistances (see `designCheck`).
 *
 * @param plain a check of the same study
 * @param file what to call the factors
 */
export function design(study: Study, plain: CheckResult, factors: PartialFactors, file: string): DesignResult {
  const atDesignStrength = designStudy(study, plain.values, factors);
  const checked = check(atDesignStrength);
  const deepSeated =
    plain.limitStates.deep_seated === undefined
      ? undefined
      : check(designStudy(study, plain.values, factors, "factored")).limitStates.deep_seated;
  const setting = {
    ground: baseGroundOf(atDesignStrength, checked),
    passiveInOverturning: study.ground.front.inOverturning,
    eccentricityLimit: study.assessment.eccentricityLimit,
    ...(deepSeated === undefined ? {} : { deepSeated }),
  };
  return { file, at: plain.at, ...designCheck(checked, setting, factors) };
}
