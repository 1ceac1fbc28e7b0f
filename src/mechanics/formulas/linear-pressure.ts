/*
 * Pressure that runs in a straight line from p0 at the top to p1 at the bottom of a stretch of plane; what is negative
 * is not transferred. All integrals are exact. p in kPa, lengths in m, heights above the bottom end of the stretch.
 */

/**
 * Length of the part under positive pressure.
 *
 * @returns m, in [0, length]; 0 where neither end is positive
 */
export function positiveLength(p0: number, p1: number, length: number): number {
  if (p0 >= 0) {
    if (p1 >= 0) return p0 > 0 || p1 > 0 ? length : 0;
    return (length * p0) / (p0 - p1);
  }
  return p1 > 0 ? (length * p1) / (p1 - p0) : 0;
}

/**
 * Height of the middle of the part under positive pressure above the bottom end; 0 where there is no such part.
 *
 * @returns m, in [0, length]
 */
export function positiveCentre(p0: number, p1: number, length: number): number {
  const half = positiveLength(p0, p1, length) / 2;
  return p0 > 0 ? length - half : half;
}

/**
 * Distance from the top end at which the pressure first turns positive: 0 where it starts positive, `length` where it
 * never is.
 *
 * @returns m, in [0, length]
 */
export function zeroCrossing(p0: number, p1: number, length: number): number {
  if (p0 > 0) return 0;
  return p1 > 0 ? length * Math.abs(p0 / (p0 - p1)) : length;
}

/**
 * Force of the positive part.
 *
 *   F = ∫ max(p, 0) dx:  ½ (p0 + p1) L, or of a triangle ½ p l over its positive length l
 *
 * @returns kN/m, 0 or more
 */
export function positiveForce(p0: number, p1: number, length: number): number {
  if (p0 >= 0 && p1 >= 0) return 0.5 * (p0 + p1) * length;
  return 0.5 * Math.max(p0, p1, 0) * positiveLength(p0, p1, length);
}

/**
 * Moment of that force about the bottom end.
 *
 *   M = ∫ max(p, 0) (L − x) dx:  L² (2 p0 + p1)/6; a triangle at the bottom p1 l²/6; one at the top ½ p0 l (L − l/3)
 *
 * @returns kNm/m, 0 or more
 */
export function positiveMoment(p0: number, p1: number, length: number): number {
  if (p0 >= 0 && p1 >= 0) return (length * length * (2 * p0 + p1)) / 6;
  const l = positiveLength(p0, p1, length);
  return p0 > 0 ? 0.5 * p0 * l * (length - l / 3) : (Math.max(p1, 0) * l * l) / 6;
}
