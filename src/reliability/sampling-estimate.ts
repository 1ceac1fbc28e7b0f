import { normalUpperQuantile } from "../numeric/normal.ts";

/** The words of `--method`. */
export type SamplingMethod = "plain" | "latin_hypercube" | "sobol" | "importance" | "subset" | "directional";

/** What every sampling method reports of the system: the union of all limit states. */
export interface SamplingEstimate {
  readonly method: SamplingMethod;
  readonly probability: number;
  readonly standardError: number;
  /** 95 %. */
  readonly interval: readonly [number, number];
  /** How the interval was made, for people. */
  readonly intervalKind: string;
  /** Evaluations of the limit states, searches and pilots included. */
  readonly evaluations: number;
  /** Reasons not to trust it; empty where there is none. */
  readonly doubts: readonly string[];
}

/** What a sampling run is asked for. */
export interface SamplingOrder {
  readonly seed: string;
  /** Coefficient of variation to reach; 0 uses all samples. */
  readonly precision: number;
  /** Most evaluations of the run. */
  readonly samples: number;
}

/** 1.96, two-sided 95 %. */
const normal95 = normalUpperQuantile(0.025);

/**
 * Normal interval on the logarithm of an estimate: p·e^(±q·se/p).
 *
 * The plain normal interval of a weighted estimate misses on one side, because an estimate that is too low comes with an error
 * that is too small.
 *
 * @param quantile of the standard normal, or of Student's t where the error rests on few replicates
 */
export function logarithmicInterval(
  probability: number,
  standardError: number,
  quantile: number = normal95,
): readonly [number, number] {
  if (probability <= 0) return [0, 1];
  const width = Math.exp((quantile * standardError) / probability);
  return [probability / width, Math.min(1, probability * width)];
}

/** Coefficient of variation of an estimate; infinite where it is 0. */
export const spreadOf = ({
  probability,
  standardError,
}: Pick<SamplingEstimate, "probability" | "standardError">): number =>
  probability > 0 ? standardError / probability : Number.POSITIVE_INFINITY;
