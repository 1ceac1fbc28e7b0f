import type { LimitStateAssessment } from "../results.ts";
import type { HandMethod, RankedUnknown } from "../results-methods.ts";
import { uncapitalised } from "./display.ts";
import { indexText, leastProbability, probabilityText, significant } from "./number.ts";

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
  if (Math.abs(value) * sd < leastProbability || Math.abs(value) < 2 * (standardError ?? 0)) return "0";
  return `${value < 0 ? "−" : "+"}${probabilityText(Math.abs(value) * sd)}`;
}

/** So many rows or more that say next to nothing are named in one line instead. */
const fewestFolded = 4;
/** Parts of a whole that read "below 0.1 %", shifts that read 0.1 at most, correlations that are noise. */
const small = { part: 1e-3, shift: 0.15, correlation: 0.1 };

/** Rows of a long table that are worth their line, and the rest. */
export function foldRows<T>(
  rows: readonly T[],
  saysNothing: (row: T) => boolean,
): { readonly shown: readonly T[]; readonly folded: readonly T[] } {
  const folded = rows.filter(saysNothing);
  return folded.length < fewestFolded
    ? { shown: rows, folded: [] }
    : { shown: rows.filter((row) => !saysNothing(row)), folded };
}

/** Whether a driver is next to nothing by every measure that was taken of it. */
export const nextToNothing = (row: Partial<RankedUnknown>): boolean =>
  [row.share, row.importance, row.totalIndex].every((part) => Math.abs(part ?? 0) < small.part) &&
  Math.abs(row.shiftGivenFailure ?? 0) < small.shift &&
  Math.abs(row.rankCorrelation ?? 0) < small.correlation;

/** "Next to nothing: toe length, base thickness." */
export const foldedSentence = (labels: readonly string[]): readonly string[] =>
  labels.length === 0 ? [] : [`Next to nothing by every measure here: ${labels.map(uncapitalised).join(", ")}.`];
