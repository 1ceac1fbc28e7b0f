/** What a root search found; `converged: false` is a result to report, not an exception. */
export interface Root {
  readonly x: number;
  readonly converged: boolean;
  readonly iterations: number;
}

/** Smallest step worth taking at x: two units in the last place, or the caller's own tolerance. */
function leastStep(x: number, tolerance: number): number {
  return Math.max(tolerance, 4.5e-16 * Math.abs(x), Number.MIN_VALUE);
}

/**
 * Root of a continuous function between two points of different sign.
 *
 * @param tolerance on x, absolute; left out: to the last digits of x
 * @throws RangeError where f has the same sign at both ends or is not a number there
 * @source R. P. Brent (1973), Algorithms for Minimization without Derivatives, chapter 4 (inverse quadratic interpolation,
 *   kept safe by bisection)
 */
export function findRoot(f: (x: number) => number, low: number, high: number, tolerance = 0): Root {
  let a = low;
  let b = high;
  let fa = f(a);
  let fb = f(b);
  if (!(Math.sign(fa) * Math.sign(fb) <= 0))
    throw new RangeError(`no change of sign between f(${a}) = ${fa} and f(${b}) = ${fb}`);
  let c = a;
  let fc = fa;
  let step = b - a;
  let lastStep = step;
  for (let iterations = 1; iterations <= 200; iterations++) {
    if (Math.abs(fc) < Math.abs(fb)) {
      [a, b, c] = [b, c, b];
      [fa, fb, fc] = [fb, fc, fb];
    }
    const least = 0.5 * leastStep(b, tolerance);
    const half = 0.5 * (c - b);
    if (Math.abs(half) <= least || fb === 0) return { x: b, converged: true, iterations };
    const trial =
      Math.abs(lastStep) >= least && Math.abs(fa) > Math.abs(fb) ? interpolatedStep(a, b, c, fa, fb, fc) : half;
    const accepted = trial * half > 0 && Math.abs(trial) < Math.min(1.5 * Math.abs(half), 0.5 * Math.abs(lastStep));
    lastStep = accepted ? step : half;
    step = accepted ? trial : half;
    a = b;
    fa = fb;
    b += Math.abs(step) > least ? step : Math.sign(half) * least;
    fb = f(b);
    if (Math.sign(fb) * Math.sign(fc) > 0) {
      c = a;
      fc = fa;
      step = b - a;
      lastStep = step;
    }
  }
  return { x: b, converged: false, iterations: 200 };
}

/** Step from b: secant through two points, inverse quadratic through three. */
function interpolatedStep(a: number, b: number, c: number, fa: number, fb: number, fc: number): number {
  const s = fb / fa;
  if (a === c) return ((c - b) * s) / (s - 1);
  const q = fa / fc;
  const r = fb / fc;
  const top = s * ((c - b) * q * (q - r) - (b - a) * (r - 1));
  return -top / ((q - 1) * (r - 1) * (s - 1));
}

/** A rising function with its slope, to be brought to zero. */
export interface RisingFunction {
  value(x: number): number;
  /** @param value what `value(x)` gave, so that nothing need be computed twice */
  slope(x: number, value: number): number;
}

/**
 * Root of a rising function by Newton's iteration, kept inside a bracket that shrinks; where a step leaves it or stalls,
 * the bracket is halved. The bracket may be wide: bisection is only the last resort.
 *
 * @returns x to the last digits that the function allows
 */
export function findRisingRoot(f: RisingFunction, low: number, high: number, start: number): Root {
  let left = low;
  let right = high;
  let x = Math.min(Math.max(start, low), high);
  let lastSize = Number.POSITIVE_INFINITY;
  for (let iterations = 1; iterations <= 300; iterations++) {
    const value = f.value(x);
    if (value === 0) return { x, converged: true, iterations };
    if (value < 0) left = x;
    else right = x;
    const slope = f.slope(x, value);
    let step = Number.isFinite(slope) ? -value / slope : Number.NaN;
    const size = Math.abs(step);
    if (size <= leastStep(x, 0)) return { x: x + step, converged: true, iterations };
    // beyond the bracket, not a number, or not getting on: halve instead
    if (!(x + step > left && x + step < right) || size > 2 * lastSize) step = 0.5 * (left + right) - x;
    if (Math.abs(right - left) <= leastStep(x, 0)) return { x: x + step, converged: true, iterations };
    lastSize = Math.abs(step);
    x += step;
  }
  return { x, converged: false, iterations: 300 };
}
