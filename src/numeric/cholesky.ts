/** A lower triangular factor L with L·Lᵀ = the matrix, or the place and direction in which there is none. */
export type Factorisation =
  | { readonly definite: true; readonly factor: readonly Float64Array[] }
  /** `direction` has a negative square: vᵀ·A·v < 0. Entries beyond `row` are 0. */
  | { readonly definite: false; readonly row: number; readonly direction: Float64Array };

/** Below this a pivot of a matrix with ones on its diagonal is taken as zero. */
const pivotTolerance = 1e-10;

/**
 * Cholesky factor of a symmetric matrix with entries of order 1, positive semi-definite ones included: a pivot that
 * vanishes gives a column of zeros. Zeros of the matrix that need not fill stay exactly zero, so rows of unrelated groups
 * do not touch each other.
 *
 * @param matrix n × n; the upper half is not read
 */
export function cholesky(matrix: readonly ArrayLike<number>[]): Factorisation {
  const n = matrix.length;
  const factor = matrix.map(() => new Float64Array(n));
  for (let i = 0; i < n; i++) {
    for (let j = 0; j <= i; j++) {
      let rest = matrix[i][j];
      for (let k = 0; k < j; k++) rest -= factor[i][k] * factor[j][k];
      if (j < i) {
        // a vanished pivot allows no more than the geometric mean of the two pivots beside it
        if (factor[j][j] === 0 && Math.abs(rest) > Math.sqrt(pivotTolerance))
          return refused(matrix, factor, i, j, rest);
        factor[i][j] = factor[j][j] === 0 ? 0 : rest / factor[j][j];
      } else {
        if (rest < -pivotTolerance) return refused(matrix, factor, i, i, 0);
        factor[i][i] = rest <= pivotTolerance ? 0 : Math.sqrt(rest);
      }
    }
  }
  return { definite: true, factor };
}

/** The direction that shows the fault: row i less its projection on the rows before (or a step across a flat pivot j). */
function refused(
  matrix: readonly ArrayLike<number>[],
  factor: readonly Float64Array[],
  i: number,
  j: number,
  rest: number,
): Factorisation {
  const direction = projected(factor, j, matrix[i]);
  direction[i] = 1;
  if (j < i) {
    // along row j's own direction the square is flat and the cross term `rest` is not: a long step makes it negative
    const flat = projected(factor, j, matrix[j]);
    flat[j] = 1;
    const step = -Math.sign(rest) * Math.max(1, 1 / Math.abs(rest));
    for (let k = 0; k <= j; k++) direction[k] += step * flat[k];
  }
  return { definite: false, row: i, direction };
}

/** −A₁₁⁻¹·a for the leading rows before `size`, a the first entries of `row`; flat pivots are left out. */
function projected(factor: readonly Float64Array[], size: number, row: ArrayLike<number>): Float64Array {
  const x = new Float64Array(factor.length);
  for (let k = 0; k < size; k++) {
    let rest = row[k];
    for (let m = 0; m < k; m++) rest -= factor[k][m] * x[m];
    x[k] = factor[k][k] === 0 ? 0 : rest / factor[k][k];
  }
  for (let k = size - 1; k >= 0; k--) {
    let rest = x[k];
    for (let m = k + 1; m < size; m++) rest -= factor[m][k] * x[m];
    x[k] = factor[k][k] === 0 ? 0 : rest / factor[k][k];
  }
  for (let k = 0; k < size; k++) x[k] = -x[k];
  return x;
}

/**
 * Solution of L·Lᵀ·x = b for a factor as above; entries that belong to a vanished pivot are 0.
 *
 * @param factor n × n, lower triangular
 */
export function solveWithFactor(factor: readonly Float64Array[], b: ArrayLike<number>): Float64Array {
  return projected(factor, factor.length, b).map((x) => -x);
}
