/** Nodes and weights on [−1, 1]; a rule of n nodes integrates polynomials up to degree 2n − 1 exactly. */
export interface GaussLegendre {
  readonly nodes: Float64Array;
  readonly weights: Float64Array;
}

const rules = new Map<number, GaussLegendre>();

/**
 * Gauss–Legendre rule of n nodes, by Newton's iteration on the Legendre polynomial from Tricomi's start values; nodes and
 * weights to 1e-15. Rules are kept, so asking again costs nothing.
 *
 * @param n 1 … a few hundred
 */
export function gaussLegendre(n: number): GaussLegendre {
  const known = rules.get(n);
  if (known) return known;
  const nodes = new Float64Array(n);
  const weights = new Float64Array(n);
  for (let i = 0; i < n; i++) {
    let x = Math.cos((Math.PI * (i + 0.75)) / (n + 0.5));
    let slope = 0;
    for (let iteration = 0; iteration < 20; iteration++) {
      let last = 1;
      let value = x;
      for (let k = 2; k <= n; k++) [last, value] = [value, ((2 * k - 1) * x * value - (k - 1) * last) / k];
      slope = (n * (last - x * value)) / (1 - x * x);
      const step = value / slope;
      x -= step;
      if (Math.abs(step) < 1e-16) break;
    }
    nodes[n - 1 - i] = x;
    weights[n - 1 - i] = 2 / ((1 - x * x) * slope * slope);
  }
  const rule = { nodes, weights };
  rules.set(n, rule);
  return rule;
}

/** ∫ f over [from, to] by one rule of n nodes; for a smooth f only. */
export function integrate(f: (x: number) => number, from: number, to: number, n = 20): number {
  const { nodes, weights } = gaussLegendre(n);
  const half = 0.5 * (to - from);
  const middle = 0.5 * (to + from);
  let sum = 0;
  for (let i = 0; i < n; i++) sum += weights[i] * f(middle + half * nodes[i]);
  return half * sum;
}

/**
 * The points that cut [from, to] into panels no wider than `width`, with every break inside the range among them.
 * Ascending, both ends included.
 */
export function panels(from: number, to: number, breaks: readonly number[], width: number): number[] {
  const inside = breaks.filter((at) => at > from && at < to).sort((a, b) => a - b);
  const points = [from];
  for (const end of [...inside, to]) {
    const start = points[points.length - 1];
    const count = Math.max(1, Math.ceil((end - start) / width - 1e-9));
    for (let i = 1; i < count; i++) points.push(start + ((end - start) * i) / count);
    points.push(end);
  }
  return points;
}
