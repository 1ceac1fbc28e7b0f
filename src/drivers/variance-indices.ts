import { normalQuantile } from "../numeric/normal.ts";
import { studentUpperQuantile } from "../numeric/student-t.ts";
import type { JointSpace } from "../probability/marginal.ts";
import { scrambledSobolSequence, sobolDimensions } from "../probability/sobol-sequence.ts";
import { fillUniforms, streamBlock } from "../probability/streams.ts";
import type { Columns, LimitStates } from "../reliability/limit-states.ts";
import { marginOf } from "../reliability/point-evaluator.ts";
import { directionsOf } from "./directions.ts";

/** An index with its 95 % interval, Student's t over the replicates. */
export interface VarianceIndex {
  readonly value: number;
  readonly interval: readonly [number, number];
}

export interface VarianceIndices {
  /** Share of the variance that is taken away, on average, by knowing the unknown alone. One per unknown. */
  readonly first: readonly VarianceIndex[];
  /** Share of the variance that stays when everything else is known. One per unknown. */
  readonly total: readonly VarianceIndex[];
  readonly variance: number;
  /** factor: of the factor of safety; margin: of its logarithm (bounded below 1), because factors at the cap would rule. */
  readonly of: "factor" | "margin";
  /** true where unknowns are correlated: `first` then counts what an unknown tells about the others, and no sum is 1. */
  readonly correlated: boolean;
}

export interface VarianceOrder {
  readonly seed: string;
  /** Points of one replicate, a power of 2. */
  readonly points?: number;
  readonly replicates?: number;
}

const factorCap = 1000;

/**
 * Sobol' indices of the first order and total, of every limit state to every unknown.
 *
 *   first_i = Var(E[F | x_i])/Var F = mean(f_B (f_Pi − f_A))/Var F;  total_i = E[Var(F | all but x_i)]/Var F = mean((f_A − f_Qi)²)/(2 Var F)
 *
 * A and B are independent points; Q_i is A with what x_i alone decides taken from B; P_i is A with x_i itself taken from B. For
 * independent unknowns they are one point. Points come from scrambled Sobol' sequences in replicates, whose spread gives the
 * interval; beyond the dimensions of the sequence they are random.
 *
 * Replicates × points × (2 + d) evaluations, d the number of unknowns, and up to 2 + 2 d with correlation.
 *
 * @source I. M. Sobol' (1993), Math. Modelling Comput. Exp. 1, 407–414; A. Saltelli et al. (2010), Comput. Phys. Commun. 181,
 *   259–270 (first order); M. J. W. Jansen (1999), Comput. Phys. Commun. 117, 35–43 (total); S. Kucherenko, S. Tarantola and P.
 *   Annoni (2012), Comput. Phys. Commun. 183, 937–946 (their meaning under correlation)
 */
export function varianceIndices(
  states: LimitStates,
  space: JointSpace,
  order: VarianceOrder,
): readonly VarianceIndices[] {
  const { points = 1024, replicates = 16 } = order;
  const { own, alone, correlated } = directionsOf(space);
  const count = space.unknowns.length;
  const run = createRun(states, points);
  const found = Array.from({ length: replicates }, (_, replicate) => {
    const [a, b] = drawPair(states, order.seed, replicate, points);
    const [fa, fb] = [run.values(a), run.values(b)];
    const moved = Array.from({ length: count }, (_, i) => {
      const q = run.values(run.swapped(a, b, alone[i]));
      return { q, p: correlated[i] ? run.values(run.swapped(a, b, own[i])) : q };
    });
    return { fa, fb, moved };
  });
  return states.names.map((_, k) => {
    const capped = found.some(({ fa }) => fa[k].some((factor) => factor >= factorCap));
    const view = capped
      ? (values: Float64Array): Float64Array => values.map(marginOf)
      : (values: Float64Array) => values;
    const each = found.map(({ fa, fb, moved }) =>
      indicesOf(
        view(fa[k]),
        view(fb[k]),
        moved.map(({ p, q }) => ({ p: view(p[k]), q: view(q[k]) })),
      ),
    );
    return {
      first: Array.from({ length: count }, (_, i) => summary(each.map(({ first }) => first[i]))),
      total: Array.from({ length: count }, (_, i) => summary(each.map(({ total }) => total[i]))),
      variance: each.reduce((sum, one) => sum + one.variance, 0) / replicates,
      of: capped ? "margin" : "factor",
      correlated: correlated.some((value) => value),
    };
  });
}

interface Run {
  /** Factors at the points, one column per limit state. */
  values(z: Columns): readonly Float64Array[];
  /** a with its part along a direction taken from b; null leaves it as it is. */
  swapped(a: Columns, b: Columns, direction: Float64Array | null): Columns;
}

function createRun(states: LimitStates, points: number): Run {
  const { capacity, names, dimension } = states;
  const factors = names.map(() => new Float64Array(capacity));
  const marks = new Uint8Array(capacity);
  const out = Array.from({ length: dimension }, () => new Float64Array(points));
  return {
    values(z) {
      const rows = names.map(() => new Float64Array(points));
      for (let start = 0; start < points; start += capacity) {
        const n = Math.min(capacity, points - start);
        states.evaluate(
          z.map((column) => column.subarray(start, start + n)),
          n,
          factors,
          marks,
          false,
        );
        for (let k = 0; k < rows.length; k++) rows[k].set(factors[k].subarray(0, n), start);
      }
      return rows;
    },
    swapped(a, b, direction) {
      if (direction === null) return a;
      for (let i = 0; i < points; i++) {
        let change = 0;
        for (let j = 0; j < dimension; j++) change += direction[j] * (b[j][i] - a[j][i]);
        for (let j = 0; j < dimension; j++) out[j][i] = a[j][i] + change * direction[j];
      }
      return out;
    },
  };
}

/** Two independent sets of standard normal points. */
function drawPair(states: LimitStates, seed: string, replicate: number, points: number): readonly [Columns, Columns] {
  const keys = [...states.keys, ...states.keys.map((key) => `${key}, second`)];
  const columns = keys.map(() => new Float64Array(points));
  if (keys.length <= sobolDimensions)
    scrambledSobolSequence(keys, seed, "variance indices", replicate).fill(columns, points);
  else
    keys.forEach((key, j) => {
      for (let start = 0; start < points; start += streamBlock) {
        const part = columns[j].subarray(start, start + streamBlock);
        fillUniforms(seed, `variance indices, replicate ${replicate}`, key, start / streamBlock, part, part.length);
      }
    });
  for (const column of columns) for (let i = 0; i < points; i++) column[i] = normalQuantile(column[i]);
  return [columns.slice(0, states.dimension), columns.slice(states.dimension)];
}

interface ReplicateIndices {
  readonly first: readonly number[];
  readonly total: readonly number[];
  readonly variance: number;
}

function indicesOf(
  fa: Float64Array,
  fb: Float64Array,
  moved: readonly { readonly p: Float64Array; readonly q: Float64Array }[],
): ReplicateIndices {
  const n = fa.length;
  let mean = 0;
  for (let i = 0; i < n; i++) mean += (fa[i] + fb[i]) / (2 * n);
  let variance = 0;
  for (let i = 0; i < n; i++) variance += ((fa[i] - mean) ** 2 + (fb[i] - mean) ** 2) / (2 * n);
  const share = (sum: number): number => (variance > 0 ? sum / n / variance : 0);
  return {
    first: moved.map(({ p }) => {
      let sum = 0;
      for (let i = 0; i < n; i++) sum += (fb[i] - mean) * (p[i] - fa[i]);
      return share(sum);
    }),
    total: moved.map(({ q }) => {
      let sum = 0;
      for (let i = 0; i < n; i++) sum += 0.5 * (fa[i] - q[i]) ** 2;
      return share(sum);
    }),
    variance,
  };
}

function summary(values: readonly number[]): VarianceIndex {
  const n = values.length;
  const value = values.reduce((sum, one) => sum + one, 0) / n;
  const square = values.reduce((sum, one) => sum + (one - value) ** 2, 0);
  const half = studentUpperQuantile(0.025, n - 1) * Math.sqrt(square / (n - 1) / n);
  return { value, interval: [value - half, value + half] };
}
