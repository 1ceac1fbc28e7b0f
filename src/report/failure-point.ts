import type { AssessResult } from "../results.ts";
import { limitStateWords } from "./display.ts";
import { probabilityText } from "./number.ts";

/** Values at which the wall is most likely to fail, as far as the methods that ran can tell. */
export interface FailurePoint {
  /** For a heading: "the most likely failure: sliding". */
  readonly name: string;
  readonly how: string;
  /** By path, house units. */
  readonly values: Readonly<Record<string, number>>;
}

/**
 * The design point of the likeliest limit state where one was found, else the means of the unknowns among the failing samples;
 * nothing where no failure was seen.
 */
export function failurePoint(result: AssessResult): FailurePoint | undefined {
  return designPoint(result) ?? meanOfFailures(result);
}

function designPoint({ limitStates }: AssessResult): FailurePoint | undefined {
  const found = Object.entries(limitStates).flatMap(([name, { firstOrderReliability: point }]) =>
    point?.converged && point.probability !== null && Object.keys(point.designPoint).length > 0
      ? [{ name, probability: point.probability, values: point.designPoint }]
      : [],
  );
  if (found.length === 0) return undefined;
  const likeliest = found.reduce((most, one) => (one.probability > most.probability ? one : most));
  return {
    name: `the most likely failure: ${limitStateWords[likeliest.name] ?? likeliest.name}`,
    how: `The design point of this limit state: of all values at which it fails, the likeliest (first-order probability ${probabilityText(likeliest.probability)}).`,
    values: likeliest.values,
  };
}

function meanOfFailures({ system }: AssessResult): FailurePoint | undefined {
  if (system.failurePicture.length === 0) return undefined;
  const { failures } = system.failurePicture[0];
  return {
    name: "a typical failure",
    how: `The means of the unknowns among ${failures === 1 ? "the one failing sample" : `${failures} failing samples`}.`,
    values: Object.fromEntries(system.failurePicture.map((picture) => [picture.path, picture.meanGivenFailure])),
  };
}
