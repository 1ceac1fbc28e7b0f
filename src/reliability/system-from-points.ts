import { bivariateNormal } from "../numeric/bivariate-normal.ts";
import { anyNormalAbove } from "../numeric/multivariate-normal.ts";
import { normalCdf } from "../numeric/normal.ts";
import type { DesignPoint } from "./design-points.ts";
import { directionCosines } from "./first-order.ts";
import { dot } from "./point-evaluator.ts";
import { systemBounds } from "./system-bounds.ts";

/** Half-spaces stand in for limit states here: a thousandth is close enough. */
const effort = { relativeError: 1e-3, evaluations: 20_000 };

/** The system as a union of half-spaces, one for each design point of each limit state. */
export interface SystemFromPoints {
  readonly probability: number;
  /** Numerical error of the multivariate normal integral, not of the half-spaces. */
  readonly standardError: number;
  readonly cornell: readonly [number, number];
  readonly ditlevsen: readonly [number, number];
}

/** Probability that any of the half-spaces behind the design points is met, with bounds. */
export function systemFromPoints(points: readonly DesignPoint[]): SystemFromPoints {
  const indices = points.map(({ reliabilityIndex }) => reliabilityIndex);
  return unionOfModes(indices, correlationOfModes(points));
}

/** Correlation of the linearised margins, α_i · α_j: 1 where two modes fail for the same reason. */
export function correlationOfModes(points: readonly DesignPoint[]): readonly (readonly number[])[] {
  const cosines = points.map(directionCosines);
  return cosines.map((a, i) => cosines.map((b, j) => (i === j ? 1 : Math.max(-1, Math.min(1, dot(a, b))))));
}

/** Union of modes of given indices and correlation. */
export function unionOfModes(
  indices: readonly number[],
  correlation: readonly (readonly number[])[],
): SystemFromPoints {
  const each = indices.map((index) => normalCdf(-index));
  if (indices.length === 0) return { probability: 0, standardError: 0, cornell: [0, 0], ditlevsen: [0, 0] };
  const { probability, standardError } = anyNormalAbove(indices, correlation, effort);
  const joint = (i: number, j: number): number => bivariateNormal(-indices[i], -indices[j], correlation[i][j]);
  return { probability, standardError, cornell: systemBounds(each), ditlevsen: ditlevsenBounds(each, joint) };
}

/**
 * Bounds on the probability of a union from single and pairwise probabilities, in the order given (both depend on
 * it; the most likely mode first is usual).
 *
 *   p_1 + Σ max(0, p_i − Σ_{j<i} p_ij) ≤ P ≤ Σ p_i − Σ_{i>1} max_{j<i} p_ij
 *
 * @source O. Ditlevsen (1979), Narrow reliability bounds for structural systems, J. Struct. Mech. 7, 453–472
 */
export function ditlevsenBounds(
  each: readonly number[],
  joint: (i: number, j: number) => number,
): readonly [number, number] {
  let [lower, upper] = [0, 0];
  each.forEach((p, i) => {
    const pairs = Array.from({ length: i }, (_, j) => joint(i, j));
    lower += Math.max(0, p - pairs.reduce((sum, pair) => sum + pair, 0));
    upper += p - Math.max(0, ...pairs);
  });
  return [lower, Math.min(1, upper)];
}
