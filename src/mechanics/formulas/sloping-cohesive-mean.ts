import { gaussLegendre } from "../../numeric/gauss-legendre.ts";

/*
 * Mean of the pressure of cohesive, sloping ground over a stretch of vertical stress: the integrals behind
 * `mazindrani-ganjali.ts`, whose symbols stand here too.
 */

const sixteenPoints = gaussLegendre(16);
const eightPoints = gaussLegendre(8);

/** Mean of p and of p ξ over a stretch, ξ from 0 at its lower stress to 1 at its higher: left behind by the functions below. */
export const mean: Float64Array = new Float64Array(2);

/** p from L, the two factors of R/4 and the two of L² − R; where R < 0, or where rounding leaves less, p with the root at 0. */
function pressureFrom(
  straight: number,
  first: number,
  second: number,
  excess: number,
  other: number,
  cosPhi: number,
  cosBeta: number,
): number {
  const rootless = (cosBeta * straight) / (cosPhi * cosPhi);
  if (!(second > 0)) return rootless;
  const denominator = straight + 2 * Math.sqrt(first * second);
  if (!(denominator > 0)) return Math.min(rootless, 0);
  return Math.min((cosBeta * cosPhi * cosPhi * excess * other) / denominator, rootless);
}

/** p at a vertical stress s ≥ 0; `excess` is s − s*, passed in so that it stays exact near s*. */
export function pressureAt(
  s: number,
  excess: number,
  c: number,
  sinPhi: number,
  cosPhi: number,
  sinBeta: number,
  cosBeta: number,
): number {
  const first = c * cosPhi + s * cosBeta * (sinPhi * cosBeta + cosPhi * sinBeta);
  const second = c * cosPhi + s * cosBeta * (sinPhi * cosBeta - cosPhi * sinBeta);
  const straight = (2 * cosBeta * cosBeta - cosPhi * cosPhi) * s + 2 * c * cosPhi * sinPhi;
  return pressureFrom(straight, first, second, excess, s + (2 * c * cosPhi) / (1 + sinPhi), cosPhi, cosBeta);
}

/** Means over s from sa to sb: of the active state up to its limit, of the straight line start + slope·s beyond it. */
export function meanOfPressure(
  sa: number,
  sb: number,
  turning: number,
  c: number,
  sinPhi: number,
  cosPhi: number,
  sinBeta: number,
  cosBeta: number,
  start: number,
  slope: number,
): void {
  const steeper = sinBeta * cosPhi - cosBeta * sinPhi;
  const limit = steeper > 0 ? (c * cosPhi) / (cosBeta * steeper) : Infinity;
  if (sa >= limit && sb > limit) {
    meanOfLine(start + slope * sa, start + slope * sb);
    return;
  }
  meanOfActiveState(sa, Math.min(sb, limit), turning, c, sinPhi, cosPhi, sinBeta, cosBeta, limit);
  if (sb <= limit) return;
  const share = (limit - sa) / (sb - sa);
  const above = share * mean[0];
  const aboveXi = share * share * mean[1];
  meanOfLine(start + slope * limit, start + slope * sb);
  const rest = 1 - share;
  mean[1] = aboveXi + rest * (share * mean[0] + rest * mean[1]);
  mean[0] = above + rest * mean[0];
}

/** Of pa + (pb − pa) ξ. */
export function meanOfLine(pa: number, pb: number): void {
  mean[0] = (pa + pb) / 2;
  mean[1] = (pa + 2 * pb) / 6;
}

/**
 * Means over s from sa to sb, R ≥ 0 throughout.
 *
 * R has the roots −r1 ≤ 0 and −r1 − D/a. With y = √(s + r1), √R ds = 2 y² √(a y² + D) dy, so that
 * - where the second root is far away, or the stretch is short beside its distance, the integrand is smooth in y, and
 *   16 Gauss–Legendre points are exact to rounding (error below 1e-14: the nearest singularity lies outside the ellipse
 *   of half-axes sum 2.8, and 2.8⁻³² = 5e-15); 8 points do where yb < 1.6 ya and a ≥ 0 (8.5⁻¹⁶ = 1e-15);
 * - where a < 0 and the stretch comes near the second root, y = √(D/|a|) sin t makes the integrand a polynomial in sin t
 *   and cos t, and the same rule serves in t;
 * - elsewhere (a > 0, long stretch) the closed form does not cancel.
 */
function meanOfActiveState(
  sa: number,
  sb: number,
  turning: number,
  c: number,
  sinPhi: number,
  cosPhi: number,
  sinBeta: number,
  cosBeta: number,
  limit: number,
): void {
  const sinSum = sinPhi * cosBeta + cosPhi * sinBeta;
  const sinDifference = sinPhi * cosBeta - cosPhi * sinBeta;
  const a = 4 * cosBeta * cosBeta * sinSum * sinDifference;
  const D = 8 * c * cosBeta * cosPhi * cosPhi * sinBeta;
  const far = 1e3 * sb; // a root farther away than this no longer matters, and would cost digits
  const root = c * cosPhi < far * cosBeta * sinSum ? (c * cosPhi) / (cosBeta * sinSum) : far;
  const ya = Math.sqrt(sa + root);
  const yb = Math.sqrt(sb + root);
  if (a * yb * yb > 2 * D && yb > 3 * ya) {
    meanClosed(sa, sb, ya, yb, a, D, c, sinPhi, cosPhi, cosBeta);
    return;
  }

  const inT = a < 0 && -a * yb * yb > 0.5 * D;
  const from = inT ? Math.atan2(ya, Math.sqrt(Math.max(limit - sa, 0))) : ya;
  const to = inT ? Math.atan2(yb, Math.sqrt(Math.max(limit - sb, 0))) : yb;
  if (inT && !(to - from > 1e-8)) {
    const pa = pressureAt(sa, sa - turning, c, sinPhi, cosPhi, sinBeta, cosBeta);
    meanOfLine(pa, pressureAt(sb, sb - turning, c, sinPhi, cosPhi, sinBeta, cosBeta));
    return;
  }
  const whole = inT ? Math.sin(to - from) * Math.sin(to + from) : to + from;
  const { nodes, weights } = a >= 0 && yb < 1.6 * ya ? eightPoints : sixteenPoints;
  // everything that is linear in s, by its value at sa and its rise over the stretch
  const span = sb - sa;
  const slope = 2 * cosBeta * cosBeta - cosPhi * cosPhi;
  const straight = slope * sa + 2 * c * cosPhi * sinPhi;
  const first = c * cosPhi + sa * cosBeta * sinSum;
  const second = c * cosPhi + sa * cosBeta * sinDifference;
  const other = sa + (2 * c * cosPhi) / (1 + sinPhi);
  let sum = 0;
  let sumXi = 0;
  let sumOfWeights = 0;
  for (let i = 0; i < nodes.length; i++) {
    const u = (1 + nodes[i]) / 2;
    const at = from + u * (to - from);
    const xi = (inT ? Math.sin(at - from) * Math.sin(at + from) : u * (at + from)) / whole;
    const w = weights[i] * (inT ? Math.sin(at) * Math.cos(at) : at); // ds = 2 y dy
    const step = xi * span;
    const p = pressureFrom(
      straight + slope * step,
      first + cosBeta * sinSum * step,
      second + cosBeta * sinDifference * step,
      sa - turning + step,
      other + step,
      cosPhi,
      cosBeta,
    );
    sum += w * p;
    sumXi += w * p * xi;
    sumOfWeights += w;
  }
  mean[0] = sum / sumOfWeights;
  mean[1] = sumXi / sumOfWeights;
}

/** ∫ y² √(a y² + D) dy with d = D/a: q y (y²/4 + d/8) − (d² √a / 8) asinh(y/√d), q = √(a y² + D). */
function integralY2(y: number, a: number, D: number): number {
  const d = D / a;
  const square = d * d;
  const tail = square > 0 ? (square * Math.sqrt(a) * Math.asinh(y / Math.sqrt(d))) / 8 : 0;
  return Math.sqrt(a * y * y + D) * y * ((y * y) / 4 + d / 8) - tail;
}

/** The means by the closed form; with F2 = ∫ y² q dy, ∫ y⁴ q dy = y³ q³/(6a) − (d/2) F2. */
function meanClosed(
  sa: number,
  sb: number,
  ya: number,
  yb: number,
  a: number,
  D: number,
  c: number,
  sinPhi: number,
  cosPhi: number,
  cosBeta: number,
): void {
  const d = D / a;
  const fa = integralY2(ya, a, D);
  const fb = integralY2(yb, a, D);
  const ga = (ya * ya * ya * Math.sqrt(a * ya * ya + D) * (ya * ya + d)) / 6 - (d / 2) * fa;
  const gb = (yb * yb * yb * Math.sqrt(a * yb * yb + D) * (yb * yb + d)) / 6 - (d / 2) * fb;
  const span = sb - sa;
  const slope = 2 * cosBeta * cosBeta - cosPhi * cosPhi;
  const start = 2 * c * cosPhi * sinPhi;
  meanOfLine(start + slope * sa, start + slope * sb);
  const factor = cosBeta / (cosPhi * cosPhi);
  mean[0] = factor * (mean[0] - (2 * (fb - fa)) / span);
  mean[1] = factor * (mean[1] - (2 * (gb - ga - ya * ya * (fb - fa))) / (span * span));
}
