import { integrate, panels } from "../numeric/gauss-legendre.ts";
import { normalCdf, normalPdf, normalQuantile, normalUpper, normalUpperQuantile } from "../numeric/normal.ts";
import { completeMarginal, requireFinite, requirePositive } from "./complete-marginal.ts";
import type { Marginal } from "./marginal.ts";

/**
 * Normal distribution cut at one or both ends. The mean and sd given are those of the parent; the marginal reports those
 * of the cut distribution. An end may be ±∞.
 *
 * Density: f(x) = φ(z)/(sd·M), z = (x − mean)/sd, M = ∫φ between the ends
 */
export function truncatedNormal(parameters: {
  readonly mean: number;
  readonly sd: number;
  readonly from: number;
  readonly to: number;
}): Marginal {
  // parameters
  const { mean, sd, from, to } = parameters;
  requireFinite("truncated normal", "mean", mean);
  requirePositive("truncated normal", "sd", sd);
  if (!(from < to)) throw new RangeError(`truncated normal: from is ${from}, must lie below to, which is ${to}`);
  const low = (from - mean) / sd;
  const high = (to - mean) / sd;
  const mass = massOver(low, (to - from) / sd, high);
  if (!(mass > 1e-290)) {
    throw new RangeError(
      `truncated normal: nothing is left of a mean of ${mean} and sd of ${sd} between ${from} and ${to}`,
    );
  }

  // moments
  const moments = momentsBetween(low, high);

  // evaluation: an end that is finite measures distances, so that the digits near it are kept
  const fromLow = (p: number): number => {
    if (from === Number.NEGATIVE_INFINITY) return mean + sd * normalQuantile(p * mass);
    return Math.min(from + sd * widthOf(low, p * mass), to);
  };
  const fromHigh = (q: number): number => {
    if (to === Number.POSITIVE_INFINITY) return mean + sd * normalUpperQuantile(q * mass);
    return Math.max(to - sd * widthOf(-high, q * mass), from);
  };
  return completeMarginal({
    kind: "truncated_normal",
    mean: mean + sd * moments.mean,
    sd: sd * moments.sd,
    lowest: from,
    highest: to,
    pdf: (x) => (x < from || x > to ? 0 : normalPdf((x - mean) / sd) / (sd * mass)),
    cdf: (x) => (x <= from ? 0 : x >= to ? 1 : massOver(low, (x - from) / sd, (x - mean) / sd) / mass),
    ccdf: (x) => (x <= from ? 1 : x >= to ? 0 : massOver(-high, (to - x) / sd, -(x - mean) / sd) / mass),
    quantile: (p) => (p <= 0.5 ? fromLow(p) : fromHigh(1 - p)),
    upperQuantile: (q) => (q <= 0.5 ? fromHigh(q) : fromLow(1 - q)),
  });
}

/** ∫φ from `start` over `width`, relative error below 1e-14: by quadrature where a difference would cancel. */
function massOver(start: number, width: number, end: number): number {
  if (width * Math.max(1, Math.abs(start), Math.abs(end)) <= 1)
    return integrate((s) => normalPdf(start + s), 0, width, 16);
  return start > 0 ? normalUpper(start) - normalUpper(end) : normalCdf(end) - normalCdf(start);
}

/** Width over which ∫φ from `start` amounts to `target`; relative error below 1e-12. */
function widthOf(start: number, target: number): number {
  const end =
    start > 0
      ? normalUpperQuantile(Math.max(normalUpper(start) - target, 0))
      : normalQuantile(normalCdf(start) + target);
  // where the end drowns in the digits of the start, the density at the start gives the first guess
  let width = end - start > 1e-6 && end < 38 ? end - start : target / normalPdf(start);
  for (let iteration = 0; iteration < 20; iteration++) {
    const step = (target - massOver(start, width, start + width)) / normalPdf(start + width);
    width = Math.max(width + step, 0.1 * width);
    if (Math.abs(step) <= 1e-15 * width) break;
  }
  return width;
}

/** Mean and sd of a standard normal between two ends, by quadrature about its most likely value. */
function momentsBetween(low: number, high: number): { mean: number; sd: number } {
  const mode = Math.min(Math.max(0, low), high);
  const reach = Math.sqrt(mode * mode + 90); // beyond it the density is e^−45 of its largest
  const points = panels(Math.max(low, -reach), Math.min(high, reach), [], 1 / Math.max(1, Math.abs(mode)));
  let [weight, first, second] = [0, 0, 0];
  for (let i = 1; i < points.length; i++) {
    const over = (power: number): number =>
      integrate((z) => (z - mode) ** power * Math.exp(0.5 * (mode - z) * (mode + z)), points[i - 1], points[i], 20);
    weight += over(0);
    first += over(1);
    second += over(2);
  }
  const shift = first / weight;
  // a second pass about the mean itself would change nothing: the mode lies within two sd of the mean
  return { mean: mode + shift, sd: Math.sqrt(second / weight - shift * shift) };
}
