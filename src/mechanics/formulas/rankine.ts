/**
 * Active earth pressure coefficient, level ground, smooth vertical plane.
 *
 *   Ka = tan²(45° − φ′/2) = (1 − sin φ′) / (1 + sin φ′)
 *
 * @param frictionAngle effective friction angle φ′, rad, in [0, π/2)
 * @returns Ka, dimensionless, in (0, 1]
 * @source Rankine (1857), Phil. Trans. R. Soc. 147, 9–27
 * @example activeCoefficientRankine(Math.PI / 6) // 0.3333
 */
export function activeCoefficientRankine(frictionAngle: number): number {
  const s = Math.sin(frictionAngle);
  return (1 - s) / (1 + s);
}

/**
 * Square root of the active coefficient, the factor of 2 c′ in the pressure of a cohesive soil.
 *
 *   √Ka = tan(45° − φ′/2) = cos φ′ / (1 + sin φ′), exactly 1 at φ′ = 0
 *
 * @param frictionAngle effective friction angle φ′, rad, in [0, π/2)
 * @returns √Ka, dimensionless, in (0, 1]
 * @source Rankine (1857); cohesion after Bell (1915), Min. Proc. Instn Civ. Engrs 199, 233–272
 */
export function rootActiveCoefficientRankine(frictionAngle: number): number {
  return Math.cos(frictionAngle) / (1 + Math.sin(frictionAngle));
}

/**
 * Passive earth pressure coefficient, level ground, smooth vertical plane.
 *
 *   Kp = tan²(45° + φ′/2) = (1 + sin φ′) / (1 − sin φ′) = 1 / Ka
 *
 * @param frictionAngle effective friction angle φ′, rad, in [0, π/2)
 * @returns Kp, dimensionless, 1 or more (13.93 at 60°)
 * @source Rankine (1857), Phil. Trans. R. Soc. 147, 9–27
 */
export function passiveCoefficientRankine(frictionAngle: number): number {
  const s = Math.sin(frictionAngle);
  return (1 + s) / (1 - s);
}

/**
 * Active earth pressure coefficient of ground without cohesion that rises at β; the pressure on a vertical plane acts
 * parallel to the slope.
 *
 *   K = cos β · (cos β − r) / (cos β + r),   r = √(cos²β − cos²φ′) = √(sin(φ′ + β) sin(φ′ − β))
 *
 * Where β > φ′ there is no active state: r is taken as 0, so K = cos β, and the caller marks the evaluation.
 *
 * @param frictionAngle effective friction angle φ′, rad, in [0, π/2)
 * @param backfillSlope β, rad, in [0, π/2)
 * @returns K along the slope: p = K σ′v, horizontal part p cos β, vertical part p sin β
 * @source Rankine (1857), Phil. Trans. R. Soc. 147, 9–27
 */
export function activeCoefficientRankineSloping(frictionAngle: number, backfillSlope: number): number {
  const cosBeta = Math.cos(backfillSlope);
  const radicand = Math.sin(frictionAngle + backfillSlope) * Math.sin(frictionAngle - backfillSlope);
  const r = radicand > 0 ? Math.sqrt(radicand) : 0;
  return (cosBeta * (cosBeta - r)) / (cosBeta + r);
}
