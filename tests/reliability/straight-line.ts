import type { JointSpace, Marginal } from "../../src/probability/marginal.ts";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import type { Columns, LimitStates } from "../../src/reliability/limit-states.ts";

/** Functions of the unknowns' values, by the name of their limit state. */
export type FunctionsOf = Readonly<Record<string, (x: readonly number[]) => number>>;

export const standardNormal: Marginal = marginalOf({ kind: "normal", mean: 0, sd: 1 });

/** A space of independent unknowns x1, x2, …, or with rows of its own (u = rows · z, each of unit length). */
export function spaceOf(
  marginals: readonly Marginal[],
  rows: readonly (readonly number[])[] = marginals.map((_, i) => marginals.map((_, j) => (i === j ? 1 : 0))),
): JointSpace {
  return {
    unknowns: marginals.map((marginal, i) => ({ path: `x${i + 1}`, marginal, knowledge: 1, yearly: false })),
    coordinates: rows[0].map((_, j) => ({ key: `x${j + 1}`, part: "knowledge", yearly: false })),
    rows: rows.map((row) => Float64Array.from(row)),
  };
}

export function standardSpace(dimension: number): JointSpace {
  return spaceOf(Array.from({ length: dimension }, () => standardNormal));
}

/** Limit states over a space, from factors as functions of the values; held to [0, 1000] as a wall's are. */
export function statesOf(
  space: JointSpace,
  factorsOf: FunctionsOf,
  capacity = 512,
  markOf: (x: readonly number[]) => number = () => 0,
): LimitStates {
  const functions = Object.values(factorsOf);
  const size = space.unknowns.length;
  const x = new Array<number>(size).fill(0);
  const evaluations = { exact: 0, batched: 0 };
  const write = (factors: Columns, marks: Uint8Array, i: number): void => {
    for (let k = 0; k < functions.length; k++) factors[k][i] = Math.min(Math.max(functions[k](x), 0), 1000);
    marks[i] = markOf(x);
  };
  const check = (n: number): void => {
    if (n > capacity) throw new RangeError(`${n} points exceed the capacity of ${capacity}`);
  };
  return {
    dimension: space.coordinates.length,
    keys: space.coordinates.map((coordinate) => coordinate.key),
    names: Object.keys(factorsOf),
    capacity,
    evaluations,
    evaluate(z, n, factors, marks, exact) {
      check(n);
      for (let i = 0; i < n; i++) {
        for (let v = 0; v < size; v++) {
          const row = space.rows[v];
          let u = 0;
          for (let j = 0; j < row.length; j++) u += row[j] * z[j][i];
          const { marginal } = space.unknowns[v];
          x[v] = marginal === standardNormal ? u : marginal.quantileOfNormal(u);
        }
        write(factors, marks, i);
      }
      evaluations[exact ? "exact" : "batched"] += n;
    },
    evaluateAt(values, n, factors, marks) {
      check(n);
      for (let i = 0; i < n; i++) {
        for (let v = 0; v < size; v++) x[v] = values[v][i];
        write(factors, marks, i);
      }
      evaluations.exact += n;
    },
  };
}

/** Limit states over independent standard normals from margins, failure where one is below 0: F = exp(g/scale). */
export function statesOfMargins(dimension: number, margins: FunctionsOf, scale = 1): LimitStates {
  const factors = Object.entries(margins).map(
    ([name, g]) => [name, (u: readonly number[]) => Math.exp(g(u) / scale)] as const,
  );
  return statesOf(standardSpace(dimension), Object.fromEntries(factors));
}

/** g = b − Σu/√d: the probability of failure is Φ(−b), whatever the dimension. */
export function straightLine(reliabilityIndex: number, dimension = 2): LimitStates {
  const sum = (u: readonly number[]): number => u.reduce((total, value) => total + value, 0);
  return statesOfMargins(dimension, { line: (u) => reliabilityIndex - sum(u) / Math.sqrt(dimension) });
}
