import { normalUpper } from "../numeric/normal.ts";
import type { DecisionBasis } from "./decision-basis.ts";
import type { FailureCentre } from "./mixture.ts";

/**
 * Failures in straight lines: an option's limit state fails about where direction·z > index. Only rules are found with them,
 * never values: where they are rough, a rule loses a little, and the value says so without bias.
 */
export interface FailureMode {
  readonly option: number;
  readonly index: number;
  /** Unit vector. */
  readonly direction: Float64Array;
  /** Cost of this limit state, brought to scale so that the option's modes add up to its expected cost. */
  readonly cost: number;
  /** Brought to scale so that the option's modes add up to its probability. */
  readonly weight: number;
  readonly limitState: string;
  /** Yearly coordinate that stands for its greatest value of the period. */
  readonly overYears?: number;
}

export function failureModes(
  { problem, failures, outcomes }: DecisionBasis,
  centres: readonly FailureCentre[],
): FailureMode[] {
  return problem.options.flatMap((option, o) => {
    const all = centres.filter((centre) => centre.option === o && Math.hypot(...centre.point) > 0);
    // over a period, the modes of the period: their chance is that of failing in any year
    const overYears = all.filter((centre) => centre.overYears !== undefined);
    const own = (overYears.length > 0 ? overYears : all).map((centre) => ({
      ...centre,
      point: centre.overYears?.point ?? centre.point,
    }));
    const indexOf = ({ point, originFails }: FailureCentre): number => (originFails ? -1 : 1) * Math.hypot(...point);
    const chances = own.map((centre) => normalUpper(indexOf(centre)));
    const prices = own.map(({ limitState }) => problem.failureCosts[limitState] ?? 0);
    const likely = chances.reduce((sum, chance) => sum + chance, 0);
    const dear = chances.reduce((sum, chance, j) => sum + chance * prices[j], 0);
    if (!(likely > 0) || failures.count === 0) return [];
    const cost = outcomes[o].expectedCost.value - option.cost;
    return own.map((centre, j): FailureMode => {
      const index = indexOf(centre);
      return {
        option: o,
        index,
        direction: centre.point.map((x) => x / index),
        cost: dear > 0 ? (prices[j] * cost) / dear : 0,
        weight: outcomes[o].probability.value / likely,
        limitState: centre.limitState,
        ...(centre.overYears === undefined ? {} : { overYears: centre.overYears.coordinate }),
      };
    });
  });
}

const step = 0.01;
const reach = 9;
const tail = Float64Array.from({ length: 2 * (reach / step) + 2 }, (_, i) => normalUpper(-reach + i * step));

/** 1 − Φ(z) from a table: relative error below 2e-4 within ±9, held beyond. */
export function quickUpper(z: number): number {
  const place = z <= -reach ? 0 : z >= reach ? 2 * (reach / step) : (z + reach) / step;
  const i = place | 0;
  return tail[i] + (place - i) * (tail[i + 1] - tail[i]);
}

/** Failure of a mode once something is known: Φ(−(index − gain·y)/spread). */
export interface ConditionalMode {
  readonly option: number;
  readonly cost: number;
  readonly weight: number;
  readonly index: number;
  /** One entry for each number that is known. */
  readonly gain: Float64Array;
  /** Standard deviation of direction·z that is left. */
  readonly spread: number;
}

/** Fills the predicted failure cost and probability of every option for sample i of the columns y, known less its mean. */
export type Predictor = (y: readonly Float64Array[], i: number, cost: Float64Array, probability: Float64Array) => void;

/** The modes laid out flat, because this runs for every sample and draw. */
export function predictorOf(modes: readonly ConditionalMode[]): Predictor {
  const size = modes[0]?.gain.length ?? 0;
  const gains = new Float64Array(size * modes.length);
  modes.forEach(({ gain }, j) => {
    gains.set(gain, j * size);
  });
  const indices = Float64Array.from(modes, ({ index }) => index);
  // a mode of which nothing is left open fails or does not: a very steep slope says the same
  const slopes = Float64Array.from(modes, ({ spread }) => 1 / Math.max(spread, 1e-9));
  const costs = Float64Array.from(modes, ({ cost }) => cost);
  const weights = Float64Array.from(modes, ({ weight }) => weight);
  const options = Int32Array.from(modes, ({ option }) => option);
  return (y, i, cost, probability) => {
    cost.fill(0);
    probability.fill(0);
    for (let j = 0; j < indices.length; j++) {
      let index = indices[j];
      for (let v = 0; v < size; v++) index -= gains[j * size + v] * y[v][i];
      const chance = quickUpper(index * slopes[j]);
      cost[options[j]] += costs[j] * chance;
      probability[options[j]] += weights[j] * chance;
    }
  };
}
