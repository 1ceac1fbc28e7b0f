/** What an assessment gives besides, where every method and measure is asked for: drivers, hand methods, the system from its points. */
import { remadeAt } from "./assess-methods.ts";
import { fragilityCurve } from "./drivers/fragility-curve.ts";
import { fullDrivers } from "./drivers/full-drivers.ts";
import type { Model } from "./model.ts";
import type { DesignPointSearch } from "./reliability/design-points.ts";
import { eigenvectorPointEstimates, twoPointEstimates } from "./reliability/point-estimates.ts";
import { firstOrderSecondMoment } from "./reliability/second-moment.ts";
import { correlationOfModes, systemFromPoints } from "./reliability/system-from-points.ts";
import type { FirstOrderResult, LimitStateAssessment, SystemAssessment } from "./results.ts";
import type { AllDrivers, FragilityCurve, HandMethods, SystemFromDesignPoints } from "./results-methods.ts";

/** Fewer failing samples than this make a poor picture: the weighted one takes its place. */
const fewPictures = 200;
const smallStep = 0.01;
/** The curve is read by eye. */
const curve = { precision: 0.1, samples: 50_000 };

export interface AllOrder {
  readonly seed: string;
  readonly search: DesignPointSearch;
  readonly correlation: (i: number, j: number) => number;
  /** Pictures given failure are then of what is believed after it, and stay as they are. */
  readonly withEvidence?: boolean;
}

/** Where circles are searched in every sample, measures rest on fewer samples, and the probability against one value is left out. */
const dear = { samples: 1024, points: 32 };
export const dearNote =
  "deep-seated failure searches circles in every sample: the measures of what drives it rest on fewer samples than those of other walls, and the probability against one known value is left out";

export const isDear = ({ study }: Model): boolean => study.assessment.limitStates.includes("deep_seated");

/** Adds all measures to the limit states and the system of an assessment. */
export function withAllMeasures(
  model: Model,
  limitStates: Readonly<Record<string, LimitStateAssessment>>,
  system: SystemAssessment,
  order: AllOrder,
): { readonly limitStates: Readonly<Record<string, LimitStateAssessment>>; readonly system: SystemAssessment } {
  const { states, space } = model;
  const { seed, search, correlation, withEvidence = false } = order;
  if (space.unknowns.length === 0) return { limitStates, system };
  const assessed = states.names.map((name) => limitStates[name]);
  const full = fullDrivers({
    states,
    space,
    seed,
    search,
    firstOrder: assessed.map((state) => state.firstOrderReliability ?? nothing),
    drivers: assessed.map((state) => state.drivers),
    remadeAt: remadeAt(model),
    ...(isDear(model) ? dear : {}),
  });
  const hands = handMethods(model, correlation);
  const entries = states.names.map((name, k): [string, LimitStateAssessment] => {
    const { failurePicture, ...measures } = full.states[k];
    const state = assessed[k];
    const allDrivers: AllDrivers = measures;
    return [
      name,
      {
        ...state,
        handMethods: hands[k],
        allDrivers,
        failurePicture: withEvidence ? state.failurePicture : sharper(state.failurePicture, failurePicture),
      },
    ];
  });
  return {
    limitStates: Object.fromEntries(entries),
    system: {
      ...system,
      failurePicture: withEvidence ? system.failurePicture : sharper(system.failurePicture, full.system.failurePicture),
      ...fromPoints(model, search),
      fragility: isDear(model)
        ? []
        : fragilityOf(
            model,
            full.states.map(({ ranking }) => ranking[0]?.path),
            seed,
          ),
    },
  };
}

const nothing: FirstOrderResult = {
  converged: false,
  status: "none",
  reliabilityIndex: null,
  probability: null,
  designPoint: {},
  importance: {},
  evaluations: 0,
};

type Pictures = SystemAssessment["failurePicture"];

const sharper = (counted: Pictures, weighted: Pictures): Pictures =>
  (counted[0]?.failures ?? 0) >= fewPictures || weighted.length === 0 ? counted : weighted;

function handMethods({ states, space }: Model, correlation: AllOrder["correlation"]): readonly HandMethods[] {
  const small = firstOrderSecondMoment(states, space, correlation, smallStep);
  const two = twoPointEstimates(states, space, correlation);
  const eigen = eigenvectorPointEstimates(states, space, correlation);
  return states.names.map((_, k) => {
    const { contributions: _shares, ...smallSteps } = small[k];
    return {
      smallSteps,
      ...(two === undefined ? {} : { twoPoints: two[k] }),
      ...(eigen === undefined ? {} : { eigenvectorPoints: eigen[k] }),
    };
  });
}

/** From the nearest point of every limit state that has one. */
function fromPoints(
  { states }: Model,
  search: DesignPointSearch,
): { readonly fromDesignPoints?: SystemFromDesignPoints } {
  const nearest = search.states.flatMap(({ points }) => points.slice(0, 1));
  if (nearest.length === 0) return {};
  const { probability, cornell, ditlevsen } = systemFromPoints(nearest);
  return {
    fromDesignPoints: {
      probability,
      cornell,
      ditlevsen,
      limitStates: nearest.map(({ state }) => states.names[state]),
      correlation: correlationOfModes(nearest),
    },
  };
}

/** Asked about on every wall, whether or not it is the strongest. */
const waterLevel = "water.behind.level";

/** Of the strongest unknown of each limit state, and of the water behind where its level is uncertain. */
function fragilityOf(model: Model, paths: readonly (string | undefined)[], seed: string): readonly FragilityCurve[] {
  const { states, space } = model;
  const asked = space.unknowns.flatMap(({ path }) => (path === waterLevel ? [path] : []));
  const strongest = [...new Set([...asked, ...paths])].filter((path): path is string => path !== undefined);
  return strongest.map((path) => {
    const place = space.unknowns.findIndex((unknown) => unknown.path === path);
    return { path, points: fragilityCurve(states, space, place, { ...curve, seed, event: "system" }) };
  });
}
