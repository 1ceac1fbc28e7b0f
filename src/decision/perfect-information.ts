import { normalUpper } from "../numeric/normal.ts";
import { refineIndices } from "./conditional-index.ts";
import type { DecisionBasis } from "./decision-basis.ts";
import { type CellDecision, createCellFinder, marginToTip, valueOfDecisionCells } from "./decision-cells.ts";
import { type ConditionalMode, type FailureMode, predictorOf } from "./failure-modes.ts";
import { createJudge } from "./failure-sample.ts";
import { termsOf } from "./investigation-value.ts";
import { statesOfPeriod } from "./period-states.ts";

/** ln of the ratio of two predicted costs below which the prediction is made again with care. */
const ambiguous = 1.5;

/** Predicted failure cost and probability of every option, for every sample. */
interface Predictions {
  readonly cost: readonly Float64Array[];
  readonly probability: readonly Float64Array[];
}

/**
 * Value of knowing all K at once, the upper bound of every investigation.
 *
 * An option whose failure hangs on knowledge alone is then known to fail or not, and what it costs is taken from the limit
 * states themselves. For the others the conditional cost comes from the failure modes, Φ(−(β − α_K·K)/|α_A|), and where two
 * options come close, from where the limit states themselves fail along α_A. This sorts the samples into cells; in each cell
 * the samples decide.
 *
 * @param careful where false, predictions from the design points are enough: for sizing a run, say
 */
export function valueOfPerfectInformation(
  basis: DecisionBasis,
  modes: readonly FailureMode[],
  { careful = true }: { readonly careful?: boolean } = {},
): CellDecision {
  const { failures, beliefs } = basis;
  const { options, roles } = basis.problem;
  const certain = options.map(({ reads }) => reads?.every((j) => roles[j] === "knowledge") === true);
  const open = modes.filter(({ option }) => !certain[option]);
  const sort = (z: readonly Float64Array[], count: number, exactly: (option: number) => ExactOption): Uint32Array => {
    const predicted = predictedCosts(basis, open, z, count);
    options.forEach((_, o) => {
      if (!certain[o]) return;
      const { cost, failure } = exactly(o);
      predicted.cost[o].set(cost);
      predicted.probability[o].set(failure);
    });
    if (careful) refine(basis, open, z, predicted);
    return cellsOf(basis, predicted, count);
  };
  return valueOfDecisionCells(basis, {
    failing: sort(failures.z, failures.count, (o) => ({ cost: failures.cost[o], failure: failures.failure[o] })),
    believed: sort(beliefs.z, beliefs.count, (o) => judged(basis, o)),
    failingDraws: 1,
    believedDraws: 1,
  });
}

function predictedCosts(
  { problem }: DecisionBasis,
  modes: readonly FailureMode[],
  z: readonly Float64Array[],
  count: number,
): Predictions {
  const { keys, roles, options } = problem;
  const known = keys.map((_, j) => j).filter((j) => roles[j] === "knowledge");
  const predict = predictorOf(
    modes.map(({ option, cost, weight, index, direction }): ConditionalMode => {
      const gain = Float64Array.from(known, (j) => direction[j]);
      const explained = gain.reduce((sum, g) => sum + g * g, 0);
      return { option, cost, weight, index, gain, spread: Math.sqrt(Math.max(1 - explained, 0)) };
    }),
  );
  const y = known.map((j) => z[j]);
  const columns = (): Float64Array[] => options.map(() => new Float64Array(count));
  const predicted = { cost: columns(), probability: columns() };
  const [cost, probability] = [new Float64Array(options.length), new Float64Array(options.length)];
  for (let i = 0; i < count; i++) {
    predict(y, i, cost, probability);
    for (let o = 0; o < options.length; o++) {
      predicted.cost[o][i] = cost[o];
      predicted.probability[o][i] = probability[o];
    }
  }
  return predicted;
}

/** The decision cell of every sample. */
function cellsOf(basis: DecisionBasis, predicted: Predictions, count: number): Uint32Array {
  const find = createCellFinder(termsOf(basis), basis.outcomes[basis.today].expectedCost.value);
  const [cost, probability] = [predicted.cost, predicted.probability].map((one) => new Float64Array(one.length));
  const cells = new Uint32Array(count);
  for (let i = 0; i < count; i++) {
    for (let o = 0; o < cost.length; o++) {
      cost[o] = predicted.cost[o][i];
      probability[o] = predicted.probability[o][i];
    }
    cells[i] = find(cost, probability);
  }
  return cells;
}

/** Predictions once more for the samples in which the decision is close, from the limit states themselves. */
function refine(
  basis: DecisionBasis,
  modes: readonly FailureMode[],
  z: readonly Float64Array[],
  predicted: Predictions,
): void {
  const { options, failureCosts } = basis.problem;
  const places = closeOnes(basis, predicted);
  if (places.length === 0) return;
  options.forEach((_, o) => {
    const own = modes.filter(({ option }) => option === o);
    if (own.length === 0) return;
    const fronts = own.map((mode) => frontOf(basis, mode, z, places));
    moveFronts(basis, own, fronts, z, places);
    const directions = fronts.map(({ along }) => along);
    const prices = own.map(({ limitState }) => failureCosts[limitState] ?? 0);
    const [chances, costs] = [own.map(() => 0), own.map(() => 0)];
    for (let k = 0; k < places.length; k++) {
      for (let m = 0; m < own.length; m++) {
        chances[m] = normalUpper(fronts[m].distance[k]);
        costs[m] = chances[m] * prices[m];
      }
      predicted.cost[o][places[k]] = together(directions, costs);
      predicted.probability[o][places[k]] = together(directions, chances);
    }
  });
}

function closeOnes(basis: DecisionBasis, { cost, probability }: Predictions): Int32Array {
  const margin = marginToTip(termsOf(basis), basis.outcomes[basis.today].expectedCost.value);
  const [costs, chances] = [new Float64Array(cost.length), new Float64Array(cost.length)];
  const close: number[] = [];
  for (let i = 0; i < cost[0].length; i++) {
    for (let o = 0; o < cost.length; o++) {
      costs[o] = cost[o][i];
      chances[o] = probability[o][i];
    }
    if (Math.abs(margin(costs, chances)) < ambiguous) close.push(i);
  }
  return Int32Array.from(close);
}

/** One mode given K: the part of its direction that is not known, of unit length, and where along it failure begins. */
interface Front {
  readonly along: Float64Array;
  /** Length of the part that is not known; 0 where knowledge decides all. */
  readonly size: number;
  /** One for each place; −∞ or ∞ where knowledge decides all. */
  readonly distance: Float64Array;
}

/** The front of a mode as its design point has it: straight. */
function frontOf(
  { problem }: DecisionBasis,
  { index, direction }: FailureMode,
  z: readonly Float64Array[],
  places: Int32Array,
): Front {
  const isKnown = (j: number): boolean => problem.roles[j] === "knowledge";
  const natural = direction.map((x, j) => (isKnown(j) ? 0 : x));
  const length = Math.hypot(...natural);
  const size = length < 1e-6 ? 0 : length;
  const distance = new Float64Array(places.length).fill(index);
  for (let j = 0; j < z.length; j++) {
    if (!isKnown(j) || direction[j] === 0) continue;
    const [column, share] = [z[j], direction[j]];
    for (let k = 0; k < places.length; k++) distance[k] -= share * column[places[k]];
  }
  for (let k = 0; k < places.length; k++)
    distance[k] = size > 0 ? distance[k] / size : distance[k] < 0 ? Number.NEGATIVE_INFINITY : Number.POSITIVE_INFINITY;
  return { along: natural.map((x) => (size > 0 ? x / size : 0)), size, distance };
}

/** A front this much farther out than the nearest of its option adds a hundredth to the chance, or less. */
const ofNoAccount = 2.5;

/** Takes the fronts to where the limit states themselves fail; one far behind another at a place is left as it is there. */
function moveFronts(
  { problem }: DecisionBasis,
  modes: readonly FailureMode[],
  fronts: readonly Front[],
  z: readonly Float64Array[],
  places: Int32Array,
): void {
  const { roles, years, options } = problem;
  const least = new Float64Array(places.length).fill(Number.POSITIVE_INFINITY);
  for (const { distance } of fronts) for (let k = 0; k < least.length; k++) least[k] = Math.min(least[k], distance[k]);
  modes.forEach(({ option, limitState, overYears }, m) => {
    const { along, size, distance } = fronts[m];
    if (size === 0) return;
    const near = places.map((_, k) => k).filter((k) => distance[k] < Math.max(least[k], 0) + ofNoAccount);
    const points = z.map((column, j) => {
      const point = new Float64Array(near.length);
      if (roles[j] === "knowledge") for (let i = 0; i < near.length; i++) point[i] = column[places[near[i]]];
      return point;
    });
    const s = new Float64Array(near.length);
    for (let i = 0; i < near.length; i++) s[i] = distance[near[i]];
    const { states } = options[option];
    const surface = overYears === undefined ? states : statesOfPeriod(states, overYears, years);
    refineIndices(surface, states.names.indexOf(limitState), points, along, s);
    for (let i = 0; i < near.length; i++) distance[near[i]] = s[i];
  });
}

/**
 * Sum of shares of which part happens together: each beside the largest counts by how little its direction is that of the
 * largest. A rough rule; the samples in the cells make up for it.
 */
function together(directions: readonly Float64Array[], shares: readonly number[]): number {
  const first = shares.indexOf(Math.max(...shares));
  return shares.reduce((sum, share, m) => {
    if (m === first) return sum + share;
    const cosine = directions[m].reduce((dot, x, j) => dot + x * directions[first][j], 0);
    return sum + share * (1 - Math.max(cosine, 0) ** 3);
  }, 0);
}

interface ExactOption {
  readonly cost: Float64Array;
  readonly failure: Float64Array;
}

/** Failure of an option at every sample of the beliefs. */
function judged({ problem, beliefs }: DecisionBasis, option: number): ExactOption {
  const { states } = problem.options[option];
  const judge = createJudge({ states }, problem.failureCosts);
  const [cost, failure] = [new Float64Array(beliefs.count), new Float64Array(beliefs.count)];
  for (let start = 0; start < beliefs.count; start += states.capacity) {
    const n = Math.min(states.capacity, beliefs.count - start);
    judge.evaluate(
      beliefs.z.map((column) => column.subarray(start, start + n)),
      n,
    );
    for (let i = 0; i < n; i++) {
      cost[start + i] = judge.cost[i];
      failure[start + i] = judge.failed[i];
    }
  }
  return { cost, failure };
}
