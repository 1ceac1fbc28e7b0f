import { gaussLegendre } from "../../numeric/gauss-legendre.ts";
import { activeCoefficientRankineSloping } from "./rankine.ts";

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
 * derived here. Angles in rad: φ′ and β in [0, π/3]; stresses in kPa.
 */

const { nodes, weights } = gaussLegendre(16);

/** kPa; less than this counts as none, so that products of it do not underflow. */
const leastCohesion = 1e-100;

/** Vertical stress at which the pressure turns positive, 2 c′ tan(45° + φ′/2). */
function turningStress(cohesion: number, sinPhi: number, cosPhi: number): number {
  return (2 * cohesion * (1 + sinPhi)) / cosPhi;
}

/** p at a vertical stress s ≥ 0; `excess` is s − s*, passed in so that it stays exact near s*. */
function pressureAt(
  s: number,
  excess: number,
  c: number,
  sinPhi: number,
  cosPhi: number,
  sinBeta: number,
  cosBeta: number,
): number {
  const straight = (2 * cosBeta * cosBeta - cosPhi * cosPhi) * s + 2 * c * cosPhi * sinPhi;
  const unstable = (cosBeta * straight) / (cosPhi * cosPhi);
  const b = c * cosPhi + s * cosBeta * (sinPhi * cosBeta - cosPhi * sinBeta);
  if (!(b > 0)) return unstable;
  const a = c * cosPhi + s * cosBeta * (sinPhi * cosBeta + cosPhi * sinBeta);
  const denominator = straight + 2 * Math.sqrt(a * b);
  if (!(denominator > 0)) return Math.min(unstable, 0);
  const other = (2 * c * cosPhi) / (1 + sinPhi);
  return Math.min((cosBeta * cosPhi * cosPhi * excess * (s + other)) / denominator, unstable);
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
  return Math.max(weighted(s0, s1, length, cohesion, frictionAngle, backfillSlope, false), 0);
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
  return Math.max(weighted(s0, s1, length, cohesion, frictionAngle, backfillSlope, true), 0);
}

/**
 * ∫ max(p, 0) h dx with h = 1, or h the height above the bottom end: the length under positive pressure times the mean of
 * p h over it. The mean is taken over s from sa to sb, ξ from 0 to 1, with h = h0 + h1 ξ.
 */
function weighted(
  s0: number,
  s1: number,
  length: number,
  c: number,
  phi: number,
  beta: number,
  moment: boolean,
): number {
  const sinPhi = Math.sin(phi);
  const cosPhi = Math.cos(phi);
  const sinBeta = Math.sin(beta);
  const cosBeta = Math.cos(beta);
  const turning = turningStress(c, sinPhi, cosPhi);
  const cohesive = c > leastCohesion;
  // p with the root at 0 is start + slope·s; where it falls it ends at −start/slope, and may never have been positive
  const slope = (cosBeta * (2 * cosBeta * cosBeta - cosPhi * cosPhi)) / (cosPhi * cosPhi);
  const start = (2 * c * cosBeta * sinPhi) / cosPhi;
  if (cohesive && start + slope * turning < 0) return 0;
  const end = cohesive && slope < 0 ? -start / slope : Infinity;

  const low = Math.min(s0, s1);
  const high = Math.max(s0, s1);
  const sa = Math.max(low, turning);
  const sb = Math.min(high, end);
  if (!(high > turning && sb >= sa && length > 0)) return 0;
  const from = sa > low ? (sa - low) / (high - low) : 0;
  const to = sb < high ? (sb - low) / (high - low) : 1;
  const positive = length * (to - from);
  const h0 = moment ? length * (s1 >= s0 ? 1 - from : from) : 1;
  const h1 = moment ? (s1 >= s0 ? -positive : positive) : 0;
  if (!cohesive) return positive * activeCoefficientRankineSloping(phi, beta) * meanOfLine(sa, sb, h0, h1);

  const limit =
    sinBeta * cosPhi > cosBeta * sinPhi ? (c * cosPhi) / (cosBeta * (sinBeta * cosPhi - cosBeta * sinPhi)) : Infinity;
  if (sb <= limit)
    return positive * meanWithActiveState(sa, sb, turning, c, sinPhi, cosPhi, sinBeta, cosBeta, limit, h0, h1);
  if (sa >= limit) return positive * meanOfLine(start + slope * sa, start + slope * sb, h0, h1);
  const share = (limit - sa) / (sb - sa);
  const above = meanWithActiveState(sa, limit, turning, c, sinPhi, cosPhi, sinBeta, cosBeta, limit, h0, h1 * share);
  const below = meanOfLine(start + slope * limit, start + slope * sb, h0 + h1 * share, h1 * (1 - share));
  return positive * (share * above + (1 - share) * below);
}

/** ∫₀¹ (pa + (pb − pa) ξ) (h0 + h1 ξ) dξ. */
function meanOfLine(pa: number, pb: number, h0: number, h1: number): number {
  return (h0 * (pa + pb)) / 2 + (h1 * (pa + 2 * pb)) / 6;
}

/**
 * Mean of p (h0 + h1 ξ) over s from sa to sb, R ≥ 0 throughout.
 *
 * R has the roots −r1 ≤ 0 and −r1 − D/a. With y = √(s + r1), √R ds = 2 y² √(a y² + D) dy, so that
 * - where the second root is far away, or the stretch is short beside its distance, the integrand is smooth in y, and
 *   16 Gauss–Legendre points are exact to rounding (error below 1e-14: the nearest singularity lies outside the ellipse
 *   of half-axes sum 2.8, and 2.8⁻³² = 5e-15);
 * - where a < 0 and the stretch comes near the second root, y = √(D/|a|) sin t makes the integrand a polynomial in sin t
 *   and cos t, and the same rule serves in t;
 * - elsewhere (a > 0, long stretch) the closed form does not cancel.
 */
function meanWithActiveState(
  sa: number,
  sb: number,
  turning: number,
  c: number,
  sinPhi: number,
  cosPhi: number,
  sinBeta: number,
  cosBeta: number,
  limit: number,
  h0: number,
  h1: number,
): number {
  const sinSum = sinPhi * cosBeta + cosPhi * sinBeta;
  const a = 4 * cosBeta * cosBeta * sinSum * (sinPhi * cosBeta - cosPhi * sinBeta);
  const D = 8 * c * cosBeta * cosPhi * cosPhi * sinBeta;
  const far = 1e3 * sb; // a root farther away than this no longer matters, and would cost digits
  const root = c * cosPhi < far * cosBeta * sinSum ? (c * cosPhi) / (cosBeta * sinSum) : far;
  const ya = Math.sqrt(sa + root);
  const yb = Math.sqrt(sb + root);
  if (a * yb * yb > 2 * D && yb > 3 * ya) return meanClosed(sa, sb, ya, yb, a, D, c, sinPhi, cosPhi, cosBeta, h0, h1);

  const inT = a < 0 && -a * yb * yb > 0.5 * D;
  const from = inT ? Math.atan2(ya, Math.sqrt(Math.max(limit - sa, 0))) : ya;
  const to = inT ? Math.atan2(yb, Math.sqrt(Math.max(limit - sb, 0))) : yb;
  if (inT && !(to - from > 1e-8)) {
    const pa = pressureAt(sa, sa - turning, c, sinPhi, cosPhi, sinBeta, cosBeta);
    return meanOfLine(pa, pressureAt(sb, sb - turning, c, sinPhi, cosPhi, sinBeta, cosBeta), h0, h1);
  }
  const whole = inT ? Math.sin(to - from) * Math.sin(to + from) : 1;
  let sum = 0;
  let sumOfWeights = 0;
  for (let i = 0; i < 16; i++) {
    const u = (1 + nodes[i]) / 2;
    const at = from + u * (to - from);
    const xi = inT ? (Math.sin(at - from) * Math.sin(at + from)) / whole : (u * (at + from)) / (to + from);
    const w = weights[i] * (inT ? Math.sin(at) * Math.cos(at) : at); // ds = 2 y dy
    const step = xi * (sb - sa);
    const p = pressureAt(sa + step, sa - turning + step, c, sinPhi, cosPhi, sinBeta, cosBeta);
    sum += w * p * (h0 + h1 * xi);
    sumOfWeights += w;
  }
  return sum / sumOfWeights;
}

/** ∫ y² √(a y² + D) dy with d = D/a: q y (y²/4 + d/8) − (d² √a / 8) asinh(y/√d), q = √(a y² + D). */
function integralY2(y: number, a: number, D: number): number {
  const d = D / a;
  const square = d * d;
  const tail = square > 0 ? (square * Math.sqrt(a) * Math.asinh(y / Math.sqrt(d))) / 8 : 0;
  return Math.sqrt(a * y * y + D) * y * ((y * y) / 4 + d / 8) - tail;
}

/** The mean by the closed form; with F2 = ∫ y² q dy, ∫ y⁴ q dy = y³ q³/(6a) − (d/2) F2. */
function meanClosed(
  sa: number,
  sb: number,
  ya: number,
  yb: number,
  a: number,
  D: number,
  c: number,
  sinPhi: number,
  cosPhi: number,
  cosBeta: number,
  h0: number,
  h1: number,
): number {
  const d = D / a;
  const fa = integralY2(ya, a, D);
  const fb = integralY2(yb, a, D);
  const ga = (ya * ya * ya * Math.sqrt(a * ya * ya + D) * (ya * ya + d)) / 6 - (d / 2) * fa;
  const gb = (yb * yb * yb * Math.sqrt(a * yb * yb + D) * (yb * yb + d)) / 6 - (d / 2) * fb;
  const span = sb - sa;
  const meanRoot = (2 * (fb - fa)) / span;
  const meanRootXi = (2 * (gb - ga - ya * ya * (fb - fa))) / (span * span);
  const slope = 2 * cosBeta * cosBeta - cosPhi * cosPhi;
  const start = 2 * c * cosPhi * sinPhi;
  const straight = meanOfLine(start + slope * sa, start + slope * sb, h0, h1);
  return (cosBeta * (straight - h0 * meanRoot - h1 * meanRootXi)) / (cosPhi * cosPhi);
}
