import type { AssessResult, BestEstimate } from "../results.ts";
import { grouped, intervalText, probabilityText, significant } from "./number.ts";

const methodNames: Readonly<Record<string, string>> = {
  plain: "plain Monte Carlo sampling",
  latin_hypercube: "Latin hypercube sampling",
  sobol: "scrambled Sobol’ sequences",
  importance: "importance sampling around the design points",
  subset: "subset simulation",
  directional: "directional sampling",
};

export const methodName = (method: string): string => methodNames[method] ?? method.replaceAll("_", " ");

/** How the best estimate was made, and what an independent method says of it; at most a few sentences. */
export function bestEstimateSentences({ bestEstimate }: AssessResult): string[] {
  const { method, probability, interval, intervalKind, reason, evaluations, doubts = [] } = bestEstimate;
  const kind = intervalKind === undefined ? "" : ` (${intervalKind})`;
  const why =
    reason === undefined ? "" : `; taken because ${reason}`.replace("because asked for", "because it was asked for");
  return [
    `Best estimate: ${probabilityText(probability)}, ${intervalText(interval)}${kind}, by ${methodName(method)} with ${grouped(evaluations)} evaluations${why}.`,
    ...(doubts.length === 0 ? [] : [`In doubt: ${doubts.join("; ")}.`]),
    ...crossCheckSentence(bestEstimate),
  ];
}

function crossCheckSentence({ probability, crossCheck }: BestEstimate): string[] {
  if (crossCheck === undefined) return [];
  const { method, probability: other, interval, evaluations, agrees, seesFactor } = crossCheck;
  const what = `${methodName(method)} (${grouped(evaluations)} evaluations) gives ${probabilityText(other)}, ${intervalText(interval)}`;
  if (!agrees) return [`The cross-check DISAGREES: ${what}. Rely on neither until it is known why.`];
  if (seesFactor === null)
    return [
      `Cross-check: ${what}; ${probability > 0 ? "it is too coarse to confirm the estimate, and does not contradict it" : "neither method saw a failure"}.`,
    ];
  return [
    `Cross-check: ${what}; the two agree, and a difference by a factor of ${significant(seesFactor, 2)} would have shown.`,
  ];
}
