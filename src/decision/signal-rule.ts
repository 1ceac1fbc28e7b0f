import { type CellSums, type CellTable, type DecisionTerms, gainOf, type Rule } from "./cell-rule.ts";

/** A range of what is seen, and the option to take there. */
export interface RuleStep {
  /** −∞ and +∞ at the ends. */
  readonly from: number;
  readonly to: number;
  readonly option: number;
}

/**
 * The rule as ranges on a line. Where two options change places between neighbouring cells, the tipping point is where the
 * difference of their conditional costs goes through zero, interpolated between the middles of the cells.
 *
 * @param edges ends of the cells, cells + 1 of them, the outermost ±∞
 */
export function ruleSteps(rule: Rule, sums: CellSums, edges: Float64Array, terms: DecisionTerms): RuleStep[] {
  const steps: { from: number; to: number; option: number }[] = [];
  for (let c = 0; c < rule.length; c++) {
    const last = steps.at(-1);
    if (last?.option === rule[c]) last.to = edges[c + 1];
    else {
      const from = c === 0 ? edges[0] : tippingPoint(c - 1, rule, sums, edges, terms);
      if (last !== undefined) last.to = from;
      steps.push({ from, to: edges[c + 1], option: rule[c] });
    }
  }
  return steps;
}

function tippingPoint(
  c: number,
  rule: Rule,
  { belief, loss }: CellSums,
  edges: Float64Array,
  { prices, mustMeet }: DecisionTerms,
): number {
  const edge = edges[c + 1];
  const [a, b] = [rule[c], rule[c + 1]];
  const inside = c > 0 && c + 2 < rule.length;
  if (mustMeet !== undefined || !inside || !(belief[c] > 0) || !(belief[c + 1] > 0)) return edge;
  const excess = (cell: number): number => prices[a] - prices[b] + (loss[a][cell] - loss[b][cell]) / belief[cell];
  const [here, there] = [excess(c), excess(c + 1)];
  if (!(here <= 0 && there > 0)) return edge;
  const middle = 0.5 * (edges[c] + edge);
  return middle + (-here / (there - here)) * (0.5 * (edge + edges[c + 2]) - middle);
}

/** A run of cells must beat what it would otherwise be by so many standard errors. */
const leastEvidence = 1.5;

/**
 * The rule without runs of cells that only noise may have made: where the folds do not agree that another option than today's
 * (or than that of the run before or after) is better, the run takes the better of these.
 *
 * @param leftOut fold that the rule must not look at; −1: none
 * @returns the rule, and the variance of what was given up, which the value must answer for
 */
export function withoutNoise(
  rule: Rule,
  table: CellTable,
  terms: DecisionTerms,
  leftOut: number,
): { readonly rule: Rule; readonly variance: number } {
  const cleaned = rule.slice();
  let variance = 0;
  const folds = table.belief.map((_, f) => f).filter((f) => f !== leftOut);
  for (let from = 0; from < cleaned.length; ) {
    let to = from + 1;
    while (to < cleaned.length && rule[to] === rule[from]) to++;
    const option = rule[from];
    if (option !== terms.today && folds.length > 1) {
      const neighbours = [terms.today, cleaned[from - 1] ?? terms.today, rule[to] ?? terms.today];
      const gains = neighbours.map((other) => folds.map((f) => gainBetween(table, f, from, to, option, other, terms)));
      const sums = gains.map((byFold) => byFold.reduce((sum, gain) => sum + gain, 0));
      const closest = neighbours
        .map((_, k) => k)
        .filter((k) => neighbours[k] !== option)
        .reduce((a, b) => (sums[b] < sums[a] ? b : a), 0);
      const error2 = varianceOfSum(gains[closest]);
      if (sums[closest] < leastEvidence * Math.sqrt(error2)) {
        cleaned.fill(neighbours[closest], from, to);
        variance += error2;
      }
    }
    from = to;
  }
  return { rule: cleaned, variance };
}

/** What a run of cells gains by an option over another, in one fold. */
function gainBetween(
  { belief, loss }: CellTable,
  fold: number,
  from: number,
  to: number,
  option: number,
  other: number,
  terms: DecisionTerms,
): number {
  const part = {
    belief: belief[fold].subarray(from, to),
    loss: loss[fold].map((column) => column.subarray(from, to)),
  };
  const rule = (o: number): Rule => new Uint8Array(to - from).fill(o);
  return gainOf(rule(option), part, terms) - gainOf(rule(other), part, terms);
}

function varianceOfSum(parts: readonly number[]): number {
  const n = parts.length;
  const mean = parts.reduce((sum, x) => sum + x, 0) / n;
  return (n / (n - 1)) * parts.reduce((sum, x) => sum + (x - mean) ** 2, 0);
}
