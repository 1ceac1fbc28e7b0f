import type { JointSpace } from "../probability/marginal.ts";
import { near } from "./design-point.ts";
import { type DesignPoint, evaluationsOf, middleOf, searchAll } from "./design-points.ts";
import { drawBack } from "./exploration.ts";
import { type FailureCentre, failureCentres, type MixturePart, mixtureOf, wholeMove } from "./failure-mixture.ts";
import type { LimitStates } from "./limit-states.ts";
import { norm, type Point, pointEvaluator } from "./point-evaluator.ts";
import { logarithmicInterval, type SamplingEstimate, type SamplingOrder, spreadOf } from "./sampling-estimate.ts";
import { segmentsOf } from "./segments.ts";
import { type FailingSample, type WeightedEstimate, type WeightedRun, weightedRun } from "./weighted-run.ts";

export interface ImportanceEstimate extends SamplingEstimate {
  /** One per limit state, from the same samples. */
  readonly states: readonly WeightedEstimate[];
  readonly centres: readonly FailureCentre[];
  /** Samples of the main run, and how many of them failed. */
  readonly samples: number;
  readonly failures: number;
}

const pilotSamples = 1000;
/** The pilot's error is itself uncertain: this many times the samples that it asks for. */
const margin = 1.25;
const mostRounds = 3;
const nearer = 0.3;
const heavy = 0.05;
const alarm = 1 / 3;

/** Centres to sample around, and what was spent and doubted on the way to them. */
export interface CentreSearch {
  readonly points: readonly DesignPoint[];
  readonly centres: readonly FailureCentre[];
  readonly pilot: WeightedRun | undefined;
  readonly doubts: readonly string[];
  readonly evaluations: number;
}

/**
 * Design points of all limit states, completed where a pilot shows that regions of failure were missed.
 *
 * A pilot of 1000 samples is looked through for failing samples nearer than the nearest point by 0.3, or that carry more than a
 * twentieth of the weight; the search starts again from them, at most three times.
 */
export function searchCentres(
  states: LimitStates,
  space: JointSpace,
  found: readonly DesignPoint[],
  seed: string,
): CentreSearch {
  const before = evaluationsOf(states);
  let points = found;
  const doubts: string[] = [];
  if (points.length === 0) return { points, centres: [], pilot: undefined, doubts, evaluations: 0 };
  const research = searchAgain(states, space);
  for (let round = 0; ; round++) {
    const centres = failureCentres(points);
    const pilot = weightedRun(states, mixtureOf(centres, wholeMove), {
      seed,
      purpose: `importance sampling, pilot ${round}`,
      samples: pilotSamples,
      keep: 4,
    });
    const missed = missedRegions(pilot, centres);
    const fresh = missed.length === 0 ? [] : research(missed, points);
    if (fresh.length > 0 && round < mostRounds) {
      points = [...points, ...fresh];
      continue;
    }
    if (fresh.length > 0) doubts.push(`regions of failure were still being found after ${mostRounds} further searches`);
    return { points, centres, pilot, doubts, evaluations: evaluationsOf(states) - before };
  }
}

/** Failing samples that the centres do not account for. */
function missedRegions(pilot: WeightedRun, centres: readonly FailureCentre[]): readonly FailingSample[] {
  const nearest = Math.min(...centres.map(({ point }) => norm(point)));
  const total = pilot.system.probability * pilot.samples;
  return pilot.standing.filter(({ point, weight }) => norm(point) < nearest - nearer || weight > heavy * total);
}

/** Searches from failing samples, each for the limit states that fail there; hands back the points that are new. */
function searchAgain(
  states: LimitStates,
  space: JointSpace,
): (missed: readonly FailingSample[], known: readonly DesignPoint[]) => readonly DesignPoint[] {
  const evaluator = pointEvaluator(states);
  const segments = segmentsOf(space, middleOf);
  return (missed, known) => {
    const factors = evaluator.factors(missed.map(({ point }) => point));
    const fresh: DesignPoint[] = [];
    states.names.forEach((_, state) => {
      const margins = (trials: readonly Point[]): Float64Array => evaluator.margins(state, trials);
      const failing = missed.flatMap(({ point }, i) => (factors[state][i] < 1 ? [point] : []));
      for (const search of searchAll(margins, segments, drawBack(margins, failing, 6))) {
        const isNew = ![...known, ...fresh].some((other) => near(other.point, search.point));
        if (isNew && search.status !== "none")
          fresh.push({
            state,
            point: search.point,
            reliabilityIndex: norm(search.point),
            status: search.status,
            gradient: search.gradient,
          });
      }
    });
    return fresh;
  };
}

/**
 * Importance sampling of the system around its design points: a stratified mixture of unit normals there, and of a wide one; a
 * pilot sizes the main run, which is drawn afresh with a fixed number of samples, so that no stop rule biases it.
 *
 * The main run is looked through as the pilot was; where it shows a region that was missed, pilot and main run start again.
 *
 * @param spent evaluations of the search that found the points, to be counted in
 */
export function importanceSampling(
  states: LimitStates,
  space: JointSpace,
  found: readonly DesignPoint[],
  order: SamplingOrder,
  spent = 0,
): ImportanceEstimate {
  const before = evaluationsOf(states);
  const research = searchAgain(states, space);
  let points = found;
  for (let round = 0; ; round++) {
    const search = searchCentres(states, space, points, `${order.seed}${"+".repeat(round)}`);
    const parts = mixtureOf(search.centres, wholeMove);
    const { estimate, run } = sampleAround(
      states,
      search,
      parts,
      search.pilot,
      order,
      `importance sampling, run ${round}`,
    );
    const missed = run === undefined || round === mostRounds ? [] : missedRegions(run, search.centres);
    const fresh = missed.length === 0 ? [] : research(missed, search.points);
    if (fresh.length === 0) return { ...estimate, evaluations: spent + evaluationsOf(states) - before };
    points = [...search.points, ...fresh];
  }
}

/**
 * One main run from a mixture, as long as the pilot says, with the doubts that it leaves.
 *
 * @param parts the centres, as they lie among the coordinates of these limit states
 */
export function sampleAround(
  states: LimitStates,
  search: CentreSearch,
  parts: readonly MixturePart[],
  pilot: WeightedRun | undefined,
  order: SamplingOrder,
  purpose: string,
): { readonly estimate: ImportanceEstimate; readonly run?: WeightedRun } {
  const samples = pilot === undefined ? 0 : samplesFor(pilot, order);
  if (samples === 0)
    return {
      estimate: nothingFound(states, search, pilot === undefined ? "no design point was found" : "no sample failed"),
    };
  const run = weightedRun(states, parts, { seed: order.seed, purpose, samples, keep: 4 });
  const { probability, standardError } = run.system;
  const doubts = [...search.doubts];
  if (run.largestShare > alarm)
    doubts.push(`a single sample carries ${Math.round(100 * run.largestShare)} % of the estimate`);
  if (order.precision > 0 && spreadOf(run.system) > 2 * order.precision)
    doubts.push(
      `the coefficient of variation is ${(100 * spreadOf(run.system)).toFixed(0)} %, where ${100 * order.precision} % was asked for`,
    );
  const estimate: ImportanceEstimate = {
    method: "importance",
    probability,
    standardError,
    interval: logarithmicInterval(probability, standardError),
    intervalKind: "95 %, normal on the logarithm",
    evaluations: run.samples,
    doubts,
    states: run.states,
    centres: search.centres,
    samples: run.samples,
    failures: run.failures,
  };
  return { estimate, run };
}

/** Samples for the precision asked for, by the pilot's error. */
function samplesFor(pilot: WeightedRun, { precision, samples }: SamplingOrder): number {
  const spread = spreadOf(pilot.system);
  if (!Number.isFinite(spread)) return 0;
  if (precision === 0) return samples;
  const wanted = Math.ceil(margin * pilot.samples * (spread / precision) ** 2);
  return Math.min(Math.max(wanted, pilotSamples), samples);
}

function nothingFound(states: LimitStates, search: CentreSearch, why: string): ImportanceEstimate {
  return {
    method: "importance",
    probability: 0,
    standardError: 0,
    interval: [0, 1],
    intervalKind: "nothing is known",
    evaluations: 0,
    doubts: [...search.doubts, why],
    states: states.names.map(() => ({ probability: 0, standardError: 0 })),
    centres: search.centres,
    samples: 0,
    failures: 0,
  };
}
