import { cholesky, solveWithFactor } from "../numeric/cholesky.ts";
import { normalPdf } from "../numeric/normal.ts";
import type { JointSpace } from "../probability/marginal.ts";
import { type Movement, movementsOf } from "../probability/moved-marginal.ts";
import type { RemadeAt } from "../reliability/first-order.ts";
import { dot, type FailureEvent } from "../reliability/point-evaluator.ts";
import type { FirstOrderResult } from "../results.ts";
import { belongs, type FailureSample } from "./failure-sample.ts";
import { lazyTable } from "./lazy-table.ts";

export interface ProbabilityDerivative {
  /** Change of the failure probability per unit of the parameter; null where it is not known. */
  readonly value: number | null;
  readonly standardError: number | null;
  /** score: from the failing samples. design_point: from the index, where the density ends abruptly and a score would miss it. */
  readonly from: "score" | "design_point";
}

export interface ProbabilityDerivatives {
  readonly path: string;
  readonly perMean: ProbabilityDerivative;
  readonly perSd: ProbabilityDerivative;
}

/**
 * Derivatives of the failure probability to the mean and standard deviation of every unknown, from samples that failed.
 *
 *   ∂p/∂θ = E[failure · ∂ ln f(x; θ)/∂θ], for x_i with u = normals of correlation R:
 *   ∂ ln f/∂θ = ∂ ln f_i(x_i)/∂θ + (u_i − (R⁻¹u)_i) ∂u_i/∂θ
 *
 * The correlation of the normals is held. Where the density of an unknown ends abruptly (uniform, truncated) the score misses what
 * happens at its end, and the derivative is −φ(β) ∂β/∂θ at the design point.
 *
 * @param firstOrder of the same event, for those; a null there stays one here
 * @source R. Y. Rubinstein (1986), The score function approach for sensitivity analysis of computer simulation models, Math. Comput.
 *   Simul. 28, 351–379
 */
export function probabilityDerivatives(
  space: JointSpace,
  sample: FailureSample,
  event: FailureEvent,
  firstOrder?: FirstOrderResult,
  remadeAt: RemadeAt = () => undefined,
): readonly ProbabilityDerivatives[] {
  const { unknowns, rows } = space;
  const movements = unknowns.map(({ marginal }, i) => movementsOf(marginal, remadeAt(i)));
  const scores = unknowns.map(({ marginal }, i) => {
    const of = (movement: Movement): Score => ({
      own: lazyTable(marginal, (u) => movement.ofLogDensity(marginal.quantileOfNormal(u))),
      beside: lazyTable(marginal, movement.ofNormal),
    });
    return { mean: of(movements[i].mean), sd: of(movements[i].sd) };
  });
  const beside = besideOthers(space);
  const count = sample.weights.length;
  const sums = unknowns.map(() => ({ mean: 0, mean2: 0, sd: 0, sd2: 0 }));
  const z = new Float64Array(rows[0]?.length ?? 0);
  for (let s = 0; s < count; s++) {
    if (!belongs(sample.failed[s], event)) continue;
    for (let j = 0; j < z.length; j++) z[j] = sample.z[j][s];
    const u = Float64Array.from(rows, (row) => dot(row, z));
    const shift = beside(u);
    for (let i = 0; i < unknowns.length; i++) {
      if (movements[i].edged) continue;
      const mean = sample.weights[s] * scoreAt(scores[i].mean, u[i], shift[i]);
      const sd = sample.weights[s] * scoreAt(scores[i].sd, u[i], shift[i]);
      sums[i].mean += mean;
      sums[i].mean2 += mean * mean;
      sums[i].sd += sd;
      sums[i].sd2 += sd * sd;
    }
  }
  return unknowns.map(({ path }, i) => {
    if (movements[i].edged) return { path, ...fromDesignPoint(path, firstOrder) };
    const { mean, mean2, sd, sd2 } = sums[i];
    return {
      path,
      perMean: fromScores(mean, mean2, sample.drawn),
      perSd: fromScores(sd, sd2, sample.drawn),
    };
  });
}

/** The two terms of a score, as functions of the unknown's own normal. */
interface Score {
  own(u: number): number;
  beside(u: number): number;
}

function scoreAt(score: Score, u: number, shift: number): number {
  const value = score.own(u) + (shift === 0 ? 0 : shift * score.beside(u));
  return Number.isFinite(value) ? value : 0;
}

function fromScores(sum: number, squares: number, n: number): ProbabilityDerivative {
  const value = sum / n;
  return { value, standardError: Math.sqrt(Math.max(squares / n - value * value, 0) / n), from: "score" };
}

function fromDesignPoint(
  path: string,
  firstOrder: FirstOrderResult | undefined,
): Pick<ProbabilityDerivatives, "perMean" | "perSd"> {
  const index = firstOrder?.reliabilityIndex ?? null;
  const derivative = firstOrder?.derivatives?.[path];
  const per = (change: number | null | undefined): ProbabilityDerivative => ({
    value: index === null || change === null || change === undefined ? null : -normalPdf(index) * change,
    standardError: null,
    from: "design_point",
  });
  return { perMean: per(derivative?.perMean), perSd: per(derivative?.perSd) };
}

/** u − R⁻¹u: zero for every unknown that is correlated with none. */
function besideOthers(space: JointSpace): (u: Float64Array) => Float64Array {
  const { rows } = space;
  const correlation = rows.map((row) => Float64Array.from(rows, (other) => dot(row, other)));
  const linked = correlation.map((row, i) => row.some((value, j) => j !== i && Math.abs(value) > 1e-12));
  if (!linked.some((value) => value)) return (u) => u.map(() => 0);
  const factored = cholesky(correlation);
  if (!factored.definite) throw new RangeError(`rows of unknowns give no correlation at ${factored.row}`);
  return (u) => {
    const solved = solveWithFactor(factored.factor, u);
    return u.map((value, i) => (linked[i] ? value - solved[i] : 0));
  };
}
