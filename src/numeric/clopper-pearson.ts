import { betaQuantile } from "./incomplete-beta.ts";

/**
 * Exact confidence interval for a probability of which `failures` were seen in `samples` independent trials. It covers
 * the truth at least as often as it says, however few the failures.
 *
 *   lower: I_p(k, n − k + 1) = α/2, upper: I_p(k + 1, n − k) = 1 − α/2, α = 1 − level
 *
 * With no failure the lower end is 0 and the upper 1 − (α/2)^(1/n); with nothing but failures the reverse. The interval
 * stays two-sided there, so that one rule holds for any count.
 *
 * @param failures count, 0 … samples (need not be whole: an effective count may be given)
 * @param level confidence, in (0, 1)
 * @returns lower and upper end, relative error below 1e-10
 * @throws RangeError where the counts make no sense
 * @source C. J. Clopper and E. S. Pearson (1934), Biometrika 26, 404–413
 * @example clopperPearson(0, 20)[1] // 0.1684
 */
export function clopperPearson(failures: number, samples: number, level = 0.95): [number, number] {
  if (!(samples > 0 && failures >= 0 && failures <= samples))
    throw new RangeError(`${failures} failures in ${samples} samples`);
  if (!(level > 0 && level < 1)) throw new RangeError(`${level} is no level of confidence`);
  const tail = 0.5 * (1 - level);
  const survivals = samples - failures;
  const lower = failures === 0 ? 0 : betaQuantile(tail, failures, survivals + 1).x;
  const upper = survivals === 0 ? 1 : betaQuantile(tail, failures + 1, survivals, true).x;
  return [lower, upper];
}
