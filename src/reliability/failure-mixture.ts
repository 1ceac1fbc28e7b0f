import { normalUpper } from "../numeric/normal.ts";
import { near } from "./design-point.ts";
import type { DesignPoint } from "./design-points.ts";
import type { Columns } from "./limit-states.ts";
import { norm, type Point } from "./point-evaluator.ts";

/** Coordinates that a part of the mixture moves, and where their normals are then centred; all others stay standard normal. */
export interface Move {
  readonly places: readonly number[];
  readonly centre: readonly number[];
}

/** A part of the mixture; where it has several moves they share it equally. */
export interface MixturePart {
  readonly share: number;
  /** Standard deviation of the coordinates moved. */
  readonly sd: number;
  readonly moves: readonly Move[];
}

/** A centre of failure: a design point, with the share of the samples drawn around it. */
export interface FailureCentre {
  readonly point: Point;
  readonly share: number;
}

const wideShare = 0.05;
const wideSd = 1.5;
const leastShare = 0.1;
/** Points farther out than the nearest by more than this add nothing that the wide part does not see. */
const reach = 2.5;

/**
 * Design points of all limit states as centres: shares by Φ(−β), at least a tenth each; the same point of two limit states counts once.
 */
export function failureCentres(points: readonly DesignPoint[]): readonly FailureCentre[] {
  const nearest = Math.min(...points.map(({ point }) => norm(point)));
  const kept: Point[] = [];
  for (const { point } of [...points].sort((a, b) => norm(a.point) - norm(b.point)))
    if (norm(point) <= nearest + reach && !kept.some((other) => near(other, point))) kept.push(point);
  const weights = kept.map((point) => normalUpper(norm(point)));
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  const least = Math.min(leastShare, 0.5 / kept.length);
  const held = weights.map((weight) => Math.max(weight / total, least));
  const sum = held.reduce((a, b) => a + b, 0);
  return kept.map((point, i) => ({ point, share: held[i] / sum }));
}

/**
 * The mixture to sample from: unit normals at the centres, and a wide normal about the origin that guards against regions that no
 * centre stands for.
 *
 * @param movesOf where a point lies among the coordinates that are drawn: once, or once for each year of a period
 */
export function mixtureOf(
  centres: readonly FailureCentre[],
  movesOf: (point: Point) => readonly Move[],
): MixturePart[] {
  const parts = centres.map(({ point, share }) => ({ share: (1 - wideShare) * share, sd: 1, moves: movesOf(point) }));
  if (centres.length === 0) return parts;
  const origin = new Float64Array(centres[0].point.length);
  return [...parts, { share: wideShare, sd: wideSd, moves: movesOf(origin) }];
}

/** All coordinates moved at once, for a space without years. */
export function wholeMove(point: Point): readonly Move[] {
  return [{ places: Array.from(point, (_, j) => j), centre: Array.from(point) }];
}

/** Moves one sample of standard normals, in place. */
export function moveSample(z: Columns, i: number, sd: number, { places, centre }: Move): void {
  for (let k = 0; k < places.length; k++) z[places[k]][i] = centre[k] + sd * z[places[k]][i];
}

/**
 * Balance weights φ(z)/q(z) of n samples, q the whole mixture.
 *
 *   q/φ = Σ share · ∏ exp(z²/2 − (z − c)²/(2 s²))/s, the product over the coordinates moved
 *
 * @source E. Veach and L. J. Guibas (1995), Optimally combining sampling techniques for Monte Carlo rendering, SIGGRAPH 95 (the
 *   balance heuristic)
 */
export function balanceWeights(parts: readonly MixturePart[], z: Columns, n: number, weights: Float64Array): void {
  weights.fill(0, 0, n);
  for (const { share, sd, moves } of parts) {
    const each = share / moves.length;
    const narrow = 0.5 - 0.5 / (sd * sd);
    for (const { places, centre } of moves) {
      const scale = each / sd ** places.length;
      const square = centre.reduce((sum, c) => sum + c * c, 0) / (2 * sd * sd);
      for (let i = 0; i < n; i++) {
        let exponent = -square;
        for (let k = 0; k < places.length; k++) {
          const value = z[places[k]][i];
          exponent += value * (narrow * value + centre[k] / (sd * sd));
        }
        weights[i] += scale * Math.exp(exponent);
      }
    }
  }
  for (let i = 0; i < n; i++) weights[i] = 1 / weights[i];
}
