import { findRisingRoot, type RisingFunction } from "../numeric/root.ts";
import { completeMarginal } from "./complete-marginal.ts";
import type { Marginal } from "./marginal.ts";

/** A part of a mixture: how often it holds, and how the quantity is then distributed. */
export interface MixturePart {
  readonly share: number;
  readonly of: Marginal;
}

/**
 * Mixture: with chance `share` the quantity follows that part.
 *
 * Density: f(x) = Σ share·f_part(x)
 * Moments: mean = Σ share·mean_part, sd² = Σ share·(sd_part² + (mean_part − mean)²)
 *
 * Where no part reaches (a gap between their supports) x(u) jumps; where a part begins, ends or has a kink it bends.
 */
export function mixture(parts: readonly MixturePart[]): Marginal {
  // parameters
  for (const { share } of parts) {
    if (!(share >= 0 && share <= 1)) throw new RangeError(`mixture: share is ${share}, must lie between 0 and 1`);
  }
  const total = parts.reduce((sum, { share }) => sum + share, 0);
  if (!(Math.abs(total - 1) <= 1e-6)) throw new RangeError(`mixture: the shares add up to ${total}, must add up to 1`);
  const present = parts.filter(({ share }) => share > 0).map(({ share, of }) => ({ share: share / total, of }));
  const over = (value: (of: Marginal) => number): number =>
    present.reduce((sum, { share, of }) => sum + share * value(of), 0);

  // moments
  const mean = over((of) => of.mean);
  const sd = Math.sqrt(over((of) => of.sd ** 2 + (of.mean - mean) ** 2));

  // evaluation
  const pdf = (x: number): number => over((of) => of.pdf(x));
  const cdf = (x: number): number => over((of) => of.cdf(x));
  const ccdf = (x: number): number => over((of) => of.ccdf(x));
  // F ≥ share·F_part: the quantile lies below each part's at p/share, and close to it where that part is alone
  const quantile = (p: number): number => {
    const [low, high] = range(present.map(({ of }) => of.quantile(p)));
    const alone = present.filter(({ share }) => share > p).map(({ share, of }) => of.quantile(p / share));
    return pointBetween(low, Math.min(high, ...alone), "high", {
      value: (x) => Math.log(cdf(x) / p),
      slope: (x, value) => pdf(x) / (p * Math.exp(value)),
    });
  };
  const upperQuantile = (q: number): number => {
    const [low, high] = range(present.map(({ of }) => of.upperQuantile(q)));
    const alone = present.filter(({ share }) => share > q).map(({ share, of }) => of.upperQuantile(q / share));
    return pointBetween(Math.max(low, ...alone), high, "low", {
      value: (x) => -Math.log(ccdf(x) / q),
      slope: (x, value) => pdf(x) / (q * Math.exp(-value)),
    });
  };
  const smooth = completeMarginal({
    kind: "mixture",
    mean,
    sd,
    lowest: Math.min(...present.map(({ of }) => of.lowest)),
    highest: Math.max(...present.map(({ of }) => of.highest)),
    pdf,
    cdf,
    ccdf,
    quantile: (p) => (p <= 0.5 ? quantile(p) : upperQuantile(1 - p)),
    upperQuantile: (q) => (q <= 0.5 ? upperQuantile(q) : quantile(1 - q)),
  });
  return { ...smooth, ...breaksOf(smooth, present) };
}

function range(values: readonly number[]): [number, number] {
  return [Math.min(...values), Math.max(...values)];
}

/** The mixture's quantile lies between the least and the largest of its parts' at the same probability. */
function pointBetween(low: number, high: number, start: "low" | "high", f: RisingFunction): number {
  if (low >= high) return start === "low" ? low : high;
  return findRisingRoot(f, low, high, start === "low" ? low : high).x;
}

/** Kinks and jumps of the mixture, as points u. */
function breaksOf(whole: Marginal, parts: readonly MixturePart[]): { kinks: number[]; jumps: number[] } {
  const image = (points: readonly number[]): number[] =>
    [...new Set(points.filter(Number.isFinite).map(whole.normalOfQuantile).filter(Number.isFinite))].sort(
      (a, b) => a - b,
    );
  const jumps = image(gapsOf(parts));
  // a part bends the mixture where it begins, where it ends, and where it bends or jumps itself
  const bends = parts.flatMap(({ of }) => [
    of.lowest,
    of.highest,
    ...of.kinks.map(of.quantileOfNormal),
    ...of.jumps.flatMap((u) => [of.quantileOfNormal(u - 1e-9), of.quantileOfNormal(u + 1e-9)]),
  ]);
  return { jumps, kinks: image(bends).filter((u) => jumps.every((jump) => Math.abs(jump - u) > 1e-7)) };
}

/**
 * Midpoints of the gaps that no part reaches. Parts without end are taken to reach as far as all but 1e-10 of their chance,
 * so that narrow parts far from each other have their jump too.
 */
function gapsOf(parts: readonly MixturePart[]): number[] {
  const pieces = parts
    .flatMap(({ of }) => {
      const ends = [
        of.quantile(1e-10),
        ...of.jumps.flatMap((u) => [of.quantileOfNormal(u - 1e-9), of.quantileOfNormal(u + 1e-9)]),
      ];
      return [...ends, of.upperQuantile(1e-10)].map((x, i, all) => [x, all[i + 1]]).filter((_, i) => i % 2 === 0);
    })
    .sort((a, b) => a[0] - b[0]);
  const gaps: number[] = [];
  let reached = pieces[0][1];
  for (const [start, end] of pieces) {
    if (start > reached) gaps.push(0.5 * (reached + start));
    reached = Math.max(reached, end);
  }
  return gaps;
}
