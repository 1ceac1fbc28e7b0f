/**
 * A kernel and a joint space → limit states over independent standard normal coordinates: the one place where chance meets
 * mechanics.
 *
 *   z → u = rows · z → x = marginal(u), held to its physical range → columns → coefficients → stages → factors
 */
import { type Coefficient, type Columns, type Kernel, type KernelInput, mark } from "./mechanics/kernel.ts";
import { createWorkspace, factorSlots, type Workspace } from "./mechanics/workspace.ts";
import type { JointSpace, Marginal } from "./probability/marginal.ts";
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
        coefficients: kernel.coefficients.filter((coefficient) => coefficient.from === input.slot),
        strays: marginal.lowest < input.lowest || marginal.highest > input.highest,
      };
    });
  const factors = kernel.limitStates.map((state) => columns[state.factor]);
  const kernelMarks = columns[kernel.marks];
  const u = new Float64Array(capacity);
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
        combine(drives[d], z, u, n);
        fillExactly(drives[d], u, n, strayed);
      }
      workspace.run(n);
      finish(n, out, marks);
      if (exact) evaluations.exact += n;
      else evaluations.batched += n;
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

/** u = row · z, zeros left out. */
function combine(drive: Drive, z: Columns, u: Float64Array, n: number): void {
  const { coordinates, weights } = drive;
  const [first, weight] = [z[coordinates[0]], weights[0]];
  for (let i = 0; i < n; i++) u[i] = weight * first[i];
  for (let k = 1; k < coordinates.length; k++) {
    const [column, share] = [z[coordinates[k]], weights[k]];
    for (let i = 0; i < n; i++) u[i] += share * column[i];
  }
}

function fillExactly(drive: Drive, u: Float64Array, n: number, strayed: Uint8Array): void {
  const { marginal, column } = drive;
  for (let i = 0; i < n; i++) column[i] = marginal.quantileOfNormal(u[i]);
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
