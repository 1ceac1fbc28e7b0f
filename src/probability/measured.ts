import { mean, sampleVariance } from "simple-statistics";
import { studentDensity, studentUpper, studentUpperQuantile } from "../numeric/student-t.ts";
import { completeMarginal, requireFinite, requirePositive } from "./complete-marginal.ts";
import { lognormalOfLogs } from "./lognormal.ts";
import type { Marginal } from "./marginal.ts";

/**
 * What a few test results say of the next value: the predictive distribution, widened because they are few.
 *
 * With m and s the mean and standard deviation (n − 1) of the n values and G the variance reduction by averaging:
 *   as normal:    X = m + s √(G + 1/n)·t, t Student's with n − 1 degrees of freedom
 *   as lognormal: ln X is normal with the mean and variance of that distribution of the logarithms,
 *                 s² (G + 1/n)(n − 1)/(n − 3), because the exponential of a Student variable has no mean
 *
 * @throws RangeError for fewer than four values, for values that are all the same, and for a logarithm that does not exist
 */
export function measured(parameters: {
  readonly values: readonly number[];
  readonly as: "normal" | "lognormal";
  readonly varianceReduction?: number;
}): Marginal {
  // parameters
  const { values, as, varianceReduction = 1 } = parameters;
  const n = values.length;
  if (n < 4) throw new RangeError(`measured: ${n} values, needs at least four`);
  for (const value of values) {
    if (as === "lognormal") requirePositive("measured", "a value", value);
    requireFinite("measured", "a value", value);
  }
  if (!(varianceReduction >= 0 && varianceReduction <= 1)) {
    throw new RangeError(`measured: the variance reduction is ${varianceReduction}, must lie between 0 and 1`);
  }
  const sample = as === "lognormal" ? values.map(Math.log) : values;
  const centre = mean(sample);
  const variance = sampleVariance(sample);
  if (!(variance > 0)) throw new RangeError(`measured: all values are ${values[0]}, which leaves no spread`);
  const scale = Math.sqrt(variance * (varianceReduction + 1 / n));
  const degrees = n - 1;
  const sd = scale * Math.sqrt(degrees / (degrees - 2));

  // moments and evaluation
  if (as === "lognormal") {
    const expected = Math.exp(centre + 0.5 * sd * sd);
    const spread = expected * Math.sqrt(Math.expm1(sd * sd));
    return lognormalOfLogs({ kind: "measured", mean: expected, sd: spread, shift: 0, logMean: centre, logSd: sd });
  }
  return completeMarginal({
    kind: "measured",
    mean: centre,
    sd,
    lowest: Number.NEGATIVE_INFINITY,
    highest: Number.POSITIVE_INFINITY,
    pdf: (x) => studentDensity((x - centre) / scale, degrees) / scale,
    cdf: (x) => studentUpper((centre - x) / scale, degrees),
    ccdf: (x) => studentUpper((x - centre) / scale, degrees),
    quantile: (p) => centre - scale * studentUpperQuantile(p, degrees),
    upperQuantile: (q) => centre + scale * studentUpperQuantile(q, degrees),
  });
}
