/** Study → decision problem: options, what was survived, and beliefs over coordinates that all of them share. */
import {
  type BeliefVariable,
  type DecisionProblem,
  knowledgePart,
  type SeenResults,
  type TestSeries,
} from "./decision/decision-problem.ts";
import { optionCase, ownVariables, survivalCase, uncertainPaths, type WallCase } from "./decision-cases.ts";
import { type DecisionSpace, decisionSpace } from "./decision-space.ts";
import { marginalOf } from "./probability/marginal-of.ts";
import type { Investigation, Notice, Study, UncertainQuantity } from "./study/study.ts";
import { wallStates } from "./wall-states.ts";

export interface DecisionModel {
  /** Before the results: condition it on them. */
  readonly problem: DecisionProblem;
  readonly results: readonly SeenResults[];
  /** Tests on a path as the decision sees them. */
  series(informs: Investigation["informs"][number]): TestSeries;
  readonly notices: readonly Notice[];
}

/**
 * A study without a decision has one option, as it stands, and failure costs 1.
 *
 * @throws StudyError where correlations or shares of knowledge have no joint distribution
 */
export function decisionModel(study: Study): DecisionModel {
  const { decision, assessment } = study;
  const own = ownVariables(study);
  const options = decision?.options ?? [{ name: study.title, cost: 0, change: {}, alwaysOpen: true }];
  const walls = options.map((option) => optionCase(study, option.change, own));
  const survived = study.evidence.flatMap((entry, i) =>
    entry.kind === "survived" ? [survivalCase(study, entry, i, own)] : [],
  );
  const space = decisionSpace(study, own, [...walls, ...survived]);
  const states = (wall: WallCase) => wallStates(wall.kernel, space, undefined, (path) => space.nameIn(wall, path));
  const variables = beliefVariables(space, new Set(own.keys()));
  const cost = decision?.failureCost ?? 1;
  const series = (informs: Investigation["informs"][number]): TestSeries => ({
    variable: variables.findIndex(({ path }) => path === informs.path),
    tests: informs.tests,
    ...errorsOf(own.get(informs.path)!, informs),
  });
  const problem: DecisionProblem = {
    keys: space.coordinates.map(({ key }) => key),
    roles: space.roles,
    options: options.map(({ name, cost: price, alwaysOpen }, o) => ({
      name,
      cost: price,
      alwaysOpen,
      states: states(walls[o]),
      reads: coordinatesOf(walls[o], space),
    })),
    failureCosts: Object.fromEntries(
      assessment.limitStates.map((name) => [name, typeof cost === "number" ? cost : (cost[name] ?? 0)]),
    ),
    years: space.roles.includes("yearly") ? (assessment.period ?? 1) : 1,
    ...(assessment.target === undefined ? {} : { target: assessment.target.probability }),
    mustMeetTarget: decision?.mustMeetTarget ?? false,
    variables,
    standIns: space.unknowns.flatMap(({ path, marginal }, v) =>
      own.has(path) ? [] : [{ marginal, image: { offset: 0, row: space.rows[v] } }],
    ),
    survivals: survived.map(states),
  };
  const results = study.evidence.flatMap((entry): SeenResults[] => {
    if (entry.kind !== "results") return [];
    const mean = entry.results.reduce((sum, x) => sum + x, 0) / entry.results.length;
    return [{ ...series({ ...entry, path: entry.of, tests: entry.results.length }), mean }];
  });
  return { problem, results, series, notices: space.notices };
}

/**
 * Error of one result and the error that all of a series share: as given; where no error is given, those of the variable's
 * scatter, with its mean.
 */
function errorsOf(
  { distribution, scatter }: UncertainQuantity,
  { error, transformation }: { readonly error?: number; readonly transformation?: number },
): Pick<TestSeries, "error" | "sharedError"> {
  const mean = Math.abs(marginalOf(distribution).mean);
  const shared = transformation ?? (error === undefined ? (scatter?.transformation ?? 0) : 0);
  return {
    error: error ?? Math.hypot(scatter?.inherent ?? 0, scatter?.measurement ?? 0) * mean,
    sharedError: shared * mean,
  };
}

function beliefVariables({ unknowns, rows, roles }: DecisionSpace, own: ReadonlySet<string>): BeliefVariable[] {
  return unknowns.flatMap(({ path, marginal, yearly }, v) => {
    if (!own.has(path)) return [];
    const { share, row } = knowledgePart(rows[v], roles);
    const knowledge = share > 1 - 1e-12 ? 1 : share;
    return [{ path, marginal, knowledge, yearly, image: { offset: 0, row: rows[v] }, known: { offset: 0, row } }];
  });
}

/** Coordinates that some uncertain input of a wall hangs on. */
function coordinatesOf(wall: WallCase, space: DecisionSpace): number[] {
  const places = new Map(space.unknowns.map(({ path }, v) => [path, v]));
  const read = new Set<number>();
  for (const path of uncertainPaths(wall)) {
    space.rows[places.get(space.nameIn(wall, path))!].forEach((weight, j) => {
      if (weight !== 0) read.add(j);
    });
  }
  return [...read];
}
