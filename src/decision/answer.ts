import type { PlannedInvestigation } from "./decision-problem.ts";
import {
  combinedResults,
  type InvestigationValue,
  type LearningBasis,
  tellingSeries,
  valueOfInvestigation,
  valueOfPair,
} from "./investigation.ts";
import type { LearningValue } from "./investigation-value.ts";
import { type TestsCurve, testsCurve } from "./number-of-tests.ts";
import { valueOfPerfectInformation } from "./perfect-information.ts";
import { valueOfKnowing } from "./single-signal.ts";
import { type TwoStagePlan, twoStagePlans } from "./two-stage.ts";

/** All that can be said of learning before building. Places are those of the lists given. */
export interface LearningAnswer {
  readonly perfect: LearningValue;
  /** By place of the variable; only those of which something can be learned. */
  readonly perfectByVariable: ReadonlyMap<number, LearningValue>;
  readonly investigations: readonly InvestigationValue[];
  /** Where one variable is informed. */
  readonly curves: readonly (TestsCurve | undefined)[];
  readonly pairs: readonly { readonly places: readonly [number, number]; readonly value: LearningValue }[];
  /** Best first; only of investigations with a price. */
  readonly plans: readonly TwoStagePlan[];
}

/** Investigations whose pairs and plans are looked at: the most valuable ones. */
const mostCombined = 5;

export function learningAnswer(
  learning: LearningBasis,
  investigations: readonly PlannedInvestigation[],
): LearningAnswer {
  const { basis, modes } = learning;
  const learnable = basis.problem.variables
    .map((_, v) => v)
    .filter((v) => basis.problem.variables[v].known.row.some((weight) => weight !== 0));
  const values = investigations.map((one) => valueOfInvestigation(learning, one));
  const combined = investigations
    .map((_, i) => i)
    .filter((i) => tellingSeries(learning, investigations[i].informs).length > 0)
    .sort((a, b) => values[b].value.value - values[a].value.value)
    .slice(0, mostCombined)
    .sort((a, b) => a - b);
  const pairs = combinedResults(learning, investigations, combined);
  return {
    perfect: valueOfPerfectInformation(basis, modes),
    perfectByVariable: new Map(learnable.map((v) => [v, valueOfKnowing(basis, learning.ledger(v))])),
    investigations: values,
    curves: investigations.map((one) => curveOf(learning, one)),
    pairs: pairs.map((pair) => ({ places: pair.places, value: valueOfPair(learning, pair) })),
    plans: [...twoStagePlans(learning, investigations, pairs)].sort((a, b) => b.netValue.value - a.netValue.value),
  };
}

function curveOf(learning: LearningBasis, investigation: PlannedInvestigation): TestsCurve | undefined {
  if (investigation.informs.length !== 1) return undefined;
  const [{ tests }] = investigation.informs;
  const price = investigation.cost === undefined ? undefined : investigation.cost / tests;
  return testsCurve(learning, investigation, Math.max(12, Math.min(3 * tests, 40)), price);
}
