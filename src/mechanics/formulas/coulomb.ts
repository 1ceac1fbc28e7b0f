import { activeCoefficientMononobeOkabe } from "./mononobe-okabe.ts";

/**
 * Active earth pressure coefficient of a plane wedge, wall friction and inclined back face included.
 *
 *                   cos²(φ′ − θ)
 *   Ka = ─────────────────────────────────────────────────────────────────────────
 *        cos²θ cos(δ + θ) [1 + √( sin(φ′ + δ) sin(φ′ − β) / (cos(δ + θ) cos(θ − β)) )]²
 *
 * The thrust ½ Ka γ H² is inclined δ to the normal of the face: horizontal part Ka cos(δ + θ). Where β > φ′ there is no
 * active state: the root is taken as 0, and the caller marks the evaluation. It is the earthquake formula at ψ = 0, bit
 * for bit, so that the earthquake increment vanishes with kh; cos(δ + θ) is not taken below cos 89°, as there.
 *
 * @param frictionAngle φ′, rad, in [0, π/3]
 * @param wallFriction δ, rad, in [0, π/3]
 * @param backFaceInclination θ from the vertical, rad, in (−π/2, π/2); positive: the foot reaches under the retained soil
 * @param backfillSlope β, rad, in [0, π/3]
 * @returns Ka, dimensionless, 0 or more
 * @source Coulomb (1776); closed form of Müller-Breslau (1906), Erddruck auf Stützmauern
 * @example activeCoefficientCoulomb(Math.PI / 6, Math.PI / 9, 0, 0) // 0.2973
 */
export function activeCoefficientCoulomb(
  frictionAngle: number,
  wallFriction: number,
  backFaceInclination: number,
  backfillSlope: number,
): number {
  return activeCoefficientMononobeOkabe(frictionAngle, wallFriction, backFaceInclination, backfillSlope, 0);
}
