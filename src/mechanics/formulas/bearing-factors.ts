/** 0.1°: the drained bearing formulas are not used below this friction angle; a smaller one is taken at it. */
export const leastDrainedFrictionAngle: number = (0.1 * Math.PI) / 180;

/** Nq − 1 without cancellation: tan²(45° + φ/2) = exp(2 asinh(tan φ)). */
function surchargeFactorLessOne(tanPhi: number): number {
  return Math.expm1(Math.PI * tanPhi + 2 * Math.asinh(tanPhi));
}

/**
 * Bearing capacity factor of the surcharge beside the base.
 *
 *   Nq = e^(π tan φ′) tan²(45° + φ′/2)
 *
 * @param frictionAngle φ′, rad, in [0, π/2)
 * @returns dimensionless, 1 at φ′ = 0
 * @source Reissner (1924), after Prandtl (1921)
 */
export function bearingFactorNq(frictionAngle: number): number {
  return 1 + surchargeFactorLessOne(Math.tan(frictionAngle));
}

/**
 * Bearing capacity factor of cohesion.
 *
 *   Nc = (Nq − 1) / tan φ′, in the limit π + 2 at φ′ = 0
 *
 * @param frictionAngle φ′, rad, in [0, π/2)
 * @returns dimensionless
 * @source Prandtl (1921)
 */
export function bearingFactorNc(frictionAngle: number): number {
  const tanPhi = Math.tan(frictionAngle);
  return tanPhi > 0 ? surchargeFactorLessOne(tanPhi) / tanPhi : Math.PI + 2;
}

/**
 * Bearing capacity factor of the soil's own weight: Nγ = 2 (Nq + 1) tan φ′.
 *
 * @param frictionAngle φ′, rad, in [0, π/2)
 * @source Vesić (1973), J. Soil Mech. Found. Div. ASCE 99(1), 45–73
 */
export function bearingFactorNgammaVesic(frictionAngle: number): number {
  const tanPhi = Math.tan(frictionAngle);
  return 2 * (surchargeFactorLessOne(tanPhi) + 2) * tanPhi;
}

/**
 * Bearing capacity factor of the soil's own weight: Nγ = 2 (Nq − 1) tan φ′, rough base.
 *
 * @param frictionAngle φ′, rad, in [0, π/2)
 * @source EN 1997-1:2004, Annex D.4
 */
export function bearingFactorNgammaEn1997(frictionAngle: number): number {
  const tanPhi = Math.tan(frictionAngle);
  return 2 * surchargeFactorLessOne(tanPhi) * tanPhi;
}

/**
 * Bearing capacity factor of the soil's own weight: Nγ = (Nq − 1) tan(1.4 φ′).
 *
 * @param frictionAngle φ′, rad, in [0, π/2.8); 60° is well inside
 * @source Meyerhof (1963), Can. Geotech. J. 1(1), 16–26
 */
export function bearingFactorNgammaMeyerhof(frictionAngle: number): number {
  return surchargeFactorLessOne(Math.tan(frictionAngle)) * Math.tan(1.4 * frictionAngle);
}

/**
 * The bracket that the inclination factors of Vesić and EN 1997-1 are powers of.
 *
 *   1 − H / (N′ + B′ c′ cot φ′), not below 0; 0 where the denominator is not positive
 *
 * @param horizontal H ≥ 0, kN/m
 * @param vertical N′, kN/m
 * @param effectiveWidth B′, m
 * @param cohesion c′, kPa
 * @param cotPhi cot φ′, dimensionless, finite (φ′ at 0.1° or more)
 * @returns dimensionless, in [0, 1]
 * @source Vesić (1973); EN 1997-1:2004, Annex D.4
 */
export function inclinationBase(
  horizontal: number,
  vertical: number,
  effectiveWidth: number,
  cohesion: number,
  cotPhi: number,
): number {
  const resisting = vertical + effectiveWidth * cohesion * cotPhi;
  return resisting > 0 ? Math.max(1 - horizontal / resisting, 0) : 0;
}

/** Inclination factor of the surcharge, strip (m = 2): iq = bracket². @source Vesić (1973); EN 1997-1:2004, Annex D.4 */
export function inclinationNq(bracket: number): number {
  return bracket * bracket;
}

/** Inclination factor of the soil's weight, strip (m + 1 = 3): iγ = bracket³. @source Vesić (1973); EN 1997-1:2004, Annex D.4 */
export function inclinationNgamma(bracket: number): number {
  return bracket * bracket * bracket;
}

/**
 * Inclination factor of cohesion.
 *
 *   ic = iq − (1 − iq) / (Nc tan φ′), not below 0
 *
 * @param iq inclination factor of the surcharge, in [0, 1]
 * @param nc Nc, dimensionless
 * @param tanPhi tan φ′
 * @returns dimensionless, in [0, 1]
 * @source Vesić (1973); EN 1997-1:2004, Annex D.4
 */
export function inclinationNc(iq: number, nc: number, tanPhi: number): number {
  return iq < 1 ? Math.max(iq - (1 - iq) / (nc * tanPhi), 0) : 1;
}

/**
 * Inclination factor of cohesion and surcharge after Meyerhof.
 *
 *   ic = iq = (1 − α/90°)², 0 from 90° on
 *
 * @param loadInclination α = atan(H/N′) from the vertical, rad, 0 or more
 * @returns dimensionless, in [0, 1]
 * @source Meyerhof (1963), Can. Geotech. J. 1(1), 16–26
 */
export function meyerhofInclinationNq(loadInclination: number): number {
  const rest = Math.max(1 - loadInclination / (Math.PI / 2), 0);
  return rest * rest;
}

/**
 * Inclination factor of the soil's weight after Meyerhof.
 *
 *   iγ = (1 − α/φ′)², 0 where α > φ′
 *
 * @param loadInclination α from the vertical, rad, 0 or more
 * @param frictionAngle φ′, rad
 * @returns dimensionless, in [0, 1]
 * @source Meyerhof (1963), Can. Geotech. J. 1(1), 16–26
 */
export function meyerhofInclinationNgamma(loadInclination: number, frictionAngle: number): number {
  if (!(loadInclination > 0)) return 1;
  if (loadInclination >= frictionAngle) return 0;
  const rest = 1 - loadInclination / frictionAngle;
  return rest * rest;
}

/**
 * Inclination factor of the undrained strength.
 *
 *   ic = ½ [1 + √(1 − H/(B′ cu))], the root 0 where H > B′ cu
 *
 * @param horizontal H ≥ 0, kN/m
 * @param effectiveWidth B′, m
 * @param strength cu, kPa
 * @returns dimensionless, in [½, 1]
 * @source EN 1997-1:2004, Annex D.3
 */
export function undrainedInclination(horizontal: number, effectiveWidth: number, strength: number): number {
  if (!(horizontal > 0)) return 1;
  const adhesion = effectiveWidth * strength;
  return horizontal < adhesion ? 0.5 * (1 + Math.sqrt(1 - horizontal / adhesion)) : 0.5;
}
