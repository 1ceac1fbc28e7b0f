import { deviance, stirlingError } from "./gamma.ts";
import { findRisingRoot } from "./root.ts";

/** xᵃ yᵇ/B(a, b) with y = 1 − x, by Stirling's formula and its error so that large a and b lose no digits. */
function leadingTerm(x: number, y: number, a: number, b: number): number {
  const n = a + b;
  const exponent = stirlingError(n) - stirlingError(a) - stirlingError(b) - deviance(a, n * x) - deviance(b, n * y);
  return Math.sqrt((a / (2 * Math.PI)) * (b / n)) * Math.exp(exponent);
}

/** a·I_x(a, b)/leadingTerm as a continued fraction, quick for x < (a + 1)/(a + b + 2). */
function fraction(x: number, a: number, b: number): number {
  const tiny = 1e-300;
  let c = 1;
  let d = 1 / nonZero(1 - ((a + b) * x) / (a + 1), tiny);
  let h = d;
  for (let m = 1; m < 1_000_000; m++) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 / nonZero(1 + even * d, tiny);
    c = nonZero(1 + even / c, tiny);
    h *= d * c;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / nonZero(1 + odd * d, tiny);
    c = nonZero(1 + odd / c, tiny);
    h *= d * c;
    if (Math.abs(d * c - 1) < 2e-16) return h;
  }
  throw new RangeError(`the incomplete beta function did not converge at x = ${x}, a = ${a}, b = ${b}`);
}

function nonZero(value: number, tiny: number): number {
  return Math.abs(value) < tiny ? tiny : value;
}

/**
 * I_x(a, b), the regularised incomplete beta function: chance that a beta variable with shapes a and b stays below x.
 * Relative error below 1e-14 where it exceeds 1e-20, below 5e-13 down to 1e-300.
 *
 * The complement y = 1 − x is given beside x, so that no digits are lost near either end. I_y(b, a) is the upper tail.
 *
 * @param a shape at 0, above 0
 * @param b shape at 1, above 0
 * @source NIST Digital Library of Mathematical Functions, 8.17.22
 */
export function betaLower(x: number, y: number, a: number, b: number): number {
  if (x <= 0) return 0;
  if (y <= 0) return 1;
  const term = leadingTerm(x, y, a, b);
  if (x <= (a + 1) / (a + b + 2)) return (term * fraction(x, a, b)) / a;
  return 1 - (term * fraction(y, b, a)) / b;
}

/** Density of a beta variable, y = 1 − x; infinite at an end whose shape is below 1. */
export function betaDensity(x: number, y: number, a: number, b: number): number {
  if (x < 0 || y < 0) return 0;
  if (x === 0) return a > 1 ? 0 : a < 1 ? Number.POSITIVE_INFINITY : b;
  if (y === 0) return b > 1 ? 0 : b < 1 ? Number.POSITIVE_INFINITY : a;
  return leadingTerm(x, y, a, b) / (x * y);
}

/** A point of the unit interval by its distance from either end, both accurate. */
export interface UnitPoint {
  readonly x: number;
  readonly y: number;
}

/**
 * The point with I_x(a, b) = p, or with the upper tail I_y(b, a) = p where `upper`; 0 < p < 1.
 *
 * @returns its distances from 0 and from 1, the smaller one with a relative error below 1e-12
 */
export function betaQuantile(p: number, a: number, b: number, upper = false): UnitPoint {
  if (upper) {
    const mirrored = betaQuantile(p, b, a);
    return { x: mirrored.y, y: mirrored.x };
  }
  if (betaLower(0.5, 0.5, a, b) >= p) {
    const x = nearEnd(p, a, b, (s) => betaLower(s, 1 - s, a, b), 1);
    return { x, y: 1 - x };
  }
  const y = nearEnd(p, b, a, (s) => betaLower(1 - s, s, a, b), -1);
  return { x: 1 - y, y };
}

/** Distance s in (0, ½] from the end whose shape is `a`, where the chance of the stated tail is p. */
function nearEnd(p: number, a: number, b: number, chance: (s: number) => number, sign: number): number {
  const target = Math.log(p);
  const root = findRisingRoot(
    {
      value: (t) => sign * (Math.log(chance(Math.exp(t))) - target),
      slope: (t, value) => {
        const s = Math.exp(t);
        return (s * betaDensity(s, 1 - s, a, b)) / (p * Math.exp(sign * value));
      },
    },
    -745,
    Math.log(0.5),
    Math.log(Math.min(0.4, a / (a + b))),
  );
  return Math.exp(root.x);
}
