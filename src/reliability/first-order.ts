import { cholesky, solveWithFactor } from "../numeric/cholesky.ts";
import { normalCdf } from "../numeric/normal.ts";
import type { JointSpace } from "../probability/marginal.ts";
import { movementsOf, type Remade, stretchAt } from "../probability/moved-marginal.ts";
import type { FirstOrderResult } from "../results.ts";
import { isSmooth, refineSmoothPoint } from "./design-point.ts";
import { type DesignPoint, evaluationsOf, type StateSearch } from "./design-points.ts";
import type { LimitStates } from "./limit-states.ts";
import { dot, norm, type Point, pointEvaluator, scaled } from "./point-evaluator.ts";

/** The marginal of an unknown with another mean and standard deviation, of the same kind; undefined where that has no meaning. */
export type RemadeAt = (place: number) => Remade | undefined;

/**
 * What a limit state's search found, as the first-order result: index, design point in values, importance, derivatives. A smooth
 * point is found to more digits first.
 */
export function firstOrderResult(
  states: LimitStates,
  space: JointSpace,
  search: StateSearch,
  remadeAt: RemadeAt = () => undefined,
): FirstOrderResult {
  const before = evaluationsOf(states);
  const [nearest, ...others] = refined(states, search.points);
  const evaluations = search.evaluations + evaluationsOf(states) - before;
  if (nearest === undefined)
    return {
      converged: false,
      status: "none",
      reliabilityIndex: null,
      probability: null,
      designPoint: {},
      importance: {},
      evaluations,
    };
  const { reliabilityIndex, status } = nearest;
  const weights = weightsOfUnknowns(space, directionCosines(nearest));
  const paths = space.unknowns.map(({ path }) => path);
  const byPath = <T>(values: ArrayLike<T>): Record<string, T> =>
    Object.fromEntries(paths.map((path, i) => [path, values[i]]));
  const square = dot(weights, weights);
  return {
    converged: status !== "usable",
    status,
    reliabilityIndex,
    probability: normalCdf(-reliabilityIndex),
    designPoint: byPath(valuesAt(space, nearest.point)),
    importance: byPath(Array.from(weights, (weight) => (weight * weight) / square)),
    derivatives: byPath(indexDerivatives(space, nearest, weights, remadeAt)),
    others: others.map((other) => ({
      reliabilityIndex: other.reliabilityIndex,
      status: other.status,
      designPoint: byPath(valuesAt(space, other.point)),
    })),
    evaluations,
  };
}

/** The points with the nearest one, where it is smooth, to more digits; a kink that the search did not feel makes it a corner. */
export function refined(states: LimitStates, points: readonly DesignPoint[]): readonly DesignPoint[] {
  const [nearest, ...others] = points;
  if (nearest?.status !== "smooth") return points;
  const evaluator = pointEvaluator(states);
  const margins = (trials: readonly Point[]): Float64Array => evaluator.margins(nearest.state, trials);
  if (norm(nearest.point) > 1e-3 && !isSmooth(margins, nearest.point))
    return [{ ...nearest, status: "corner" }, ...others];
  const better = refineSmoothPoint(margins, nearest);
  const sign = Math.sign(nearest.reliabilityIndex);
  return [{ ...nearest, ...better, reliabilityIndex: sign * norm(better.point) }, ...others];
}

/** Values of the unknowns at a point of standard normal space. */
export function valuesAt(space: JointSpace, z: Point): readonly number[] {
  return space.unknowns.map(({ marginal }, i) => marginal.quantileOfNormal(dot(space.rows[i], z)));
}

/** α, the unit vector from the origin to the design point (towards failure); from the gradient where the point is the origin. */
export function directionCosines({ point, gradient, reliabilityIndex }: DesignPoint): Point {
  if (Math.abs(reliabilityIndex) > 1e-6) return scaled(point, 1 / reliabilityIndex);
  return scaled(gradient, -1 / norm(gradient));
}

/**
 * The share of each unknown's own normal in α: w with Rᵀ·w = α, u = R·z.
 *
 * With independent unknowns w = α and w² is the importance; with correlation w, normalised, is the γ of Der Kiureghian and
 * Liu, since the sd of every u is 1.
 *
 * @source A. Der Kiureghian and P.-L. Liu (1986), Structural reliability under incomplete probability information, ASCE J. Eng.
 *   Mech. 112, 85–104; P.-L. Liu and A. Der Kiureghian (1986), Univ. of California report UCB/SESM-89/18 for γ
 */
export function weightsOfUnknowns(space: JointSpace, alpha: Point): Float64Array {
  const { rows } = space;
  const correlation = rows.map((row) => Float64Array.from(rows, (other) => dot(row, other)));
  const along = Float64Array.from(rows, (row) => dot(row, alpha));
  const factored = cholesky(correlation);
  if (!factored.definite) throw new RangeError(`rows of unknowns give no correlation at ${factored.row}`);
  return solveWithFactor(factored.factor, along);
}

/** Change of an index per unit of a mean and of a standard deviation; null where the value does not move with its normal. */
export interface IndexDerivative {
  readonly perMean: number | null;
  readonly perSd: number | null;
}

/**
 * Derivatives of the reliability index to every mean and standard deviation.
 *
 *   ∂β/∂θ = −w_i (∂x_i/∂θ)/(∂x_i/∂u_i), at the design point
 *
 * The correlation of the normals is held (its small change with the moments is left out).
 */
export function indexDerivatives(
  space: JointSpace,
  { point }: DesignPoint,
  weights: Float64Array,
  remadeAt: RemadeAt,
): readonly IndexDerivative[] {
  return space.unknowns.map(({ marginal }, i) => {
    const u = dot(space.rows[i], point);
    const { mean, sd } = movementsOf(marginal, remadeAt(i));
    const stretch = stretchAt(marginal, u);
    const per = (move: number): number | null => {
      const derivative = (-weights[i] * move) / stretch;
      return Number.isFinite(derivative) ? derivative : null;
    };
    return { perMean: per(mean.ofValue(u)), perSd: per(sd.ofValue(u)) };
  });
}
