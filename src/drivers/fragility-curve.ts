import type { JointSpace } from "../probability/marginal.ts";
import type { Columns, LimitStates } from "../reliability/limit-states.ts";
import type { FailureEvent } from "../reliability/point-evaluator.ts";
import { estimateProbability } from "../reliability/quick-estimate.ts";
import type { SamplingEstimate, SamplingOrder } from "../reliability/sampling-estimate.ts";

/** Probability of failure with one unknown at a value, the others as they then are (correlation moves them along). */
export interface FragilityPoint {
  readonly value: number;
  readonly probability: number;
  readonly standardError: number;
  readonly interval: readonly [number, number];
  readonly method: SamplingEstimate["method"];
}

export interface FragilityOrder extends SamplingOrder {
  readonly event: FailureEvent;
  /** Values to look at; by default 21 from the 0.1 to the 99.9 % fractile, in even steps. */
  readonly values?: readonly number[];
}

/**
 * Fragility curve: the probability of failure as a function of one unknown, for example of the water level.
 *
 * All points see the same draws, so the curve is smooth; each is counted where failures are common and sampled around design points
 * where they are rare.
 *
 * @param place of the unknown in the space
 * @throws RangeError for a value outside its support, or a place that there is not
 */
export function fragilityCurve(
  states: LimitStates,
  space: JointSpace,
  place: number,
  order: FragilityOrder,
): readonly FragilityPoint[] {
  const unknown = space.unknowns[place];
  if (unknown === undefined) throw new RangeError(`there is no unknown ${place}`);
  const { marginal, path } = unknown;
  const values = order.values ?? evenSteps(marginal.quantile(0.001), marginal.upperQuantile(0.001), 21);
  const event = order.event === "system" ? states : onlyOne(states, order.event);
  return values.map((value) => {
    const u = marginal.normalOfQuantile(value);
    if (!Number.isFinite(u))
      throw new RangeError(`${path}: ${value} is outside ${marginal.lowest} to ${marginal.highest}`);
    const given = conditionedStates(event, space.rows[place], u);
    const { probability, standardError, interval, method } = estimateProbability(given, space, order);
    return { value, probability, standardError, interval, method };
  });
}

function evenSteps(from: number, to: number, count: number): number[] {
  return Array.from({ length: count }, (_, k) => from + ((to - from) * k) / (count - 1));
}

/** One limit state of several. */
function onlyOne(states: LimitStates, place: number): LimitStates {
  const { names, capacity } = states;
  if (names[place] === undefined) throw new RangeError(`there is no limit state ${place}`);
  const all = names.map(() => new Float64Array(capacity));
  return {
    ...states,
    names: [names[place]],
    evaluations: states.evaluations,
    evaluate(z, n, factors, marks, exact) {
      states.evaluate(z, n, all, marks, exact);
      factors[0].set(all[place].subarray(0, n));
    },
    evaluateAt(x, n, factors, marks) {
      states.evaluateAt(x, n, all, marks);
      factors[0].set(all[place].subarray(0, n));
    },
  };
}

/**
 * The same limit states with one normal held: z becomes z − (row·z) row + u row, whose unknown is at u whatever z, and the rest as
 * its distribution given that.
 *
 * @param row of the unknown, of unit length
 */
export function conditionedStates(states: LimitStates, row: Float64Array, u: number): LimitStates {
  const { capacity, dimension } = states;
  const held = Array.from({ length: dimension }, () => new Float64Array(capacity));
  const hold = (z: Columns, n: number): Columns => {
    for (let i = 0; i < n; i++) {
      let change = u;
      for (let j = 0; j < dimension; j++) change -= row[j] * z[j][i];
      for (let j = 0; j < dimension; j++) held[j][i] = z[j][i] + change * row[j];
    }
    return held;
  };
  return {
    ...states,
    evaluations: states.evaluations,
    evaluate(z, n, factors, marks, exact) {
      states.evaluate(hold(z, n), n, factors, marks, exact);
    },
  };
}
