import { compensatedSum } from "../numeric/compensated-sum.ts";

/** Samples of which some are kept; an estimate is the sum of weight·value over those, the others count as zeros. */
export interface StratifiedSample {
  readonly count: number;
  /** Coordinates, one column each, `count` entries. */
  readonly z: readonly Float64Array[];
  /** Includes 1/(number of samples drawn). */
  readonly weight: Float64Array;
  /**
   * Number of the pair that a sample belongs to, rising. The two of a pair come from neighbouring parts of one distribution;
   * one of them may not have been kept.
   */
  readonly pair: Uint32Array;
  /** Part of the sample for cross-fitting, 0 … folds − 1. */
  readonly fold: Uint8Array;
  readonly folds: number;
}

export interface Estimate {
  readonly value: number;
  readonly standardError: number;
}

/**
 * Σ weight·y with its standard error.
 *
 * Every sample comes from a part of its own of the distribution, so the variance is estimated from the differences within
 * pairs, Σ (y_a − y_b)²: too large by the square of the difference between the two means, never too small in the mean.
 *
 * @source W. G. Cochran (1977), Sampling Techniques, 3rd ed., section 5A.12, collapsed strata (from memory)
 */
export function stratifiedSum(sample: StratifiedSample, y: ArrayLike<number>): Estimate {
  const { weight, pair, count } = sample;
  const terms = new Float64Array(count);
  let variance = 0;
  for (let i = 0; i < count; i++) {
    terms[i] = weight[i] * y[i];
    if (i > 0 && pair[i] === pair[i - 1]) {
      variance += terms[i] * terms[i] - 2 * terms[i] * terms[i - 1];
    } else variance += terms[i] * terms[i];
  }
  return { value: compensatedSum(terms), standardError: Math.sqrt(Math.max(variance, 0)) };
}

/** Largest share of the sum that a single sample carries; a third is a sign that a region was missed. */
export function largestShare(sample: StratifiedSample, y: ArrayLike<number>): number {
  let [sum, largest] = [0, 0];
  for (let i = 0; i < sample.count; i++) {
    const term = sample.weight[i] * y[i];
    sum += term;
    largest = Math.max(largest, term);
  }
  return sum > 0 ? largest / sum : 0;
}
