import {
  bestRule,
  type CellSums,
  type CellTable,
  type DecisionTerms,
  gainOf,
  jackknifeError,
  sumOverFolds,
  sumWithout,
} from "./cell-rule.ts";
import type { DecisionBasis } from "./decision-basis.ts";
import type { TestSeries } from "./decision-problem.ts";
import { type LearningValue, termsOf } from "./investigation-value.ts";
import { knowledgeCurve, meanResultSd } from "./knowledge-curve.ts";
import type { KnowledgeLedger, KnownValues } from "./knowledge-ledger.ts";
import { mergeRanges } from "./merge-ranges.ts";
import { perfectCells, type SignalCells, signalCellsOf } from "./signal-cells.ts";
import { type RuleStep, ruleSteps, withoutNoise } from "./signal-rule.ts";
import { stratifiedSum } from "./stratified-sample.ts";

export interface SingleSignalValue extends LearningValue {
  /** Which option to take for which mean result, in the variable's own unit. */
  readonly steps: readonly (RuleStep & { readonly chance: number })[];
}

/** Value of tests on one variable, with the exact likelihood of their mean. No tests are worth nothing. */
export function valueOfTests(basis: DecisionBasis, ledger: KnowledgeLedger, series: TestSeries): SingleSignalValue {
  const sd = meanResultSd(ledger.variable, series);
  if (sd === Number.POSITIVE_INFINITY) return nothingSeen(basis.today);
  return sd === 0 ? valueOfKnowing(basis, ledger) : valueOfSignal(basis, ledger, signalCellsOf(ledger, sd));
}

/** Value of knowing θ of one variable: no investigation of it can be worth more. */
export function valueOfKnowing(basis: DecisionBasis, ledger: KnowledgeLedger): SingleSignalValue {
  const found = valueOfSignal(basis, ledger, perfectCells(ledger));
  const curve = knowledgeCurve(ledger.variable);
  const own = (k: number): number => (Number.isFinite(k) ? curve.at(k) : k);
  return { ...found, steps: found.steps.map((step) => ({ ...step, from: own(step.from), to: own(step.to) })) };
}

function nothingSeen(today: number): SingleSignalValue {
  const none = { value: 0, standardError: 0 };
  const all = { from: Number.NEGATIVE_INFINITY, to: Number.POSITIVE_INFINITY, option: today, chance: 1 };
  return { value: none, inSample: 0, chanceItChangesTheDecision: none, steps: [all] };
}

/**
 * 1. conditional costs on cells of the signal, and the option of least cost in each: a rule, for every fold from the others
 * 2. value of that rule = prices × chance of each range, exactly where beliefs are normal,
 *    + Σ weight·(cost of today's best − cost of the rule's option)·P(range | K of the sample)
 */
function valueOfSignal(basis: DecisionBasis, ledger: KnowledgeLedger, signal: SignalCells): SingleSignalValue {
  const { failures, beliefs, today } = basis;
  const terms = termsOf(basis);
  const table = tableOf(ledger, signal, terms);
  const all = sumOverFolds(table);
  const found = ruleFrom(table, all, terms, -1);
  const steps = ruleSteps(found.rule, all, signal.edges, terms);
  const foldSteps = table.belief.map((_, f) => {
    const others = sumWithout(all, table, f);
    return ruleSteps(ruleFrom(table, others, terms, f).rule, others, signal.edges, terms);
  });

  const savings = new Float64Array(failures.count);
  for (let i = 0; i < failures.count; i++) {
    for (const step of foldSteps[failures.fold[i]]) {
      if (step.option === today) continue;
      const saved = failures.cost[today][i] - failures.cost[step.option][i];
      if (saved !== 0) savings[i] += saved * signal.chanceOf(step, ledger.failures, i);
    }
  }
  const saved = stratifiedSum(failures, savings);
  const inPrices = pricesOf(ledger, signal, foldSteps, terms, beliefs);
  const value = saved.value + inPrices.value;
  let standardError = Math.hypot(saved.standardError, Math.sqrt(found.variance));
  if (inPrices.bySample !== undefined) {
    const centred = inPrices.bySample.map((price) => price - value);
    standardError = Math.hypot(standardError, stratifiedSum(beliefs, centred).standardError);
  }
  const changed = (ranges: readonly RuleStep[]): number =>
    ranges.reduce((sum, step) => (step.option === today ? sum : sum + chanceOfStep(ledger, signal, step, beliefs)), 0);
  return {
    value: { value, standardError },
    inSample: Math.max(gainOf(found.rule, all, terms), value),
    chanceItChangesTheDecision: { value: changed(steps), standardError: jackknifeError(foldSteps.map(changed)) },
    steps: shownSteps(steps.map((step) => ({ ...step, chance: chanceOfStep(ledger, signal, step, beliefs) }))),
  };
}

/** The best option of every cell, without what only noise may have made; where the target decides, as it is. */
function ruleFrom(table: CellTable, sums: CellSums, terms: DecisionTerms, leftOut: number) {
  const rule = bestRule(sums, terms);
  return terms.mustMeet === undefined ? withoutNoise(rule, table, terms, leftOut) : { rule, variance: 0 };
}

/** Stretches that are next to impossible are not worth a line. */
function shownSteps(steps: readonly (RuleStep & { chance: number })[]): (RuleStep & { chance: number })[] {
  const ranges = steps.map(({ option, ...range }) => ({ ...range, choice: option }));
  return mergeRanges(ranges, (a, b) => a === b, 1e-4).map(({ choice, ...range }) => ({ ...range, option: choice }));
}

function tableOf(ledger: KnowledgeLedger, signal: SignalCells, { mustMeet }: DecisionTerms): CellTable {
  return {
    cells: signal.cells,
    belief: ledger.belief.map((bins) => signal.seen(bins)),
    loss: ledger.loss.map((options) => options.map((bins) => signal.seen(bins))),
    ...(mustMeet === undefined
      ? {}
      : { failure: ledger.failure.map((options) => options.map((bins) => signal.seen(bins))) }),
  };
}

type Beliefs = DecisionBasis["beliefs"];

/** Difference in price between today's best and what each fold's rule takes. */
function pricesOf(
  ledger: KnowledgeLedger,
  signal: SignalCells,
  foldSteps: readonly (readonly RuleStep[])[],
  { prices, today }: DecisionTerms,
  beliefs: Beliefs,
): { readonly value: number; readonly bySample?: Float64Array } {
  const saving = (step: RuleStep): number => prices[today] - prices[step.option];
  if (ledger.normal !== undefined) {
    const sum = foldSteps.flat().reduce((total, step) => {
      return step.option === today ? total : total + saving(step) * chanceOfStep(ledger, signal, step, beliefs);
    }, 0);
    return { value: sum / foldSteps.length };
  }
  const bySample = new Float64Array(beliefs.count);
  for (let j = 0; j < beliefs.count; j++)
    for (const step of foldSteps[beliefs.fold[j]])
      if (step.option !== today) bySample[j] += saving(step) * signal.chanceOf(step, ledger.beliefs, j);
  return { value: stratifiedSum(beliefs, bySample).value, bySample };
}

function chanceOfStep(ledger: KnowledgeLedger, signal: SignalCells, step: RuleStep, beliefs: Beliefs): number {
  const { normal, middles, variable } = ledger;
  if (normal !== undefined) {
    const exact = signal.chanceUnderNormal(step, normal);
    if (exact !== undefined) return exact;
    const { at } = knowledgeCurve(variable);
    const values: KnownValues = { k: middles, theta: middles.map(at) };
    return ledger.belief.reduce(
      (sum, bins) => sum + bins.reduce((part, chance, b) => part + chance * signal.chanceOf(step, values, b), 0),
      0,
    );
  }
  let sum = 0;
  for (let j = 0; j < beliefs.count; j++) sum += beliefs.weight[j] * signal.chanceOf(step, ledger.beliefs, j);
  return sum;
}
