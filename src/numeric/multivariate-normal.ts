import { normalCdf, normalQuantile } from "./normal.ts";

/** A chance found by quasi-random points, with the standard error of the mean over their random shifts. */
export interface EstimatedChance {
  readonly probability: number;
  readonly standardError: number;
}

/** How far to go: stop at this relative standard error, or after this many evaluations. */
export interface Effort {
  readonly relativeError: number;
  readonly evaluations: number;
}

const usualEffort: Effort = { relativeError: 1e-5, evaluations: 400_000 };

/** Independent shifts of the lattice; their spread gives the error. */
const shifts = 12;

/**
 * Chance that standard normals with the given correlation all stay below their limits.
 *
 * The n-fold integral becomes one over the unit cube by conditioning one variable after the other, the most limiting first;
 * it is then averaged over a lattice of quasi-random points (multiples of square roots of primes, folded) with fixed
 * shifts, so the same question has the same answer. Each factor is a chance that keeps its digits when it is small, so the
 * error is relative to the result.
 *
 * @param limits n numbers, ±∞ allowed
 * @param correlation n × n, positive semi-definite
 * @source A. Genz (1992), Numerical computation of multivariate normal probabilities, J. Comput. Graph. Stat. 1, 141–149;
 *   order of the variables after G. J. Gibson, C. A. Glasbey and D. A. Elston (1994)
 */
export function multivariateNormal(
  limits: ArrayLike<number>,
  correlation: readonly ArrayLike<number>[],
  effort: Effort = usualEffort,
): EstimatedChance {
  const { ordered, factor } = conditioned(limits, correlation);
  const n = ordered.length;
  if (n === 0) return { probability: 1, standardError: 0 };
  if (n === 1) return { probability: normalCdf(ordered[0]), standardError: 0 };
  const roots = primes(n - 1).map(Math.sqrt);
  const y = new Float64Array(n);
  const sums = new Float64Array(shifts);
  for (let points = 0, next = 256; ; next *= 2) {
    for (let shift = 0; shift < shifts; shift++) {
      for (let k = points; k < next; k++) sums[shift] += chanceAt(ordered, factor, roots, k, shift, y);
    }
    points = next;
    const means = sums.map((sum) => sum / points);
    const probability = means.reduce((a, b) => a + b) / shifts;
    const variance = means.reduce((sum, mean) => sum + (mean - probability) ** 2, 0) / (shifts * (shifts - 1));
    const standardError = Math.sqrt(variance);
    if (standardError <= effort.relativeError * probability || 2 * points * shifts > effort.evaluations) {
      return { probability, standardError };
    }
  }
}

/**
 * Chance that any of several standard normals exceeds its limit, without the cancellation of 1 − multivariateNormal:
 * the sum of the chances that one does and none before it does, the most likely first.
 */
export function anyNormalAbove(
  limits: ArrayLike<number>,
  correlation: readonly ArrayLike<number>[],
  effort: Effort = usualEffort,
): EstimatedChance {
  const order = Array.from(limits, (_, i) => i).sort((i, j) => limits[i] - limits[j]);
  let probability = 0;
  let variance = 0;
  order.forEach((last, place) => {
    // −Z of the last one below −limit, Z of those before below their limits
    const chosen = order.slice(0, place + 1);
    const sign = (i: number): number => (i === last ? -1 : 1);
    const term = multivariateNormal(
      chosen.map((i) => sign(i) * limits[i]),
      chosen.map((i) => chosen.map((j) => sign(i) * sign(j) * correlation[i][j])),
      effort,
    );
    probability += term.probability;
    variance += term.standardError ** 2;
  });
  return { probability, standardError: Math.sqrt(variance) };
}

/** The product of conditional chances at one point of the lattice. */
function chanceAt(
  limits: ArrayLike<number>,
  factor: readonly Float64Array[],
  roots: readonly number[],
  k: number,
  shift: number,
  y: Float64Array,
): number {
  let product = 1;
  for (let i = 0; i < limits.length; i++) {
    let given = limits[i];
    for (let j = 0; j < i; j++) given -= factor[i][j] * y[j];
    // a variable that hangs on those before is within its limit or not
    const chance = factor[i][i] > 0 ? normalCdf(given / factor[i][i]) : given >= 0 ? 1 : 0;
    product *= chance;
    if (product === 0) return 0;
    if (i === limits.length - 1) return product;
    const place = (k + 0.5) * roots[i] + shiftOf(shift, i);
    const folded = Math.abs(2 * (place - Math.floor(place)) - 1);
    y[i] = normalQuantile(Math.min(Math.max(folded, 1e-12), 1 - 1e-12) * chance);
  }
  return product;
}

/** Shift of one coordinate: fixed numbers without a pattern (the golden ratio's multiples of a mixed index). */
function shiftOf(shift: number, coordinate: number): number {
  const mixed = Math.sin(12.9898 * (shift + 1) + 78.233 * (coordinate + 1)) * 43758.5453;
  return mixed - Math.floor(mixed);
}

/** Limits and Cholesky factor with the variable of least conditional chance taken first, and so on. */
function conditioned(
  limits: ArrayLike<number>,
  correlation: readonly ArrayLike<number>[],
): { ordered: Float64Array; factor: Float64Array[] } {
  const left = Array.from(limits, (_, i) => i).filter((i) => limits[i] < Number.POSITIVE_INFINITY);
  const n = left.length;
  const rows = left.map(() => new Float64Array(n));
  const ordered = new Float64Array(n);
  const factor: Float64Array[] = [];
  const y = new Float64Array(n);
  const index = left.map((_, i) => i);
  for (let place = 0; place < n; place++) {
    let best = place;
    let least = Number.POSITIVE_INFINITY;
    for (let c = place; c < n; c++) {
      const { given, pivot } = remaining(
        limits[left[index[c]]],
        correlation[left[index[c]]][left[index[c]]],
        rows[index[c]],
        y,
        place,
      );
      const chance = pivot > 0 ? normalCdf(given / pivot) : given >= 0 ? 1 : 0;
      if (chance < least) [least, best] = [chance, c];
    }
    [index[place], index[best]] = [index[best], index[place]];
    const own = index[place];
    const { given, pivot } = remaining(limits[left[own]], correlation[left[own]][left[own]], rows[own], y, place);
    rows[own][place] = pivot;
    for (let c = place + 1; c < n; c++) {
      let rest = correlation[left[index[c]]][left[own]];
      for (let k = 0; k < place; k++) rest -= rows[index[c]][k] * rows[own][k];
      rows[index[c]][place] = pivot > 0 ? rest / pivot : 0;
    }
    ordered[place] = limits[left[own]];
    factor.push(rows[own]);
    y[place] = pivot > 0 ? meanBelow(given / pivot) : 0;
  }
  return { ordered, factor };
}

/** Limit less what the variables before contribute at their means, and the standard deviation that is left. */
function remaining(
  limit: number,
  variance: number,
  row: Float64Array,
  y: Float64Array,
  place: number,
): { given: number; pivot: number } {
  let given = limit;
  let rest = variance;
  for (let k = 0; k < place; k++) {
    given -= row[k] * y[k];
    rest -= row[k] * row[k];
  }
  return { given, pivot: rest > 1e-10 ? Math.sqrt(rest) : 0 };
}

/** Mean of a standard normal that stays below a limit, −φ/Φ. */
function meanBelow(limit: number): number {
  const chance = normalCdf(limit);
  return chance > 0 ? (-Math.exp(-0.5 * limit * limit) * 0.3989422804014327) / chance : limit;
}

/** The first n primes. */
function primes(n: number): number[] {
  const found: number[] = [];
  for (let candidate = 2; found.length < n; candidate++)
    if (found.every((p) => candidate % p !== 0)) found.push(candidate);
  return found;
}
