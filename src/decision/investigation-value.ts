import type { DecisionTerms } from "./cell-rule.ts";
import type { DecisionBasis } from "./decision-basis.ts";
import type { Estimate } from "./stratified-sample.ts";

/** What an investigation is worth before it is made. */
export interface LearningValue {
  /** Cross-fitted; in the study's currency. */
  readonly value: Estimate;
  /** The same rule judged on the samples it was found on, never smaller in the mean: bounds what noise in the rule can do. */
  readonly inSample: number;
  readonly chanceItChangesTheDecision: Estimate;
}

export function termsOf({ problem, today }: DecisionBasis): DecisionTerms {
  const { options, mustMeetTarget, target } = problem;
  return {
    prices: options.map((option) => option.cost),
    today,
    ...(mustMeetTarget && target !== undefined
      ? { mustMeet: { target, alwaysOpen: options.map((option) => option.alwaysOpen) } }
      : {}),
  };
}
