import type { JointSpace, Marginal } from "../../src/probability/marginal.ts";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import type { LimitStates } from "../../src/reliability/limit-states.ts";
import type { Distribution } from "../../src/study/study.ts";

/** A problem with a known answer: named factors of physical values, drawn independently. */
export interface Problem {
  readonly states: LimitStates;
  readonly space: JointSpace;
}

export function independentSpace(marginals: Readonly<Record<string, Marginal>>): JointSpace {
  const entries = Object.entries(marginals);
  return {
    unknowns: entries.map(([path, marginal]) => ({ path, marginal, knowledge: 1, yearly: false })),
    coordinates: entries.map(([path]) => ({ key: path, part: "knowledge", yearly: false })),
    rows: entries.map((_, i) => Float64Array.from(entries, (_, j) => (i === j ? 1 : 0))),
  };
}

/** Factors of safety of x, one function per limit state, over independent unknowns. */
export function problemOf(
  distributions: Readonly<Record<string, Distribution>>,
  factors: Readonly<Record<string, (x: readonly number[]) => number>>,
  markOf: (x: readonly number[]) => number = () => 0,
): Problem {
  const space = independentSpace(
    Object.fromEntries(Object.entries(distributions).map(([path, distribution]) => [path, marginalOf(distribution)])),
  );
  const names = Object.keys(factors);
  const x = space.unknowns.map(() => 0);
  const evaluations = { exact: 0, batched: 0 };
  const at = (
    fill: (place: number, sample: number) => number,
    n: number,
    out: readonly Float64Array[],
    marks: Uint8Array,
  ): void => {
    for (let i = 0; i < n; i++) {
      for (let v = 0; v < x.length; v++) x[v] = fill(v, i);
      names.forEach((name, k) => {
        out[k][i] = Math.min(Math.max(factors[name](x), 0), 1000);
      });
      marks[i] = markOf(x);
    }
  };
  const states: LimitStates = {
    dimension: x.length,
    keys: space.coordinates.map((coordinate) => coordinate.key),
    names,
    capacity: 512,
    evaluations,
    evaluate(z, n, out, marks, exact) {
      evaluations[exact ? "exact" : "batched"] += n;
      at((v, i) => space.unknowns[v].marginal.quantileOfNormal(z[v][i]), n, out, marks);
    },
    evaluateAt(values, n, out, marks) {
      evaluations.exact += n;
      at((v, i) => values[v][i], n, out, marks);
    },
  };
  return { states, space };
}

/** A straight line in one standard normal variable with the given index of reliability: F < 1 where z < −index. */
export function straightLine(index: number): Problem {
  return problemOf(
    { "line.z": { kind: "normal", mean: 0, sd: 1 } },
    { line: ([z]) => (z + index > -999 ? 1 + (z + index) / 1000 : 0) },
  );
}
