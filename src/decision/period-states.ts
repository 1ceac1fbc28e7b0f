import { logNormalCdf, normalUpperQuantile } from "../numeric/normal.ts";
import type { LimitStates } from "../reliability/limit-states.ts";

/**
 * The greatest of T independent standard normals that is as likely as v: y with Φ(y)^T = Φ(v).
 *
 *   1 − Φ(y) = 1 − Φ(v)^(1/T), through the logarithm so that neither tail loses digits
 */
export function greatestOfYears(v: number, years: number): number {
  return normalUpperQuantile(-Math.expm1(logNormalCdf(v) / years));
}

/**
 * Limit states with one yearly coordinate at its greatest value of the period: where to look for failures over many years, in
 * which an extreme year meets ordinary ground. Only for the search; no probability is taken from it.
 */
export function statesOfPeriod(states: LimitStates, coordinate: number, years: number): LimitStates {
  const greatest = new Float64Array(states.capacity);
  return {
    ...states,
    get evaluations() {
      return states.evaluations;
    },
    evaluate(z, n, factors, marks, exact) {
      const column = z[coordinate];
      for (let i = 0; i < n; i++) greatest[i] = greatestOfYears(column[i], years);
      const moved = z.map((other, j) => (j === coordinate ? greatest : other));
      states.evaluate(moved, n, factors, marks, exact);
    },
  };
}
