import { normalCdf, normalQuantile, normalTailLimit, normalUpper, normalUpperQuantile } from "../numeric/normal.ts";
import type { Marginal } from "./marginal.ts";

/** What a distribution must state itself; the rest follows. */
export interface MarginalParts
  extends Pick<
    Marginal,
    "kind" | "mean" | "sd" | "lowest" | "highest" | "pdf" | "cdf" | "ccdf" | "quantile" | "upperQuantile"
  > {
  /** Left out where x(u) is smooth. */
  readonly kinks?: readonly number[];
  readonly jumps?: readonly number[];
  /** A shorter way than through the probability, where there is one. */
  readonly quantileOfNormal?: (u: number) => number;
  readonly normalOfQuantile?: (x: number) => number;
}

/**
 * The marginal whose images in standard normal space go through the nearer tail:
 *
 *   x(u) = quantile(Φ(u)) for u ≤ 0, upperQuantile(1 − Φ(u)) above
 *   u(x) = Φ⁻¹(cdf(x)) where cdf(x) ≤ ½, else −Φ⁻¹(ccdf(x))
 *
 * |u| above 37.5, where probabilities underflow, is taken as 37.5.
 */
export function completeMarginal(parts: MarginalParts): Marginal {
  const { cdf, ccdf, quantile, upperQuantile } = parts;
  return {
    kinks: [],
    jumps: [],
    quantileOfNormal(u: number): number {
      if (u <= 0) return quantile(normalCdf(Math.max(u, -normalTailLimit)));
      return upperQuantile(normalUpper(Math.min(u, normalTailLimit)));
    },
    normalOfQuantile(x: number): number {
      const below = cdf(x);
      return below <= 0.5 ? normalQuantile(below) : normalUpperQuantile(ccdf(x));
    },
    ...parts,
  };
}

/** @throws RangeError naming the parameter and its value where it is not above 0 (and finite) */
export function requirePositive(distribution: string, name: string, value: number): void {
  if (!(value > 0 && value < Number.POSITIVE_INFINITY)) {
    throw new RangeError(`${distribution}: ${name} is ${value}, must be above 0`);
  }
}

/** @throws RangeError naming the parameter where it is not a finite number */
export function requireFinite(distribution: string, name: string, value: number): void {
  if (!Number.isFinite(value)) throw new RangeError(`${distribution}: ${name} is ${value}, must be a finite number`);
}
