/** What is believed of a normal mean. */
export interface NormalBelief {
  readonly mean: number;
  readonly sd: number;
}

/**
 * Normal mean after the mean of some results with a known standard deviation,
 *
 *   1/σ″² = 1/σ′² + 1/s²,  μ″ = σ″²(μ′/σ′² + x̄/s²),  s² = e²/n + t²
 */
export function updatedMean(prior: NormalBelief, resultMean: number, resultSd: number): NormalBelief {
  const precision = 1 / prior.sd ** 2 + 1 / resultSd ** 2;
  const mean = (prior.mean / prior.sd ** 2 + resultMean / resultSd ** 2) / precision;
  return { mean, sd: 1 / Math.sqrt(precision) };
}

/**
 * Normal distribution whose mean and variance are both unknown: the mean has Student's t about `mean` with `degrees` degrees
 * of freedom and scale √(variance/weight), the variance is `variance·degrees` over a chi-square variable.
 */
export interface NormalVarianceBelief {
  readonly mean: number;
  /** Results that the mean is worth. */
  readonly weight: number;
  readonly variance: number;
  readonly degrees: number;
}

/** @source A. Gelman et al. (2013), Bayesian Data Analysis, 3rd ed., section 3.3 (from memory) */
export function updatedMeanAndVariance(prior: NormalVarianceBelief, results: readonly number[]): NormalVarianceBelief {
  const n = results.length;
  const average = results.reduce((sum, x) => sum + x, 0) / n;
  const squares = results.reduce((sum, x) => sum + (x - average) ** 2, 0);
  const weight = prior.weight + n;
  const degrees = prior.degrees + n;
  const between = ((prior.weight * n) / weight) * (average - prior.mean) ** 2;
  return {
    mean: (prior.weight * prior.mean + n * average) / weight,
    weight,
    degrees,
    variance: (prior.degrees * prior.variance + squares + between) / degrees,
  };
}

/** Scale of Student's t for the next value, √(variance (1 + 1/weight)); it has `degrees` degrees of freedom. */
export function predictiveScale({ variance, weight }: NormalVarianceBelief): number {
  return Math.sqrt(variance * (1 + 1 / weight));
}
