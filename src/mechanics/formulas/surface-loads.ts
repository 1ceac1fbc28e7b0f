/*
 * Horizontal pressure of loads on the surface against a vertical plane: the elastic half-space of Boussinesq (1885),
 * doubled for a plane that does not yield (image load). a: distance behind the plane, m; s: depth below its top, m; H: height of the
 * plane, m. A load at distance 0 is the limit a → 0: the whole of it acts at the top of the plane.
 */

/** 1 − (a/H) atan(H/a), from 0 (far away) to 1 (a = 0), without cancellation: a series where H < a/5 (error below 1e-16). */
function momentShape(a: number, height: number): number {
  if (height < 0.2 * a) {
    const x = (height / a) * (height / a);
    let sum = 0;
    for (let k = 12; k >= 1; k--) sum = x * (1 / (2 * k + 1) - sum);
    return sum;
  }
  return 1 - (a / height) * Math.atan2(height, a);
}

/**
 * Pressure of a line load.
 *
 *   σh = (4Q/π) a² s / (a² + s²)²
 *
 * @param force Q, kN/m
 * @param distance a ≥ 0
 * @param depth s
 * @returns kPa; 0 for s ≤ 0 and for a = 0
 * @source Boussinesq (1885), integrated along the line and doubled
 */
export function lineLoadPressure(force: number, distance: number, depth: number): number {
  const larger = Math.max(distance, depth);
  if (!(Math.min(distance, depth) > 0)) return 0;
  const a = distance / larger;
  const s = depth / larger;
  const square = a * a + s * s;
  return (((4 * force) / Math.PI) * a * a * s) / (square * square * larger);
}

/**
 * Thrust of a line load over the whole plane.
 *
 *   ∫₀ᴴ σh ds = (2Q/π) H² / (a² + H²)
 *
 * @returns kN/m; 0 for H ≤ 0
 */
export function lineLoadThrust(force: number, distance: number, height: number): number {
  if (!(height > 0)) return 0;
  const ratio = distance / height;
  return (2 * force) / Math.PI / (1 + ratio * ratio);
}

/**
 * Moment of that thrust about the bottom of the plane.
 *
 *   ∫₀ᴴ σh (H − s) ds = (2Q/π) [H − a atan(H/a)]
 *
 * @returns kNm/m; 0 for H ≤ 0
 */
export function lineLoadMoment(force: number, distance: number, height: number): number {
  if (!(height > 0)) return 0;
  return ((2 * force) / Math.PI) * height * momentShape(distance, height);
}

/** atan(a/s) − a s/(a² + s²), rad: 0 at a = 0, π/2 at s = 0 with a > 0. */
function stripShape(a: number, s: number): number {
  if (!(a > 0)) return 0;
  const ratio = Math.min(a, s) / Math.max(a, s);
  return Math.atan2(a, s) - ratio / (1 + ratio * ratio);
}

/**
 * Pressure of a strip load.
 *
 *   σh = (2p/π) [atan(a/s) − a s/(a² + s²)] from a1 to a2
 *
 * @param pressure p, kPa
 * @param from a1 ≥ 0
 * @param to a2 ≥ a1
 * @param depth s
 * @returns kPa; 0 above the top
 * @source Boussinesq (1885), integrated over the strip and doubled
 */
export function stripLoadPressure(pressure: number, from: number, to: number, depth: number): number {
  if (!(depth >= 0 && to > from)) return 0;
  return ((2 * pressure) / Math.PI) * (stripShape(to, depth) - stripShape(from, depth));
}

/**
 * Thrust of a strip load over the whole plane.
 *
 *   ∫₀ᴴ σh ds = (2p/π) H [atan(a2/H) − atan(a1/H)] = (2p/π) H atan( (a2 − a1) H / (H² + a1 a2) )
 *
 * @returns kN/m; 0 for H ≤ 0
 */
export function stripLoadThrust(pressure: number, from: number, to: number, height: number): number {
  if (!(height > 0 && to > from)) return 0;
  return ((2 * pressure) / Math.PI) * height * Math.atan2((to - from) * height, height * height + from * to);
}

/**
 * Moment of that thrust about the bottom of the plane.
 *
 *   ∫₀ᴴ σh (H − s) ds = (p/π) [H a − a² atan(H/a) + H² atan(a/H)] from a1 to a2
 *
 * @returns kNm/m; 0 for H ≤ 0
 */
export function stripLoadMoment(pressure: number, from: number, to: number, height: number): number {
  if (!(height > 0 && to > from)) return 0;
  const angle = Math.atan2((to - from) * height, height * height + from * to);
  const shape = to * momentShape(to, height) - from * momentShape(from, height);
  return (pressure / Math.PI) * height * (shape + height * angle);
}
