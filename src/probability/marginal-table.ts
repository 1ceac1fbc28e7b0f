import type { Marginal } from "./marginal.ts";
import { piecewise } from "./piecewise.ts";

/**
 * Cubic tables of functions of one standard normal variable u: y(u) = f(x(u)), for the sampling loop.
 *
 * |u| ≤ 6 is cut into cells of 1/64. In a cell the cubic goes through y at the four Chebyshev nodes, so its error is below
 * h⁴ |y⁗|/3072 = 2e-11 |y⁗|. Cells that hold a break (a kink or jump of y), cells where the cubic fails (near a jump, where
 * y may start like a square root) and everything outside ±6 are left to the function or its stand-in (piecewise.ts).
 * Checked on every kind of distribution, with an error below 1.3e-9 of the spread; tests/probability/marginal-table.
 *
 * A table has four coefficients for each cell and one more cell at either end; a cell that does not serve holds NaN, which
 * the loops find in their result and replace.
 */

/** Cells on each unit of u, and how far the tables reach. */
const cellsPerUnit = 64;
export const tableReach = 6;
const cells = 2 * tableReach * cellsPerUnit;
/** u·64 + this is the place of u, counted in cells from the one before the table's first. */
const offset = tableReach * cellsPerUnit + 1;

/** Chebyshev nodes of a cell, as fractions of its width. */
const nodes = [0, 1, 2, 3].map((k) => 0.5 - 0.5 * Math.cos((Math.PI * (2 * k + 1)) / 8));

/** A function of u made ready for the sampling loop. */
export interface Tabulated {
  /** For `lookUp`; NaN in the cells that do not serve. */
  readonly cubics: Float64Array;
  /** For the samples that the table does not serve: a finer table of the cells in question, or the stand-in itself. */
  readonly standIn: (u: number) => number;
}

const standIns = new WeakMap<Marginal, (u: number) => number>();

/** A quick x(u) of a marginal, to 1e-10 of its spread within the reach of the tables; made once, whoever asks. */
export function standInOf(marginal: Marginal): (u: number) => number {
  const known = standIns.get(marginal);
  if (known) return known;
  const made = piecewise(marginal.quantileOfNormal, marginal, tableReach);
  standIns.set(marginal, made);
  return made;
}

/** Largest error of a table, as a share of the spread |y(1) − y(−1)| or of the distance from the middle. */
const tableTolerance = 5e-10;
/** Points of a cell where the error of its cubic is largest, as fractions of its width. */
const checkPoints = [1e-9, 0.146, 0.5, 0.854, 1 - 1e-9];
/** A cell that does not serve is cut into this many. */
const finerCells = 64;

/** @param y may be slow: it is asked a few hundred times, and some hundreds more for each jump */
export function tabulate(
  y: (u: number) => number,
  breaks: { readonly kinks: readonly number[]; readonly jumps: readonly number[] },
): Tabulated {
  const smooth = piecewise(y, breaks, tableReach);
  const [middle, spread] = [smooth(0), Math.abs(smooth(1) - smooth(-1))];
  const cubics = fitTable(tableNodes().map(smooth));
  const points = [...breaks.kinks, ...breaks.jumps];
  /** Puts NaN where a cell of a table holds a break or misses the function; returns those cells. */
  const spoil = (table: Float64Array, start: number, width: number): number[] => {
    const spoilt: number[] = [];
    for (let cell = 1; 4 * cell < table.length - 4; cell++) {
      const from = start + (cell - 1) * width;
      const holds = checkPoints.every((t) => {
        const exact = smooth(from + t * width);
        return Math.abs(cubicAt(table, 4 * cell, t) - exact) <= tableTolerance * (spread + Math.abs(exact - middle));
      });
      if (holds && !points.some((at) => at >= from - 1e-9 && at <= from + width + 1e-9)) continue;
      table[4 * cell] = Number.NaN;
      spoilt.push(cell);
    }
    return spoilt;
  };
  const spoilt = spoil(cubics, -tableReach, 1 / cellsPerUnit);
  const finer = spoilt.map((cell) => {
    const from = (cell - offset) / cellsPerUnit;
    const width = 1 / (cellsPerUnit * finerCells);
    const at = Float64Array.from({ length: 4 * finerCells }, (_, i) => from + ((i >> 2) + nodes[i & 3]) * width);
    const table = fitTable(at.map(smooth));
    spoil(table, from, width);
    return table;
  });
  return { cubics, standIn: finer.length === 0 ? smooth : withFinerTables(smooth, spoilt, finer) };
}

function cubicAt(table: Float64Array, k: number, t: number): number {
  return table[k] + t * (table[k + 1] + t * (table[k + 2] + t * table[k + 3]));
}

function withFinerTables(
  smooth: (u: number) => number,
  spoilt: readonly number[],
  finer: readonly Float64Array[],
): (u: number) => number {
  const tableOf = new Int16Array(cells + 2).fill(-1);
  spoilt.forEach((cell, i) => {
    tableOf[cell] = i;
  });
  return (u) => {
    const place = u * cellsPerUnit + offset;
    if (!(place > 0 && place < cells + 2)) return smooth(u);
    const cell = place | 0;
    if (tableOf[cell] < 0) return smooth(u);
    const finerPlace = (place - cell) * finerCells + 1;
    const finerCell = finerPlace | 0;
    const value = cubicAt(finer[tableOf[cell]], finerCell << 2, finerPlace - finerCell);
    return Number.isNaN(value) ? smooth(u) : value;
  };
}

/** Places of the samples that a table did not serve, in one pass over up to this many. */
const exceptions = new Int32Array(1024);

/** y of every u, for an unknown that only one table hangs on. Allocates nothing. */
export function evaluateTable({ cubics, standIn }: Tabulated, u: Float64Array, count: number, y: Float64Array): void {
  for (let start = 0; start < count; start += exceptions.length) {
    const end = Math.min(start + exceptions.length, count);
    let missed = 0;
    for (let i = start; i < end; i++) {
      const place = u[i] * cellsPerUnit + offset;
      const cell = place | 0;
      const k = cell > 0 && cell <= cells ? cell << 2 : 0;
      const value = cubicAt(cubics, k, place - cell);
      y[i] = value;
      if (Number.isNaN(value)) exceptions[missed++] = i;
    }
    fillExceptions(missed, standIn, u, y);
  }
}

/** Apart from the loops, which a call of a function that changes from table to table would slow down. */
function fillExceptions(count: number, exactly: (u: number) => number, u: Float64Array, y: Float64Array): void {
  for (let e = 0; e < count; e++) {
    const i = exceptions[e];
    y[i] = exactly(u[i]);
  }
}

/** Where the samples of a block lie: shared by all tables of the same u. Made once, filled by `locate`. */
export interface Location {
  /** First coefficient of the cell. */
  readonly cell: Int32Array;
  /** Place within the cell, in [0, 1). */
  readonly fraction: Float64Array;
}

export function createLocation(capacity: number): Location {
  return { cell: new Int32Array(capacity), fraction: new Float64Array(capacity) };
}

/** Cells that a break falls into, a cell each side of one on a border included. */
export function brokenCells(breaks: readonly number[]): Uint8Array {
  const broken = new Uint8Array(cells + 2);
  for (const u of breaks) {
    const place = u * cellsPerUnit + offset;
    for (const cell of [Math.floor(place - 1e-9), Math.floor(place + 1e-9)])
      if (cell >= 1 && cell <= cells) broken[cell] = 1;
  }
  return broken;
}

/**
 * Finds cell and place of every u.
 *
 * @param broken cells that no table may serve (`brokenCells`); tables made by `tabulate` know their own
 */
export function locate(u: Float64Array, count: number, broken: Uint8Array, location: Location): void {
  const { cell, fraction } = location;
  for (let i = 0; i < count; i++) {
    const place = u[i] * cellsPerUnit + offset;
    const k = place | 0;
    const serves = k > 0 && k <= cells && broken[k] === 0;
    cell[i] = serves ? k << 2 : 0;
    fraction[i] = place - k;
  }
}

/** All the u at which a function is tabulated, four to a cell. */
export function tableNodes(): Float64Array {
  const u = new Float64Array(4 * cells);
  for (let k = 0; k < cells; k++) for (let j = 0; j < 4; j++) u[4 * k + j] = (k + nodes[j]) / cellsPerUnit - tableReach;
  return u;
}

/**
 * Newton's divided differences of a cell's four values, turned into powers of the fraction: 4 numbers a cell, and a cell of
 * NaN before the first and after the last.
 */
export function fitTable(y: Float64Array): Float64Array {
  const [n0, n1, n2, n3] = nodes;
  const table = new Float64Array(y.length + 8).fill(Number.NaN);
  for (let k = 0; k < y.length; k += 4) {
    const d01 = (y[k + 1] - y[k]) / (n1 - n0);
    const d12 = (y[k + 2] - y[k + 1]) / (n2 - n1);
    const d23 = (y[k + 3] - y[k + 2]) / (n3 - n2);
    const d012 = (d12 - d01) / (n2 - n0);
    const d123 = (d23 - d12) / (n3 - n1);
    const cubic = (d123 - d012) / (n3 - n0);
    table[k + 4] = y[k] - n0 * d01 + n0 * n1 * d012 - n0 * n1 * n2 * cubic;
    table[k + 5] = d01 - (n0 + n1) * d012 + (n0 * n1 + n0 * n2 + n1 * n2) * cubic;
    table[k + 6] = d012 - (n0 + n1 + n2) * cubic;
    table[k + 7] = cubic;
  }
  return table;
}

/** y of every located sample; those that the table does not serve are filled with the function itself. Allocates nothing. */
export function lookUp(
  table: Float64Array,
  location: Location,
  u: Float64Array,
  count: number,
  exactly: (u: number) => number,
  y: Float64Array,
): void {
  const { cell, fraction } = location;
  for (let start = 0; start < count; start += exceptions.length) {
    const end = Math.min(start + exceptions.length, count);
    let missed = 0;
    for (let i = start; i < end; i++) {
      const value = cubicAt(table, cell[i], fraction[i]);
      y[i] = value;
      if (Number.isNaN(value)) exceptions[missed++] = i;
    }
    fillExceptions(missed, exactly, u, y);
  }
}
