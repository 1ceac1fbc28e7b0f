/** The best estimate after what has been seen: failures among survivors, over the chance of the evidence. */
import { asResult, type BestEstimateOptions, plainInHand } from "./assess-methods.ts";
import { failureAfterSurvival } from "./decision/after-survival.ts";
import { beliefSampleSize, drawBeliefs } from "./decision/belief-sample.ts";
import { type DecisionProblem, isGaussian } from "./decision/decision-problem.ts";
import { findFailureCentres, searchAfterSurvival, searchSpace } from "./decision/failure-centres.ts";
import { beliefMixture } from "./decision/mixture.ts";
import type { Estimate } from "./decision/stratified-sample.ts";
import { clopperPearson } from "./numeric/clopper-pearson.ts";
import { normalUpperQuantile } from "./numeric/normal.ts";
import { type BestOfMethods, bestEstimate } from "./reliability/best-estimate.ts";
import type { MonteCarloRun } from "./reliability/monte-carlo.ts";
import type { PeriodResult } from "./reliability/period.ts";
import type { SamplingEstimate } from "./reliability/sampling-estimate.ts";
import type { BestEstimate, SystemAssessment } from "./results.ts";
import type { Study } from "./study/study.ts";

/** Plain sampling as it was run, those that do not agree with the evidence counted in. */
export interface PlainRuns {
  readonly run: MonteCarloRun;
  readonly period?: PeriodResult;
}

/**
 * P(failure | evidence) = P(failure and survival)/P(survival), each from samples of its own: the numerator by the method that suits
 * it, about the points where the wall fails now and stood then, the denominator from samples about where survival is likely.
 *
 * Where failures are common the samples of plain sampling that agree with the evidence are simply counted.
 *
 * @param problem after the results, without a likelihood (posterior.ts)
 */
export function bestEstimateWithEvidence(
  study: Study,
  problem: DecisionProblem,
  plain: PlainRuns,
  system: SystemAssessment,
  options: BestEstimateOptions,
): BestEstimate {
  const space = searchSpace(problem);
  const both = failureAfterSurvival(problem.options[0].states, problem.survivals);
  const search = searchAfterSurvival(problem.options[0].states, problem.survivals, space, options.seed);
  const years = system.period?.years;
  const numerator = bestEstimate(both, space, {
    ...options,
    ...(years === undefined ? {} : { years }),
    search,
    plain: plainOfBoth(plain),
  });
  if (numerator.method === "plain" || isGaussian(problem))
    return asResult(study, numerator.method === "plain" ? counted(numerator, system) : numerator, years);
  const chance = chanceOfSurvival(problem, options.seed);
  const { crossCheck } = numerator;
  return asResult(
    study,
    {
      ...numerator,
      ...overChance(numerator, chance),
      intervalKind: `${numerator.intervalKind}; the error of the chance of the evidence is in it`,
      doubts: [...numerator.doubts, ...chanceDoubts(chance)],
      evaluations: numerator.evaluations + chance.evaluations,
      ...(crossCheck === undefined
        ? {}
        : {
            crossCheck: {
              ...crossCheck,
              estimate: { ...crossCheck.estimate, ...overChance(crossCheck.estimate, chance) },
            },
          }),
    },
    years,
  );
}

/** The samples that agree with the evidence, counted, in place of the numerator alone. */
function counted(numerator: BestOfMethods, system: SystemAssessment): BestOfMethods {
  const own = plainInHand(system);
  const share = numerator.probability > 0 ? own.probability / numerator.probability : undefined;
  const { crossCheck, ...rest } = numerator;
  const checked =
    crossCheck === undefined || share === undefined
      ? {}
      : {
          crossCheck: { ...crossCheck, estimate: { ...crossCheck.estimate, ...scaledBy(crossCheck.estimate, share) } },
        };
  return { ...rest, ...own, evaluations: rest.evaluations, ...checked };
}

/** Failure and survival together, as plain sampling saw them. */
function plainOfBoth({ run, period }: PlainRuns): SamplingEstimate {
  const [failures, drawn, years] =
    period === undefined ? [run.system.failures, run.drawn, 1] : [period.failures, period.drawn, period.years];
  const probability = failures / drawn;
  return {
    method: "plain",
    probability,
    standardError: Math.sqrt((probability * (1 - probability)) / drawn),
    interval: clopperPearson(failures, drawn),
    intervalKind: "95 %, Clopper–Pearson",
    evaluations: drawn * years,
    doubts: failures === 0 ? ["no sample failed"] : [],
  };
}

function chanceOfSurvival(problem: DecisionProblem, seed: string): Estimate & { readonly evaluations: number } {
  const search = findFailureCentres({ ...problem, options: [] }, seed);
  const strata = beliefMixture(search.survivalPoints, problem.keys.length);
  const plan = { seed, purpose: "chance of the evidence", samples: 2 * beliefSampleSize, folds: 2 };
  const { chance, evaluations } = drawBeliefs(problem, strata, plan);
  return { ...chance, evaluations };
}

function chanceDoubts({ value, standardError }: Estimate): readonly string[] {
  if (!(value > 0)) return ["no sample of what is believed agrees with the evidence"];
  return standardError > 0.05 * value ? ["the chance of the evidence is known to no better than a twentieth"] : [];
}

type Uncertain = Pick<SamplingEstimate, "probability" | "standardError" | "interval">;

/** An estimate over a chance that has an error of its own: relative errors add as squares, on the logarithm for the interval. */
export function overChance({ probability, standardError, interval }: Uncertain, chance: Estimate): Uncertain {
  if (!(chance.value > 0)) return { probability: 0, standardError: 0, interval: [0, 1] };
  const value = Math.min(probability / chance.value, 1);
  const doubt = chance.standardError / chance.value;
  const aside = (end: number): number =>
    probability > 0 && end > 0
      ? Math.exp(Math.hypot(Math.log(end / probability), normalUpperQuantile(0.025) * doubt))
      : Number.POSITIVE_INFINITY;
  return {
    probability: value,
    standardError: Math.hypot(standardError / chance.value, value * doubt),
    interval: [
      value / aside(interval[0]),
      Math.min(1, value === 0 ? interval[1] / chance.value : value * aside(interval[1])),
    ],
  };
}

function scaledBy({ probability, standardError, interval }: Uncertain, factor: number): Uncertain {
  return {
    probability: Math.min(1, probability * factor),
    standardError: standardError * factor,
    interval: [interval[0] * factor, Math.min(1, interval[1] * factor)],
  };
}
