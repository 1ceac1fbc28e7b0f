import type { LimitStateAssessment } from "../results.ts";
import type { HandMethod } from "../results-methods.ts";
import { indexText, probabilityText, significant } from "./number.ts";

/**
 * Hand methods as rows: name, mean and sd of the factor, both indices, and how far the better of their two probabilities lies from the
 * reference, as a factor.
 */
export function handRows(state: LimitStateAssessment): readonly (readonly string[])[] {
  const { handMethods, firstOrderSecondMoment: moment } = state;
  if (handMethods === undefined) return [];
  const reference = referenceOf(state);
  const row = (name: string, method: HandMethod | undefined): readonly (readonly string[])[] =>
    method === undefined
      ? []
      : [
          [
            name,
            significant(method.mean, 3),
            significant(method.sd, 3),
            indexText(method.reliabilityIndexNormal),
            indexText(method.reliabilityIndexLognormal),
            offBy(method, reference),
          ],
        ];
  return [
    ...row("Second moment, ± 1 sd", moment),
    ...row("Second moment, at the means", handMethods.smallSteps),
    ...row("Point estimates, all corners", handMethods.twoPoints),
    ...row("Point estimates, two an axis", handMethods.eigenvectorPoints),
  ];
}

/** What the hand methods are held against: sampling where it saw failures enough, else the design point. */
function referenceOf({ monteCarlo, secondOrderReliability, firstOrderReliability }: LimitStateAssessment): number {
  if (monteCarlo.failures >= 30) return monteCarlo.probability;
  return secondOrderReliability?.probability ?? firstOrderReliability?.probability ?? 0;
}

/** "× 0.4 to × 12": both guesses of the tail over the reference, normal and lognormal. */
function offBy({ probabilityNormal, probabilityLognormal }: HandMethod, reference: number): string {
  if (!(reference > 1e-12)) return "–";
  const ratio = (probability: number): string => {
    const value = probability / reference;
    return value < 1e-3 ? "× under 0.001" : value > 1e3 ? "× over 1000" : `× ${significant(value, 2)}`;
  };
  return `${ratio(probabilityNormal)}, ${ratio(probabilityLognormal)}`;
}

/** Change of the probability when a mean moves by one standard deviation; 0 where it is not clear of its sampling error. */
export function probabilityPerSd(
  derivative: { readonly value: number | null; readonly standardError: number | null } | undefined,
  sd: number | undefined,
): string {
  if (derivative === undefined || derivative.value === null || sd === undefined) return "–";
  const { value, standardError } = derivative;
  if (value === 0 || Math.abs(value) < 2 * (standardError ?? 0)) return "0";
  return `${value < 0 ? "−" : "+"}${probabilityText(Math.abs(value) * sd)}`;
}
