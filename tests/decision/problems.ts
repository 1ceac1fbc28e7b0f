import type {
  BeliefVariable,
  CoordinateRole,
  DecisionOption,
  DecisionProblem,
} from "../../src/decision/decision-problem.ts";
import { knowledgePart } from "../../src/decision/decision-problem.ts";
import type { FailureCentre } from "../../src/decision/mixture.ts";
import type { Marginal } from "../../src/probability/marginal.ts";
import { normal } from "../../src/probability/normal.ts";
import type { LimitStates } from "../../src/reliability/limit-states.ts";

/** Limit states from plain functions of one point: slow, and easy to check. */
export function statesOf(
  keys: readonly string[],
  limitStates: Readonly<Record<string, (z: Float64Array) => number>>,
  capacity = 512,
): LimitStates {
  const point = new Float64Array(keys.length);
  const evaluations = { exact: 0, batched: 0 };
  return {
    dimension: keys.length,
    keys,
    names: Object.keys(limitStates),
    capacity,
    evaluations,
    evaluate(z, n, factors, marks, exact) {
      Object.values(limitStates).forEach((factor, k) => {
        for (let i = 0; i < n; i++) {
          for (let j = 0; j < point.length; j++) point[j] = z[j][i];
          factors[k][i] = Math.min(Math.max(factor(point), 0), 1000);
        }
      });
      marks.fill(0, 0, n);
      if (exact) evaluations.exact += n;
      else evaluations.batched += n;
    },
    evaluateAt() {
      throw new Error("not needed here");
    },
  };
}

/** Fails where direction·z > index (direction of unit length): probability Φ(−index). */
export function planeMargin(direction: readonly number[], index: number): (z: Float64Array) => number {
  return (z) => 1 + 0.1 * (index - direction.reduce((sum, a, j) => sum + a * z[j], 0));
}

/** The design point of a plane margin. */
export function planeCentre(
  direction: readonly number[],
  index: number,
  option: number,
  limitState = "sliding",
): FailureCentre {
  return { point: Float64Array.from(direction, (a) => a * index), option, limitState };
}

export function unit(direction: readonly number[]): number[] {
  const size = Math.hypot(...direction);
  return direction.map((a) => a / size);
}

/** A variable whose U is `row`·z. */
export function variable(
  path: string,
  row: readonly number[],
  roles: readonly CoordinateRole[],
  marginal: Marginal = normal({ mean: 0, sd: 1 }),
): BeliefVariable {
  const image = Float64Array.from(row);
  const known = knowledgePart(image, roles);
  return {
    path,
    marginal,
    knowledge: known.share,
    yearly: roles.some((role, j) => role === "yearly" && row[j] !== 0),
    image: { offset: 0, row: image },
    known: { offset: 0, row: known.row },
  };
}

export function problemOf(parts: {
  readonly roles: readonly CoordinateRole[];
  readonly options: readonly (Omit<DecisionOption, "alwaysOpen" | "states"> & {
    readonly alwaysOpen?: boolean;
    readonly margins: Readonly<Record<string, (z: Float64Array) => number>>;
  })[];
  readonly variables: readonly BeliefVariable[];
  readonly failureCosts?: Readonly<Record<string, number>>;
  readonly years?: number;
  readonly target?: number;
  readonly mustMeetTarget?: boolean;
}): DecisionProblem {
  const keys = parts.roles.map((_, j) => `z${j}`);
  return {
    keys,
    roles: parts.roles,
    options: parts.options.map(({ margins, alwaysOpen, ...option }) => ({
      ...option,
      alwaysOpen: alwaysOpen ?? false,
      states: statesOf(keys, margins),
    })),
    failureCosts: parts.failureCosts ?? { sliding: 1e6 },
    years: parts.years ?? 1,
    ...(parts.target === undefined ? {} : { target: parts.target }),
    mustMeetTarget: parts.mustMeetTarget ?? false,
    variables: parts.variables,
    standIns: [],
    survivals: [],
  };
}
