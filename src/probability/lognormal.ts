import { normalCdf, normalPdf, normalQuantile, normalUpper, normalUpperQuantile } from "../numeric/normal.ts";
import { completeMarginal, requireFinite, requirePositive } from "./complete-marginal.ts";
import type { Marginal } from "./marginal.ts";

/**
 * Lognormal distribution, X = shift + exp(logMean + logSd·U); mean and sd are those of X.
 *
 * Parameters: logSd² = ln(1 + (sd/(mean − shift))²), logMean = ln(mean − shift) − logSd²/2
 */
export function lognormal(parameters: {
  readonly mean: number;
  readonly sd: number;
  readonly shift?: number;
}): Marginal {
  // parameters
  const { mean, sd, shift = 0 } = parameters;
  requireFinite("lognormal", "shift", shift);
  requirePositive("lognormal", shift === 0 ? "mean" : "mean - shift", mean - shift);
  requirePositive("lognormal", "sd", sd);
  const logVariance = Math.log1p((sd / (mean - shift)) ** 2);
  return lognormalOfLogs({
    kind: "lognormal",
    mean,
    sd,
    shift,
    logMean: Math.log(mean - shift) - 0.5 * logVariance,
    logSd: Math.sqrt(logVariance),
  });
}

/** The same from the moments of ln(X − shift), for a member that has these (the moments of X must go with them). */
export function lognormalOfLogs(parameters: {
  readonly kind: string;
  readonly mean: number;
  readonly sd: number;
  readonly shift: number;
  readonly logMean: number;
  readonly logSd: number;
}): Marginal {
  const { kind, mean, sd, shift, logMean, logSd } = parameters;

  // density: f(x) = φ(z)/(logSd·(x − shift)), z = (ln(x − shift) − logMean)/logSd
  const standard = (x: number): number =>
    x > shift ? (Math.log(x - shift) - logMean) / logSd : Number.NEGATIVE_INFINITY;

  // evaluation
  const at = (z: number): number => shift + Math.exp(logMean + logSd * z);
  return completeMarginal({
    kind,
    mean,
    sd,
    lowest: shift,
    highest: Number.POSITIVE_INFINITY,
    pdf: (x) => (x > shift ? normalPdf(standard(x)) / (logSd * (x - shift)) : 0),
    cdf: (x) => (x > shift ? normalCdf(standard(x)) : 0),
    ccdf: (x) => (x > shift ? normalUpper(standard(x)) : 1),
    quantile: (p) => at(normalQuantile(p)),
    upperQuantile: (q) => at(normalUpperQuantile(q)),
    quantileOfNormal: at,
    normalOfQuantile: standard,
  });
}
