import { normalCdf } from "../numeric/normal.ts";
import type { Agreement } from "../reliability/block-tally.ts";
import type { LimitStates } from "../reliability/limit-states.ts";
import { createSurvivalMargin } from "./after-survival.ts";
import { applyForm, type DecisionProblem, type LikelihoodPart } from "./decision-problem.ts";
import { posteriorLine } from "./posterior-line.ts";

const cap = 1e3;

/** A problem whose likelihood is gone, and where its coordinates stand in those of the problem it was made from. */
export interface SettledProblem {
  readonly problem: DecisionProblem;
  /** Brings columns of standard normals to where the results put them, in place; absent where they stay. */
  readonly move?: (z: readonly Float64Array[], n: number) => void;
}

/**
 * The same problem without a likelihood: independent standard normals that survive are then samples of what is believed.
 *
 * Results on independent variables stretch a direction each (posterior-line.ts), exactly. Where several tested variables that are not
 * normal are correlated, the likelihood becomes something survived (agreementStates).
 */
export function settledProblem(problem: DecisionProblem): SettledProblem {
  const { likelihood, likelihoodParts } = problem;
  if (likelihood === undefined) return { problem };
  return likelihoodParts !== undefined && areIndependent(likelihoodParts)
    ? stretched(problem, likelihoodParts)
    : { problem: likelihoodAsSurvival(problem, likelihood) };
}

function areIndependent(parts: readonly LikelihoodPart[]): boolean {
  return parts.every(({ form: a }, i) =>
    parts.every(({ form: b }, j) => i === j || Math.abs(a.row.reduce((sum, x, c) => sum + x * b.row[c], 0)) < 1e-9),
  );
}

/** z = w + Σ e (s(e·w) − e·w), e the direction of each part. */
function stretched(problem: DecisionProblem, parts: readonly LikelihoodPart[]): SettledProblem {
  const lines = parts.map((part) => {
    const size = Math.hypot(...part.form.row);
    const entries = [...part.form.row.keys()].filter((j) => part.form.row[j] !== 0);
    return { entries, weights: entries.map((j) => part.form.row[j] / size), at: posteriorLine(part) };
  });
  const move = (z: readonly Float64Array[], n: number): void => {
    for (const { entries, weights, at } of lines)
      for (let i = 0; i < n; i++) {
        let along = 0;
        for (let k = 0; k < entries.length; k++) along += weights[k] * z[entries[k]][i];
        const shift = at(along) - along;
        for (let k = 0; k < entries.length; k++) z[entries[k]][i] += weights[k] * shift;
      }
  };
  const touched = new Set(lines.flatMap(({ entries }) => entries));
  const moved = (states: LimitStates): LimitStates => {
    const scratch = problem.keys.map((_, j) => new Float64Array(touched.has(j) ? states.capacity : 0));
    return {
      ...states,
      get evaluations() {
        return states.evaluations;
      },
      evaluate(z, n, factors, marks, exact) {
        for (const j of touched) scratch[j].set(z[j].subarray(0, n));
        const columns = problem.keys.map((_, j) => (touched.has(j) ? scratch[j] : z[j]));
        move(columns, n);
        states.evaluate(columns, n, factors, marks, exact);
      },
    };
  };
  const { likelihood: _, likelihoodParts: __, ...rest } = problem;
  return {
    move,
    problem: {
      ...rest,
      options: problem.options.map((option) => ({ ...option, states: moved(option.states) })),
      survivals: problem.survivals.map(moved),
    },
  };
}

const agreementKey = "agreement with the results";
const grid = 600;
const gridReach = 6;

/**
 * The likelihood L as something survived: one more coordinate v, and survival where Φ(v) ≤ L/bound. Beyond six standard deviations L
 * is held at its bound.
 *
 * @source J. von Neumann (1951), Various techniques used in connection with random digits, NBS Appl. Math. Ser. 12, 36–38 (from memory)
 */
function likelihoodAsSurvival(
  problem: DecisionProblem,
  likelihood: NonNullable<DecisionProblem["likelihood"]>,
): DecisionProblem {
  const { keys, likelihoodParts = [] } = problem;
  const wide = [...keys, agreementKey];
  const logBound = likelihoodParts.reduce((sum, part) => sum + largestWithinReach(part), 0);
  const extended = (states: LimitStates): LimitStates => ({
    ...states,
    dimension: wide.length,
    keys: wide,
    get evaluations() {
      return states.evaluations;
    },
  });
  const longer = (row: Float64Array): Float64Array => Float64Array.of(...row, 0);
  const { likelihood: _, likelihoodParts: __, ...rest } = problem;
  const capacity = Math.min(...problem.options.map(({ states }) => states.capacity));
  const share = (z: readonly Float64Array[], n: number, out: Float64Array): void => {
    out.fill(Math.exp(-logBound), 0, n);
    likelihood(z, n, out);
  };
  return {
    ...rest,
    keys: wide,
    roles: [...problem.roles, "nature"],
    options: problem.options.map((option) => ({ ...option, states: extended(option.states) })),
    survivals: [...problem.survivals.map(extended), agreementStates(wide, capacity, share)],
    variables: problem.variables.map((variable) => ({
      ...variable,
      image: { offset: variable.image.offset, row: longer(variable.image.row) },
      known: { offset: variable.known.offset, row: longer(variable.known.row) },
    })),
    standIns: problem.standIns.map((one) => ({
      ...one,
      image: { offset: one.image.offset, row: longer(one.image.row) },
    })),
  };
}

function largestWithinReach({ form: { offset, row }, logCorrection }: LikelihoodPart): number {
  const sd = Math.hypot(...row);
  let largest = Number.NEGATIVE_INFINITY;
  for (let i = 0; i <= grid; i++)
    largest = Math.max(largest, logCorrection(offset + sd * gridReach * ((2 * i) / grid - 1)));
  return largest;
}

/** F = (L/bound)/Φ(v). */
function agreementStates(
  keys: readonly string[],
  capacity: number,
  share: (z: readonly Float64Array[], n: number, out: Float64Array) => void,
): LimitStates {
  const form = { offset: 0, row: Float64Array.from(keys, (key) => (key === agreementKey ? 1 : 0)) };
  const v = new Float64Array(capacity);
  return {
    dimension: keys.length,
    keys,
    names: ["agreement"],
    capacity,
    evaluations: { exact: 0, batched: 0 },
    evaluate(z, n, factors, marks) {
      share(z, n, factors[0]);
      applyForm(form, z, n, v);
      for (let i = 0; i < n; i++) factors[0][i] = Math.min(factors[0][i] / normalCdf(v[i]), cap);
      marks.fill(0, 0, n);
    },
    evaluateAt() {
      throw new RangeError("agreement depends on coordinates, not on values of the variables alone");
    },
  };
}

/** Moves samples to where the results put them, and says which agree with what was survived. */
export function agreementOf(before: DecisionProblem, { problem, move }: SettledProblem): Agreement {
  const survivals = move === undefined ? problem.survivals : before.survivals;
  const margin = createSurvivalMargin(survivals);
  const least = new Float64Array(Math.max(cap, ...survivals.map(({ capacity }) => capacity)));
  return (z, n, keep) => {
    move?.(z as readonly Float64Array[], n);
    margin(z, n, least, false);
    for (let i = 0; i < n; i++) keep[i] = least[i] >= 1 ? 1 : 0;
  };
}
