import { completeMarginal, requireFinite, requirePositive } from "./complete-marginal.ts";
import type { Marginal } from "./marginal.ts";

const eulerGamma = 0.5772156649015329;

/**
 * Gumbel distribution of largest values.
 *
 * Density: f(x) = exp(−s − e^(−s))/scale, F(x) = exp(−e^(−s)), s = (x − mode)/scale
 * Parameters: scale = sd·√6/π, mode = mean − 0.5772…·scale
 *
 * The largest of T such years has the mode shifted by scale·ln T and the same sd.
 */
export function gumbel(parameters: { readonly mean: number; readonly sd: number }): Marginal {
  // parameters
  const { mean, sd } = parameters;
  requireFinite("gumbel", "mean", mean);
  requirePositive("gumbel", "sd", sd);
  const scale = (sd * Math.sqrt(6)) / Math.PI;
  const mode = mean - eulerGamma * scale;

  // evaluation
  const expected = (x: number): number => Math.exp(-(x - mode) / scale); // −ln F
  return completeMarginal({
    kind: "gumbel",
    mean,
    sd,
    lowest: Number.NEGATIVE_INFINITY,
    highest: Number.POSITIVE_INFINITY,
    pdf: (x) => {
      const e = expected(x);
      return e === Number.POSITIVE_INFINITY ? 0 : (e * Math.exp(-e)) / scale;
    },
    cdf: (x) => Math.exp(-expected(x)),
    ccdf: (x) => -Math.expm1(-expected(x)),
    quantile: (p) => mode - scale * Math.log(p < 0.5 ? -Math.log(p) : -Math.log1p(p - 1)),
    upperQuantile: (q) => mode - scale * Math.log(-Math.log1p(-q)),
  });
}
