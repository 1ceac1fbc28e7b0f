/** The methods beside plain sampling, for one study: design points, first and second order, and the best estimate. */
import type { Model } from "./model.ts";
import { unknownsOf } from "./model.ts";
import { normalUpperQuantile } from "./numeric/normal.ts";
import { remadeMarginal } from "./probability/remade-marginal.ts";
import { type BestOfMethods, bestEstimate } from "./reliability/best-estimate.ts";
import { type DesignPointSearch, evaluationsOf } from "./reliability/design-points.ts";
import { firstOrderResult, type RemadeAt, refined } from "./reliability/first-order.ts";
import type { SamplingEstimate, SamplingMethod } from "./reliability/sampling-estimate.ts";
import { curvaturesAt, secondOrder } from "./reliability/second-order.ts";
import type { BestEstimate, FirstOrderResult, SecondOrderResult, SystemAssessment } from "./results.ts";
import type { Study } from "./study/study.ts";

/** First and, where the design point is smooth, second order, for one limit state. */
export function pointMethods(
  model: Model,
  search: DesignPointSearch,
  state: number,
): { readonly firstOrderReliability: FirstOrderResult; readonly secondOrderReliability?: SecondOrderResult } {
  const { states, space } = model;
  const found = search.states[state];
  const firstOrderReliability = firstOrderResult(states, space, found, remadeAt(model));
  const second = secondOrderOf(model, search, state);
  return { firstOrderReliability, ...(second === undefined ? {} : { secondOrderReliability: second }) };
}

function secondOrderOf(model: Model, search: DesignPointSearch, state: number): SecondOrderResult | undefined {
  const { states } = model;
  const before = evaluationsOf(states);
  const [nearest] = refined(states, search.states[state].points);
  if (nearest?.status !== "smooth") return undefined;
  const curvatures = states.dimension < 2 ? { values: [], smooth: true } : curvaturesAt(states, nearest);
  if (!curvatures.smooth) return undefined;
  const result = secondOrder(nearest.reliabilityIndex, curvatures.values);
  if (result === undefined) return undefined;
  return {
    reliabilityIndex: result.reliabilityIndex,
    probability: result.hohenbichlerRackwitz,
    breitung: result.breitung,
    curvatures: curvatures.values,
    evaluations: evaluationsOf(states) - before,
  };
}

/** The marginals of a model's unknowns with other means and standard deviations, where their distribution is given by these. */
export function remadeAt({ study, kernel, space }: Model): RemadeAt {
  const distributions = new Map(unknownsOf(study, kernel).map(({ path, quantity }) => [path, quantity.distribution]));
  return (place) => {
    const { path } = space.unknowns[place];
    const distribution = distributions.get(path);
    return distribution === undefined ? undefined : remadeMarginal(distribution);
  };
}

export interface BestEstimateOptions {
  readonly seed: string;
  readonly samples: number;
  readonly precision: number;
  readonly method?: SamplingMethod;
}

/** The best estimate of a study, of its period where it has one, with plain sampling in hand. */
export function bestEstimateOf(
  model: Model,
  search: DesignPointSearch,
  system: SystemAssessment,
  options: BestEstimateOptions,
): BestEstimate {
  const { study, states, space } = model;
  const years = system.period?.years;
  const found = bestEstimate(states, space, {
    seed: options.seed,
    samples: options.samples,
    precision: options.precision,
    ...(options.method === undefined ? {} : { method: options.method }),
    ...(years === undefined ? {} : { years }),
    search,
    plain: plainInHand(system),
  });
  return asResult(study, found, years);
}

/** Plain sampling as it was run, of the period where there is one. */
export function plainInHand({ monteCarlo, period }: SystemAssessment): SamplingEstimate {
  const { probability, standardError, interval } = period ?? monteCarlo;
  return {
    method: "plain",
    probability,
    standardError,
    interval,
    intervalKind: "95 %, Clopper–Pearson",
    evaluations: period === undefined ? monteCarlo.samples : period.periods * period.years,
    doubts: probability === 0 ? ["no sample failed"] : [],
  };
}

/** Plain sampling alone, for a run that was stopped before anything else could follow. */
export function plainEstimate(study: Study, system: SystemAssessment): BestEstimate {
  return asResult(
    study,
    { ...plainInHand(system), reason: "stopped before another method could run" },
    system.period?.years,
  );
}

export function asResult(study: Study, found: BestOfMethods, years: number | undefined): BestEstimate {
  const { method, probability, standardError, interval, intervalKind, evaluations, doubts, reason, crossCheck } = found;
  const { target } = study.assessment;
  return {
    method,
    probability,
    standardError,
    interval,
    reliabilityIndex: probability > 0 && probability < 1 ? normalUpperQuantile(probability) : null,
    evaluations,
    ...(years === undefined ? {} : { years }),
    // Met only where the whole interval lies below the target: an unresolved tail is not a proof.
    ...(target === undefined ? {} : { meetsTarget: interval[1] <= target.probability }),
    intervalKind,
    reason,
    doubts,
    ...(crossCheck === undefined
      ? {}
      : {
          crossCheck: {
            method: crossCheck.estimate.method,
            probability: crossCheck.estimate.probability,
            standardError: crossCheck.estimate.standardError,
            interval: crossCheck.estimate.interval,
            evaluations: crossCheck.estimate.evaluations,
            agrees: crossCheck.agrees,
            seesFactor: Number.isFinite(crossCheck.seesFactor) ? crossCheck.seesFactor : null,
          },
        }),
  };
}
