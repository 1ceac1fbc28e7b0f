import { normalCdf } from "../numeric/normal.ts";
import type { JointSpace } from "../probability/marginal.ts";
import type { SecondMomentResult } from "../results.ts";
import type { LimitStates } from "./limit-states.ts";

/** Factors at points given by the value of every unknown: rows of x in, rows of factors out (one entry per limit state). */
export function factorsAt(states: LimitStates, points: readonly (readonly number[])[]): readonly (readonly number[])[] {
  const rows: number[][] = [];
  const size = Math.min(states.capacity, Math.max(points.length, 1));
  const width = points[0]?.length ?? 0;
  const x = Array.from({ length: width }, () => new Float64Array(size));
  const factors = states.names.map(() => new Float64Array(size));
  const marks = new Uint8Array(size);
  for (let start = 0; start < points.length; start += size) {
    const n = Math.min(size, points.length - start);
    for (let i = 0; i < n; i++) for (let v = 0; v < width; v++) x[v][i] = points[start + i][v];
    states.evaluateAt(x, n, factors, marks);
    for (let i = 0; i < n; i++) rows.push(factors.map((column) => column[i]));
  }
  return rows;
}

/** The point of all means, and for each unknown the two points with it moved to the given values. */
export function oneAtATime(
  space: JointSpace,
  moved: (place: number) => readonly [number, number],
): readonly (readonly number[])[] {
  const means = space.unknowns.map((unknown) => unknown.marginal.mean);
  const points: number[][] = [means];
  space.unknowns.forEach((_, place) => {
    for (const value of moved(place)) points.push(means.map((mean, other) => (other === place ? value : mean)));
  });
  return points;
}

/**
 * First-order second-moment on the factor of safety, each derivative from two points at mean ± one standard deviation.
 *
 *   a_i = (F(mean + sd_i) − F(mean − sd_i))/2,  sd² = Σ Σ ρ_ij a_i a_j
 *   index: (mean − 1)/sd, and for a lognormal factor ln(mean/√(1 + V²))/√ln(1 + V²), V = sd/mean
 *
 * The share of a variable is a_i Σ_j ρ_ij a_j / sd²: shares sum to 1, and one can be negative under correlation.
 *
 * @param correlation of the variables themselves, by place
 * @param steps length of the step on either side, in standard deviations: 1 as defined above, a small one for the derivative at
 *   the means
 * @returns one result per limit state
 * @source J. M. Duncan (2000), J. Geotech. Geoenviron. Eng. 126(4), 307–316
 */
export function firstOrderSecondMoment(
  states: LimitStates,
  space: JointSpace,
  correlation: (i: number, j: number) => number,
  steps = 1,
): readonly SecondMomentResult[] {
  const rows = factorsAt(
    states,
    oneAtATime(space, (place) => {
      const { mean, sd } = space.unknowns[place].marginal;
      return [mean - steps * sd, mean + steps * sd];
    }),
  );
  return states.names.map((_, k) => {
    const half = space.unknowns.map((_, place) => (rows[2 + 2 * place][k] - rows[1 + 2 * place][k]) / (2 * steps));
    const along = half.map((_, i) => half.reduce((sum, aj, j) => sum + (i === j ? 1 : correlation(i, j)) * aj, 0));
    const variance = half.reduce((sum, ai, i) => sum + ai * along[i], 0);
    const shares = half.map((ai, i) => (variance > 0 ? (ai * along[i]) / variance : 0));
    const contributions = Object.fromEntries(space.unknowns.map((unknown, i) => [unknown.path, shares[i]]));
    return { ...secondMomentIndices(rows[0][k], Math.sqrt(Math.max(variance, 0))), contributions };
  });
}

/** No index above this is a finding; a spread of zero gives it. */
const largestIndex = 1000;
const held = (index: number): number => Math.min(Math.max(index, -largestIndex), largestIndex);

/** The two indices and probabilities of a factor of safety with this mean and standard deviation. */
export function secondMomentIndices(mean: number, sd: number): Omit<SecondMomentResult, "contributions"> {
  const v = mean > 0 ? sd / mean : 0;
  const zeta2 = Math.log1p(v * v);
  const normal = held(sd > 0 ? (mean - 1) / sd : largestIndex * Math.sign(mean - 1));
  const logRatio = mean > 0 ? Math.log(mean) - 0.5 * zeta2 : Number.NEGATIVE_INFINITY;
  const lognormal = held(zeta2 > 0 ? logRatio / Math.sqrt(zeta2) : largestIndex * Math.sign(mean - 1));
  return {
    mean,
    sd,
    reliabilityIndexNormal: normal,
    reliabilityIndexLognormal: lognormal,
    probabilityNormal: normalCdf(-normal),
    probabilityLognormal: normalCdf(-lognormal),
  };
}
