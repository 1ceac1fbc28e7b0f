import { deviance, gamma, logGamma, stirlingError } from "./gamma.ts";
import { normalQuantile } from "./normal.ts";
import { findRisingRoot } from "./root.ts";

const rootTwoPi = 2.5066282746310007;

/** xᵃ e⁻ˣ/Γ(a + 1), by Stirling's formula and its error so that large a loses no digits. */
function leadingTerm(a: number, x: number): number {
  return Math.exp(-stirlingError(a) - deviance(a, x)) / (rootTwoPi * Math.sqrt(a));
}

/** P(a, x)/leadingTerm = 1 + x/(a + 1) + x²/((a + 1)(a + 2)) + …, for x < a + 1. */
function lowerSeries(a: number, x: number): number {
  let sum = 1;
  let term = 1;
  for (let n = a + 1; ; n++) {
    term *= x / n;
    sum += term;
    if (term < 1e-17 * sum) return sum;
  }
}

/** Q(a, x)/(a·leadingTerm) as a continued fraction, for x ≥ a + 1. Its length grows with √a. */
function upperFraction(a: number, x: number): number {
  const tiny = 1e-300;
  let b = x + 1 - a;
  let c = 1 / tiny;
  let d = 1 / b;
  let h = d;
  for (let n = 1; n < 1_000_000; n++) {
    const coefficient = -n * (n - a);
    b += 2;
    d = 1 / nonZero(coefficient * d + b, tiny);
    c = nonZero(b + coefficient / c, tiny);
    h *= d * c;
    if (Math.abs(d * c - 1) < 2e-16) return h;
  }
  throw new RangeError(`the incomplete gamma function did not converge at a = ${a}, x = ${x}`);
}

function nonZero(value: number, tiny: number): number {
  return Math.abs(value) < tiny ? tiny : value;
}

/**
 * P(a, x), the lower regularised incomplete gamma function: chance that a gamma variable of shape a and scale 1 stays
 * below x. Relative error below 1e-14 where it exceeds 1e-20, below 5e-13 down to 1e-300.
 *
 * @param a shape, above 0
 * @source NIST Digital Library of Mathematical Functions, 8.11.4 and 8.9.2
 */
export function gammaLower(a: number, x: number): number {
  if (x <= 0) return 0;
  if (x === Number.POSITIVE_INFINITY) return 1;
  return x < a + 1 ? leadingTerm(a, x) * lowerSeries(a, x) : 1 - leadingTerm(a, x) * a * upperFraction(a, x);
}

/** Q(a, x) = 1 − P(a, x), accurate in the upper tail. */
export function gammaUpper(a: number, x: number): number {
  if (x <= 0) return 1;
  if (x === Number.POSITIVE_INFINITY) return 0;
  return x < a + 1 ? 1 - leadingTerm(a, x) * lowerSeries(a, x) : leadingTerm(a, x) * a * upperFraction(a, x);
}

/** Density of a gamma variable of shape a and scale 1. */
export function gammaDensity(a: number, x: number): number {
  if (x > 0) return (leadingTerm(a, x) * a) / x;
  return x < 0 || a > 1 ? 0 : a === 1 ? 1 : Number.POSITIVE_INFINITY;
}

/** x with P(a, x) = p (or Q(a, x) = p where `upper`), relative error below 1e-12; 0 < p < 1. */
export function gammaQuantile(a: number, p: number, upper: boolean): number {
  const tail = upper ? gammaUpper : gammaLower;
  const sign = upper ? -1 : 1;
  const target = Math.log(p);
  // in t = ln x the logarithm of either tail bends one way only, which Newton's iteration likes
  const root = findRisingRoot(
    {
      value: (t) => sign * (Math.log(tail(a, Math.exp(t))) - target),
      slope: (t, value) => (Math.exp(t) * gammaDensity(a, Math.exp(t))) / (p * Math.exp(sign * value)),
    },
    -745,
    709,
    startOfQuantile(a, p, upper),
  );
  return Math.exp(root.x);
}

/** ln of a first guess: Wilson and Hilferty's cube, or the leading power of the lower tail where that fails. */
function startOfQuantile(a: number, p: number, upper: boolean): number {
  const z = upper ? -normalQuantile(p) : normalQuantile(p);
  const cube = 1 - 1 / (9 * a) + z / (3 * Math.sqrt(a));
  if (cube > 0.3) return Math.log(a) + 3 * Math.log(cube);
  const lower = upper ? 1 - p : p;
  return lower > 0 ? Math.min((Math.log(lower) + logGamma(a + 1)) / a, Math.log(a + 1)) : Math.log(gamma(1) + a);
}
