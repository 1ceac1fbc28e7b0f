/** Sentences that the page and the terminal share, so that both say the same of the same number. */
import type { AssessResult, FirstOrderResult, MonteCarloResult } from "../results.ts";
import { betweenText, grouped, indexText, oneIn, significant } from "./number.ts";

/** A probability as it is known: by counting failures, or by a method that weighs its samples. */
export interface Estimate {
  readonly probability: number;
  readonly interval: readonly [number, number];
  readonly reliabilityIndex: number | null;
  /** Failures among samples, where the estimate is a plain count. */
  readonly counted?: { readonly failures: number; readonly samples: number; readonly of?: "periods" };
}

export const countedEstimate = (mc: MonteCarloResult): Estimate => ({
  probability: mc.probability,
  interval: mc.interval,
  reliabilityIndex: mc.reliabilityIndex,
  counted: { failures: mc.failures, samples: mc.samples },
});

/** What is known of the wall as a whole: over the period where the study has one, else its count or the best estimate. */
export function wallEstimate({ bestEstimate, system }: AssessResult): Estimate {
  const { probability, interval, reliabilityIndex } = bestEstimate;
  if (!bestEstimate.method.startsWith("plain")) return { probability, interval, reliabilityIndex };
  if (system.period === undefined) return countedEstimate(system.monteCarlo);
  const { failures, periods } = system.period;
  return { probability, interval, reliabilityIndex, counted: { failures, samples: periods, of: "periods" } };
}

export const noneSeen = ({ counted }: Estimate): boolean => counted !== undefined && counted.failures === 0;
export const allFailed = ({ counted }: Estimate): boolean =>
  counted !== undefined && counted.failures === counted.samples;

/** "about 1 in 240; between 1 in 225 and 1 in 255". Zero failures never read as safe. */
export function estimateSentence(estimate: Estimate): string {
  const { probability, interval, counted } = estimate;
  if (counted?.failures === 0)
    return `no failure in ${countText(counted)}, which shows only that it is rarer than ${oneIn(interval[1])} (upper end of the 95 % interval)`;
  if (counted !== undefined && counted.failures === counted.samples)
    return `failure in every one of ${countText(counted)}`;
  const between = betweenText(interval);
  return aboutText(probability) === between ? between : `${aboutText(probability)}; ${between}`;
}

/** "about 1 in 240"; "below 1 in 10¹²" for what is too rare to name. */
export function aboutText(probability: number): string {
  const text = oneIn(probability);
  return text.startsWith("below") ? text : `about ${text}`;
}

/** "131 072 samples". */
export const countText = ({ samples, of }: NonNullable<Estimate["counted"]>): string =>
  `${grouped(samples)} ${of ?? "samples"}`;

/** One value of a table: "1 in 240", "none seen". */
export const oneInCell = (estimate: Estimate): string =>
  noneSeen(estimate) ? "none seen" : oneIn(estimate.probability);

/** Where an interval stands against the target. "open" where the target lies inside it. */
export type Standing = "below" | "above" | "open";

export function standing({ interval: [low, high] }: Pick<Estimate, "interval">, target: number): Standing {
  if (high <= target) return "below";
  return low > target ? "above" : "open";
}

/** "4.9 times the target", "a third of the target"; nothing where no failure was seen. */
export function multipleText(probability: number, target: number): string {
  const ratio = probability / target;
  if (!(ratio > 0)) return "";
  if (ratio >= 1e4 || ratio < 1e-4)
    return ratio > 1 ? "over 10 000 times the target" : "under a ten-thousandth of the target";
  return `${significant(ratio, 2)} times the target`;
}

/** The target named: "1 in 1030 (index 3.10; the owner's brief)". */
export function targetName({ target }: Pick<AssessResult, "target">): string {
  if (target === undefined) return "";
  const parts = [
    `index ${indexText(target.reliabilityIndex)}`,
    ...(target.period === undefined ? [] : [yearsText(target.period)]),
    ...(target.reason === undefined ? [] : [target.reason]),
  ];
  return `${oneIn(target.probability)} (${parts.join("; ")})`;
}

/** The wall against its target, in one sentence; none without a target. */
export function againstTarget(result: AssessResult): string[] {
  const { target } = result;
  if (target === undefined) return [];
  const estimate = wallEstimate(result);
  const named = targetName(result);
  const times = noneSeen(estimate) ? "" : multipleText(estimate.probability, target.probability);
  switch (standing(estimate, target.probability)) {
    case "below":
      return [`The whole interval lies below the target of ${named}.`];
    case "above":
      return [`The whole interval lies above the target of ${named}${times === "" ? "" : `: ${times}`}.`];
    case "open":
      return [`The target of ${named} lies within the interval: this run does not tell whether it is met.`];
  }
}

/** " within 50 years", where the study has yearly values. */
export const within = ({ bestEstimate: { years } }: AssessResult): string =>
  years === undefined ? "" : ` within ${yearsText(years)}`;

/** What the probability is of: so many years, or the ground as it is. */
export function periodSentence({ bestEstimate: { years }, system }: AssessResult): string {
  if (years === undefined)
    return "No value in the study is yearly: the probability holds for the ground as it is, and is not per year.";
  return `The probability of the wall is of ${yearsText(years)}, in any of which it may fail; in one year it is ${oneInCell(countedEstimate(system.monteCarlo))}, and the probabilities of the limit states are of one year too.`;
}

export const yearsText = (years: number): string => `${Number(years.toPrecision(4))} ${years === 1 ? "year" : "years"}`;

/** "sliding, overturning or bearing failure". */
export function orList(words: readonly string[], link = "or"): string {
  if (words.length < 2) return words.join("");
  return `${words.slice(0, -1).join(", ")} ${link} ${words[words.length - 1]}`;
}

/** How the search for a design point ended, in words, with the points farther out where there are some. */
export function designPointWords({ status, others = [] }: Pick<FirstOrderResult, "status" | "others">): string {
  const further = others.map(({ reliabilityIndex }) => indexText(reliabilityIndex));
  const more =
    further.length === 0 ? "" : `; ${further.length === 1 ? "another" : "others"} at index ${orList(further, "and")}`;
  switch (status) {
    case "smooth":
      return `design point found${more}`;
    case "corner":
      return `design point found, at a kink of the limit state${more}`;
    case "usable":
      return `the search did not settle: the point fails, but a nearer one may exist${more}`;
    default:
      return "no design point: nothing within reach fails";
  }
}
