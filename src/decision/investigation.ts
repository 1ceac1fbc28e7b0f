import type { DecisionBasis } from "./decision-basis.ts";
import { type DecisionCells, valueOfDecisionCells } from "./decision-cells.ts";
import type { PlannedInvestigation, TestSeries } from "./decision-problem.ts";
import type { FailureMode } from "./failure-modes.ts";
import type { LearningValue } from "./investigation-value.ts";
import { type DrawnScores, decisionCellsOf, drawnScores, valueOfScores } from "./joint-signal.ts";
import { meanResultSd } from "./knowledge-curve.ts";
import type { KnowledgeLedger } from "./knowledge-ledger.ts";
import { resultScore } from "./result-scores.ts";
import type { RuleStep } from "./signal-rule.ts";
import { valueOfTests } from "./single-signal.ts";

/** A basis with all that values of investigations are made from. */
export interface LearningBasis {
  readonly basis: DecisionBasis;
  readonly modes: readonly FailureMode[];
  /** By place of the variable; made on first use. */
  ledger(variable: number): KnowledgeLedger;
  readonly seed: string;
}

export interface InvestigationValue extends LearningValue {
  /** Which option to take for which result; only where one variable is informed. */
  readonly steps?: readonly (RuleStep & { readonly chance: number })[];
}

/** Series of an investigation that tell something: those of a variable of which something can be learned. */
export function tellingSeries({ basis }: LearningBasis, series: readonly TestSeries[]): TestSeries[] {
  return series.filter(({ variable, tests }) => {
    const { known } = basis.problem.variables[variable];
    return tests > 0 && known.row.some((weight) => weight !== 0);
  });
}

/** Value of an investigation: exactly by its likelihood where it informs one variable, else with drawn results. */
export function valueOfInvestigation(
  learning: LearningBasis,
  { name, informs }: PlannedInvestigation,
): InvestigationValue {
  const { basis, modes } = learning;
  const series = tellingSeries(learning, informs);
  if (series.length === 0) {
    const nothing = { value: 0, standardError: 0 };
    return { value: nothing, inSample: 0, chanceItChangesTheDecision: nothing };
  }
  if (series.length === 1) return valueOfTests(basis, learning.ledger(series[0].variable), series[0]);
  return valueOfScores(basis, modes, scoresOf(learning, name, series));
}

/** Results of an investigation, drawn; the same errors whatever the number of tests, so that values are smooth in it. */
export function scoresOf(learning: LearningBasis, name: string, series: readonly TestSeries[]): DrawnScores[] {
  return series.map((one, s) => {
    const ledger = learning.ledger(one.variable);
    // a result without any error is read as one with a hardly noticeable one: the likelihood stays a density
    const sd = Math.max(meanResultSd(ledger.variable, one), 1e-3 * ledger.variable.marginal.sd);
    return drawnScores(
      learning.basis,
      resultScore(ledger, sd),
      learning.seed,
      `${name}: ${ledger.variable.path}, ${s}`,
    );
  });
}

/** Results of two investigations together, and the decision cells that they lead to. */
export interface CombinedResults {
  readonly places: readonly [number, number];
  readonly cells: DecisionCells;
}

/** All pairs of the investigations at `places`, both made whatever the first shows. */
export function combinedResults(
  learning: LearningBasis,
  investigations: readonly PlannedInvestigation[],
  places: readonly number[],
): readonly CombinedResults[] {
  const { basis, modes } = learning;
  const scores = new Map(
    places.map((i) => {
      const { name, informs } = investigations[i];
      return [i, scoresOf(learning, name, tellingSeries(learning, informs))];
    }),
  );
  return places.flatMap((i) =>
    places
      .filter((j) => j > i)
      .map((j): CombinedResults => {
        const both = [...scores.get(i)!, ...scores.get(j)!];
        return { places: [i, j], cells: decisionCellsOf(basis, modes, both) };
      }),
  );
}

export function valueOfPair({ basis }: LearningBasis, { cells }: CombinedResults): LearningValue {
  return valueOfDecisionCells(basis, cells);
}
