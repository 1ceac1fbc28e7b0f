/**
 * A kernel and a joint space → limit states over independent standard normal coordinates: the one place where chance meets
 * mechanics.
 *
 *   z → u = rows · z → x = marginal(u), held to its physical range → columns → coefficients → stages → factors
 */
import { type Coefficient, type Columns, type Kernel, type KernelInput, mark } from "./mechanics/kernel.ts";
import { createWorkspace, factorSlots, type Workspace } from "./mechanics/workspace.ts";
import type { JointSpace, Marginal } from "./probability/marginal.ts";
import {
  brokenCells,
  createLocation,
  type Location,
  locate,
  lookUp,
  standInOf,
  type Tabulated,
  tableReach,
  tabulate,
} from "./probability/marginal-table.ts";
import type { LimitStates } from "./reliability/limit-states.ts";

/** An input of the kernel driven by an unknown of the space. */
interface Drive {
  readonly input: KernelInput;
  readonly marginal: Marginal;
  /** Place of the unknown in the space. */
  readonly place: number;
  /** Nonzero entries of its row. */
  readonly coordinates: readonly number[];
  readonly weights: readonly number[];
  readonly column: Float64Array;
  readonly coefficients: readonly Coefficient[];
  /** Whether a sample can lie outside the physical range. */
  readonly strays: boolean;
  tables?: DriveTables;
}

/** Cells that do not serve are marked in the tables themselves. */
const noBrokenCells = brokenCells([]);

/** Tables over u of the column itself and of the coefficients that hang on it alone. Made on first use. */
interface DriveTables {
  /** Absent for a normal marginal: a line needs no table. */
  readonly column?: Tabulated;
  readonly coefficients: readonly { readonly table: Tabulated; readonly into: Float64Array }[];
  /** Coefficients that are straight lines of the column, such as a weight: constant + slope·x. */
  readonly lines: readonly { readonly constant: number; readonly slope: number; readonly into: Float64Array }[];
  /** u at the ends of the physical range; infinite where no sample can stray. */
  readonly ends: readonly [number, number];
  /** Coefficients with a kink within reach, or of a column that is the same for all: by their formula. */
  readonly byFormula: readonly { readonly value: (x: number) => number; readonly into: Float64Array }[];
}

export interface WallStates extends LimitStates {
  readonly workspace: Workspace;
}

/**
 * @param pathOf the name in the space of a kernel's path; differs where an option gives a variable another distribution
 * @throws RangeError where the space lacks an uncertain input of the kernel
 */
export function wallStates(
  kernel: Kernel,
  space: JointSpace,
  capacity = 512,
  pathOf: (path: string) => string = (path) => path,
): WallStates {
  const workspace = createWorkspace(kernel, capacity, factorSlots(kernel));
  const { columns } = workspace;
  const places = new Map(space.unknowns.map((unknown, place) => [unknown.path, place]));
  const drives = kernel.inputs
    .filter((input) => input.fixed === undefined)
    .map((input): Drive => {
      const place = places.get(pathOf(input.path));
      if (place === undefined) throw new RangeError(`the space has no unknown ${pathOf(input.path)}`);
      const row = space.rows[place];
      const coordinates = [...row.keys()].filter((coordinate) => row[coordinate] !== 0);
      const { marginal } = space.unknowns[place];
      return {
        input,
        marginal,
        place,
        coordinates,
        weights: coordinates.map((coordinate) => row[coordinate]),
        column: columns[input.slot],
        coefficients: kernel.coefficients.filter(
          (coefficient) => coefficient.from === input.slot && workspace.needs(coefficient.into),
        ),
        strays: marginal.lowest < input.lowest || marginal.highest > input.highest,
      };
    });
  const factors = kernel.limitStates.map((state) => columns[state.factor]);
  const kernelMarks = columns[kernel.marks];
  const u = new Float64Array(capacity);
  const location = createLocation(capacity);
  const strayed = new Uint8Array(capacity);
  const evaluations = { exact: 0, batched: 0 };

  const finish = (n: number, out: Columns, marks: Uint8Array): void => {
    for (let k = 0; k < factors.length; k++) {
      const [from, to] = [factors[k], out[k]];
      for (let i = 0; i < n; i++) to[i] = from[i];
    }
    for (let i = 0; i < n; i++) marks[i] = kernelMarks[i] | strayed[i];
  };
  const check = (n: number): void => {
    if (!(n >= 0 && n <= capacity)) throw new RangeError(`a block holds up to ${capacity} samples, not ${n}`);
  };
  return {
    workspace,
    dimension: space.coordinates.length,
    keys: space.coordinates.map((coordinate) => coordinate.key),
    names: kernel.limitStates.map((state) => state.limitState),
    capacity,
    evaluations,
    evaluate(z, n, out, marks, exact) {
      check(n);
      strayed.fill(0, 0, n);
      for (let d = 0; d < drives.length; d++) {
        const drive = drives[d];
        combine(drive, z, u, n);
        if (exact) fillExactly(drive, u, n, strayed);
        else {
          drive.tables ??= makeTables(drive, columns);
          fillFromTables(drive, drive.tables, u, n, strayed, location);
        }
      }
      if (exact) {
        workspace.run(n);
        evaluations.exact += n;
      } else {
        workspace.runStages(n);
        evaluations.batched += n;
      }
      finish(n, out, marks);
    },
    evaluateAt(x, n, out, marks) {
      check(n);
      strayed.fill(0, 0, n);
      for (let d = 0; d < drives.length; d++) {
        const { place } = drives[d];
        hold(drives[d], x[place], n, strayed);
      }
      workspace.run(n);
      finish(n, out, marks);
      evaluations.exact += n;
    },
  };
}

/** u = row · z, zeros left out; two coordinates to a pass. */
function combine(drive: Drive, z: Columns, u: Float64Array, n: number): void {
  const { coordinates, weights } = drive;
  const first = z[coordinates[0]];
  const weight = weights[0];
  if (coordinates.length === 1) for (let i = 0; i < n; i++) u[i] = weight * first[i];
  else {
    const second = z[coordinates[1]];
    const share = weights[1];
    for (let i = 0; i < n; i++) u[i] = weight * first[i] + share * second[i];
  }
  for (let k = 2; k < coordinates.length; k += 2) {
    const third = z[coordinates[k]];
    const share = weights[k];
    if (k + 1 === coordinates.length) for (let i = 0; i < n; i++) u[i] += share * third[i];
    else {
      const fourth = z[coordinates[k + 1]];
      const other = weights[k + 1];
      for (let i = 0; i < n; i++) u[i] = u[i] + share * third[i] + other * fourth[i];
    }
  }
}

/** A gradient moves one coordinate at a time: where u stands still from one point to the next, so does x. */
function fillExactly(drive: Drive, u: Float64Array, n: number, strayed: Uint8Array): void {
  const { marginal, column } = drive;
  let [lastU, x] = [Number.NaN, Number.NaN];
  for (let i = 0; i < n; i++) {
    if (u[i] !== lastU) {
      lastU = u[i];
      x = marginal.quantileOfNormal(lastU);
    }
    column[i] = x;
  }
  hold(drive, column, n, strayed);
}

/** Takes x to the column: held to its physical range and marked where it lies outside, then scaled. */
function hold(drive: Drive, x: Float64Array, n: number, strayed: Uint8Array): void {
  const { column, input } = drive;
  const { lowest, highest, scale } = input;
  for (let i = 0; i < n; i++) {
    const value = x[i];
    if (value < lowest || value > highest) strayed[i] |= mark.outOfRange;
    column[i] = scale * Math.min(Math.max(value, lowest), highest);
  }
}

function makeTables(drive: Drive, columns: Columns): DriveTables {
  const { marginal, input } = drive;
  const x = standInOf(marginal);
  const held = (u: number): number => input.scale * Math.min(Math.max(x(u), input.lowest), input.highest);
  const ends: [number, number] = drive.strays
    ? [marginal.normalOfQuantile(input.lowest), marginal.normalOfQuantile(input.highest)]
    : [Number.NEGATIVE_INFINITY, Number.POSITIVE_INFINITY];
  const breaks = { kinks: [...marginal.kinks, ...ends].filter(Number.isFinite), jumps: marginal.jumps };
  const reach = [held(-tableReach), held(tableReach)];
  const smooth = (coefficient: Coefficient): boolean =>
    !coefficient.kinks.some((kink) => kink >= reach[0] && kink <= reach[1]);
  const lines = drive.coefficients.flatMap(({ value, into }) => {
    const line = lineOf(value, reach[0], reach[1]);
    return line === undefined ? [] : [{ ...line, slot: into, into: columns[into] }];
  });
  const straight = new Set(lines.map(({ slot }) => slot));
  return {
    ends,
    lines,
    ...(marginal.kind === "normal" ? {} : { column: tabulate(held, breaks) }),
    coefficients: drive.coefficients
      .filter((coefficient) => smooth(coefficient) && !straight.has(coefficient.into))
      .map(({ value, into }) => ({ table: tabulate((u) => value(held(u)), breaks), into: columns[into] })),
    byFormula: drive.coefficients
      .filter((coefficient) => !smooth(coefficient) && !straight.has(coefficient.into))
      .map(({ value, into }) => ({ value, into: columns[into] })),
  };
}

/** The line that a function is, to rounding, at points all over a range; undefined where it is none. */
function lineOf(
  value: (x: number) => number,
  from: number,
  to: number,
): { readonly constant: number; readonly slope: number } | undefined {
  const [first, last] = [value(from), value(to)];
  const slope = (last - first) / (to - from);
  const constant = first - slope * from;
  const size = Math.max(Math.abs(first), Math.abs(last), Math.abs(constant));
  for (let k = 1; k < 64; k++) {
    const x = from + ((to - from) * k) / 64;
    if (!(Math.abs(value(x) - (constant + slope * x)) <= 1e-13 * size)) return undefined;
  }
  return Number.isFinite(slope) ? { constant, slope } : undefined;
}

function fillFromTables(
  drive: Drive,
  tables: DriveTables,
  u: Float64Array,
  n: number,
  strayed: Uint8Array,
  location: Location,
): void {
  const { column, marginal, input } = drive;
  const tabulated = tables.coefficients;
  if (tables.column !== undefined || tabulated.length > 0) locate(u, n, noBrokenCells, location);
  if (drive.strays) markStrays(tables.ends, u, n, strayed);
  if (tables.column === undefined) {
    const { mean, sd } = marginal;
    const { lowest, highest, scale } = input;
    for (let i = 0; i < n; i++) column[i] = scale * Math.min(Math.max(mean + sd * u[i], lowest), highest);
  } else lookUp(tables.column.cubics, location, u, n, tables.column.standIn, column);
  for (let k = 0; k < tabulated.length; k++) {
    const { table, into } = tabulated[k];
    lookUp(table.cubics, location, u, n, table.standIn, into);
  }
  for (let k = 0; k < tables.lines.length; k++) {
    const { constant, slope, into } = tables.lines[k];
    for (let i = 0; i < n; i++) into[i] = constant + slope * column[i];
  }
  for (let k = 0; k < tables.byFormula.length; k++) {
    const { value, into } = tables.byFormula[k];
    for (let i = 0; i < n; i++) into[i] = value(column[i]);
  }
}

/** Marks the samples beyond the physical range, found in u: the column itself is held to the range already. */
function markStrays([low, high]: readonly [number, number], u: Float64Array, n: number, strayed: Uint8Array): void {
  for (let i = 0; i < n; i++) if (u[i] < low || u[i] > high) strayed[i] |= mark.outOfRange;
}
