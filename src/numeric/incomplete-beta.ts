import { deviance, stirlingError } from "./gamma.ts";
import { findRisingRoot } from "./root.ts";

/** xᵃ yᵇ/B(a, b) with y = 1 − x, by Stirling's formula and its error so that large a and b lose no digits. */
function leadingTerm(x: number, y: number, a: number, b: number): number {
  const n = a + b;
  const known = shapeTerms(a, b);
  return known.factor * Math.exp(known.exponent - deviance(a, n * x) - deviance(b, n * y));
}

interface ShapeTerms {
  a: number;
  b: number;
  exponent: number;
  factor: number;
}

/** What hangs on the shapes alone, kept for the last few pairs: a distribution asks for the same two again and again. */
const kept: ShapeTerms[] = Array.from({ length: 8 }, () => ({ a: 0, b: 0, exponent: 0, factor: 0 }));
let oldest = 0;

function shapeTerms(a: number, b: number): ShapeTerms {
  for (let k = 0; k < kept.length; k++) if (kept[k].a === a && kept[k].b === b) return kept[k];
  const terms = kept[oldest];
  oldest = (oldest + 1) % kept.length;
  const n = a + b;
  terms.a = a;
  terms.b = b;
  terms.exponent = stirlingError(n) - stirlingError(a) - stirlingError(b);
  terms.factor = Math.sqrt((a / (2 * Math.PI)) * (b / n));
  return terms;
}

/**
 * leadingTerm/I_x(a, b) as a continued fraction, quick for x < (a + 1)/(a + b + 2). It needs y as well as x: 1 − y alone
 * would lose the digits of a small x that decide where b is large.
 */
function fraction(x: number, y: number, a: number, b: number): number {
  const tiny = 1e-300;
  const lambda = a * y - b * x;
  let h = nonZero((a * (lambda + 1)) / (a + 1), tiny);
  let c = h;
  let d = 0;
  for (let n = 1; n < 1_000_000; n++) {
    const odd = a + 2 * n - 1;
    const top = ((((a + n - 1) * (a + b + n - 1)) / odd) * n * (b - n) * x * x) / odd;
    const bottom = n + (n * (b - n) * x) / odd + ((a + n) * (lambda + 1 + n * (1 + y))) / (odd + 2);
    d = 1 / nonZero(bottom + top * d, tiny);
    c = nonZero(bottom + top / c, tiny);
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
 * @source A. R. DiDonato and A. H. Morris (1992), Algorithm 708, ACM Trans. Math. Softw. 18, 360–373, equation 9
 */
export function betaLower(x: number, y: number, a: number, b: number): number {
  if (x <= 0) return 0;
  if (y <= 0) return 1;
  const term = leadingTerm(x, y, a, b);
  if (x <= (a + 1) / (a + b + 2)) return term / fraction(x, y, a, b);
  return 1 - term / fraction(y, x, b, a);
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
