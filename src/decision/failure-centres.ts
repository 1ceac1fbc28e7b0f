import type { JointSpace, Marginal } from "../probability/marginal.ts";
import { type DesignPoint, type DesignPointSearch, findDesignPoints } from "../reliability/design-points.ts";
import type { LimitStates } from "../reliability/limit-states.ts";
import { failureAfterSurvival, survivalAsFailure } from "./after-survival.ts";
import type { DecisionProblem } from "./decision-problem.ts";
import type { FailureCentre } from "./mixture.ts";
import { greatestOfYears, statesOfPeriod } from "./period-states.ts";

export interface CentreSearch {
  readonly centres: readonly FailureCentre[];
  /** Points about which what was survived is likely; empty where it holds at the means of what is believed. */
  readonly survivalPoints: readonly Float64Array[];
  readonly evaluations: number;
}

/**
 * Design points of every limit state of every option, after the evidence: the nearest points, in the coordinates that the
 * results have set anew, where the wall fails now and stood what it has stood. Over a period of years also those where one of
 * the yearly coordinates is at its greatest value of the period.
 */
export function findFailureCentres(problem: DecisionProblem, seed: string): CentreSearch {
  const space = searchSpace(problem);
  const { years, roles } = problem;
  let evaluations = 0;
  const centresOf = (states: LimitStates, option: number): FailureCentre[] => {
    const search = searchAfterSurvival(states, problem.survivals, space, seed);
    evaluations += search.evaluations;
    return search.states.flatMap(({ points, originFails }, k) =>
      points.map(
        ({ point }): FailureCentre => ({
          option,
          limitState: states.names[k],
          point,
          ...(originFails ? { originFails } : {}),
        }),
      ),
    );
  };
  const centres = problem.options.flatMap(({ states, reads }, option) => {
    const yearly = years > 1 ? (reads ?? roles.map((_, j) => j)).filter((j) => roles[j] === "yearly") : [];
    const overYears = yearly.flatMap((j) =>
      centresOf(statesOfPeriod(states, j, years), option).map(
        (centre): FailureCentre => ({
          ...centre,
          point: centre.point.map((x, i) => (i === j ? greatestOfYears(x, years) : x)),
          overYears: { point: centre.point, coordinate: j },
        }),
      ),
    );
    return [...centresOf(states, option), ...overYears];
  });
  return { centres, survivalPoints: survivalPointsOf(problem, space, seed), evaluations };
}

/** Least factors that count as survival, on the way to 1. */
const levels = [0.5, 0.75, 0.9, 0.97];

/**
 * Design points of failure now and survival then. Where the two leave no more than a narrow strip, no start falls into it: the
 * search then lets survival be easier at first, and goes on from what it finds as survival becomes what it was.
 */
export function searchAfterSurvival(
  states: LimitStates,
  survivals: readonly LimitStates[],
  space: JointSpace,
  seed: string,
): DesignPointSearch {
  const direct = findDesignPoints(failureAfterSurvival(states, survivals), space, seed);
  if (survivals.length === 0 || direct.states.every(({ points }) => points.length > 0)) return direct;
  let { evaluations } = direct;
  let known: readonly DesignPoint[] = [];
  for (const level of [...levels, 1]) {
    const search = findDesignPoints(failureAfterSurvival(states, survivals, level), space, seed, known);
    evaluations += search.evaluations;
    known = search.states.flatMap(({ points }) => points);
    if (level === 1) return { ...search, evaluations };
  }
  return direct;
}

function survivalPointsOf({ survivals }: DecisionProblem, space: JointSpace, seed: string): Float64Array[] {
  if (survivals.length === 0) return [];
  const [search] = findDesignPoints(survivalAsFailure(survivals), space, seed).states;
  return search.originFails ? [] : search.points.map(({ point }) => point);
}

/** Where the variables jump, for the search: u = offset + row·z brought to unit length, the jumps moved with it. */
export function searchSpace({ keys, roles, variables, standIns }: DecisionProblem): JointSpace {
  const jumping = [...variables, ...standIns].filter(({ marginal }) => marginal.jumps.length > 0);
  return {
    coordinates: keys.map((key, j) => ({
      key,
      part: roles[j] === "knowledge" ? "knowledge" : "nature",
      yearly: roles[j] === "yearly",
    })),
    unknowns: jumping.map(({ marginal, image }, v) => ({
      path: String(v),
      marginal: withJumps(marginal, image.offset, Math.hypot(...image.row)),
      knowledge: 1,
      yearly: false,
    })),
    rows: jumping.map(({ image }) => {
      const size = Math.hypot(...image.row);
      return image.row.map((weight) => weight / size);
    }),
  };
}

function withJumps(marginal: Marginal, offset: number, size: number): Marginal {
  return { ...marginal, jumps: marginal.jumps.map((jump) => (jump - offset) / size) };
}
