import { gammaDensity, gammaLower, gammaQuantile, gammaUpper } from "../numeric/incomplete-gamma.ts";
import { completeMarginal, requirePositive } from "./complete-marginal.ts";
import type { Marginal } from "./marginal.ts";

/**
 * Gamma distribution, X ≥ 0.
 *
 * Density: f(x) = t^(shape − 1) e^(−t)/(scale Γ(shape)), t = x/scale
 * Parameters: shape = (mean/sd)², scale = sd²/mean
 */
export function gamma(parameters: { readonly mean: number; readonly sd: number }): Marginal {
  // parameters
  const { mean, sd } = parameters;
  requirePositive("gamma", "mean", mean);
  requirePositive("gamma", "sd", sd);
  const shape = (mean / sd) ** 2;
  const scale = (sd / mean) * sd;
  if (shape < 0.01) throw new RangeError(`gamma: sd is ${sd}, must not exceed ten times the mean`);

  // evaluation
  return completeMarginal({
    kind: "gamma",
    mean,
    sd,
    lowest: 0,
    highest: Number.POSITIVE_INFINITY,
    pdf: (x) => gammaDensity(shape, x / scale) / scale,
    cdf: (x) => gammaLower(shape, x / scale),
    ccdf: (x) => gammaUpper(shape, x / scale),
    quantile: (p) => scale * gammaQuantile(shape, p, false),
    upperQuantile: (q) => scale * gammaQuantile(shape, q, true),
  });
}
