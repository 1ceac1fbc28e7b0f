import { normalUpperQuantile } from "../numeric/normal.ts";
import type { LikelihoodPart } from "./decision-problem.ts";

const cells = 12_000;
const reach = 9;

/**
 * Standard normal ξ → s, where s has the density φ(s)·c(k) up to a factor, k = offset + |row|·s: the posterior of one knowledge part
 * whatever its distribution, in the coordinate that the fitted normal has set.
 *
 *   Φ(ξ) = ∫₋∞ˢ φ c / ∫ φ c
 *
 * From sums over 12 000 cells that cover nine standard deviations of what is believed before and after; each tail is summed from its
 * own end. Linear between grid points: error in s below 1e-5 where the density is smooth; beyond the grid s goes on with slope 1.
 */
export function posteriorLine({ form, logCorrection }: LikelihoodPart): (xi: number) => number {
  const size = Math.hypot(...form.row);
  const from = Math.min(-reach, (-reach - form.offset) / size);
  const to = Math.max(reach, (reach - form.offset) / size);
  const step = (to - from) / cells;
  const s = Float64Array.from({ length: cells + 1 }, (_, i) => from + i * step);
  const logs = s.map((x) => -0.5 * x * x + logCorrection(form.offset + size * x));
  const highest = logs.reduce((a, b) => Math.max(a, b), Number.NEGATIVE_INFINITY);
  const density = logs.map((x) => Math.exp(x - highest));
  const below = runningSums(density);
  const above = runningSums(density.slice().reverse()).reverse();
  const total = below[cells];
  const [xs, ys]: [number[], number[]] = [[], []];
  for (let i = 0; i <= cells; i++) {
    const xi = below[i] < above[i] ? -normalUpperQuantile(below[i] / total) : normalUpperQuantile(above[i] / total);
    if (!(Math.abs(xi) < reach) || (xs.length > 0 && !(xi > xs[xs.length - 1]))) continue;
    xs.push(xi);
    ys.push(s[i]);
  }
  return (xi) => interpolated(Math.max(Math.min(xi, reach), -reach), xs, ys);
}

/** ∫ from the first grid point, by trapezoids, in units of the step. */
function runningSums(density: Float64Array): Float64Array {
  const sums = new Float64Array(density.length);
  for (let i = 1; i < sums.length; i++) sums[i] = sums[i - 1] + 0.5 * (density[i - 1] + density[i]);
  return sums;
}

function interpolated(x: number, xs: readonly number[], ys: readonly number[]): number {
  const last = xs.length - 1;
  if (x <= xs[0]) return ys[0] + (x - xs[0]);
  if (x >= xs[last]) return ys[last] + (x - xs[last]);
  let [low, high] = [0, last];
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (xs[middle] <= x) low = middle;
    else high = middle;
  }
  return ys[low] + ((ys[high] - ys[low]) * (x - xs[low])) / (xs[high] - xs[low]);
}
