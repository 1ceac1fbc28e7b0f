import { cholesky, solveWithFactor } from "../numeric/cholesky.ts";
import { gammaUpper } from "../numeric/incomplete-gamma.ts";
import { normalCdf } from "../numeric/normal.ts";
import { type DecisionProblem, formSd, type SeenResults } from "./decision-problem.ts";
import { knowledgeCurve, meanResultSd } from "./knowledge-curve.ts";

/** Below this chance, evidence and beliefs are in conflict. */
export const conflictChance = 1e-6;

export interface ResultSurprise {
  /** Places of the variables. */
  readonly variables: readonly number[];
  /** Chance, under the beliefs, of results at least as far out. */
  readonly chance: number;
}

/**
 * How surprising results are to the beliefs before them: of every series by itself, by the chance of a mean result at least as
 * far out on either side; of all series of normal variables together, by the chi-square of their standardised distance.
 */
export function resultSurprises(problem: DecisionProblem, results: readonly SeenResults[]): ResultSurprise[] {
  const alone = results.map(
    (one): ResultSurprise => ({ variables: [one.variable], chance: chanceBeyond(problem, one) }),
  );
  const straight = results.filter(({ variable }) => knowledgeCurve(problem.variables[variable]).linear !== undefined);
  if (straight.length < 2) return alone;
  const variables = straight.map((one) => one.variable);
  return [...alone, { variables, chance: chanceTogether(problem, straight) }];
}

/** Predictive chance of a mean result beyond this one, both sides: the smaller tail twice. */
function chanceBeyond(problem: DecisionProblem, series: SeenResults): number {
  const variable = problem.variables[series.variable];
  const curve = knowledgeCurve(variable);
  const sd = meanResultSd(variable, series);
  const size = formSd(variable.known);
  let [weights, below, above] = [0, 0, 0];
  for (let i = -450; i <= 450; i++) {
    const v = i / 50;
    const weight = Math.exp(-0.5 * v * v);
    const distance = (series.mean - curve.at(variable.known.offset + size * v)) / sd;
    weights += weight;
    below += weight * normalCdf(distance);
    above += weight * normalCdf(-distance);
  }
  return Math.min(1, (2 * Math.min(below, above)) / weights);
}

function chanceTogether(problem: DecisionProblem, results: readonly SeenResults[]): number {
  const forms = results.map((series) => {
    const variable = problem.variables[series.variable];
    const { mean, slope } = knowledgeCurve(variable).linear!;
    const row = variable.known.row.map((weight) => weight * slope);
    const noise = meanResultSd(variable, series) ** 2;
    return { row, noise, distance: series.mean - mean - slope * variable.known.offset };
  });
  const covariance = forms.map((a, v) =>
    forms.map((b, w) => a.row.reduce((sum, x, j) => sum + x * b.row[j], v === w ? a.noise : 0)),
  );
  const size = covariance.map((row, v) => Math.sqrt(row[v]));
  const factored = cholesky(covariance.map((row, v) => row.map((x, w) => x / (size[v] * size[w]))));
  if (!factored.definite) return Math.min(...results.map((one) => chanceBeyond(problem, one)));
  const scaled = forms.map(({ distance }, v) => distance / size[v]);
  const solved = solveWithFactor(factored.factor, scaled);
  const square = scaled.reduce((sum, x, v) => sum + x * solved[v], 0);
  return gammaUpper(0.5 * forms.length, 0.5 * square);
}
