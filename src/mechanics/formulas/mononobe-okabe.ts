/** 89°: the largest seismic angle; also the largest inclination of the thrust to the horizontal that a closed form is given. */
export const largestSeismicAngle: number = (89 * Math.PI) / 180;

/** cos 89°: the least cosine of the thrust's inclination in the closed forms; keeps them finite. */
export const leastCosine: number = Math.cos(largestSeismicAngle);

/**
 * Angle by which inertia turns the resultant body force of the soil from the vertical.
 *
 *   ψ = atan( kh / (1 − kv) · m ),   m = 1 above the water level, `submergedMassRatio` below it
 *
 * Below water the pore water moves with the soil: inertia acts on γsat, gravity on the buoyant weight (EN 1998-5,
 * Annex E). ψ is not taken above 89°, and at 89° where m is negative or not a number or kv ≥ 1; kh ≤ 0 gives 0.
 *
 * @param kh horizontal pseudo-static coefficient, dimensionless, 0 or more
 * @param kv vertical coefficient, positive upwards (it lightens the soil), dimensionless
 * @param massRatio m, dimensionless
 * @returns ψ, rad, in [0, 89°]
 */
export function seismicAngle(kh: number, kv: number, massRatio: number): number {
  if (!(kh > 0)) return 0;
  const gravity = 1 - kv;
  if (!(massRatio > 0 && gravity > 0)) return largestSeismicAngle;
  return Math.min(Math.atan((kh / gravity) * massRatio), largestSeismicAngle);
}

/**
 * Ratio of the mass that inertia moves to the weight that gravity leaves, below the water level.
 *
 *   m = γsat / (γsat − γw), not above 1e6, which stands for all soils without buoyant weight (γsat ≤ γw)
 *
 * It is finite so that ψ still goes to 0 with kh.
 *
 * @param saturatedUnitWeight γsat, kN/m³
 * @param waterUnitWeight γw, kN/m³
 * @returns m, dimensionless, in (1, 1e6]
 * @source EN 1998-5:2004, Annex E, E.6 (impervious soil below the water table)
 */
export function submergedMassRatio(saturatedUnitWeight: number, waterUnitWeight: number): number {
  const buoyant = saturatedUnitWeight - waterUnitWeight;
  return buoyant > 0 ? Math.min(saturatedUnitWeight / buoyant, 1e6) : 1e6;
}

/**
 * Active earth pressure coefficient under earthquake, static part included.
 *
 *                         cos²(φ′ − θ − ψ)
 *   KAE = ───────────────────────────────────────────────────────────────────────────────────
 *         cos ψ cos²θ cos(δ + θ + ψ) [1 + √( sin(δ + φ′) sin(φ′ − β − ψ) / (cos(δ + θ + ψ) cos(θ − β)) )]²
 *
 * computed with cos(δ + θ + ψ) drawn into the bracket. The thrust is ½ γ H² (1 − kv) KAE, inclined δ to the normal of
 * the face. Where β + ψ > φ′ there is no solution: the root is taken as 0, and the caller marks the evaluation.
 * cos(δ + θ + ψ) and cos ψ are not taken below cos 89°, so the result is finite (below 7e3 for θ up to 45°).
 *
 * @param frictionAngle φ′, rad, in [0, π/3]
 * @param wallFriction δ, rad, in [0, π/3]
 * @param backFaceInclination θ from the vertical, rad, in (−π/2, π/2); positive: the foot reaches under the retained soil
 * @param backfillSlope β, rad, in [0, π/3]
 * @param seismicAngle ψ, rad, in [0, 89°]
 * @returns KAE, dimensionless, 0 or more
 * @source Okabe (1926); Mononobe and Matsuo (1929); in the form of EN 1998-5:2004, Annex E, E.4
 */
export function activeCoefficientMononobeOkabe(
  frictionAngle: number,
  wallFriction: number,
  backFaceInclination: number,
  backfillSlope: number,
  seismicAngle: number,
): number {
  const c = Math.cos(frictionAngle - backFaceInclination - seismicAngle);
  const cosTheta = Math.cos(backFaceInclination);
  const cosThrust = Math.max(Math.cos(wallFriction + backFaceInclination + seismicAngle), leastCosine);
  const cosSeismic = Math.max(Math.cos(seismicAngle), leastCosine);
  const radicand =
    (Math.sin(wallFriction + frictionAngle) * Math.sin(frictionAngle - backfillSlope - seismicAngle)) /
    Math.cos(backFaceInclination - backfillSlope);
  const bracket = Math.sqrt(cosThrust) + (radicand > 0 ? Math.sqrt(radicand) : 0);
  return (c * c) / (cosSeismic * cosTheta * cosTheta * bracket * bracket);
}
