import { type CellSums, type CellTable, sumOverFolds, sumWithout } from "./cell-rule.ts";
import type { DecisionBasis } from "./decision-basis.ts";
import { cellCount, cellTable, type DecisionCells, errorOf, rowLength, rowRule } from "./decision-cells.ts";
import type { PlannedInvestigation } from "./decision-problem.ts";
import { type CombinedResults, type LearningBasis, scoresOf, tellingSeries } from "./investigation.ts";
import { termsOf } from "./investigation-value.ts";
import { type DrawnScores, decisionCellsOf, failingDraws } from "./joint-signal.ts";
import { mergeRanges } from "./merge-ranges.ts";
import type { Estimate } from "./stratified-sample.ts";
import { bestStagePlan, gainOfPlan, type SecondStage, type StageAction } from "./two-stage-rule.ts";

export interface PlanStep {
  /** Range of the first mean result in its own unit, where the first investigation informs one variable. */
  readonly from?: number;
  readonly to?: number;
  /** Chance of coming here. */
  readonly chance: number;
  readonly choice:
    | { readonly kind: "build"; readonly option: number }
    | { readonly kind: "investigate"; readonly investigation: number };
}

export interface TwoStagePlan {
  /** Places in the list of investigations. */
  readonly first: number;
  /** Expected saving against today's best, all investigations paid. */
  readonly netValue: Estimate;
  readonly chanceOfSecond: number;
  readonly steps: readonly PlanStep[];
}

/** Cells of a first result that informs one variable, over its score from −6 to 6 standard deviations. */
const firstCells = 64;
const reach = 6;

interface FirstSignal {
  readonly count: number;
  readonly failing: Uint32Array;
  readonly believed: Uint32Array;
  /** Ends of the cells as mean results; absent where several variables are informed. */
  readonly edges?: Float64Array;
}

/**
 * For every investigation as the first: the best plan of it and at most one other after it.
 *
 * @param combined results of all pairs that may follow one another
 */
export function twoStagePlans(
  learning: LearningBasis,
  investigations: readonly PlannedInvestigation[],
  combined: readonly CombinedResults[],
): readonly TwoStagePlan[] {
  const priced = combined.filter(({ places }) => places.every((i) => investigations[i].cost !== undefined));
  const firsts = [...new Set(priced.flatMap(({ places }) => places))].sort((a, b) => a - b);
  return firsts.map((first) => {
    const own = priced.filter(({ places }) => places.includes(first));
    const { name, informs } = investigations[first];
    const signal = firstSignal(learning, scoresOf(learning, name, tellingSeries(learning, informs)));
    const others = own.map(({ places: [i, j] }) => (i === first ? j : i));
    return planFrom(learning, first, investigations, others, signal, own);
  });
}

const coarsening = 4;
const inRow = rowLength / coarsening;
const coarse = (cells: Uint32Array): Uint32Array => cells.map((cell) => (cell / coarsening) | 0);

function firstSignal(learning: LearningBasis, scores: readonly DrawnScores[]): FirstSignal {
  const { basis, modes } = learning;
  if (scores.length > 1) {
    const { failing, believed } = decisionCellsOf(basis, modes, scores);
    return {
      count: cellCount(basis.problem.options.length) / coarsening,
      failing: coarse(failing),
      believed: coarse(believed),
    };
  }
  const [{ score, failing, believed }] = scores;
  const { known } = score.ledger.variable;
  const unit = Math.sqrt(known.row.reduce((sum, weight) => sum + weight * weight, 0) + score.noise);
  const placesOf = (y: Float64Array): Uint32Array => {
    const places = new Uint32Array(y.length);
    for (let i = 0; i < y.length; i++) {
      const place = Math.floor(((y[i] / unit + reach) / (2 * reach)) * firstCells);
      places[i] = place < 0 ? 0 : place >= firstCells ? firstCells - 1 : place;
    }
    return places;
  };
  const edges = Float64Array.from({ length: firstCells + 1 }, (_, c) =>
    c === 0 ? Number.NEGATIVE_INFINITY : c === firstCells ? Number.POSITIVE_INFINITY : resultOf(score, unit, c),
  );
  return {
    count: firstCells,
    failing: placesOf(failing),
    believed: placesOf(believed),
    edges,
  };
}

/** The mean result whose score is the lower end of cell c: scores rise with results. */
function resultOf(score: DrawnScores["score"], unit: number, c: number): number {
  const wanted = unit * (-reach + (2 * reach * c) / firstCells);
  const { marginal } = score.ledger.variable;
  const wide = 12 * (marginal.sd + score.sd);
  let [low, high] = [marginal.mean - wide, marginal.mean + wide];
  for (let k = 0; k < 60; k++) {
    const middle = 0.5 * (low + high);
    if (score.of(middle) < wanted) low = middle;
    else high = middle;
  }
  return 0.5 * (low + high);
}

/** A first investigation with those that may follow it. */
interface Stages {
  readonly signal: FirstSignal;
  readonly first: CellTable;
  readonly costs: readonly number[];
  /** Cells of the first and the second together: first × inner, row-major. */
  readonly cells: readonly DecisionCells[];
  readonly tables: readonly CellTable[];
  readonly inner: number;
}

function planFrom(
  { basis }: LearningBasis,
  first: number,
  investigations: readonly PlannedInvestigation[],
  others: readonly number[],
  signal: FirstSignal,
  pairs: readonly CombinedResults[],
): TwoStagePlan {
  const terms = termsOf(basis);
  const stages = stagesOf(
    basis,
    signal,
    others.map((j) => investigations[j].cost ?? 0),
    pairs,
  );
  const firstAll = sumOverFolds(stages.first);
  const all = stages.tables.map(sumOverFolds);
  const seconds = (sums: readonly CellSums[]): SecondStage[] =>
    sums.map((one, s) => ({ cost: stages.costs[s], cells: stages.inner, sums: one }));
  const planOn = (sums: CellSums, second: readonly CellSums[]): readonly StageAction[] =>
    bestStagePlan(sums, seconds(second), terms, rowRule(inRow)).actions;
  let gain = 0;
  const foldPlans = stages.first.belief.map((_, f) => {
    const actions = planOn(
      sumWithout(firstAll, stages.first, f),
      stages.tables.map((table, s) => sumWithout(all[s], table, f)),
    );
    gain += gainOfPlan(actions, foldOf(stages.first, f), seconds(stages.tables.map((one) => foldOf(one, f))), terms);
    return actions;
  });
  const plan = planOn(firstAll, all);
  const { belief } = firstAll;
  return {
    first,
    netValue: {
      value: gain - (investigations[first].cost ?? 0),
      standardError: planError(basis, foldPlans, stages, gain),
    },
    chanceOfSecond: plan.reduce((sum, action, c) => (action.kind === "investigate" ? sum + belief[c] : sum), 0),
    steps: planSteps(plan, belief, others, signal.edges),
  };
}

function foldOf({ belief, loss }: CellTable, fold: number): CellSums {
  return { belief: belief[fold], loss: loss[fold] };
}

function stagesOf(
  basis: DecisionBasis,
  signal: FirstSignal,
  costs: readonly number[],
  pairs: readonly CombinedResults[],
): Stages {
  const terms = termsOf(basis);
  const inner = cellCount(basis.problem.options.length) / coarsening;
  const draws = { failingDraws: failingDraws(basis), believedDraws: 1 };
  const cells = pairs.map(({ cells: together }) => ({
    failing: nested(signal.failing, together.failing, inner),
    believed: nested(signal.believed, together.believed, inner),
    ...draws,
  }));
  return {
    signal,
    costs,
    first: cellTable(basis, { ...signal, ...draws }, signal.count, terms),
    cells,
    tables: cells.map((one) => cellTable(basis, one, signal.count * inner, terms)),
    inner,
  };
}

function nested(first: Uint32Array, together: Uint32Array, inner: number): Uint32Array {
  const cells = new Uint32Array(first.length);
  for (let i = 0; i < cells.length; i++) cells[i] = first[i] * inner + ((together[i] / coarsening) | 0);
  return cells;
}

/** Savings of every sample under the plan of the other folds, for the standard error. */
function planError(
  basis: DecisionBasis,
  foldPlans: readonly (readonly StageAction[])[],
  { signal, cells, costs, inner }: Stages,
  gain: number,
): number {
  const { failures, beliefs, today } = basis;
  const { prices } = termsOf(basis);
  const chosen = (action: StageAction, sample: "failing" | "believed", at: number): number =>
    action.kind === "build" ? action.option : action.rule[cells[action.second][sample][at] % inner];
  const draws = failingDraws(basis);
  const savings = new Float64Array(failures.count);
  for (let i = 0; i < failures.count; i++) {
    const plan = foldPlans[failures.fold[i]];
    for (let at = i * draws; at < (i + 1) * draws; at++) {
      const o = chosen(plan[signal.failing[at]], "failing", at);
      savings[i] += (failures.cost[today][i] - failures.cost[o][i]) / draws;
    }
  }
  const bySample = new Float64Array(beliefs.count);
  for (let j = 0; j < beliefs.count; j++) {
    const action = foldPlans[beliefs.fold[j]][signal.believed[j]];
    const paid = action.kind === "investigate" ? costs[action.second] : 0;
    bySample[j] = prices[today] - prices[chosen(action, "believed", j)] - paid;
  }
  return errorOf(basis, savings, bySample, gain);
}

/** Ranges less likely than this join their neighbour. */
const negligible = 2e-3;

/** The plan as ranges of the first result, or, where it has no single number, what it leads to and how often. */
function planSteps(
  plan: readonly StageAction[],
  belief: Float64Array,
  others: readonly number[],
  edges?: Float64Array,
): PlanStep[] {
  type Choice = PlanStep["choice"];
  const same = (a: Choice, b: Choice): boolean => JSON.stringify(a) === JSON.stringify(b);
  const ranges = plan.map((action, c) => ({
    from: edges?.[c] ?? Number.NaN,
    to: edges?.[c + 1] ?? Number.NaN,
    chance: belief[c],
    choice: (action.kind === "build"
      ? { kind: "build", option: action.option }
      : { kind: "investigate", investigation: others[action.second] }) as Choice,
  }));
  if (edges !== undefined) return mergeRanges(ranges, same, negligible);
  const sorted = ranges.sort((a, b) => JSON.stringify(a.choice).localeCompare(JSON.stringify(b.choice)));
  return mergeRanges(sorted, same, 0)
    .map(({ chance, choice }) => ({ chance, choice }))
    .filter(({ chance }) => chance > 0)
    .sort((a, b) => b.chance - a.chance);
}
