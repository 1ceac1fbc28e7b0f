import { activeCoefficientRankineSloping } from "./rankine.ts";
import { mean, meanOfLine, meanOfPressure, pressureAt } from "./sloping-cohesive-mean.ts";

/*
 * Active pressure of cohesive ground that rises at β, on a vertical plane, parallel to the slope.
 *
 *   p = cos β { [2 cos²β s + 2 c′ cos φ′ sin φ′ − √R] / cos²φ′ − s }
 *   R = 4 cos²β (cos²β − cos²φ′) s² + 8 c′ s cos²β sin φ′ cos φ′ + 4 c′² cos²φ′
 *     = 4 [c′ cos φ′ + s cos β sin(φ′ + β)] [c′ cos φ′ + s cos β sin(φ′ − β)]
 *
 * with the vertical effective stress s for the authors' γz. p turns positive at s* = 2 c′ tan(45° + φ′/2), whatever the
 * slope (with β above 45° and little friction, 2 cos²β < cos²φ′, it may stay negative, or end again). Where R < 0 (β > φ′ and s beyond sLimit = c′ cos φ′ / (cos β sin(β − φ′))) there is no active state: √R is
 * taken as 0 there. At c′ = 0 the pressure is K s with the coefficient of `rankine.ts`, which is the limit c′ → 0 where
 * β ≤ φ′; where β > φ′ the two formulas do not meet with their roots at 0 (K = cos β against
 * cos β (2 cos²β/cos²φ′ − 1)), so the pressure jumps at c′ = 0 on a slope that is unstable anyway, and marked.
 * With L = (2 cos²β − cos²φ′) s + 2 c′ cos φ′ sin φ′ the same p, without cancellation, is
 *
 *   p = cos β cos²φ′ (s − s*) (s + 2 c′ tan(45° − φ′/2)) / (L + √R)
 *
 * Source: Mazindrani and Ganjali (1997), J. Geotech. Geoenviron. Eng. 123(2), 110–112; factors and integrals of R
 * derived here; the means over a stretch are in `sloping-cohesive-mean.ts`. Angles in rad: φ′ and β in [0, π/3]; stresses in kPa.
 */

/** kPa; less than this counts as none, so that products of it do not underflow. */
const leastCohesion = 1e-100;

/** Vertical stress at which the pressure turns positive, 2 c′ tan(45° + φ′/2). */
function turningStress(cohesion: number, sinPhi: number, cosPhi: number): number {
  return (2 * cohesion * (1 + sinPhi)) / cosPhi;
}

/**
 * Active pressure along the slope; negative above the depth where it turns positive.
 *
 * @param verticalStress s, kPa; below 0 taken as 0
 * @param cohesion c′, kPa, 0 or more
 * @param frictionAngle φ′, rad, in [0, π/3]
 * @param backfillSlope β, rad, in [0, π/3]
 * @returns p, kPa; horizontal part p cos β, vertical part p sin β
 * @source Mazindrani and Ganjali (1997), J. Geotech. Geoenviron. Eng. 123(2), 110–112
 */
export function slopingCohesivePressure(
  verticalStress: number,
  cohesion: number,
  frictionAngle: number,
  backfillSlope: number,
): number {
  const s = Math.max(verticalStress, 0);
  if (!(cohesion > leastCohesion)) return activeCoefficientRankineSloping(frictionAngle, backfillSlope) * s;
  const sinPhi = Math.sin(frictionAngle);
  const cosPhi = Math.cos(frictionAngle);
  const excess = s - turningStress(cohesion, sinPhi, cosPhi);
  return pressureAt(s, excess, cohesion, sinPhi, cosPhi, Math.sin(backfillSlope), Math.cos(backfillSlope));
}

/**
 * Whether the radicand is negative anywhere between 0 and a vertical stress, that is, whether there is ground without an
 * active state.
 *
 *   c′ cos φ′ < s cos β sin(β − φ′)
 */
export function slopeUnstable(
  verticalStressMax: number,
  cohesion: number,
  frictionAngle: number,
  backfillSlope: number,
): boolean {
  const needed = verticalStressMax * Math.cos(backfillSlope) * Math.sin(backfillSlope - frictionAngle);
  return needed > cohesion * Math.cos(frictionAngle);
}

/**
 * Force along the slope of the positive pressure on a stretch of plane.
 *
 *   F = ∫ max(p, 0) dx, s in a straight line from s0 (top) to s1 (bottom) over `length`
 *
 * Exact: relative error below 1e-11, but for what rounding of s and of the angles moves by itself
 * (tests/outside/sloping-cohesive-ground).
 *
 * @param s0 vertical stress at the top, kPa
 * @param s1 vertical stress at the bottom, kPa; may equal s0 or lie below it
 * @param length m
 * @returns kN/m, 0 or more
 */
export function slopingCohesiveForce(
  s0: number,
  s1: number,
  length: number,
  cohesion: number,
  frictionAngle: number,
  backfillSlope: number,
): number {
  slopingCohesiveThrust(result, s0, s1, length, cohesion, frictionAngle, backfillSlope);
  return result[0];
}

/**
 * Moment of that force, still along the slope, about the bottom end of the stretch: ∫ max(p, 0) (length − x) dx.
 *
 * @returns kNm/m, 0 or more; times cos β for the horizontal part
 */
export function slopingCohesiveMoment(
  s0: number,
  s1: number,
  length: number,
  cohesion: number,
  frictionAngle: number,
  backfillSlope: number,
): number {
  slopingCohesiveThrust(result, s0, s1, length, cohesion, frictionAngle, backfillSlope);
  return result[1];
}

const result: Float64Array = new Float64Array(2);
/**
 * Force and moment in one go, for half the time of the two.
 *
 * @param into [0] becomes the force, [1] the moment
 */
export function slopingCohesiveThrust(
  into: Float64Array,
  s0: number,
  s1: number,
  length: number,
  cohesion: number,
  frictionAngle: number,
  backfillSlope: number,
): void {
  const c = cohesion > leastCohesion ? cohesion : 0;
  const sinPhi = Math.sin(frictionAngle);
  const cosPhi = Math.cos(frictionAngle);
  const sinBeta = Math.sin(backfillSlope);
  const cosBeta = Math.cos(backfillSlope);
  const turning = turningStress(c, sinPhi, cosPhi);
  // p with the root at 0 is start + slope·s; where it falls it ends at −start/slope, and may never have been positive
  const slope = (cosBeta * (2 * cosBeta * cosBeta - cosPhi * cosPhi)) / (cosPhi * cosPhi);
  const start = (2 * c * cosBeta * sinPhi) / cosPhi;
  const end = c > 0 && slope < 0 ? -start / slope : Infinity;

  const low = Math.min(s0, s1);
  const high = Math.max(s0, s1);
  const sa = Math.max(low, turning);
  const sb = Math.min(high, end);
  into[0] = 0;
  into[1] = 0;
  if (!(high > turning && sb >= sa && length > 0)) return;
  if (c > 0) meanOfPressure(sa, sb, turning, c, sinPhi, cosPhi, sinBeta, cosBeta, start, slope);
  else {
    const k = activeCoefficientRankineSloping(frictionAngle, backfillSlope);
    meanOfLine(k * sa, k * sb);
  }
  const from = sa > low ? (sa - low) / (high - low) : 0;
  const to = sb < high ? (sb - low) / (high - low) : 1;
  const positive = length * (to - from);
  // height above the bottom end: where stress rises downwards it falls with ξ from length (1 − from), else it rises
  const height =
    s1 >= s0 ? length * (1 - from) * mean[0] - positive * mean[1] : length * from * mean[0] + positive * mean[1];
  into[0] = Math.max(positive * mean[0], 0);
  into[1] = Math.max(positive * height, 0);
}
