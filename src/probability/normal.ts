import { normalCdf, normalPdf, normalQuantile, normalUpper, normalUpperQuantile } from "../numeric/normal.ts";
import { completeMarginal, requireFinite, requirePositive } from "./complete-marginal.ts";
import type { Marginal } from "./marginal.ts";

/**
 * Normal distribution.
 *
 * Density: f(x) = φ(z)/sd, z = (x − mean)/sd
 */
export function normal(parameters: { readonly mean: number; readonly sd: number }): Marginal {
  // parameters
  const { mean, sd } = parameters;
  requireFinite("normal", "mean", mean);
  requirePositive("normal", "sd", sd);

  // evaluation
  return completeMarginal({
    kind: "normal",
    mean,
    sd,
    lowest: Number.NEGATIVE_INFINITY,
    highest: Number.POSITIVE_INFINITY,
    pdf: (x) => normalPdf((x - mean) / sd) / sd,
    cdf: (x) => normalCdf((x - mean) / sd),
    ccdf: (x) => normalUpper((x - mean) / sd),
    quantile: (p) => mean + sd * normalQuantile(p),
    upperQuantile: (q) => mean + sd * normalUpperQuantile(q),
    quantileOfNormal: (u) => mean + sd * u,
    normalOfQuantile: (x) => (x - mean) / sd,
  });
}
