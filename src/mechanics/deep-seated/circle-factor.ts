import { factorCap } from "../kernel.ts";
import type { Arc } from "./arc.ts";
import { resistingMoment } from "./bishop.ts";

/** Not a factor of safety: the circle is left out, m_α being under 0.2 at the factor it would have. */
export const leftOut: number = Number.POSITIVE_INFINITY;

/**
 * Factor of safety of a circle: the F with F = M_R(F)/M_D. M_R(F)/F falls with F wherever m_α > 0, since
 * d ln M_R/d ln F is a mean of sin α tan φ/(F m_α) = 1 − cos α/m_α < 1; so there is one root at most, and whether it lies
 * among the factors with m_α ≥ 0.2 shows at their ends.
 *
 * @param start where to begin; any positive number gives the same to 1e-9
 * @returns 0 … the cap (also where nothing drives), or `leftOut`
 */
export function circleFactor(arc: Arc, start: number): number {
  const { driving } = arc;
  if (!(driving > 0)) return factorCap;
  if (arc.count === 0) return Math.min(resistingMoment(arc, 1) / driving, factorCap);
  const low = Math.max(arc.least, 1e-6);
  const high = Math.min(arc.greatest, factorCap);
  if (low > high) return leftOut;
  const excess = (factor: number): number => Math.log(resistingMoment(arc, factor) / driving / factor);
  let [left, right] = [low, high];
  let x = Math.min(Math.max(start, low), high);
  let y = excess(x);
  let [lastX, lastY] = [Number.NaN, Number.NaN];
  for (let i = 0; i < 100; i++) {
    if (y > 0) {
      if (x >= high) return arc.greatest < factorCap ? leftOut : factorCap;
      left = x;
    } else if (y < 0) {
      if (x <= low) return arc.least > 1e-6 ? leftOut : 0;
      right = x;
    } else return x;
    // the secant on logarithms; at first, and where it leaves the bracket, F = M_R/M_D itself or the middle
    const slope = (y - lastY) / Math.log(x / lastX);
    const step =
      slope < 0 ? Math.exp(Math.min(Math.max(-y / slope, -20), 20)) : Math.exp(Math.min(Math.max(y, -20), 20));
    let next = x * step;
    if (next >= right) next = right === high ? high : Math.sqrt(left * right);
    if (next <= left) next = left === low ? low : Math.sqrt(left * right);
    if (Math.abs(next - x) <= 1e-7 * x && i > 0) return next; // the step after this one would be far smaller
    [lastX, lastY] = [x, y];
    x = next;
    y = excess(x);
  }
  return x;
}

/** Whether the factor of a circle lies above a bound, by one look: M_R(F)/F falls with F. A circle that is left out may say either. */
export function liesAbove(arc: Arc, bound: number): boolean {
  if (!(arc.driving > 0) || !(bound >= arc.least && bound <= arc.greatest)) return false;
  return resistingMoment(arc, bound) > bound * arc.driving;
}
