/**
 * What an investigation may show, cut into cells, and in each cell how likely it is and what each option's failures cost
 * together with it. Sums are kept by fold, so that a rule found on the others can be judged on each.
 */
export interface CellTable {
  readonly cells: number;
  /** By fold: chance of the cell (all folds add up to 1). */
  readonly belief: readonly Float64Array[];
  /** By fold and option: expected cost of failure, in the cell. */
  readonly loss: readonly (readonly Float64Array[])[];
  /** By fold and option: probability of failure in the cell; needed only where the target decides. */
  readonly failure?: readonly (readonly Float64Array[])[];
}

/** What decides between options besides failures. */
export interface DecisionTerms {
  readonly prices: readonly number[];
  /** Where an option must meet the target: which are open whatever is found. */
  readonly mustMeet?: { readonly target: number; readonly alwaysOpen: readonly boolean[] };
  /** The best option today. */
  readonly today: number;
}

/** For every cell the option to choose. */
export type Rule = Uint8Array;

/** A table summed over folds. */
export interface CellSums {
  readonly belief: Float64Array;
  readonly loss: readonly Float64Array[];
  readonly failure?: readonly Float64Array[];
}

/** Sums over all folds. */
export function sumOverFolds({ belief, loss, failure }: CellTable): CellSums {
  const over = (parts: readonly Float64Array[]): Float64Array => {
    const sum = parts[0].slice();
    for (let f = 1; f < parts.length; f++) {
      const part = parts[f];
      for (let c = 0; c < sum.length; c++) sum[c] += part[c];
    }
    return sum;
  };
  const byOption = (parts: readonly (readonly Float64Array[])[]): Float64Array[] =>
    parts[0].map((_, o) => over(parts.map((part) => part[o])));
  return {
    belief: over(belief),
    loss: byOption(loss),
    ...(failure === undefined ? {} : { failure: byOption(failure) }),
  };
}

/** Sums over all folds but one. What is left of a cell that only this fold has seen is nothing, not rounding. */
export function sumWithout(all: CellSums, { belief, loss, failure }: CellTable, fold: number): CellSums {
  const less = (sum: Float64Array, part: Float64Array): Float64Array => {
    const rest = new Float64Array(sum.length);
    for (let c = 0; c < sum.length; c++) {
      const left = sum[c] - part[c];
      rest[c] = left > 1e-12 * sum[c] ? left : 0;
    }
    return rest;
  };
  return {
    belief: less(all.belief, belief[fold]),
    loss: all.loss.map((sum, o) => less(sum, loss[fold][o])),
    ...(all.failure === undefined || failure === undefined
      ? {}
      : { failure: all.failure.map((sum, o) => less(sum, failure[fold][o])) }),
  };
}

/** In each cell the open option of least cost; today's best where costs are equal, or where no sample fell. */
export function bestRule({ belief, loss, failure }: CellSums, { prices, mustMeet, today }: DecisionTerms): Rule {
  const rule = new Uint8Array(belief.length).fill(today);
  for (let c = 0; c < rule.length; c++) {
    let least = Number.POSITIVE_INFINITY;
    for (let k = 0; k < prices.length; k++) {
      const o = k === 0 ? today : k <= today ? k - 1 : k; // today's first: it keeps ties
      if (mustMeet && !mustMeet.alwaysOpen[o] && !((failure?.[o][c] ?? 0) <= mustMeet.target * belief[c])) continue;
      const cost = prices[o] * belief[c] + loss[o][c];
      if (cost < least) [least, rule[c]] = [cost, o];
    }
  }
  return rule;
}

/**
 * A rule for cells in rows, each sorted by how much some option is predicted to be better than today's: within a row, today's
 * option up to a threshold and one other from there on, both found from the sums. Far less is left to chance than cell by cell.
 *
 * @param length cells of a row
 */
export function thresholdRule(sums: CellSums, terms: DecisionTerms, length: number): Rule {
  const { prices, today } = terms;
  const { belief, loss } = sums;
  const rule = new Uint8Array(belief.length).fill(today);
  for (let start = 0; start < rule.length; start += length) {
    let best = 0;
    let from = start + length;
    let choice = today;
    for (let o = 0; o < prices.length; o++) {
      if (o === today) continue;
      let gain = 0;
      for (let c = start + length - 1; c >= start; c--) {
        gain += (prices[today] - prices[o]) * belief[c] + loss[today][c] - loss[o][c];
        if (gain > best) [best, from, choice] = [gain, c, o];
      }
    }
    rule.fill(choice, from, start + length);
  }
  return rule;
}

/** Expected cost of today's best less that of the option the rule takes. */
export function gainOf(
  rule: Rule,
  { belief, loss }: Pick<CellSums, "belief" | "loss">,
  { prices, today }: DecisionTerms,
): number {
  let gain = 0;
  for (let c = 0; c < rule.length; c++) {
    const o = rule[c];
    if (o !== today) gain += (prices[today] - prices[o]) * belief[c] + loss[today][c] - loss[o][c];
  }
  return gain;
}

/** Chance that the rule takes another option than today's. */
export function chanceOfChange(rule: Rule, belief: Float64Array, today: number): number {
  return rule.reduce((chance, option, c) => (option === today ? chance : chance + belief[c]), 0);
}

/** Standard error of an estimate from its values with each fold left out. */
export function jackknifeError(leftOut: readonly number[]): number {
  const n = leftOut.length;
  const mean = leftOut.reduce((sum, value) => sum + value, 0) / n;
  const spread = leftOut.reduce((sum, value) => sum + (value - mean) ** 2, 0);
  return Math.sqrt((spread * (n - 1)) / n);
}

export interface CellValue {
  /** Each fold judged by the rule of the others: unbiased for the rule, whatever the rule. */
  readonly value: number;
  /** All judged by the rule of all: biased upwards. */
  readonly inSample: number;
  readonly rule: Rule;
  /** By fold: the rule found without it. */
  readonly foldRules: readonly Rule[];
  readonly chance: { readonly value: number; readonly standardError: number };
}

/**
 * Value of seeing which cell comes true: E[cost of today's best] − E[cost of the option that the rule takes in the cell].
 *
 * The minimum of noisy means would be biased low; the cost of following a rule that was found on other samples is not.
 *
 * @param ruleOf how a rule is found from sums; in each cell by itself where left out
 */
export function valueOfCells(
  table: CellTable,
  terms: DecisionTerms,
  ruleOf: (sums: CellSums, terms: DecisionTerms) => Rule = bestRule,
): CellValue {
  const { belief, loss } = table;
  const all = sumOverFolds(table);
  const rule = ruleOf(all, terms);
  const foldRules = belief.length === 1 ? [rule] : belief.map((_, f) => ruleOf(sumWithout(all, table, f), terms));
  const chances = foldRules.map((found) => chanceOfChange(found, all.belief, terms.today));
  return {
    value: foldRules.reduce((sum, found, f) => sum + gainOf(found, { belief: belief[f], loss: loss[f] }, terms), 0),
    inSample: gainOf(rule, all, terms),
    rule,
    foldRules,
    chance: { value: chanceOfChange(rule, all.belief, terms.today), standardError: jackknifeError(chances) },
  };
}
