import type { LimitStates } from "../reliability/limit-states.ts";

const cap = 1e3;

/** Least factor of safety over all limit states of what was survived. */
export function createSurvivalMargin(
  survivals: readonly LimitStates[],
): (z: readonly Float64Array[], n: number, least: Float64Array, exact: boolean) => void {
  const factors = survivals.map((states) => states.names.map(() => new Float64Array(states.capacity)));
  const marks = new Uint8Array(Math.max(0, ...survivals.map((states) => states.capacity)));
  return (z, n, least, exact) => {
    least.fill(cap, 0, n);
    survivals.forEach((states, s) => {
      states.evaluate(z, n, factors[s], marks, exact);
      for (const column of factors[s]) for (let i = 0; i < n; i++) if (column[i] < least[i]) least[i] = column[i];
    });
  };
}

/**
 * Limit states that fail where the wall fails now *and* has stood what it has stood: what a search for design points with
 * evidence looks for. The factor is the greater of F and 1/(least factor then), so both conditions meet at 1.
 *
 * @param level least factor that counts as survival: 1, or less for a search on its way there
 */
export function failureAfterSurvival(states: LimitStates, survivals: readonly LimitStates[], level = 1): LimitStates {
  if (survivals.length === 0) return states;
  const margin = createSurvivalMargin(survivals);
  const capacity = Math.min(states.capacity, ...survivals.map((one) => one.capacity));
  const least = new Float64Array(capacity);
  return {
    ...states,
    capacity,
    get evaluations() {
      return states.evaluations;
    },
    evaluate(z, n, factors, marks, exact) {
      states.evaluate(z, n, factors, marks, exact);
      margin(z, n, least, exact);
      for (const column of factors)
        for (let i = 0; i < n; i++) column[i] = Math.max(column[i], Math.min(level / least[i], cap));
    },
    evaluateAt() {
      throw new RangeError("what was survived depends on coordinates, not on values of the variables alone");
    },
  };
}

/** One limit state, "survival", whose failure domain (factor below 1) is all that has stood. */
export function survivalAsFailure(survivals: readonly LimitStates[]): LimitStates {
  const margin = createSurvivalMargin(survivals);
  const capacity = Math.min(...survivals.map((one) => one.capacity));
  const [first] = survivals;
  return {
    dimension: first.dimension,
    keys: first.keys,
    names: ["survival"],
    capacity,
    evaluations: { exact: 0, batched: 0 },
    evaluate(z, n, factors, marks, exact) {
      margin(z, n, factors[0], exact);
      for (let i = 0; i < n; i++) factors[0][i] = Math.min(1 / factors[0][i], cap);
      marks.fill(0, 0, n);
    },
    evaluateAt() {
      throw new RangeError("what was survived depends on coordinates, not on values of the variables alone");
    },
  };
}
