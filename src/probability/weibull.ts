import { logGamma } from "../numeric/gamma.ts";
import { completeMarginal, requireFinite, requirePositive } from "./complete-marginal.ts";
import type { Marginal } from "./marginal.ts";

/**
 * Weibull distribution of least values, X = shift + scale·T, 1 − F = exp(−t^shape).
 *
 * Density: f(x) = (shape/scale) t^(shape − 1) exp(−t^shape), t = (x − shift)/scale
 * Moments: mean = shift + scale Γ(1 + 1/shape), sd² = scale² (Γ(1 + 2/shape) − Γ(1 + 1/shape)²)
 */
export function weibull(parameters: {
  readonly shape: number;
  readonly scale: number;
  readonly shift?: number;
}): Marginal {
  // parameters
  const { shape, scale, shift = 0 } = parameters;
  requirePositive("weibull", "shape", shape);
  requirePositive("weibull", "scale", scale);
  requireFinite("weibull", "shift", shift);

  // moments
  const logFirst = logGamma(1 + 1 / shape);
  const first = scale * Math.exp(logFirst);
  const squaredVariation = Math.expm1(logGamma(1 + 2 / shape) - 2 * logFirst);
  if (!Number.isFinite(first * squaredVariation))
    throw new RangeError(`weibull: shape is ${shape}, too small for a finite sd`);

  // evaluation
  const hazard = (x: number): number => (x <= shift ? 0 : Math.exp(shape * Math.log((x - shift) / scale))); // −ln(1 − F)
  const at = (h: number): number => shift + scale * Math.exp(Math.log(h) / shape);
  return completeMarginal({
    kind: "weibull",
    mean: shift + first,
    sd: first * Math.sqrt(squaredVariation),
    lowest: shift,
    highest: Number.POSITIVE_INFINITY,
    pdf: (x) => {
      if (x < shift) return 0;
      if (x === shift) return shape > 1 ? 0 : shape === 1 ? 1 / scale : Number.POSITIVE_INFINITY;
      const h = hazard(x);
      return h === Number.POSITIVE_INFINITY ? 0 : (shape * h * Math.exp(-h)) / (x - shift);
    },
    cdf: (x) => -Math.expm1(-hazard(x)),
    ccdf: (x) => Math.exp(-hazard(x)),
    quantile: (p) => at(p < 0.5 ? -Math.log1p(-p) : -Math.log(1 - p)),
    upperQuantile: (q) => at(q < 0.5 ? -Math.log(q) : -Math.log1p(q - 1)),
  });
}
