import { EigenvalueDecomposition, Matrix } from "ml-matrix";
import { normalCdf, normalPdf, normalUpperQuantile } from "../numeric/normal.ts";
import type { DesignPoint } from "./design-points.ts";
import { directionCosines } from "./first-order.ts";
import type { LimitStates } from "./limit-states.ts";
import { norm, type Point, pointEvaluator } from "./point-evaluator.ts";

/** Main curvatures of the limit surface at its design point; positive where it bends away from the origin. */
export interface Curvatures {
  readonly values: readonly number[];
  /** false where two step sizes disagree: a kink lies near, and the curvatures mean nothing. */
  readonly smooth: boolean;
}

const step = 0.02;

/**
 * Curvatures by second differences of the margin in the plane that touches the surface at the point.
 *
 * d (d − 1)/2 + 3 (d − 1) + 1 exact evaluations for d coordinates (two step sizes along each axis).
 */
export function curvaturesAt(states: LimitStates, designPoint: DesignPoint): Curvatures {
  const { point, state } = designPoint;
  const evaluator = pointEvaluator(states);
  const axes = tangents(directionCosines(designPoint));
  const moved = (...moves: readonly (readonly [number, number])[]): Point => {
    const at = point.slice();
    for (const [axis, length] of moves) for (let i = 0; i < at.length; i++) at[i] += length * axes[axis][i];
    return at;
  };
  const count = axes.length;
  const trials: Point[] = [point];
  for (let a = 0; a < count; a++)
    trials.push(moved([a, step]), moved([a, -step]), moved([a, 2 * step]), moved([a, -2 * step]));
  for (let a = 0; a < count; a++) for (let b = 0; b < a; b++) trials.push(moved([a, step], [b, step]));
  const values = evaluator.margins(state, trials);
  const slope = slopeAt(designPoint);
  const matrix = Matrix.zeros(count, count);
  let smooth = Number.isFinite(slope) && slope > 0;
  const along = (a: number, side: number): number => values[1 + 4 * a + side];
  for (let a = 0; a < count; a++) {
    const near = (along(a, 0) - 2 * values[0] + along(a, 1)) / (step * step) / slope;
    const far = (along(a, 2) - 2 * values[0] + along(a, 3)) / (4 * step * step) / slope;
    if (Math.abs(near - far) > 0.02 + 0.2 * Math.abs(near)) smooth = false;
    matrix.set(a, a, near);
  }
  let next = 1 + 4 * count;
  for (let a = 0; a < count; a++)
    for (let b = 0; b < a; b++) {
      const together = values[next++] - along(a, 0) - along(b, 0) + values[0];
      matrix.set(a, b, together / (step * step) / slope);
      matrix.set(b, a, matrix.get(a, b));
    }
  if (!smooth) return { values: [], smooth };
  const { realEigenvalues } = new EigenvalueDecomposition(matrix, { assumeSymmetric: true });
  return { values: realEigenvalues.sort((a, b) => b - a), smooth };
}

const slopeAt = ({ gradient }: DesignPoint): number => norm(gradient);

/** Unit vectors at right angles to α and to each other: the columns of its Householder reflection, but for the first. */
export function tangents(alpha: Point): readonly Point[] {
  const d = alpha.length;
  const mirror = alpha.slice();
  mirror[0] += alpha[0] >= 0 ? 1 : -1;
  const square = mirror.reduce((sum, value) => sum + value * value, 0);
  return Array.from({ length: d - 1 }, (_, a) => {
    const column = new Float64Array(d);
    column[a + 1] = 1;
    for (let i = 0; i < d; i++) column[i] -= (2 * mirror[i] * mirror[a + 1]) / square;
    return column;
  });
}

export interface SecondOrder {
  /** Φ(−β) ∏ (1 + β κ_i)^(−½) */
  readonly breitung: number;
  /** The same with φ(β)/Φ(−β) in place of β. */
  readonly hohenbichlerRackwitz: number;
  readonly reliabilityIndex: number;
}

/**
 * Second-order probabilities from the index and the curvatures; none where 1 + β κ is not above 0 (the point is no nearest
 * point then) or the index is not above 0.
 *
 * @source K. Breitung (1984), Asymptotic approximations for multinormal integrals, ASCE J. Eng. Mech. 110, 357–366;
 *   M. Hohenbichler and R. Rackwitz (1988), Improvement of second-order reliability estimates by importance sampling, ASCE J.
 *   Eng. Mech. 114, 2195–2199
 */
export function secondOrder(index: number, curvatures: readonly number[]): SecondOrder | undefined {
  if (!(index > 0)) return undefined;
  const tail = normalCdf(-index);
  const psi = normalPdf(index) / tail;
  if (curvatures.some((curvature) => !(1 + psi * curvature > 0))) return undefined;
  const product = (factor: number): number =>
    curvatures.reduce((total, curvature) => total / Math.sqrt(1 + factor * curvature), tail);
  const [breitung, hohenbichlerRackwitz] = [product(index), product(psi)];
  return { breitung, hohenbichlerRackwitz, reliabilityIndex: normalUpperQuantile(Math.min(hohenbichlerRackwitz, 1)) };
}
