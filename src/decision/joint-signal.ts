import { cholesky, solveWithFactor } from "../numeric/cholesky.ts";
import type { DecisionBasis } from "./decision-basis.ts";
import { type CellDecision, createCellFinder, type DecisionCells, valueOfDecisionCells } from "./decision-cells.ts";
import { type ConditionalMode, type FailureMode, predictorOf } from "./failure-modes.ts";
import { termsOf } from "./investigation-value.ts";
import { drawScores, type ResultScore } from "./result-scores.ts";

/** Draws of the results per failing sample: some 50 000 in all, at least one each. */
export function failingDraws({ failures }: DecisionBasis): number {
  return Math.min(Math.max(Math.round(50_000 / Math.max(failures.count, 1)), 1), 16);
}

/** Scores of one variable's results, drawn for every sample of a basis. */
export interface DrawnScores {
  readonly score: ResultScore;
  /** `failingDraws` of each failing sample; one of each sample of the beliefs. */
  readonly failing: Float64Array;
  readonly believed: Float64Array;
}

/** @param key of the stream: results that are to be independent have different keys */
export function drawnScores(basis: DecisionBasis, score: ResultScore, seed: string, key: string): DrawnScores {
  const { ledger } = score;
  const draws = failingDraws(basis);
  return {
    score,
    failing: drawScores(score, ledger.failures, draws, { seed, purpose: "results beside failures", key }),
    believed: drawScores(score, ledger.beliefs, 1, { seed, purpose: "results beside beliefs", key }),
  };
}

/** Value of several results seen together, each with the exact likelihood of its mean. */
export function valueOfScores(
  basis: DecisionBasis,
  modes: readonly FailureMode[],
  drawn: readonly DrawnScores[],
): CellDecision {
  return valueOfDecisionCells(basis, decisionCellsOf(basis, modes, drawn));
}

/** The decision cell of every sample and draw. */
export function decisionCellsOf(
  basis: DecisionBasis,
  modes: readonly FailureMode[],
  drawn: readonly DrawnScores[],
): DecisionCells {
  const conditional = conditionalModes(
    modes,
    drawn.map((one) => one.score),
  );
  const cells = (pick: (one: DrawnScores) => Float64Array): Uint32Array => cellsOf(basis, conditional, drawn.map(pick));
  return {
    failing: cells((one) => one.failing),
    believed: cells((one) => one.believed),
    failingDraws: failingDraws(basis),
    believedDraws: 1,
  };
}

/**
 * Modes given scores y = B·z + noise: z has mean Bᵀ(BBᵀ + D)⁻¹y, so a mode's index falls by gain·y with
 * gain = (BBᵀ + D)⁻¹B·direction, and 1 − (B·direction)·gain of its variance is left.
 */
export function conditionalModes(modes: readonly FailureMode[], scores: readonly ResultScore[]): ConditionalMode[] {
  const rows = scores.map(({ ledger }) => ledger.variable.known.row);
  // scores of unit variance, so that the matrix has ones on its diagonal
  const sizes = rows.map((row, v) => Math.sqrt(dot(row, row) + scores[v].noise));
  const matrix = rows.map((a, v) =>
    rows.map((b, w) => (dot(a, b) + (v === w ? scores[v].noise : 0)) / (sizes[v] * sizes[w])),
  );
  const factored = cholesky(matrix);
  if (!factored.definite) throw new RangeError("scores whose covariance is not positive semi-definite");
  return modes.map(({ option, cost, weight, index, direction }) => {
    const shared = rows.map((row, v) => dot(row, direction) / sizes[v]);
    const gain = solveWithFactor(factored.factor, shared);
    const explained = gain.reduce((sum, g, v) => sum + g * shared[v], 0);
    return {
      option,
      cost,
      weight,
      index,
      gain: gain.map((g, v) => g / sizes[v]),
      spread: Math.sqrt(Math.max(1 - explained, 0)),
    };
  });
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let j = 0; j < a.length; j++) sum += a[j] * b[j];
  return sum;
}

function cellsOf(
  basis: DecisionBasis,
  modes: readonly ConditionalMode[],
  scores: readonly Float64Array[],
): Uint32Array {
  const options = basis.problem.options.length;
  const find = createCellFinder(termsOf(basis), basis.outcomes[basis.today].expectedCost.value);
  const predict = predictorOf(modes);
  const [cost, probability] = [new Float64Array(options), new Float64Array(options)];
  const cells = new Uint32Array(scores[0].length);
  for (let i = 0; i < cells.length; i++) {
    predict(scores, i, cost, probability);
    cells[i] = find(cost, probability);
  }
  return cells;
}
