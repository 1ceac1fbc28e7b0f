import type { JointSpace } from "../probability/marginal.ts";
import type { Move } from "./failure-mixture.ts";
import type { Columns, LimitStates } from "./limit-states.ts";
import type { Point } from "./point-evaluator.ts";

/** Limit states of a whole period: what is not yearly once, and every yearly coordinate once for each year. */
export interface PeriodStates extends LimitStates {
  readonly years: number;
  /** Where a point of one year lies among the coordinates of the period: with its yearly part in each of the years. */
  movesOf(point: Point): readonly Move[];
}

/**
 * Each limit state's factor is its least over the years, so that failing in the period is failing in any year.
 *
 * Evaluations stay counted per year, where the limit states count them.
 */
export function periodStates(states: LimitStates, space: JointSpace, years: number): PeriodStates {
  const fixed = space.coordinates.flatMap((coordinate, j) => (coordinate.yearly ? [] : [j]));
  const yearly = space.coordinates.flatMap((coordinate, j) => (coordinate.yearly ? [j] : []));
  const { capacity, names } = states;
  const keys = [
    ...fixed.map((j) => states.keys[j]),
    ...Array.from({ length: years }, (_, year) => yearly.map((j) => `${states.keys[j]}, year ${year}`)).flat(),
  ];
  const ofYear = names.map(() => new Float64Array(capacity));
  const marksOfYear = new Uint8Array(capacity);
  const columns = new Array<Float64Array>(states.dimension);
  const placeOf = (year: number, k: number): number => fixed.length + year * yearly.length + k;
  return {
    dimension: keys.length,
    keys,
    names,
    capacity,
    evaluations: states.evaluations,
    years,
    evaluate(z: Columns, n: number, factors: Columns, marks: Uint8Array, exact: boolean): void {
      for (let k = 0; k < fixed.length; k++) columns[fixed[k]] = z[k];
      marks.fill(0, 0, n);
      for (let year = 0; year < years; year++) {
        for (let k = 0; k < yearly.length; k++) columns[yearly[k]] = z[placeOf(year, k)];
        states.evaluate(columns, n, ofYear, marksOfYear, exact);
        for (let i = 0; i < n; i++) marks[i] |= marksOfYear[i];
        for (let s = 0; s < names.length; s++)
          for (let i = 0; i < n; i++) if (year === 0 || ofYear[s][i] < factors[s][i]) factors[s][i] = ofYear[s][i];
      }
    },
    evaluateAt(): void {
      throw new RangeError("a period has no single set of values");
    },
    movesOf(point) {
      const places = (year: number): number[] => [...fixed.map((_, k) => k), ...yearly.map((_, k) => placeOf(year, k))];
      const centre = [...fixed, ...yearly].map((j) => point[j]);
      return Array.from({ length: years }, (_, year) => ({ places: places(year), centre }));
    },
  };
}
