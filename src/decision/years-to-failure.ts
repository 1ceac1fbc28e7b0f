import { fillNormals, streamBlock } from "../probability/streams.ts";
import type { DecisionProblem } from "./decision-problem.ts";

/**
 * Turns failures of one year into first failures of the period.
 *
 * With p the failure probability of one year given everything that is not yearly, and m the expected cost of that year,
 *
 *   P(failure in the period) = 1 − (1 − p)^T = p·G,  expected cost = m·G,  G = Σ_{t < T} (1 − p)^t
 *
 * because the first year that fails sets the cost. G is the expected number of years until the first failure, the last year
 * included, so one run of further years beside each failing sample gives it without bias, whatever p is.
 *
 * Multiplies `failure` and `cost` in place.
 *
 * @returns evaluations spent
 */
export function applyPeriod(
  { keys, roles, options, years }: DecisionProblem,
  sample: {
    readonly count: number;
    readonly z: readonly Float64Array[];
    readonly failure: readonly Float64Array[];
    readonly cost: readonly Float64Array[];
  },
  plan: { readonly seed: string; readonly purpose: string },
): number {
  if (years <= 1) return 0;
  const yearly = keys.map((_, j) => j).filter((j) => roles[j] === "yearly");
  let evaluations = 0;
  for (let from = 0; from < sample.count; from += streamBlock) {
    const count = Math.min(streamBlock, sample.count - from);
    const runs = options.map((_, o) => startRun(sample, o, from, count));
    const draws = yearly.map(() => new Float64Array(count));
    for (let year = 1; year < years; year++) {
      yearly.forEach((j, y) => {
        fillNormals(plan.seed, `${plan.purpose}, year ${year}`, keys[j], from / streamBlock, draws[y], count);
      });
      runs.forEach((run, o) => {
        evaluations += nextYear(run, options[o].states, yearly, draws);
      });
    }
    runs.forEach((run, o) => {
      for (let k = 0; k < run.places.length; k++) {
        const i = from + run.places[k];
        sample.failure[o][i] *= run.expected[k];
        sample.cost[o][i] *= run.expected[k];
      }
    });
  }
  return evaluations;
}

interface Run {
  /** Samples that fail, counted from the start of the block; those still standing in further years come first. */
  readonly places: Int32Array;
  standing: number;
  /** Years until the first failure. */
  readonly expected: Float64Array;
  readonly z: Float64Array[];
}

function startRun(
  sample: { readonly z: readonly Float64Array[]; readonly failure: readonly Float64Array[] },
  option: number,
  from: number,
  count: number,
): Run {
  const places = Int32Array.from([...Array(count).keys()].filter((i) => sample.failure[option][from + i] > 0));
  return {
    places,
    standing: places.length,
    expected: new Float64Array(places.length).fill(1),
    z: sample.z.map((column) => Float64Array.from(places, (i) => column[from + i])),
  };
}

/** One more year for all that still stand; those that fail are moved behind them and are done. */
function nextYear(
  run: Run,
  states: DecisionProblem["options"][number]["states"],
  yearly: readonly number[],
  draws: readonly Float64Array[],
): number {
  const { capacity, names } = states;
  const factors = names.map(() => new Float64Array(capacity));
  const marks = new Uint8Array(capacity);
  const tried = run.standing;
  const fell: number[] = [];
  for (let start = 0; start < tried; start += capacity) {
    const n = Math.min(capacity, tried - start);
    yearly.forEach((j, y) => {
      for (let k = 0; k < n; k++) run.z[j][start + k] = draws[y][run.places[start + k]];
    });
    const tile = run.z.map((column) => column.subarray(start, start + n));
    states.evaluate(tile, n, factors, marks, false);
    for (let k = 0; k < n; k++) {
      if (factors.some((column) => column[k] < 1)) fell.push(start + k);
      else run.expected[start + k]++;
    }
  }
  for (let f = fell.length - 1; f >= 0; f--) swapOut(run, fell[f]);
  return tried;
}

function swapOut(run: Run, k: number): void {
  const last = --run.standing;
  [run.places[k], run.places[last]] = [run.places[last], run.places[k]];
  [run.expected[k], run.expected[last]] = [run.expected[last], run.expected[k]];
  for (const column of run.z) [column[k], column[last]] = [column[last], column[k]];
}
