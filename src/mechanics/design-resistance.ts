/** Resistance of the base to given forces: the formulas of sliding and bearing, outside the kernel's columns. */
import type { CheckResult } from "../results.ts";
import type { Quantity, Study } from "../study/study.ts";
import {
  bearingFactorNc,
  bearingFactorNgammaEn1997,
  bearingFactorNgammaMeyerhof,
  bearingFactorNgammaVesic,
  bearingFactorNq,
  inclinationBase,
  inclinationNc,
  inclinationNgamma,
  inclinationNq,
  leastDrainedFrictionAngle,
  meyerhofInclinationNgamma,
  meyerhofInclinationNq,
  undrainedInclination,
} from "./formulas/bearing-factors.ts";
import { unitWeightBelow } from "./stages/bearing.ts";
import { compressedLength, drainedResistance, undrainedResistance } from "./stages/sliding.ts";

/** What the base stands on, in numbers; radians. */
export interface BaseGround {
  readonly width: number;
  readonly undrained: boolean;
  readonly tanBaseFriction: number;
  readonly adhesion: number;
  readonly frictionAngle: number;
  /** c′, or c_u where undrained. */
  readonly cohesion: number;
  readonly unitWeight: number;
  readonly saturatedUnitWeight: number;
  /** Depth of the water below the underside; ∞ where dry. */
  readonly waterDepth: number;
  /** q0, effective stress beside the base. */
  readonly surcharge: number;
  readonly bearing: Study["model"]["bearing"];
  /** model.factors.base_resistance and bearing_capacity. */
  readonly baseFactor: number;
  readonly bearingFactor: number;
}

/** Forces on the base: N′, H (towards the front) and B′. */
export interface BaseLoad {
  readonly normal: number;
  readonly horizontal: number;
  readonly effectiveWidth: number;
}

/**
 * From a study whose quantities are all numbers, and the check of it.
 *
 * @throws RangeError where a quantity is still uncertain
 */
export function baseGroundOf(study: Study, check: CheckResult): BaseGround {
  const soil = study.soils[study.ground.below.soil];
  const undrained = soil.drainage === "undrained";
  const friction = study.wall.slidingFriction;
  const frictionAngle = undrained ? 0 : radians(soil.frictionAngle);
  const underside = certain(study.wall.undersideLevel);
  const water = study.water.front ?? study.water.behind;
  const q0 = check.sheet.find(({ heading, symbol }) => heading === "Bearing" && symbol === "q0");
  return {
    width: check.section.baseWidth,
    undrained,
    tanBaseFriction:
      friction?.ratio !== undefined
        ? Math.tan(certain(friction.ratio) * frictionAngle)
        : friction?.angle !== undefined
          ? Math.tan(radians(friction.angle))
          : 0,
    adhesion: friction === undefined ? 0 : certain(friction.adhesion),
    frictionAngle,
    cohesion: undrained ? certain(soil.undrainedStrength ?? 0) : certain(soil.cohesion),
    unitWeight: certain(soil.unitWeight),
    saturatedUnitWeight: certain(soil.saturatedUnitWeight ?? certain(soil.unitWeight) + 2),
    waterDepth: water === undefined ? Number.POSITIVE_INFINITY : Math.max(underside - certain(water.level), 0),
    surcharge: q0?.value ?? 0,
    bearing: study.model.bearing,
    baseFactor: certain(study.model.factors.baseResistance),
    bearingFactor: certain(study.model.factors.bearingCapacity),
  };
}

function certain(quantity: Quantity): number {
  if (typeof quantity !== "number") throw new RangeError("a design study holds numbers alone");
  return quantity;
}

const radians = (angle: Quantity): number => (certain(angle) * Math.PI) / 180;

/** Resistance of the base to sliding without passive resistance, kN/m; 0 without contact. */
export function baseResistance(ground: BaseGround, { normal, effectiveWidth }: BaseLoad): number {
  if (!(normal > 0)) return 0;
  if (ground.undrained) return undrainedResistance(ground.cohesion, effectiveWidth, ground.baseFactor, 0);
  const length = compressedLength(effectiveWidth, ground.width);
  return drainedResistance(normal, ground.tanBaseFriction, ground.adhesion, length, ground.baseFactor, 0);
}

const ngammaOf = {
  vesic: bearingFactorNgammaVesic,
  en1997: bearingFactorNgammaEn1997,
  meyerhof: bearingFactorNgammaMeyerhof,
} as const;

/**
 * Bearing capacity under a load, kPa:
 *
 *   c′ Nc ic + q0 Nq iq + ½ γ′ B′ Nγ iγ, undrained (π + 2) c_u ic + q0
 */
export function bearingCapacity(ground: BaseGround, load: BaseLoad): number {
  const { cohesion, surcharge, bearingFactor } = ground;
  const [horizontal, width] = [Math.max(load.horizontal, 0), Math.max(load.effectiveWidth, 0)];
  if (ground.undrained) {
    const ic = undrainedInclination(horizontal, width, cohesion);
    return bearingFactor * ((Math.PI + 2) * cohesion * ic + surcharge);
  }
  const phi = Math.max(ground.frictionAngle, leastDrainedFrictionAngle);
  const [nq, nc, ngamma] = [bearingFactorNq(phi), bearingFactorNc(phi), ngammaOf[ground.bearing](phi)];
  const { iq, igamma, ic } = inclinationFactors(ground, { ...load, horizontal }, phi, nc);
  const unitWeight = Number.isFinite(ground.waterDepth)
    ? unitWeightBelow(ground.unitWeight, ground.saturatedUnitWeight, ground.waterDepth, width)
    : ground.unitWeight;
  const sum = cohesion * nc * ic + surcharge * nq * iq + 0.5 * unitWeight * width * ngamma * igamma;
  return bearingFactor * Math.max(sum, 0);
}

function inclinationFactors(
  { bearing, cohesion }: BaseGround,
  { normal, horizontal, effectiveWidth }: BaseLoad,
  phi: number,
  nc: number,
): { iq: number; igamma: number; ic: number } {
  if (bearing === "meyerhof") {
    const inclination = normal > 0 ? Math.atan(horizontal / normal) : Math.PI / 2;
    const iq = meyerhofInclinationNq(inclination);
    return { iq, ic: iq, igamma: meyerhofInclinationNgamma(inclination, phi) };
  }
  const bracket = inclinationBase(horizontal, normal, effectiveWidth, cohesion, 1 / Math.tan(phi));
  const iq = inclinationNq(bracket);
  return { iq, igamma: inclinationNgamma(bracket), ic: inclinationNc(iq, nc, Math.tan(phi)) };
}
