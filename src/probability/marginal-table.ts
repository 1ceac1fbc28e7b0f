/**
 * Cubic tables of functions of one standard normal variable u: y(u) = f(x(u)), for the sampling loop.
 *
 * |u| ≤ 6 is cut into cells of 1/64. In a cell the cubic goes through y at the four Chebyshev nodes, so its error is below
 * h⁴ |y⁗|/3072 = 2e-11 |y⁗|. Cells that hold a break (a kink or jump of y) and everything outside ±6 are left to the function
 * itself. Checked on every kind of distribution, with an error below 1.3e-9 of the spread; tests/probability/marginal-table.
 */

/** Cells on each unit of u, and how far the tables reach. */
const cellsPerUnit = 64;
export const tableReach = 6;
const cells = 2 * tableReach * cellsPerUnit;

/** Chebyshev nodes of a cell, as fractions of its width. */
const nodes = [0, 1, 2, 3].map((k) => 0.5 - 0.5 * Math.cos((Math.PI * (2 * k + 1)) / 8));

/** Where the samples of a block lie: shared by all tables of the same u. Made once, filled by `locate`. */
export interface Location {
  readonly cell: Int32Array;
  /** Place within the cell, in [0, 1). */
  readonly fraction: Float64Array;
  /** Samples that no table may serve; the first `exceptionCount` are valid. */
  readonly exceptions: Int32Array;
  exceptionCount: number;
}

export function createLocation(capacity: number): Location {
  return {
    cell: new Int32Array(capacity),
    fraction: new Float64Array(capacity),
    exceptions: new Int32Array(capacity),
    exceptionCount: 0,
  };
}

/** Cells that a break falls into, a cell each side of one on a border included. */
export function brokenCells(breaks: readonly number[]): Uint8Array {
  const broken = new Uint8Array(cells);
  for (const u of breaks) {
    const place = (u + tableReach) * cellsPerUnit;
    for (const cell of [Math.floor(place - 1e-9), Math.floor(place + 1e-9)])
      if (cell >= 0 && cell < cells) broken[cell] = 1;
  }
  return broken;
}

/** Finds cell and place of every u; samples in broken cells or outside the tables go to the list of exceptions. */
export function locate(u: Float64Array, count: number, broken: Uint8Array, location: Location): void {
  const { cell, fraction, exceptions } = location;
  let exceptional = 0;
  for (let i = 0; i < count; i++) {
    const place = (u[i] + tableReach) * cellsPerUnit;
    if (place >= 0 && place < cells) {
      const k = place | 0;
      cell[i] = k;
      fraction[i] = place - k;
      if (broken[k] !== 0) exceptions[exceptional++] = i;
    } else {
      cell[i] = 0;
      fraction[i] = 0;
      exceptions[exceptional++] = i;
    }
  }
  location.exceptionCount = exceptional;
}

/** All the u at which a function is tabulated, four to a cell. */
export function tableNodes(): Float64Array {
  const u = new Float64Array(4 * cells);
  for (let k = 0; k < cells; k++) for (let j = 0; j < 4; j++) u[4 * k + j] = (k + nodes[j]) / cellsPerUnit - tableReach;
  return u;
}

/** Newton's divided differences of a cell's four values, turned into powers of the fraction: 4 numbers a cell. */
export function fitTable(y: Float64Array): Float64Array {
  const [n0, n1, n2, n3] = nodes;
  const table = new Float64Array(4 * cells);
  for (let k = 0; k < 4 * cells; k += 4) {
    const d01 = (y[k + 1] - y[k]) / (n1 - n0);
    const d12 = (y[k + 2] - y[k + 1]) / (n2 - n1);
    const d23 = (y[k + 3] - y[k + 2]) / (n3 - n2);
    const d012 = (d12 - d01) / (n2 - n0);
    const d123 = (d23 - d12) / (n3 - n1);
    const cubic = (d123 - d012) / (n3 - n0);
    table[k] = y[k] - n0 * d01 + n0 * n1 * d012 - n0 * n1 * n2 * cubic;
    table[k + 1] = d01 - (n0 + n1) * d012 + (n0 * n1 + n0 * n2 + n1 * n2) * cubic;
    table[k + 2] = d012 - (n0 + n1 + n2) * cubic;
    table[k + 3] = cubic;
  }
  return table;
}

/** y of every located sample; exceptions are filled with the function itself. Allocates nothing. */
export function lookUp(
  table: Float64Array,
  location: Location,
  u: Float64Array,
  count: number,
  exactly: (u: number) => number,
  y: Float64Array,
): void {
  const { cell, fraction, exceptions, exceptionCount } = location;
  for (let i = 0; i < count; i++) {
    const k = cell[i] << 2;
    const t = fraction[i];
    y[i] = table[k] + t * (table[k + 1] + t * (table[k + 2] + t * table[k + 3]));
  }
  for (let e = 0; e < exceptionCount; e++) {
    const i = exceptions[e];
    y[i] = exactly(u[i]);
  }
}
