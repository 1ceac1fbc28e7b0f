import type { PlannedInvestigation } from "./decision-problem.ts";
import { type LearningBasis, valueOfInvestigation } from "./investigation.ts";
import type { Estimate } from "./stratified-sample.ts";

/** Value against number of tests. */
export interface TestsCurve {
  readonly points: readonly { readonly tests: number; readonly value: Estimate; readonly cost?: number }[];
  /** Number of tests of greatest net value, 0 where none pays; absent where the study gives no price. */
  readonly best?: number;
}

/**
 * Value of 0, 1, 2, … tests with every series of the investigation scaled alike, at the price of one test.
 *
 * The best number is where the next test costs more than it brings: the best of `someNumbers`, then of the whole numbers
 * between its neighbours.
 *
 * @param pricePerTest price of one more test of the first series
 */
export function testsCurve(
  learning: LearningBasis,
  investigation: PlannedInvestigation,
  most: number,
  pricePerTest?: number,
): TestsCurve {
  const [{ tests: planned }] = investigation.informs;
  const pointAt = (tests: number): TestsCurve["points"][number] => {
    const informs = investigation.informs.map((series) => ({ ...series, tests: (series.tests * tests) / planned }));
    const { value } = valueOfInvestigation(learning, { ...investigation, informs });
    return { tests, value, ...(pricePerTest === undefined ? {} : { cost: pricePerTest * tests }) };
  };
  const coarse = someNumbers(most).map(pointAt);
  if (pricePerTest === undefined) return { points: coarse };
  const place = bestOf(coarse);
  const between = (from: number, to: number): number[] =>
    Array.from({ length: Math.max(to - from - 1, 0) }, (_, k) => from + 1 + k);
  const here = coarse[place].tests;
  const fine = [
    ...between(coarse[place - 1]?.tests ?? here, here),
    ...between(here, coarse[place + 1]?.tests ?? here),
  ].map(pointAt);
  const points = [...coarse, ...fine].sort((a, b) => a.tests - b.tests);
  return { points, best: points[bestOf(points)].tests };
}

/** Place of the greatest net value. */
function bestOf(points: TestsCurve["points"]): number {
  const net = points.map(({ value, cost }) => value.value - (cost ?? 0));
  return net.indexOf(Math.max(...net));
}

/** 0, 1, 2, 3, 4, 6, 8, 12, 16, 24, … up to a limit. */
export function someNumbers(most: number): number[] {
  const numbers = [0, 1, 2, 3];
  for (let n = 4; n <= most; n *= 2) numbers.push(n, 1.5 * n);
  return numbers.filter((n) => n <= most);
}
