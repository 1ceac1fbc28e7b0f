/*
 * Soil over the base, as areas and first moments of what lies between the top of the slab (z = t) and a level z. The
 * weight of a layer is its unit weight times the difference of two such areas; so each is a sum of closed polynomials.
 *
 * Over the heel: right of the stem's back face, which starts at (xFoot, t) and runs in by tan θ per metre of height up
 * to zCrest; left of x = B; below the surface, which rises at tan β from the crest.
 * Over the toe: from x = 0 to the stem's front face, toe + (z − t)·frontSlope, up to zCrest.
 * Lengths and levels in m, areas in m² = m³ per metre run, moments in m³.
 */

/** Height of the part of [t, z] that lies below the crest. */
function heightBelowCrest(z: number, t: number, zCrest: number): number {
  return Math.max(Math.min(z, zCrest) - t, 0);
}

/**
 * Area over the heel between t and z; z is taken within [t, zV], zV = zCrest + (B − xCrest) tan β the top of the
 * virtual back.
 *
 *   below the crest ∫ w du, w = B − xFoot + u tan θ; above it W v (1 − f/2), f = v/V, W = B − xCrest, V = W tan β
 *
 * @returns m², 0 or more
 */
export function heelArea(
  z: number,
  t: number,
  zCrest: number,
  xFoot: number,
  B: number,
  tanTheta: number,
  tanBeta: number,
): number {
  const w = B - xFoot;
  const h = heightBelowCrest(z, t, zCrest);
  const below = h * (w + (h * tanTheta) / 2);
  const wide = w + (zCrest - t) * tanTheta;
  const tall = wide * tanBeta;
  if (!(z > zCrest && tall > 0)) return below;
  const v = Math.min(z - zCrest, tall);
  return below + wide * v * (1 - v / tall / 2);
}

/**
 * First moment of that area about x = 0.
 *
 *   ∫ (B² − x²)/2 dz over the left edge x, = B · area − ½ ∫ w² dz with the width w at each level
 *
 * @returns m³
 */
export function heelMomentX(
  z: number,
  t: number,
  zCrest: number,
  xFoot: number,
  B: number,
  tanTheta: number,
  tanBeta: number,
): number {
  const w = B - xFoot;
  const h = heightBelowCrest(z, t, zCrest);
  const run = h * tanTheta;
  let area = h * (w + run / 2);
  let squares = h * (w * w + w * run + (run * run) / 3);
  const wide = w + (zCrest - t) * tanTheta;
  const tall = wide * tanBeta;
  if (z > zCrest && tall > 0) {
    const v = Math.min(z - zCrest, tall);
    const f = v / tall;
    area += wide * v * (1 - f / 2);
    squares += wide * wide * v * (1 - f + (f * f) / 3);
  }
  return B * area - squares / 2;
}

/**
 * First moment of that area about z = 0.
 *
 *   ∫ z w dz = t A + w h²/2 + tan θ h³/3 below the crest, zCrest A + W v² (½ − f/3) above it
 *
 * @returns m³
 */
export function heelMomentZ(
  z: number,
  t: number,
  zCrest: number,
  xFoot: number,
  B: number,
  tanTheta: number,
  tanBeta: number,
): number {
  const w = B - xFoot;
  const h = heightBelowCrest(z, t, zCrest);
  const run = h * tanTheta;
  const below = t * h * (w + run / 2) + h * h * (w / 2 + run / 3);
  const wide = w + (zCrest - t) * tanTheta;
  const tall = wide * tanBeta;
  if (!(z > zCrest && tall > 0)) return below;
  const v = Math.min(z - zCrest, tall);
  const f = v / tall;
  return below + zCrest * wide * v * (1 - f / 2) + wide * v * v * (1 / 2 - f / 3);
}

/**
 * Area over the toe between t and z; z is taken within [t, zCrest].
 *
 *   ∫ (toe + u·frontSlope) du
 *
 * @param frontSlope run of the front face per metre of height, 0 or more
 * @returns m², 0 or more
 */
export function toeArea(z: number, t: number, zCrest: number, toe: number, frontSlope: number): number {
  const h = heightBelowCrest(z, t, zCrest);
  return h * (toe + (h * frontSlope) / 2);
}

/** First moment of that area about x = 0: ½ ∫ (toe + u·frontSlope)² du, m³. */
export function toeMomentX(z: number, t: number, zCrest: number, toe: number, frontSlope: number): number {
  const h = heightBelowCrest(z, t, zCrest);
  const run = h * frontSlope;
  return (h * (toe * toe + toe * run + (run * run) / 3)) / 2;
}

/** First moment of that area about z = 0: ∫ (t + u)(toe + u·frontSlope) du, m³. */
export function toeMomentZ(z: number, t: number, zCrest: number, toe: number, frontSlope: number): number {
  const h = heightBelowCrest(z, t, zCrest);
  const run = h * frontSlope;
  return t * h * (toe + run / 2) + h * h * (toe / 2 + run / 3);
}
