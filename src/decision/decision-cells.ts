import {
  bestRule,
  type CellSums,
  type CellTable,
  type CellValue,
  type DecisionTerms,
  type Rule,
  thresholdRule,
  valueOfCells,
} from "./cell-rule.ts";
import type { DecisionBasis } from "./decision-basis.ts";
import { type LearningValue, termsOf } from "./investigation-value.ts";
import { type StratifiedSample, stratifiedSum } from "./stratified-sample.ts";

/**
 * Cells for what is seen in any number of dimensions: which option is predicted to be the best beside today's, and by how
 * much. The prediction only sorts; in every cell the samples themselves decide. So a rough prediction costs a little value,
 * and none where it has the order right.
 */
export interface DecisionCells {
  /** By sample and draw: the cell. */
  readonly failing: Uint32Array;
  readonly believed: Uint32Array;
  /** Draws of what is seen, per failing sample and per sample of the beliefs. */
  readonly failingDraws: number;
  readonly believedDraws: number;
}

/** Cells of one row: predictions in which the same option is the best beside today's. */
export const rowLength = 160;
const reach = 4;

export function cellCount(options: number): number {
  return options * rowLength;
}

/** A predicted decision: the option that the cell's row belongs to, and how far it is from tipping. */
interface Prediction {
  option: number;
  margin: number;
}

/**
 * The best option but today's, and ln of today's cost over its cost. Where the target decides: the best of those predicted to
 * be open, and ln of the probability over the target of the option nearest to it.
 *
 * @param scale cost beside which smaller ones do not matter
 */
function createPredictor(
  { prices, mustMeet, today }: DecisionTerms,
  scale: number,
): (cost: Float64Array, probability: Float64Array) => Prediction {
  const fixed = Float64Array.from(prices, (price) => price + 1e-4 * scale + Number.MIN_VALUE);
  const found: Prediction = { option: today, margin: 0 };
  const cheapest = (cost: Float64Array, excluded: (o: number) => boolean): number => {
    let lowest = Number.POSITIVE_INFINITY;
    found.option = today;
    for (let o = 0; o < fixed.length; o++) {
      const expected = fixed[o] + cost[o];
      if (expected >= lowest || excluded(o)) continue;
      lowest = expected;
      found.option = o;
    }
    return lowest;
  };
  if (mustMeet === undefined) {
    const isToday = (o: number): boolean => o === today;
    return (cost) => {
      const lowest = cheapest(cost, isToday);
      found.margin = lowest === Number.POSITIVE_INFINITY ? 0 : Math.log((fixed[today] + cost[today]) / lowest);
      return found;
    };
  }
  const { target, alwaysOpen } = mustMeet;
  return (cost, probability) => {
    cheapest(cost, (o) => !alwaysOpen[o] && probability[o] > target);
    found.margin = Number.POSITIVE_INFINITY;
    for (let o = 0; o < fixed.length; o++) {
      if (alwaysOpen[o]) continue;
      const margin = Math.log((probability[o] + 1e-300) / target);
      if (Math.abs(margin) < Math.abs(found.margin)) found.margin = margin;
    }
    return found;
  };
}

/** The cell of a prediction: rows by option, within a row by the margin from −4 to 4. */
export function createCellFinder(
  terms: DecisionTerms,
  scale: number,
): (cost: Float64Array, probability: Float64Array) => number {
  const predict = createPredictor(terms, scale);
  return (cost, probability) => {
    const { option, margin } = predict(cost, probability);
    const place = Math.floor(((margin + reach) / (2 * reach)) * rowLength);
    return option * rowLength + (place < 0 ? 0 : place >= rowLength ? rowLength - 1 : place);
  };
}

/** How far a prediction is from tipping the decision: ln of a ratio, 0 at the tipping point. */
export function marginToTip(
  terms: DecisionTerms,
  scale: number,
): (cost: Float64Array, probability: Float64Array) => number {
  const predict = createPredictor(terms, scale);
  return (cost, probability) => predict(cost, probability).margin;
}

/** How rules are found in rows of decision cells. Where the target decides, cell by cell: what is open is no matter of a threshold. */
export function rowRule(length: number): (sums: CellSums, terms: DecisionTerms) => Rule {
  return (sums, terms) => (terms.mustMeet === undefined ? thresholdRule(sums, terms, length) : bestRule(sums, terms));
}

export interface CellDecision extends LearningValue {
  readonly found: CellValue;
}

/** Value of seeing what the cells tell apart. */
export function valueOfDecisionCells(basis: DecisionBasis, cells: DecisionCells): CellDecision {
  const { failures, beliefs, problem, today } = basis;
  const terms = termsOf(basis);
  const table = cellTable(basis, cells, cellCount(problem.options.length), terms);
  const found = valueOfCells(table, terms, rowRule(rowLength));
  const options = problem.options.length;
  const savings = new Float64Array(failures.count);
  for (let i = 0; i < failures.count; i++) {
    const rule = found.foldRules[failures.fold[i]];
    let saved = 0;
    for (let d = 0; d < cells.failingDraws; d++) {
      const o = rule[cells.failing[i * cells.failingDraws + d]];
      if (o !== today) saved += failures.cost[today][i] - failures.cost[o][i];
    }
    savings[i] = saved / cells.failingDraws;
  }
  const prices = Float64Array.from({ length: options }, (_, o) => terms.prices[today] - terms.prices[o]);
  const bySample = new Float64Array(beliefs.count);
  for (let j = 0; j < beliefs.count; j++) {
    const rule = found.foldRules[beliefs.fold[j]];
    let saved = 0;
    for (let d = 0; d < cells.believedDraws; d++) saved += prices[rule[cells.believed[j * cells.believedDraws + d]]];
    bySample[j] = saved / cells.believedDraws;
  }
  return {
    value: { value: found.value, standardError: errorOf(basis, savings, bySample, found.value) },
    inSample: Math.max(found.inSample, found.value),
    chanceItChangesTheDecision: found.chance,
    found,
  };
}

/**
 * Standard error of Σ over failures + mean over beliefs. The second is a ratio, so its samples count by their distance from
 * it; with evidence the first is one too, with the same denominator.
 */
export function errorOf(basis: DecisionBasis, savings: Float64Array, bySample: Float64Array, value: number): number {
  const { failures, beliefs } = basis;
  const saved = stratifiedSum(failures, savings);
  const exact = beliefs.chance.standardError === 0;
  const centre = exact ? stratifiedSum(beliefs, bySample).value : value;
  const priced = stratifiedSum(
    beliefs,
    bySample.map((price) => price - centre),
  );
  return Math.hypot(saved.standardError, priced.standardError);
}

/**
 * Chance and expected failure costs of every cell.
 *
 * @param count number of cells
 */
export function cellTable(
  basis: DecisionBasis,
  cells: DecisionCells,
  count: number,
  { mustMeet }: DecisionTerms,
): CellTable {
  const { failures, beliefs } = basis;
  const sums = (
    sample: StratifiedSample,
    values: Float64Array | undefined,
    places: Uint32Array,
    draws: number,
  ): Float64Array[] => {
    const byFold = Array.from({ length: sample.folds }, () => new Float64Array(count));
    for (let i = 0; i < sample.count; i++) {
      const weight = (sample.weight[i] * (values === undefined ? 1 : values[i])) / draws;
      if (weight === 0) continue;
      const into = byFold[sample.fold[i]];
      for (let d = 0; d < draws; d++) into[places[i * draws + d]] += weight;
    }
    return byFold;
  };
  const ofFailures = (values: readonly Float64Array[]): Float64Array[][] => {
    const byOption = values.map((value) => sums(failures, value, cells.failing, cells.failingDraws));
    return Array.from({ length: failures.folds }, (_, f) => byOption.map((folds) => folds[f]));
  };
  return {
    cells: count,
    belief: sums(beliefs, undefined, cells.believed, cells.believedDraws),
    loss: ofFailures(failures.cost),
    ...(mustMeet === undefined ? {} : { failure: ofFailures(failures.failure) }),
  };
}
