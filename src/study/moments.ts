import { mean as sampleMean, sampleVariance } from "simple-statistics";
/** Mean and standard deviation of every kind of distribution, in closed form. */
import { gamma } from "../numeric/gamma.ts";
import { normalCdf, normalPdf } from "../numeric/normal.ts";
import type { Distribution, Quantity } from "./study.ts";

export interface Moments {
  readonly mean: number;
  readonly sd: number;
}

/** Mean of a certain or uncertain quantity. */
export function meanOf(quantity: Quantity): number {
  return typeof quantity === "number" ? quantity : distributionMean(quantity.distribution);
}

export function distributionMean(distribution: Distribution): number {
  return distributionMoments(distribution).mean;
}

export function distributionSd(distribution: Distribution): number {
  return distributionMoments(distribution).sd;
}

/** Mean and sd of the variable itself: of the cut distribution for `truncated_normal`, of the prediction for `measured`. */
export function distributionMoments(distribution: Distribution): Moments {
  switch (distribution.kind) {
    case "normal":
    case "lognormal":
    case "gumbel":
    case "gamma":
    case "beta":
      return { mean: distribution.mean, sd: distribution.sd };
    case "uniform":
      return {
        mean: (distribution.from + distribution.to) / 2,
        sd: (distribution.to - distribution.from) / Math.sqrt(12),
      };
    case "triangular":
      return triangularMoments(distribution.from, distribution.peak, distribution.to);
    case "truncated_normal":
      return truncatedNormalMoments(distribution.mean, distribution.sd, distribution.from, distribution.to);
    case "weibull":
      return weibullMoments(distribution.shape, distribution.scale, distribution.shift);
    case "mixture":
      return mixtureMoments(distribution.parts);
    case "measured":
      return predictiveMoments(distribution.values, distribution.as, distribution.varianceReduction);
  }
}

function triangularMoments(a: number, c: number, b: number): Moments {
  return { mean: (a + b + c) / 3, sd: Math.sqrt(((b - a) ** 2 + (c - a) * (c - b)) / 18) };
}

/**
 * With a = (from − m)/s, b = (to − m)/s and Z = Φ(b) − Φ(a):
 *
 *   mean = m + s (φ(a) − φ(b))/Z,  variance = s² [1 + (a φ(a) − b φ(b))/Z − ((φ(a) − φ(b))/Z)²]
 *
 * Both cuts are finite. Mirrored where both lie above the mean, so that Z keeps its digits.
 */
function truncatedNormalMoments(m: number, s: number, from: number, to: number): Moments {
  if (from > m) {
    const mirrored = truncatedNormalMoments(-m, s, -to, -from);
    return { mean: -mirrored.mean, sd: mirrored.sd };
  }
  const a = (from - m) / s;
  const b = (to - m) / s;
  const z = normalCdf(b) - normalCdf(a);
  const shift = (normalPdf(a) - normalPdf(b)) / z;
  const atEnds = (a * normalPdf(a) - b * normalPdf(b)) / z;
  return { mean: m + s * shift, sd: s * Math.sqrt(Math.max(0, 1 + atEnds - shift * shift)) };
}

/** mean = shift + scale Γ(1 + 1/k), variance = scale² [Γ(1 + 2/k) − Γ(1 + 1/k)²] */
function weibullMoments(shape: number, scale: number, shift: number): Moments {
  const first = gamma(1 + 1 / shape);
  return { mean: shift + scale * first, sd: scale * Math.sqrt(Math.max(0, gamma(1 + 2 / shape) - first * first)) };
}

function mixtureMoments(parts: readonly { readonly share: number; readonly of: Distribution }[]): Moments {
  const each = parts.map((part) => ({ share: part.share, ...distributionMoments(part.of) }));
  const mean = each.reduce((sum, part) => sum + part.share * part.mean, 0);
  const variance = each.reduce((sum, part) => sum + part.share * (part.sd ** 2 + (part.mean - mean) ** 2), 0);
  return { mean, sd: Math.sqrt(variance) };
}

/**
 * Predictive distribution after n values with mean m and standard deviation s (n − 1): `m + s √(Γ² + 1/n)·t` with
 * Student's t of n − 1 degrees of freedom; for `lognormal` the logarithm is normal with the same mean and variance,
 * `s² (Γ² + 1/n)(n − 1)/(n − 3)`. Needs n ≥ 4.
 */
function predictiveMoments(values: readonly number[], as: "normal" | "lognormal", varianceReduction: number): Moments {
  const n = values.length;
  const numbers = as === "lognormal" ? values.map(Math.log) : values;
  const mean = sampleMean(numbers);
  const variance = (sampleVariance(numbers) * (varianceReduction + 1 / n) * (n - 1)) / (n - 3);
  if (as === "normal") return { mean, sd: Math.sqrt(variance) };
  const logMean = Math.exp(mean + variance / 2);
  return { mean: logMean, sd: logMean * Math.sqrt(Math.expm1(variance)) };
}
