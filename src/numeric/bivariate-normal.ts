import { gaussLegendre, panels } from "./gauss-legendre.ts";
import { logNormalCdf, logNormalPdf, normalCdf, normalPdf, normalUpper } from "./normal.ts";
import { findRoot } from "./root.ts";

/**
 * Φ₂(h, k; r), the chance that two standard normals of correlation r stay below h and below k.
 *
 *   ∫ φ(x) Φ((k − r x)/√(1 − r²)) dx over x ≤ h
 *
 * The integrand is never negative and falls from its largest value at least as fast as φ, so quadrature about that point
 * keeps the digits of small chances too: relative error below 1e-12 down to 1e-290; tests/outside/bivariate-normal.
 *
 * @param r in [−1, 1]
 */
export function bivariateNormal(h: number, k: number, r: number): number {
  if (!(r >= -1 && r <= 1)) throw new RangeError(`${r} is no correlation`);
  if (h > k) return bivariateNormal(k, h, r);
  if (h === Number.NEGATIVE_INFINITY) return 0;
  if (k === Number.POSITIVE_INFINITY) return normalCdf(h);
  if (r === 0) return normalCdf(h) * normalCdf(k);
  const s = Math.sqrt((1 - r) * (1 + r));
  if (s < 1e-8) return r > 0 ? normalCdf(h) : between(-k, h);
  return integrateFrom(h, k, r, s);
}

/** Chance that one standard normal lies between the two, 0 where the first is the larger. */
function between(low: number, high: number): number {
  if (low >= high) return 0;
  return low > 0 ? normalUpper(low) - normalUpper(high) : normalCdf(high) - normalCdf(low);
}

function integrateFrom(h: number, k: number, r: number, s: number): number {
  const { centre, slope } = largestAt(h, k, r, s);
  const top = Math.min(h, centre + 9); // φ falls by e^−40 within 9
  // at a limit the integrand falls like an exponential, and by e^−45 at least within this
  const bottom = centre - Math.min(9, 45 / slope);
  // Φ steps from 0 to 1 within some s/|r| of x = k/r: panels of that width there, of 1 elsewhere
  const width = s / Math.abs(r);
  const step = k / r;
  const fine = width >= 1 ? [] : Array.from({ length: 21 }, (_, i) => step + (i - 10) * width);
  const points = panels(bottom, top, fine, Math.min(1, 15 / slope));
  const { nodes, weights } = gaussLegendre(20);
  let sum = 0;
  for (let p = 1; p < points.length; p++) {
    const half = 0.5 * (points[p] - points[p - 1]);
    const middle = points[p - 1] + half;
    for (let i = 0; i < nodes.length; i++) {
      const x = middle + half * nodes[i];
      sum += half * weights[i] * normalPdf(x) * normalCdf((k - r * x) / s);
    }
  }
  return sum;
}

/** Where φ(x) Φ((k − r x)/s) is largest for x ≤ h (its logarithm is concave), and its slope there: 0 but at the limit. */
function largestAt(h: number, k: number, r: number, s: number): { centre: number; slope: number } {
  const slope = (x: number): number => {
    const t = (k - r * x) / s;
    return -x - (r / s) * Math.exp(logNormalPdf(t) - logNormalCdf(t));
  };
  const start = Math.min(h, 40);
  if (slope(start) >= 0) return { centre: start, slope: slope(start) };
  let low = start - 1;
  while (slope(low) < 0) low -= 2 * (start - low);
  return { centre: findRoot(slope, low, start, 1e-3).x, slope: 0 };
}
