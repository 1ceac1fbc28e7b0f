/** How likely is each failure, how sure are we, and which unknown drives it? */
import { dearNote, isDear, withAllMeasures } from "./assess-all.ts";
import { bestEstimateWithEvidence } from "./assess-evidence.ts";
import { bestEstimateOf, plainEstimate, pointMethods } from "./assess-methods.ts";
import { cautions } from "./cautions.ts";
import { cautiousValues, driverTable } from "./drivers/driver-table.ts";
import { failurePicture } from "./drivers/failure-picture.ts";
import { tornado } from "./drivers/tornado.ts";
import { StudyError } from "./errors.ts";
import { evidence, evidenceNotes } from "./evidence.ts";
import { mechanicsNotes } from "./mechanics/notes.ts";
import { createWorkspace } from "./mechanics/workspace.ts";
import { buildModel, type Model, unknownsOf } from "./model.ts";
import { assessmentNotes } from "./notes.ts";
import { type SampledModel, sampledModel } from "./posterior.ts";
import { createBlockCounter, type SamplingPlan } from "./reliability/block-tally.ts";
import { type DesignPointSearch, findDesignPoints } from "./reliability/design-points.ts";
import { firstOrderResult } from "./reliability/first-order.ts";
import { localRunner } from "./reliability/local-runner.ts";
import {
  type BlockRunner,
  histogramEdges,
  histogramOf,
  type MonteCarloRun,
  monteCarlo,
  monteCarloResult,
} from "./reliability/monte-carlo.ts";
import { type PeriodResult, periodProbability, yearlyGivenSurvival } from "./reliability/period.ts";
import type { SamplingMethod } from "./reliability/sampling-estimate.ts";
import { firstOrderSecondMoment } from "./reliability/second-moment.ts";
import { systemBounds } from "./reliability/system-bounds.ts";
import type {
  AssessResult,
  LimitStateAssessment,
  PeriodAssessment,
  SecondMomentResult,
  SystemAssessment,
  TornadoBar,
  VariableSummary,
} from "./results.ts";
import type { BeliefMoments, EvidenceResult } from "./results-decision.ts";
import type { LimitStateName, Study } from "./study/study.ts";
import { variableSummaries } from "./variables.ts";
import { version } from "./version.ts";

export interface AssessOptions {
  /** In place of the study's own. */
  readonly seed?: string;
  readonly samples?: number;
  readonly precision?: number;
  /** Of the best estimate; chosen by the program where left out. */
  readonly method?: SamplingMethod;
  /** Every method and measure: hand methods, all drivers, fragility. */
  readonly all?: boolean;
  readonly onProgress?: (done: number, of: number) => void;
  readonly signal?: AbortSignal;
  /** Counts blocks elsewhere, on workers; in this thread where absent. */
  readonly startRunner?: (study: Study, plan: SamplingPlan) => BlockRunner;
  /** Threads that `startRunner` counts on: shown beside the result. */
  readonly workers?: number;
  /** A clock in seconds, for the time shown beside the result; no time is shown without one. */
  readonly clock?: () => number;
}

/**
 * @throws StudyError where correlations have no joint distribution
 */
export async function assess(study: Study, options: AssessOptions = {}): Promise<AssessResult> {
  const model = buildModel(study);
  const { states, space, kernel } = model;
  const seed = options.seed ?? study.assessment.seed;
  const secondMoment = firstOrderSecondMoment(states, space, correlationOf(study, model));
  const bars = tornado(states, space);
  const plan: SamplingPlan = {
    seed,
    purpose: "plain sampling",
    samples: options.samples ?? study.assessment.samples,
    centres: secondMoment.map((moment) => moment.mean),
    edges: secondMoment.map((moment) => histogramEdges(moment.mean, moment.sd)),
  };
  const start = options.clock?.() ?? 0;
  const sampled = sampledModel(study, model);
  const runner =
    options.startRunner?.(study, plan) ??
    localRunner(createBlockCounter(sampled.states, sampled.space, plan, sampled.agrees));
  const run = await monteCarlo(plan, runner, {
    precision: options.precision ?? study.assessment.precision,
    ...(options.onProgress === undefined ? {} : { onProgress: options.onProgress }),
    ...(options.signal === undefined ? {} : { signal: options.signal }),
  }).finally(() => runner.close?.());
  const period = await periodOf(study, sampled, seed, options, run.complete);
  const seconds = (options.clock?.() ?? 0) - start;
  const goOn = run.complete && (period?.complete ?? true) && options.signal?.aborted !== true;
  const search = goOn ? findDesignPoints(states, space, seed) : undefined;
  const seen = evidence(study, { seed });
  const sources: SampleSources = { model, run, ...(seen === undefined ? {} : { moments: momentsOf(seen) }) };
  const assessed = Object.fromEntries(
    states.names.map((name, k) => [
      name,
      {
        ...limitStateAssessment(sources, plan, k, secondMoment[k], bars[k]),
        ...(search === undefined ? {} : pointMethods(model, search, k)),
      },
    ]),
  ) as Partial<Record<LimitStateName, LimitStateAssessment>>;
  const whole = systemAssessment(sources, assessed, period);
  const { limitStates, system } =
    search === undefined || options.all !== true
      ? { limitStates: assessed, system: whole }
      : withAllMeasures(model, assessed, whole, {
          seed,
          search,
          correlation: correlationOf(study, model),
          withEvidence: seen !== undefined,
        });
  const order = {
    seed,
    samples: options.samples ?? study.assessment.samples,
    precision: options.precision ?? study.assessment.precision,
    ...(options.method === undefined ? {} : { method: options.method }),
  };
  const bestEstimate =
    search === undefined
      ? plainEstimate(study, system)
      : sampled.problem === undefined
        ? bestEstimateOf(model, search, system, order)
        : bestEstimateWithEvidence(
            study,
            sampled.problem,
            { run, ...(period === undefined ? {} : { period }) },
            system,
            order,
          );
  const variables = variableSummaries(study, unknownsOf(study, kernel), space);
  const columns = columnsAtMeans(model);
  const { target } = study.assessment;
  const result: AssessResult = {
    study: study.title,
    kind: "assess",
    seed,
    variables,
    limitStates,
    system,
    bestEstimate,
    ...(seen === undefined ? {} : { evidence: seen }),
    ...(target === undefined ? {} : { target }),
    run: {
      version,
      seed,
      workers: options.workers ?? 1,
      complete: run.complete && (period?.complete ?? true),
      sampling: { evaluations: run.drawn + (period?.evaluations ?? 0), seconds },
    },
    warnings: [],
    cautions,
  };
  return {
    ...result,
    warnings: [
      ...study.notices,
      ...mechanicsNotes(study, kernel, columns),
      ...assessmentNotes(study, result),
      ...(options.all === true && isDear(model) ? [{ path: "assessment.limit_states", message: dearNote }] : []),
      ...(seen === undefined ? [] : evidenceNotes(study, seen)),
    ],
  };
}

/** The Pearson coefficient that the study gives for two unknowns, by place. */
function correlationOf(study: Study, model: Model): (i: number, j: number) => number {
  const { unknowns } = model.space;
  const given = new Map(
    study.correlations.flatMap(({ between: [a, b], coefficient }) => [
      [`${a} ${b}`, coefficient] as const,
      [`${b} ${a}`, coefficient] as const,
    ]),
  );
  return (i, j) => given.get(`${unknowns[i].path} ${unknowns[j].path}`) ?? 0;
}

/** What the samples say, and of whom. */
interface SampleSources {
  readonly model: Model;
  readonly run: MonteCarloRun;
  /** After evidence, by path. */
  readonly moments?: ReadonlyMap<string, BeliefMoments>;
}

const momentsOf = ({ variables }: EvidenceResult): ReadonlyMap<string, BeliefMoments> =>
  new Map(variables.map(({ path, posterior }) => [path, posterior]));

const believedIn = ({ run, moments }: SampleSources) => (moments === undefined ? undefined : run.believed);

function limitStateAssessment(
  sources: SampleSources,
  plan: SamplingPlan,
  k: number,
  secondMoment: SecondMomentResult,
  bars: readonly TornadoBar[],
): LimitStateAssessment {
  const { model, run, moments } = sources;
  const state = run.states[k];
  const picture = failurePicture(model.space, state, believedIn(sources));
  return {
    factorAtMean: secondMoment.mean,
    monteCarlo: monteCarloResult(run, state, plan.centres[k]),
    firstOrderSecondMoment: secondMoment,
    drivers: driverTable(model.space, {
      shares: secondMoment.contributions,
      tornado: bars,
      picture,
      ...(moments === undefined ? {} : { moments }),
    }),
    tornado: bars,
    failurePicture: picture,
    histogram: histogramOf(state, plan.edges[k]),
    convergence: state.convergence,
  };
}

function systemAssessment(
  sources: SampleSources,
  limitStates: Partial<Record<LimitStateName, LimitStateAssessment>>,
  period: PeriodResult | undefined,
): SystemAssessment {
  const { model, run, moments } = sources;
  const picture = failurePicture(model.space, run.system, believedIn(sources));
  return {
    monteCarlo: monteCarloResult(run, run.system),
    ...(period === undefined ? {} : { period: periodAssessment(period) }),
    bounds:
      moments === undefined
        ? systemBounds(Object.values(limitStates).map(probabilityInHand))
        : boundsFromIntervals(Object.values(limitStates)),
    drivers: driverTable(model.space, { picture, ...(moments === undefined ? {} : { moments }) }),
    failurePicture: picture,
    convergence: run.system.convergence,
  };
}

/** Counted where enough failures were seen; else that of the design point, if there is one. */
function probabilityInHand(state: LimitStateAssessment): number {
  const { probability, failures } = state.monteCarlo;
  if (failures >= 30) return probability;
  return state.secondOrderReliability?.probability ?? state.firstOrderReliability?.probability ?? probability;
}

/** With evidence, design points describe what was believed before it: bounds then come from the samples' intervals alone. */
function boundsFromIntervals(states: readonly LimitStateAssessment[]): readonly [number, number] {
  const [lower] = systemBounds(states.map(({ monteCarlo }) => monteCarlo.interval[0]));
  const [, upper] = systemBounds(states.map(({ monteCarlo }) => monteCarlo.interval[1]));
  return [lower, upper];
}

/** Where something in the study is yearly, whole periods are drawn too. */
async function periodOf(
  study: Study,
  { states, space, agrees }: SampledModel,
  seed: string,
  options: AssessOptions,
  goOn: boolean,
): Promise<PeriodResult | undefined> {
  const { period, samples, precision } = study.assessment;
  if (period === undefined || !goOn || !space.coordinates.some((coordinate) => coordinate.yearly)) return undefined;
  return periodProbability(states, space, {
    seed,
    ...(agrees === undefined ? {} : { agrees }),
    years: period,
    evaluations: options.samples ?? samples,
    precision: options.precision ?? precision,
    ...(options.signal === undefined ? {} : { signal: options.signal }),
    ...(options.onProgress === undefined ? {} : { onProgress: options.onProgress }),
  });
}

function periodAssessment(period: PeriodResult): PeriodAssessment {
  const { years, probability, standardError, interval, periods, failures } = period;
  return {
    years,
    probability,
    standardError,
    interval,
    periods,
    failures,
    yearlyGivenSurvival: yearlyGivenSurvival(period),
  };
}

function columnsAtMeans(model: Model): readonly Float64Array[] {
  const workspace = createWorkspace(model.kernel, 1);
  const means = new Map(model.space.unknowns.map((unknown) => [unknown.path, unknown.marginal.mean]));
  for (const input of model.kernel.inputs) {
    if (input.fixed === undefined)
      workspace.columns[input.slot][0] =
        input.scale * Math.min(Math.max(means.get(input.path) ?? 0, input.lowest), input.highest);
  }
  workspace.run(1);
  return workspace.columns;
}

/** Each variable at its adverse 5 % fractile, for `check --at cautious`: adverse to the limit state with the lowest factor at the means. */
export function cautiousPoint(study: Study): {
  readonly name: string;
  readonly values: Readonly<Record<string, number>>;
} {
  const { states, space } = buildModel(study);
  const moments = firstOrderSecondMoment(states, space, () => 0);
  const bars = tornado(states, space);
  const lowest = moments.reduce((best, moment, k) => (moment.mean < moments[best].mean ? k : best), 0);
  return { name: "cautious", values: cautiousValues(space, bars[lowest]) };
}

/**
 * The design point of a limit state, for `check --at design_point:sliding`: of all values at which it fails, the likeliest.
 *
 * @throws StudyError where the limit state is not among those of the study, or no design point was found
 */
export function designPointOf(
  study: Study,
  name: LimitStateName,
): { readonly name: string; readonly values: Readonly<Record<string, number>> } {
  const model = buildModel(study);
  const { states, space } = model;
  const place = states.names.indexOf(name);
  const refuse = (message: string): never => {
    throw new StudyError([{ path: "assessment.limit_states", message }], study.file);
  };
  if (place < 0) return refuse(`${name} is not among the limit states of this study: ${states.names.join(", ")}`);
  const search: DesignPointSearch = findDesignPoints(states, space, study.assessment.seed);
  const { status, designPoint } = firstOrderResult(states, space, search.states[place]);
  if (status === "none") return refuse(`no design point of ${name} was found: nothing within reach fails`);
  return { name: `design point of ${name}${status === "usable" ? " (not converged)" : ""}`, values: designPoint };
}

export type { VariableSummary };
