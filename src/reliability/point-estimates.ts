import { EigenvalueDecomposition, Matrix } from "ml-matrix";
import type { JointSpace } from "../probability/marginal.ts";
import type { SecondMomentResult } from "../results.ts";
import type { LimitStates } from "./limit-states.ts";
import { factorsAt, secondMomentIndices } from "./second-moment.ts";

/** Moments of a factor of safety from a few points, with the indices that go with them. */
export interface PointEstimate extends Omit<SecondMomentResult, "contributions"> {
  readonly points: number;
}

/** Pearson coefficient of two unknowns, by place. */
export type CorrelationOf = (i: number, j: number) => number;

/** Beyond this many unknowns 2^n points are no longer a hand method. */
export const mostForTwoPoints = 12;

interface WeightedPoint {
  readonly x: readonly number[];
  readonly weight: number;
}

/**
 * Rosenblueth's point estimates: all 2^n combinations of mean ± one standard deviation.
 *
 *   weight 2^(−n) (1 + Σ_{i<j} s_i s_j ρ_ij), s = ±1
 *
 * @returns one per limit state; undefined for more than `mostForTwoPoints` unknowns, or none
 * @source E. Rosenblueth (1975), Point estimates for probability moments, Proc. Nat. Acad. Sci. 72, 3812–3814
 */
export function twoPointEstimates(
  states: LimitStates,
  space: JointSpace,
  correlation: CorrelationOf,
): readonly PointEstimate[] | undefined {
  const n = space.unknowns.length;
  if (n === 0 || n > mostForTwoPoints) return undefined;
  const points = Array.from({ length: 2 ** n }, (_, bits): WeightedPoint => {
    const sign = (i: number): number => ((bits >> i) & 1 ? 1 : -1);
    let weight = 1;
    for (let i = 0; i < n; i++) for (let j = 0; j < i; j++) weight += sign(i) * sign(j) * correlation(i, j);
    const x = space.unknowns.map(({ marginal: { mean, sd } }, i) => mean + sign(i) * sd);
    return { x, weight: weight / 2 ** n };
  });
  return momentsOver(states, points);
}

/**
 * Harr's point estimates: two points along each eigenvector of the correlation, 2 n in all.
 *
 *   x = mean ± √n·sd·v_k, weight λ_k/(2 n)
 *
 * With many unknowns the points lie far out (√n standard deviations), which shows where the factor is curved.
 *
 * @returns one per limit state; undefined without unknowns
 * @source M. E. Harr (1989), Probabilistic estimates for multivariate analyses, Appl. Math. Modelling 13, 313–318
 */
export function eigenvectorPointEstimates(
  states: LimitStates,
  space: JointSpace,
  correlation: CorrelationOf,
): readonly PointEstimate[] | undefined {
  const n = space.unknowns.length;
  if (n === 0) return undefined;
  const matrix = Matrix.zeros(n, n);
  for (let i = 0; i < n; i++) for (let j = 0; j < n; j++) matrix.set(i, j, i === j ? 1 : correlation(i, j));
  const { realEigenvalues, eigenvectorMatrix } = new EigenvalueDecomposition(matrix, { assumeSymmetric: true });
  const points = realEigenvalues.flatMap((value, k): WeightedPoint[] =>
    [1, -1].map((sign) => ({
      x: space.unknowns.map(
        ({ marginal: { mean, sd } }, i) => mean + sign * Math.sqrt(n) * sd * eigenvectorMatrix.get(i, k),
      ),
      weight: Math.max(value, 0) / (2 * n),
    })),
  );
  return momentsOver(states, points);
}

function momentsOver(states: LimitStates, points: readonly WeightedPoint[]): readonly PointEstimate[] {
  const rows = factorsAt(
    states,
    points.map(({ x }) => x),
  );
  return states.names.map((_, k) => {
    const mean = points.reduce((sum, { weight }, i) => sum + weight * rows[i][k], 0);
    const variance = points.reduce((sum, { weight }, i) => sum + weight * (rows[i][k] - mean) ** 2, 0);
    return { ...secondMomentIndices(mean, Math.sqrt(Math.max(variance, 0))), points: points.length };
  });
}
