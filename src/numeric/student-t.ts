import { logGamma } from "./gamma.ts";
import { betaLower, betaQuantile } from "./incomplete-beta.ts";

/** Density of Student's t with ν degrees of freedom. */
export function studentDensity(t: number, degrees: number): number {
  const scale = Math.exp(logGamma(0.5 * (degrees + 1)) - logGamma(0.5 * degrees)) / Math.sqrt(degrees * Math.PI);
  return scale * Math.exp(-0.5 * (degrees + 1) * Math.log1p((t * t) / degrees));
}

/**
 * Chance that Student's t with ν degrees of freedom exceeds t, accurate in the upper tail; the lower tail is that of −t.
 *
 *   ½ I_x(ν/2, ½), x = ν/(ν + t²), for t ≥ 0
 *
 * @source NIST Digital Library of Mathematical Functions, 8.17; relative error as of `betaLower`
 */
export function studentUpper(t: number, degrees: number): number {
  if (t < 0) return 1 - studentUpper(-t, degrees);
  const whole = degrees + t * t;
  if (whole === Number.POSITIVE_INFINITY) return 0;
  return 0.5 * betaLower(degrees / whole, (t * t) / whole, 0.5 * degrees, 0.5);
}

/** t that is exceeded with chance q, relative error below 1e-12; 0 < q < 1. */
export function studentUpperQuantile(q: number, degrees: number): number {
  if (q > 0.5) return -studentUpperQuantile(1 - q, degrees);
  if (q === 0.5) return 0;
  const { x, y } = betaQuantile(2 * q, 0.5 * degrees, 0.5);
  return Math.sqrt((degrees * y) / x);
}
