import { completeMarginal, requireFinite, requirePositive } from "./complete-marginal.ts";
import type { Marginal } from "./marginal.ts";

/**
 * Uniform distribution.
 *
 * Density: f(x) = 1/(to − from) between the two
 */
export function uniform(parameters: { readonly from: number; readonly to: number }): Marginal {
  // parameters
  const { from, to } = parameters;
  const width = to - from;
  requireFinite("uniform", "from", from);
  requireFinite("uniform", "to", to);
  requirePositive("uniform", "to - from", width);

  // evaluation
  const share = (distance: number): number => Math.min(Math.max(distance / width, 0), 1);
  return completeMarginal({
    kind: "uniform",
    mean: from + 0.5 * width,
    sd: width / Math.sqrt(12),
    lowest: from,
    highest: to,
    pdf: (x) => (x >= from && x <= to ? 1 / width : 0),
    cdf: (x) => share(x - from),
    ccdf: (x) => share(to - x),
    quantile: (p) => (p <= 0.5 ? from + p * width : to - (1 - p) * width),
    upperQuantile: (q) => (q <= 0.5 ? to - q * width : from + (1 - q) * width),
  });
}
