import type { Problem } from "../errors.ts";
import { cholesky } from "../numeric/cholesky.ts";
import type { Correlation, Notice } from "../study/study.ts";
import type { Marginal } from "./marginal.ts";
import { correlationOfNormals } from "./nataf.ts";

/** An uncertain quantity as the study gives it. */
export interface StatedUnknown {
  readonly path: string;
  readonly marginal: Marginal;
  /** κ where the study states one (scatter, measured, yearly); absent for a plain distribution. */
  readonly knowledge?: number;
  readonly yearly: boolean;
}

/** A pair of unknowns that the study correlates: places in the list of unknowns, r of their normals, and where it stands. */
export interface CorrelatedPair {
  readonly first: number;
  readonly second: number;
  readonly coefficient: number;
  /** `correlations.N`, for messages */
  readonly path: string;
  /** As the study gives it. */
  readonly stated: number;
}

export interface NormalCorrelations {
  readonly pairs: readonly CorrelatedPair[];
  readonly problems: readonly Problem[];
  readonly notices: readonly Notice[];
}

/** The correlations of a study turned into those of the standard normals behind its unknowns. */
export function normalCorrelations(
  unknowns: readonly { readonly path: string; readonly marginal: Marginal }[],
  correlations: readonly Correlation[],
): NormalCorrelations {
  const places = new Map(unknowns.map(({ path }, i) => [path, i]));
  const pairs: CorrelatedPair[] = [];
  const problems: Problem[] = [];
  const notices: Notice[] = [];
  correlations.forEach(({ between, coefficient }, n) => {
    const path = `correlations.${n}`;
    const [first, second] = between.map((name) => places.get(name));
    if (first === undefined || second === undefined) {
      const certain = between.filter((name) => !places.has(name)).join(" and ");
      notices.push({ path, message: `the correlation has no effect: ${certain} is a certain number` });
      return;
    }
    const twin = pairs.find((pair) => samePair(pair, first, second));
    if (first === second || twin) {
      problems.push({
        path,
        message: `${both(between)}: ${twin ? `the pair stands in ${twin.path} already` : "a variable has no correlation with itself"}`,
      });
      return;
    }
    const found = correlationOfNormals(unknowns[first].marginal, unknowns[second].marginal, coefficient);
    if (!found.possible) {
      const [least, largest] = found.range.map((value) => value.toFixed(3));
      problems.push({
        path,
        message: `${both(between)} cannot have a correlation of ${coefficient}: their distributions allow ${least} to ${largest}`,
        hint: "distributions of more similar shape allow more",
      });
      return;
    }
    if (found.error > 1e-6) {
      notices.push({
        path,
        message: `the correlation of the normals is known to ${found.error.toExponential(0)} only`,
      });
    }
    pairs.push({ first, second, coefficient: found.coefficient, path, stated: coefficient });
  });
  return { pairs, problems, notices };
}

function samePair(pair: CorrelatedPair, first: number, second: number): boolean {
  return (pair.first === first && pair.second === second) || (pair.first === second && pair.second === first);
}

export function both(between: readonly [string, string]): string {
  return `${between[0]} and ${between[1]}`;
}

/** Ones on the diagonal, the pairs' coefficients beside it. n × n. */
export function correlationMatrix(
  n: number,
  pairs: readonly Pick<CorrelatedPair, "first" | "second" | "coefficient">[],
): Float64Array[] {
  const matrix = Array.from({ length: n }, (_, i) => Float64Array.from({ length: n }, (_, j) => (i === j ? 1 : 0)));
  for (const { first, second, coefficient } of pairs) {
    matrix[first][second] = coefficient;
    matrix[second][first] = coefficient;
  }
  return matrix;
}

/**
 * Rows that make the covariance: rowᵢ · rowⱼ = matrixᵢⱼ, one column per variable, in the order of the variables.
 *
 * The factor is taken in the order of the names, not of the study, and unrelated variables leave zeros: so neither moving
 * a variable in the study nor adding one that has nothing to do with the others changes a draw.
 */
export function factorByName(
  matrix: readonly Float64Array[],
  names: readonly string[],
): { readonly rows: Float64Array[] } | { readonly direction: Float64Array } {
  const n = names.length;
  const order = names.map((_, i) => i).sort((i, j) => (names[i] < names[j] ? -1 : names[i] > names[j] ? 1 : 0));
  const sorted = order.map((i) => Float64Array.from(order, (j) => matrix[i][j]));
  const result = cholesky(sorted);
  if (!result.definite) {
    const direction = new Float64Array(n);
    for (let k = 0; k < n; k++) direction[order[k]] = result.direction[k];
    return { direction };
  }
  const rows = matrix.map(() => new Float64Array(n));
  for (let k = 0; k < n; k++) for (let m = 0; m <= k; m++) rows[order[k]][order[m]] = result.factor[k][m];
  return { rows };
}

/** The pair that does most to make vᵀ·matrix·v negative: the one to name where a matrix is refused. */
export function worstPair(
  pairs: readonly CorrelatedPair[],
  direction: ArrayLike<number>,
  coefficient: (pair: CorrelatedPair) => number = (pair) => pair.coefficient,
): CorrelatedPair | undefined {
  const share = (pair: CorrelatedPair): number => coefficient(pair) * direction[pair.first] * direction[pair.second];
  return pairs.reduce<CorrelatedPair | undefined>(
    (worst, pair) => (worst === undefined || share(pair) < share(worst) ? pair : worst),
    undefined,
  );
}
