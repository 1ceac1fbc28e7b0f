import { Matrix, QrDecomposition } from "ml-matrix";

/**
 * Minimises |E·x − f| over x ≥ 0.
 *
 * Columns enter one at a time, the one along which the residual falls fastest; where the unconstrained solution over the
 * columns in hand has a negative entry, a step is taken as far as the bounds allow and the columns at 0 leave.
 *
 * @param columns the columns of E, each of the length of f
 * @returns x, one entry per column, and the residual f − E·x
 * @source C. L. Lawson and R. J. Hanson (1974), Solving Least Squares Problems, chapter 23, algorithm NNLS
 */
export function nonnegativeLeastSquares(
  columns: readonly ArrayLike<number>[],
  f: ArrayLike<number>,
): { readonly x: Float64Array; readonly residual: Float64Array } {
  const count = columns.length;
  const x = new Float64Array(count);
  const inHand: number[] = [];
  const barred = new Set<number>();
  let residual = residualOf(columns, f, x);
  const scale = columns.map((column) => Math.sqrt(dot(column, column)));
  for (let round = 0; round < 3 * count + 3; round++) {
    const slopes = columns.map((column, j) =>
      inHand.includes(j) || barred.has(j) || scale[j] === 0 ? 0 : dot(column, residual) / scale[j],
    );
    const steepest = slopes.indexOf(Math.max(...slopes));
    if (steepest < 0 || slopes[steepest] <= 1e-12) break;
    inHand.push(steepest);
    let trial = leastSquares(columns, inHand, f);
    if (trial[inHand.length - 1] <= 0) {
      // lost in rounding: a column that depends on those in hand
      inHand.pop();
      barred.add(steepest);
      continue;
    }
    barred.clear();
    while (trial.some((value) => value <= 0)) {
      stepTowards(x, inHand, trial);
      trial = leastSquares(columns, inHand, f);
    }
    x.fill(0);
    inHand.forEach((j, place) => {
      x[j] = trial[place];
    });
    residual = residualOf(columns, f, x);
  }
  return { x, residual };
}

/** As far from x towards the trial as no entry falls below 0; entries that reach 0 leave. */
function stepTowards(x: Float64Array, inHand: number[], trial: readonly number[]): void {
  let share = 1;
  inHand.forEach((j, place) => {
    if (trial[place] <= 0) share = Math.min(share, x[j] / (x[j] - trial[place]));
  });
  const blocking = new Set<number>();
  inHand.forEach((j, place) => {
    const at = x[j] + share * (trial[place] - x[j]);
    x[j] = at > 1e-14 && !(trial[place] <= 0 && x[j] / (x[j] - trial[place]) <= share) ? at : 0;
    if (x[j] === 0) blocking.add(j);
  });
  for (let place = inHand.length - 1; place >= 0; place--) if (blocking.has(inHand[place])) inHand.splice(place, 1);
}

function leastSquares(
  columns: readonly ArrayLike<number>[],
  chosen: readonly number[],
  f: ArrayLike<number>,
): number[] {
  if (chosen.length === 0) return [];
  const e = new Matrix(f.length, chosen.length);
  chosen.forEach((j, place) => {
    for (let i = 0; i < f.length; i++) e.set(i, place, columns[j][i]);
  });
  const qr = new QrDecomposition(e);
  if (!qr.isFullRank()) return chosen.map((_, place) => (place === chosen.length - 1 ? -1 : 1));
  return qr.solve(Matrix.columnVector(Array.from(f))).to1DArray();
}

function residualOf(columns: readonly ArrayLike<number>[], f: ArrayLike<number>, x: Float64Array): Float64Array {
  const residual = Float64Array.from(f);
  for (let j = 0; j < columns.length; j++)
    if (x[j] !== 0) for (let i = 0; i < residual.length; i++) residual[i] -= columns[j][i] * x[j];
  return residual;
}

function dot(a: ArrayLike<number>, b: ArrayLike<number>): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += a[i] * b[i];
  return sum;
}

/** The point of a polyhedron that lies nearest to the origin, or none where the half-spaces have no point in common. */
export type NearestPoint =
  | { readonly feasible: true; readonly point: Float64Array; readonly multipliers: Float64Array }
  | { readonly feasible: false };

/**
 * The point of least |z| with normals[j] · z ≤ bounds[j] for every j.
 *
 * At the answer z = −Σ multipliers[j]·normals[j], multipliers ≥ 0, and positive only where the bound is met exactly.
 *
 * @source Lawson and Hanson (1974), chapter 23, problem LDP (least distance programming)
 */
export function nearestPoint(normals: readonly ArrayLike<number>[], bounds: ArrayLike<number>): NearestPoint {
  const dimension = normals[0]?.length ?? 0;
  // G z ≥ h with G = −normals, h = −bounds: columns of E are (G_j, h_j), f = (0, …, 0, 1)
  const columns = normals.map((normal, j) => {
    const column = new Float64Array(dimension + 1);
    for (let i = 0; i < dimension; i++) column[i] = -normal[i];
    column[dimension] = -bounds[j];
    return column;
  });
  const f = new Float64Array(dimension + 1);
  f[dimension] = 1;
  const { x, residual } = nonnegativeLeastSquares(columns, f);
  const last = residual[dimension];
  if (!(last > 1e-9)) return { feasible: false };
  return {
    feasible: true,
    point: residual.subarray(0, dimension).map((value) => 0 - value / last),
    multipliers: x.map((value) => value / last),
  };
}
