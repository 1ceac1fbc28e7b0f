/**
 * Coefficient of earth pressure at rest, for the horizontal part of the pressure.
 *
 *   K0 = (1 − sin φ′) √OCR (1 + sin β)
 *
 * The thrust is parallel to the slope, so its vertical part is the horizontal one times tan β. Cohesion does not enter.
 *
 * @param frictionAngle φ′, rad, in [0, π/2)
 * @param overconsolidationRatio OCR, dimensionless, 1 or more; below 0 taken as 0
 * @param backfillSlope β, rad, in [0, π/2)
 * @returns K0, dimensionless, 0 or more
 * @source Jaky (1944); EN 1997-1:2004, 9.5.2 (3) and (4)
 */
export function atRestCoefficient(
  frictionAngle: number,
  overconsolidationRatio: number,
  backfillSlope: number,
): number {
  const root = overconsolidationRatio > 0 ? Math.sqrt(overconsolidationRatio) : 0;
  return (1 - Math.sin(frictionAngle)) * root * (1 + Math.sin(backfillSlope));
}
