/** How likely is each failure, how sure are we, and which unknown drives it? */
import { withAllMeasures } from "./assess-all.ts";
import { bestEstimateOf, plainEstimate, pointMethods } from "./assess-methods.ts";
import { cautions } from "./cautions.ts";
import { cautiousValues, driverTable } from "./drivers/driver-table.ts";
import { failurePicture } from "./drivers/failure-picture.ts";
import { tornado } from "./drivers/tornado.ts";
import { StudyError } from "./errors.ts";
import { mechanicsNotes } from "./mechanics/notes.ts";
import { createWorkspace } from "./mechanics/workspace.ts";
import { buildModel, type Model, unknownsOf } from "./model.ts";
import { assessmentNotes } from "./notes.ts";
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
  const runner = options.startRunner?.(study, plan) ?? localRunner(createBlockCounter(states, space, plan));
  const run = await monteCarlo(plan, runner, {
    precision: options.precision ?? study.assessment.precision,
    ...(options.onProgress === undefined ? {} : { onProgress: options.onProgress }),
    ...(options.signal === undefined ? {} : { signal: options.signal }),
  }).finally(() => runner.close?.());
  const period = await periodOf(model, seed, options, run.complete);
  const goOn = run.complete && (period?.complete ?? true) && options.signal?.aborted !== true;
  const search = goOn ? findDesignPoints(states, space, seed) : undefined;
  const assessed = Object.fromEntries(
    states.names.map((name, k) => [
      name,
      {
        ...limitStateAssessment(model, run, plan, k, secondMoment[k], bars[k]),
        ...(search === undefined ? {} : pointMethods(model, search, k)),
      },
    ]),
  ) as Partial<Record<LimitStateName, LimitStateAssessment>>;
  const whole = systemAssessment(model, run, assessed, period);
  const { limitStates, system } =
    search === undefined || options.all !== true
      ? { limitStates: assessed, system: whole }
      : withAllMeasures(model, assessed, whole, { seed, search, correlation: correlationOf(study, model) });
  const bestEstimate =
    search === undefined
      ? plainEstimate(study, system)
      : bestEstimateOf(model, search, system, {
          seed,
          samples: options.samples ?? study.assessment.samples,
          precision: options.precision ?? study.assessment.precision,
          ...(options.method === undefined ? {} : { method: options.method }),
        });
  const seconds = (options.clock?.() ?? 0) - start;
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
    ...(target === undefined ? {} : { target }),
    run: {
      version,
      seed,
      workers: options.workers ?? 1,
      complete: run.complete && (period?.complete ?? true),
      sampling: { evaluations: run.samples + (period?.evaluations ?? 0), seconds },
    },
    warnings: [],
    cautions,
  };
  return {
    ...result,
    warnings: [...study.notices, ...mechanicsNotes(study, kernel, columns), ...assessmentNotes(study, result)],
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

function limitStateAssessment(
  model: Model,
  run: MonteCarloRun,
  plan: SamplingPlan,
  k: number,
  secondMoment: SecondMomentResult,
  bars: readonly TornadoBar[],
): LimitStateAssessment {
  const state = run.states[k];
  const picture = failurePicture(model.space, state);
  return {
    factorAtMean: secondMoment.mean,
    monteCarlo: monteCarloResult(run, state, plan.centres[k]),
    firstOrderSecondMoment: secondMoment,
    drivers: driverTable(model.space, { shares: secondMoment.contributions, tornado: bars, picture }),
    tornado: bars,
    failurePicture: picture,
    histogram: histogramOf(state, plan.edges[k]),
    convergence: state.convergence,
  };
}

function systemAssessment(
  model: Model,
  run: MonteCarloRun,
  limitStates: Partial<Record<LimitStateName, LimitStateAssessment>>,
  period: PeriodResult | undefined,
): SystemAssessment {
  const picture = failurePicture(model.space, run.system);
  return {
    monteCarlo: monteCarloResult(run, run.system),
    ...(period === undefined ? {} : { period: periodAssessment(period) }),
    bounds: systemBounds(Object.values(limitStates).map(probabilityInHand)),
    drivers: driverTable(model.space, { picture }),
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

/** Where something in the study is yearly, whole periods are drawn too. */
async function periodOf(
  model: Model,
  seed: string,
  options: AssessOptions,
  goOn: boolean,
): Promise<PeriodResult | undefined> {
  const { period, samples, precision } = model.study.assessment;
  if (period === undefined || !goOn || !model.space.coordinates.some((coordinate) => coordinate.yearly))
    return undefined;
  return periodProbability(model.states, model.space, {
    seed,
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
