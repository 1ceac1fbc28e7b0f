import type { BeliefVariable, SeenResults } from "./decision-problem.ts";
import { knowledgeCurve, meanResultSd } from "./knowledge-curve.ts";

/**
 * What results say of K, as a normal factor exp(−½·precision·k² + shift·k) on its density. Exact where X is normal;
 * otherwise the factor that gives the posterior of K its true mean and variance, and `logCorrection` is the rest of the
 * likelihood.
 */
export interface ResultSite {
  readonly variable: number;
  readonly precision: number;
  readonly shift: number;
  readonly logCorrection?: (k: number) => number;
}

/** Several series on one variable as one: their means weighted by precision. */
export function pooledResults(
  variable: BeliefVariable,
  series: readonly SeenResults[],
): { readonly mean: number; readonly sd: number } {
  let precision = 0;
  let sum = 0;
  for (const one of series) {
    const weight = 1 / meanResultSd(variable, one) ** 2;
    precision += weight;
    sum += weight * one.mean;
  }
  return { mean: sum / precision, sd: 1 / Math.sqrt(precision) };
}

/**
 * @param prior mean and sd of K before these results
 */
export function resultSite(
  variable: BeliefVariable,
  place: number,
  series: readonly SeenResults[],
  prior: { readonly mean: number; readonly sd: number } = { mean: 0, sd: 1 },
): ResultSite {
  const { mean, sd } = pooledResults(variable, series);
  const curve = knowledgeCurve(variable);
  if (curve.linear !== undefined) {
    const { slope } = curve.linear;
    return { variable: place, precision: (slope / sd) ** 2, shift: (slope * (mean - curve.linear.mean)) / (sd * sd) };
  }
  const logLikelihood = (k: number): number => -0.5 * ((mean - curve.at(k)) / sd) ** 2;
  const moments = posteriorMoments(logLikelihood, prior);
  // a posterior wider than the prior (a flat stretch of θ) leaves no normal factor: the correction carries it all
  const precision = Math.max(1 / moments.variance - 1 / prior.sd ** 2, 0);
  const shift = precision === 0 ? 0 : moments.mean / moments.variance - prior.mean / prior.sd ** 2;
  const raw = (k: number): number => logLikelihood(k) + 0.5 * precision * k * k - shift * k;
  const level = raw(moments.mean);
  return { variable: place, precision, shift, logCorrection: (k) => raw(k) - level };
}

/** Mean and variance of k under φ·likelihood: a coarse sum over the whole line, then a fine one where the weight is. */
function posteriorMoments(
  logLikelihood: (k: number) => number,
  prior: { readonly mean: number; readonly sd: number },
): { mean: number; variance: number } {
  const logPosterior = (k: number): number => logLikelihood(k) - 0.5 * ((k - prior.mean) / prior.sd) ** 2;
  let from = prior.mean - 9 * prior.sd;
  let to = prior.mean + 9 * prior.sd;
  let found = { mean: prior.mean, variance: prior.sd ** 2 };
  for (let round = 0; round < 4; round++) {
    found = momentsOver(logPosterior, from, to);
    const width = 10 * Math.sqrt(found.variance) + (to - from) / 900;
    if (2 * width >= to - from) break;
    from = found.mean - width;
    to = found.mean + width;
  }
  return found;
}

function momentsOver(logDensity: (k: number) => number, from: number, to: number): { mean: number; variance: number } {
  const n = 1801;
  const k = Float64Array.from({ length: n }, (_, i) => from + ((to - from) * i) / (n - 1));
  const logs = k.map(logDensity);
  const highest = logs.reduce((a, b) => Math.max(a, b), Number.NEGATIVE_INFINITY);
  const weights = logs.map((value) => Math.exp(value - highest));
  let [sum, first] = [0, 0];
  for (let i = 0; i < n; i++) {
    sum += weights[i];
    first += weights[i] * k[i];
  }
  const mean = first / sum;
  let second = 0;
  for (let i = 0; i < n; i++) second += weights[i] * (k[i] - mean) ** 2;
  return { mean, variance: Math.max(second / sum, ((to - from) / (n - 1)) ** 2 / 12) };
}
