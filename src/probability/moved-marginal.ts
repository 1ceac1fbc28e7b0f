import { normalPdf } from "../numeric/normal.ts";
import type { Marginal } from "./marginal.ts";

/**
 * How a distribution answers when its mean or its standard deviation changes a little, per unit of that change. Three views of
 * the same movement; each serves another method.
 */
export interface Movement {
  /** ∂x/∂θ at fixed u: where the value goes. */
  ofValue(u: number): number;
  /** ∂ ln f(x)/∂θ at fixed x. */
  ofLogDensity(x: number): number;
  /** ∂u/∂θ at fixed x: where the normal image goes. */
  ofNormal(u: number): number;
}

export interface Movements {
  readonly mean: Movement;
  readonly sd: Movement;
  /** Whether the density jumps at an end of the support, so that ofLogDensity misses what happens there. */
  readonly edged: boolean;
}

/** The marginal with another mean and standard deviation, of the same kind. */
export type Remade = (mean: number, sd: number) => Marginal;

/**
 * Movements of a marginal.
 *
 * Without `remade` the whole distribution is shifted, or stretched about its mean: X + δ, and mean + (1 + ε)(X − mean) with
 * sd·ε the change of the standard deviation. With it the parameters change and the kind stays: a lognormal remains one.
 */
export function movementsOf(marginal: Marginal, remade?: Remade): Movements {
  if (remade !== undefined) return { ...remadeMovements(marginal, remade), edged: isEdged(marginal) };
  const { mean, sd } = marginal;
  const step = 1e-5 * sd;
  const slope = (x: number): number => (logPdf(marginal, x + step) - logPdf(marginal, x - step)) / (2 * step);
  return {
    mean: {
      ofValue: () => 1,
      ofLogDensity: (x) => -slope(x),
      ofNormal: (u) => -1 / stretchAt(marginal, u),
    },
    sd: {
      ofValue: (u) => (marginal.quantileOfNormal(u) - mean) / sd,
      ofLogDensity: (x) => (-1 - (x - mean) * slope(x)) / sd,
      ofNormal: (u) => -(marginal.quantileOfNormal(u) - mean) / sd / stretchAt(marginal, u),
    },
    edged: isEdged(marginal),
  };
}

function remadeMovements(marginal: Marginal, remade: Remade): { mean: Movement; sd: Movement } {
  const { mean, sd } = marginal;
  const step = 1e-4 * sd;
  const along = (up: Marginal, down: Marginal): Movement => {
    const ofValue = (u: number): number => (up.quantileOfNormal(u) - down.quantileOfNormal(u)) / (2 * step);
    return {
      ofValue,
      ofLogDensity: (x) => (logPdf(up, x) - logPdf(down, x)) / (2 * step),
      ofNormal: (u) => -ofValue(u) / stretchAt(marginal, u),
    };
  };
  return {
    mean: along(remade(mean + step, sd), remade(mean - step, sd)),
    sd: along(remade(mean, sd + step), remade(mean, sd - step)),
  };
}

const logPdf = (marginal: Marginal, x: number): number => Math.log(marginal.pdf(x));

/** dx/du = φ(u)/f(x): how much of the value one standard normal unit is worth at u. */
export function stretchAt(marginal: Marginal, u: number): number {
  const step = 1e-4;
  const stretch = (marginal.quantileOfNormal(u + step) - marginal.quantileOfNormal(u - step)) / (2 * step);
  if (stretch > 0) return stretch;
  const density = marginal.pdf(marginal.quantileOfNormal(u));
  return density > 0 ? normalPdf(u) / density : Number.POSITIVE_INFINITY;
}

/** A density that does not fall to 0 at a finite end. */
function isEdged(marginal: Marginal): boolean {
  const { lowest, highest, sd } = marginal;
  const typical = 1 / sd;
  const at = (end: number, inwards: number): boolean =>
    Number.isFinite(end) && !(marginal.pdf(end + 1e-6 * inwards * sd) < 1e-3 * typical);
  return at(lowest, 1) || at(highest, -1);
}
