import { clopperPearson } from "../numeric/clopper-pearson.ts";
import type { JointSpace } from "../probability/marginal.ts";
import { fillNormals, streamBlock } from "../probability/streams.ts";
import { type DesignPointSearch, evaluationsOf, findDesignPoints } from "./design-points.ts";
import { directionalSampling } from "./directional.ts";
import { mixtureOf } from "./failure-mixture.ts";
import { type CentreSearch, importanceSampling, sampleAround, searchCentres } from "./importance-sampling.ts";
import { latinHypercube } from "./latin-hypercube.ts";
import type { LimitStates } from "./limit-states.ts";
import { spread } from "./monte-carlo.ts";
import { periodStates } from "./period-states.ts";
import { createFailureCount } from "./replicates.ts";
import { type SamplingEstimate, type SamplingMethod, type SamplingOrder, spreadOf } from "./sampling-estimate.ts";
import { sobolSampling } from "./sobol-sampling.ts";
import { subsetSimulation } from "./subset-simulation.ts";
import { weightedRun } from "./weighted-run.ts";

export interface BestEstimateOrder extends SamplingOrder {
  /** Forced by the user; chosen where left out. */
  readonly method?: SamplingMethod;
  /** Years of the period, where something is yearly. */
  readonly years?: number;
  /** Made before, and then not counted; searched for where left out. */
  readonly search?: DesignPointSearch;
  /** Plain sampling of the same event, where it is in hand: taken as it is, or as the cross-check where it is sharp enough. */
  readonly plain?: SamplingEstimate;
}

export interface CrossCheck {
  readonly estimate: SamplingEstimate;
  /** Whether the two are within chance of each other (a false alarm once in a thousand). */
  readonly agrees: boolean;
  /** Factor between the two estimates that the check could have seen. */
  readonly seesFactor: number;
}

export interface BestOfMethods extends SamplingEstimate {
  /** Why this method was taken. */
  readonly reason: string;
  readonly crossCheck?: CrossCheck;
}

/** Where the nearest design point is no farther out than this, failures are common: plain sampling sees them (p > 0.02). */
const commonIndex = 2;

/**
 * Probability of failure of the system by the method that suits it, checked by another.
 *
 * Plain sampling where failures are common; importance sampling where design points were found and leave no doubt; subset
 * simulation where not. A method that is asked for is taken, whatever it finds. Evaluations are those of the search, the pilot and
 * the run; those of the cross-check are counted in it.
 */
export function bestEstimate(states: LimitStates, space: JointSpace, order: BestEstimateOrder): BestOfMethods {
  const search = order.search ?? findDesignPoints(states, space, order.seed);
  const problem: Problem = { states, space, search, order, drawn: drawnStates(states, space, order.years) };
  const { estimate, reason } = chosen(problem);
  const crossCheck = checkOf(problem, estimate);
  return { ...estimate, reason, ...(crossCheck === undefined ? {} : { crossCheck }) };
}

interface Problem {
  readonly states: LimitStates;
  readonly space: JointSpace;
  readonly search: DesignPointSearch;
  readonly order: BestEstimateOrder;
  /** The limit states that are drawn: of one year, or of a period. */
  readonly drawn: LimitStates;
}

function drawnStates(states: LimitStates, space: JointSpace, years: number | undefined): LimitStates {
  const yearly = space.coordinates.some((coordinate) => coordinate.yearly);
  return years === undefined || !yearly ? states : periodStates(states, space, years);
}

function chosen(problem: Problem): Choice {
  const { order, search } = problem;
  if (order.method !== undefined) return { estimate: run(order.method, problem), reason: "asked for" };
  const indices = search.states.flatMap(({ points }) => points.map(({ reliabilityIndex }) => reliabilityIndex));
  if (search.states.some(({ originFails }) => originFails) || Math.min(...indices) < commonIndex)
    return {
      estimate: withSearch(run("plain", problem), search),
      reason: "failures are common enough for plain sampling",
    };
  if (indices.length > 0) {
    const estimate = run("importance", problem);
    if (estimate.doubts.length === 0)
      return { estimate, reason: "design points were found, and the samples around them leave no doubt" };
    return orPlain(problem, {
      estimate: withSearch(run("subset", problem), { evaluations: estimate.evaluations }),
      reason: `importance sampling is in doubt: ${estimate.doubts.join("; ")}`,
    });
  }
  return orPlain(problem, {
    estimate: withSearch(run("subset", problem), search),
    reason: "no design point was found",
  });
}

interface Choice {
  readonly estimate: SamplingEstimate;
  readonly reason: string;
}

/** Where subset simulation finds nothing either, plain sampling at least gives an upper limit. */
function orPlain(problem: Problem, { estimate, reason }: Choice): Choice {
  if (estimate.probability > 0) return { estimate, reason };
  return {
    estimate: withSearch(run("plain", problem), estimate),
    reason: `${reason}, and subset simulation found no failure`,
  };
}

function withSearch(estimate: SamplingEstimate, search: { readonly evaluations: number }): SamplingEstimate {
  return { ...estimate, evaluations: estimate.evaluations + search.evaluations };
}

function run(method: SamplingMethod, problem: Problem): SamplingEstimate {
  const { drawn, order } = problem;
  const years = order.years !== undefined && drawn !== problem.states ? order.years : 1;
  // an evaluation of a period costs one a year
  const scaled: SamplingOrder = { ...order, samples: Math.max(1, Math.floor(order.samples / years)) };
  switch (method) {
    case "plain":
      return order.plain ?? plainSampling(drawn, scaled);
    case "latin_hypercube":
      return latinHypercube(drawn, scaled);
    case "sobol":
      return sobolSampling(drawn, scaled);
    case "directional":
      return directionalSampling(drawn, scaled);
    case "subset":
      return subsetSimulation(drawn, { ...scaled, samples: order.samples });
    case "importance":
      return importance(problem, scaled);
  }
}

function importance({ states, space, search, drawn }: Problem, order: SamplingOrder): SamplingEstimate {
  const points = search.states.flatMap((state) => state.points);
  if (drawn === states) return importanceSampling(states, space, points, order, search.evaluations);
  const before = evaluationsOf(states);
  const centres: CentreSearch = searchCentres(states, space, points, order.seed);
  const parts = mixtureOf(centres.centres, (drawn as ReturnType<typeof periodStates>).movesOf);
  const pilot =
    parts.length === 0
      ? undefined
      : weightedRun(drawn, parts, {
          seed: order.seed,
          purpose: "importance sampling, pilot of the period",
          samples: 1000,
        });
  const { estimate } = sampleAround(drawn, centres, parts, pilot, order, "importance sampling of the period");
  return { ...estimate, evaluations: search.evaluations + evaluationsOf(states) - before };
}

/** Plain sampling at a few points in time: blocks doubled, stopped at the precision; Clopper–Pearson. */
export function plainSampling(states: LimitStates, order: SamplingOrder): SamplingEstimate {
  const before = evaluationsOf(states);
  const count = createFailureCount(states);
  const size = Math.min(streamBlock, 4096);
  const z = states.keys.map(() => new Float64Array(size));
  let [failures, samples, nextLook] = [0, 0, 1];
  for (let block = 0; samples < order.samples; block++) {
    const n = Math.min(size, order.samples - samples);
    states.keys.forEach((key, j) => {
      fillNormals(order.seed, "plain sampling, best estimate", key, block, z[j], n);
    });
    failures += count(z, n);
    samples += n;
    if (block + 1 !== nextLook) continue;
    nextLook *= 2;
    if (order.precision > 0 && spread(failures, samples) <= order.precision) break;
  }
  const probability = failures / samples;
  return {
    method: "plain",
    probability,
    standardError: Math.sqrt((probability * (1 - probability)) / samples),
    interval: clopperPearson(failures, samples),
    intervalKind: "95 %, Clopper–Pearson",
    evaluations: evaluationsOf(states) - before,
    doubts: failures === 0 ? ["no sample failed"] : [],
  };
}

/** Three sampling errors and a bit: a false alarm once in a thousand. */
const tooFar = 3.3;

/** The same probability by an independent method; undefined where there is nothing to hold against. */
function checkOf(problem: Problem, estimate: SamplingEstimate): CrossCheck | undefined {
  const { order } = problem;
  const other =
    order.plain !== undefined &&
    estimate.method !== "plain" &&
    order.plain.probability > 0 &&
    spreadOf(order.plain) < 0.2
      ? order.plain
      : run(checkMethod(estimate.method, problem), {
          ...problem,
          order: { ...order, seed: `${order.seed}, cross-check`, precision: 0.2 },
        });
  if (!(estimate.probability > 0))
    return { estimate: other, agrees: other.probability === 0, seesFactor: Number.POSITIVE_INFINITY };
  if (!(other.probability > 0))
    // a method that saw nothing refutes only where its upper limit lies below
    return { estimate: other, agrees: other.interval[1] > estimate.interval[0], seesFactor: Number.POSITIVE_INFINITY };
  const error = Math.hypot(spreadOf(estimate), spreadOf(other));
  const apart = Math.abs(Math.log(estimate.probability / other.probability));
  return { estimate: other, agrees: apart <= tooFar * error, seesFactor: Math.exp(tooFar * error) };
}

/** A method that shares as little as can be with the first, and that can see the probability at hand. */
function checkMethod(method: SamplingMethod, { search }: Problem): SamplingMethod {
  const nearest = Math.min(...search.states.flatMap(({ points }) => points.map((point) => point.reliabilityIndex)));
  switch (method) {
    case "importance":
    case "directional":
      return "subset";
    case "subset":
      return "plain";
    default:
      return nearest >= commonIndex && Number.isFinite(nearest) ? "importance" : "sobol";
  }
}
