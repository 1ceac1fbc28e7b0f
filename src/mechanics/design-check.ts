/**
 * A check with partial factors: forces of a check at design strengths times action factors, against resistances over theirs.
 *
 * Which factor a force takes:
 *
 *   group of the force             factor
 *   weight, earth, water           permanent, unfavourable or favourable
 *   surcharge (loads)              variable where unfavourable, left out where favourable
 *   inertia, earthquake increment  1: an earthquake is a situation of its own
 *   front (passive resistance)     no action: resistance, divided by `passive`
 *
 * A force has one factor, for all of it and its moments, since it has one cause. Whether it is unfavourable is judged for each
 * limit state: in sliding by H − V tan δ, in overturning by its moment about the toe. Vertical forces may be unfavourable to
 * bearing and eccentricity either way; so both are tried, weights unfavourable and weights favourable, and the smaller ratio
 * counts; horizontal forces towards the front are unfavourable there, those against it favourable. Under sloping ground with
 * cohesion the pressure is not linear in the load: the surcharge stays in the earth thrust and takes the permanent factor.
 */
import type { CheckResult, Force, LimitStateCheck } from "../results.ts";
import type { LimitStateName } from "../study/study.ts";
import { type BaseGround, type BaseLoad, baseResistance, bearingCapacity } from "./design-resistance.ts";
import type { PartialFactors } from "./partial-factors.ts";
import { cappedRatio } from "./stages/base.ts";

export interface DesignLimitState {
  /** Design resistance over design action; the requirement is met from 1 on. Between 0 and the cap. */
  readonly ratio: number;
  readonly resisting: number;
  readonly driving: number;
  readonly unit: string;
  /** The factor that each force took here, in the order of the check's forces; passive resistance as 1 over its own. */
  readonly forceFactors: readonly number[];
  /** Of bearing and eccentricity: which way of the weights gave the smaller ratio. */
  readonly weights?: "favourable" | "unfavourable";
}

export interface DesignCheck {
  readonly factors: PartialFactors;
  /** Forces of the check at design strengths, before action factors. */
  readonly forces: readonly Force[];
  readonly limitStates: Readonly<Partial<Record<LimitStateName, DesignLimitState>>>;
}

export interface DesignSetting {
  readonly ground: BaseGround;
  /** Whether passive resistance stabilises against overturning. */
  readonly passiveInOverturning: boolean;
  /** `assessment.eccentricity_limit`. */
  readonly eccentricityLimit?: number;
  /** Deep-seated failure at design strengths and with variable loads factored; its weights, which drive and resist, take 1. */
  readonly deepSeated?: LimitStateCheck;
}

/**
 * @param check at design strengths (of `designStudy`)
 */
export function designCheck(check: CheckResult, setting: DesignSetting, factors: PartialFactors): DesignCheck {
  const { forces } = check;
  const limitStates: Partial<Record<LimitStateName, DesignLimitState>> = {};
  for (const name of Object.keys(check.limitStates) as LimitStateName[]) {
    if (name === "sliding") limitStates.sliding = sliding(forces, setting, factors);
    if (name === "overturning") limitStates.overturning = overturning(forces, setting, factors);
    if (name === "bearing") limitStates.bearing = smaller((weights) => bearing(forces, setting, factors, weights));
    if (name === "eccentricity")
      limitStates.eccentricity = smaller((weights) => eccentricity(forces, setting, factors, weights));
    if (name === "deep_seated" && setting.deepSeated !== undefined) {
      const { factorOfSafety, resisting, driving, unit } = setting.deepSeated;
      limitStates.deep_seated = { ratio: factorOfSafety, resisting, driving, unit, forceFactors: [] };
    }
  }
  return { factors, forces, limitStates };
}

/** Factor of one force, by its group and by whether it is unfavourable here. */
export function actionFactor(force: Force, unfavourable: boolean, { actions, resistance }: PartialFactors): number {
  if (force.group === "front") return 1 / resistance.passive;
  if (force.group === "inertia" || force.name === "Earthquake increment") return 1;
  if (force.group === "surcharge") return unfavourable ? actions.variable : 0;
  return unfavourable ? actions.permanentUnfavourable : actions.permanentFavourable;
}

interface Sums extends BaseLoad {
  readonly resultantX: number;
  readonly stabilising: number;
  readonly overturning: number;
  /** Passive resistance over its factor, positive. */
  readonly passive: number;
}

/** Forces times their factors, as the base sums them: passive resistance apart, the uplift among what overturns. */
function sumsOf(forces: readonly Force[], factors: readonly number[], setting: DesignSetting): Sums {
  let [normal, horizontal, stabilising, overturns, passive] = [0, 0, 0, 0, 0];
  forces.forEach((force, i) => {
    const [across, down] = [factors[i] * force.horizontal, factors[i] * force.vertical];
    if (force.group === "front") {
      passive -= across;
      if (setting.passiveInOverturning) stabilising -= across * force.z;
      return;
    }
    normal += down;
    horizontal += across;
    overturns += across * force.z;
    if (force.group === "water" && down < 0) overturns -= down * force.x;
    else stabilising += down * force.x;
  });
  const resultantX = normal > 0 ? (stabilising - overturns) / normal : 0;
  const effectiveWidth = 2 * Math.min(resultantX, setting.ground.width - resultantX);
  return { normal, horizontal, stabilising, overturning: overturns, passive, resultantX, effectiveWidth };
}

function factorsBy(
  forces: readonly Force[],
  factors: PartialFactors,
  unfavourable: (force: Force) => boolean,
): readonly number[] {
  return forces.map((force) => actionFactor(force, unfavourable(force), factors));
}

function sliding(forces: readonly Force[], setting: DesignSetting, factors: PartialFactors): DesignLimitState {
  const { ground } = setting;
  const friction = ground.undrained ? 0 : ground.baseFactor * ground.tanBaseFriction;
  const forceFactors = factorsBy(forces, factors, ({ horizontal, vertical }) => horizontal - vertical * friction > 0);
  const sums = sumsOf(forces, forceFactors, setting);
  const resisting = baseResistance(ground, sums) / factors.resistance.sliding + sums.passive;
  const ratio = sums.normal > 0 ? cappedRatio(resisting, sums.horizontal) : 0;
  return { ratio, resisting, driving: sums.horizontal, unit: "kN/m", forceFactors };
}

function overturning(forces: readonly Force[], setting: DesignSetting, factors: PartialFactors): DesignLimitState {
  const forceFactors = factorsBy(
    forces,
    factors,
    ({ horizontal, vertical, x, z }) => horizontal * z - vertical * x > 0,
  );
  const { stabilising, overturning: driving } = sumsOf(forces, forceFactors, setting);
  return { ratio: cappedRatio(stabilising, driving), resisting: stabilising, driving, unit: "kNm/m", forceFactors };
}

type Weights = "favourable" | "unfavourable";

/** Vertical forces by the way of the weights (uplift the other way), all that pushes towards the front unfavourable. */
function withWeights(forces: readonly Force[], factors: PartialFactors, weights: Weights): readonly number[] {
  return factorsBy(forces, factors, ({ horizontal, vertical }) =>
    horizontal !== 0 ? horizontal > 0 : vertical > 0 === (weights === "unfavourable"),
  );
}

function bearing(
  forces: readonly Force[],
  setting: DesignSetting,
  factors: PartialFactors,
  weights: Weights,
): DesignLimitState {
  const forceFactors = withWeights(forces, factors, weights);
  const sums = sumsOf(forces, forceFactors, setting);
  const inContact = sums.normal > 0 && sums.effectiveWidth > 0;
  const resisting = inContact ? bearingCapacity(setting.ground, sums) / factors.resistance.bearing : 0;
  const driving = inContact ? sums.normal / sums.effectiveWidth : 0;
  const ratio = inContact ? cappedRatio(resisting, driving) : 0;
  return { ratio, resisting, driving, unit: "kPa", forceFactors, weights };
}

function eccentricity(
  forces: readonly Force[],
  setting: DesignSetting,
  factors: PartialFactors,
  weights: Weights,
): DesignLimitState {
  const { ground, eccentricityLimit = 0 } = setting;
  const forceFactors = withWeights(forces, factors, weights);
  const sums = sumsOf(forces, forceFactors, setting);
  const resisting = eccentricityLimit * ground.width;
  const driving = Math.abs(ground.width / 2 - sums.resultantX);
  const ratio = sums.normal > 0 && sums.effectiveWidth > 0 ? cappedRatio(resisting, driving) : 0;
  return { ratio, resisting, driving, unit: "m", forceFactors, weights };
}

function smaller(of: (weights: Weights) => DesignLimitState): DesignLimitState {
  const [favourable, unfavourable] = [of("favourable"), of("unfavourable")];
  return unfavourable.ratio < favourable.ratio ? unfavourable : favourable;
}
