import { gaussLegendre, panels } from "../numeric/gauss-legendre.ts";
import { normalPdf } from "../numeric/normal.ts";
import type { Marginal } from "./marginal.ts";

/**
 * A standardised marginal in Hermite polynomials of its standard normal image,
 *
 *   (x(u) − mean)/sd = Σ aₙ Heₙ(u)/√n!,  n = 1 … N
 *
 * The squares of all the coefficients add up to 1, so what is left out is known: `rest` = 1 − Σ aₙ².
 */
export interface HermiteSeries {
  /** coefficients[n], n = 0 … N; entry 0 is the error of the mean, 0 but for rounding */
  readonly coefficients: Float64Array;
  readonly rest: number;
}

/** Nodes u with the standardised value and the weight φ(u) du. */
export interface NormalRule {
  readonly u: Float64Array;
  readonly weight: Float64Array;
}

/**
 * Gauss–Legendre rule for integrals against φ, on panels no wider than `width` that end on every break and become finer
 * towards the jumps (x(u) may start there like a square root).
 */
export function normalRule(marginals: readonly Marginal[], breaks: Breaks, width: number): NormalRule {
  const reach = Math.max(...marginals.map(reachOf));
  const graded = breaks.jumps.flatMap((at) =>
    Array.from({ length: 10 }, (_, k) => 0.25 * 4 ** -k).flatMap((step) => [at - step, at + step]),
  );
  const points = panels(-reach, reach, [...new Set([...breaks.kinks, ...breaks.jumps, ...graded])], width);
  const { nodes, weights } = gaussLegendre(16);
  const u = new Float64Array(16 * (points.length - 1));
  const weight = new Float64Array(u.length);
  for (let p = 1, at = 0; p < points.length; p++) {
    const half = 0.5 * (points[p] - points[p - 1]);
    for (let i = 0; i < 16; i++, at++) {
      u[at] = points[p - 1] + half * (1 + nodes[i]);
      weight[at] = half * weights[i] * normalPdf(u[at]);
    }
  }
  return { u, weight };
}

type Breaks = Pick<Marginal, "kinks" | "jumps">;

/** |u| beyond which nothing counts: 16 where a tail is as heavy as a Student variable's with few degrees of freedom. */
function reachOf(m: Marginal): number {
  const square = (u: number): number => ((m.quantileOfNormal(u) - m.mean) / m.sd) ** 2 * normalPdf(u);
  return Math.max(square(-9), square(9)) > 1e-14 ? 16 : 9;
}

const series = new WeakMap<Marginal, HermiteSeries>();

/** The series of a marginal with at least `terms` terms (at most 4096); kept, so asking again costs nothing. */
export function hermiteSeries(m: Marginal, terms: number): HermiteSeries {
  const known = series.get(m);
  if (known && known.coefficients.length > terms) return known;
  const found = m.kind === "normal" ? { coefficients: Float64Array.of(0, 1), rest: 0 } : projected(m, terms);
  series.set(m, found);
  return found;
}

function projected(m: Marginal, terms: number): HermiteSeries {
  // a Hermite polynomial of degree n waves √n radians per unit; 16 nodes follow 8 radians either side of a panel's middle
  const { u, weight } = normalRule([m], m, terms <= 500 ? 0.5 : 0.25);
  const coefficients = new Float64Array(terms + 1);
  for (let i = 0; i < u.length; i++) {
    const value = ((m.quantileOfNormal(u[i]) - m.mean) / m.sd) * weight[i];
    let last = 0;
    let polynomial = 1; // Heₙ/√n!, by its three-term recurrence
    for (let n = 0; n <= terms; n++) {
      coefficients[n] += value * polynomial;
      const next = (u[i] * polynomial - Math.sqrt(n) * last) / Math.sqrt(n + 1);
      last = polynomial;
      polynomial = next;
    }
  }
  const sum = coefficients.reduce((total, a) => total + a * a, 0);
  return { coefficients, rest: Math.max(0, 1 - sum) };
}
