import { bestRule, type CellSums, type DecisionTerms, gainOf, type Rule } from "./cell-rule.ts";

/** A second investigation that may follow, with what it may show beside each cell of the first. */
export interface SecondStage {
  readonly cost: number;
  /** Cells of the second within each cell of the first; row-major: first × second. */
  readonly cells: number;
  readonly sums: CellSums;
}

/** What to do after the first result: build an option, or investigate further and then follow a rule. */
export type StageAction =
  | { readonly kind: "build"; readonly option: number }
  | { readonly kind: "investigate"; readonly second: number; readonly rule: Rule };

export interface StagePlan {
  /** By cell of the first. */
  readonly actions: readonly StageAction[];
  /** Expected saving against today's best, the second investigations paid, the first not. */
  readonly gain: number;
}

/**
 * The best plan once the first investigation is made: in each cell of its result, either the best option now, or the second
 * investigation whose expected saving, less its price, is greatest.
 *
 * @param first sums over cells of the first result
 * @param ruleOf how the rule after the second is found; in each cell by itself where left out
 */
export function bestStagePlan(
  first: CellSums,
  seconds: readonly SecondStage[],
  terms: DecisionTerms,
  ruleOf: (sums: CellSums, terms: DecisionTerms) => Rule = bestRule,
): StagePlan {
  const stop = bestRule(first, terms);
  let gain = 0;
  const actions = Array.from(stop, (option, c): StageAction => {
    let action: StageAction = { kind: "build", option };
    let best = gainOf(stop.subarray(c, c + 1), slice(first, c, c + 1), terms);
    seconds.forEach(({ cost, cells, sums }, second) => {
      const part = slice(sums, c * cells, (c + 1) * cells);
      const rule = ruleOf(part, terms);
      const going = gainOf(rule, part, terms) - cost * first.belief[c];
      if (going > best) {
        best = going;
        action = { kind: "investigate", second, rule };
      }
    });
    gain += best;
    return action;
  });
  return { actions, gain };
}

/** The saving of a given plan on other sums of the same cells. */
export function gainOfPlan(
  actions: readonly StageAction[],
  first: CellSums,
  seconds: readonly SecondStage[],
  terms: DecisionTerms,
): number {
  return actions.reduce((gain, action, c) => {
    if (action.kind === "build") return gain + gainOf(Uint8Array.of(action.option), slice(first, c, c + 1), terms);
    const { cost, cells, sums } = seconds[action.second];
    return gain + gainOf(action.rule, slice(sums, c * cells, (c + 1) * cells), terms) - cost * first.belief[c];
  }, 0);
}

function slice({ belief, loss, failure }: CellSums, from: number, to: number): CellSums {
  return {
    belief: belief.subarray(from, to),
    loss: loss.map((column) => column.subarray(from, to)),
    ...(failure === undefined ? {} : { failure: failure.map((column) => column.subarray(from, to)) }),
  };
}
