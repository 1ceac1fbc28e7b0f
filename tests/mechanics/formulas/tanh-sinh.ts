/** ∫ f over [a, b] by the double-exponential rule: near rounding for anything smooth inside, whatever its ends do. */
export function tanhSinh(f: (x: number) => number, a: number, b: number): number {
  const half = (b - a) / 2;
  const step = 1 / 24;
  let sum = 0;
  for (let k = -96; k <= 96; k++) {
    const t = k * step;
    const u = (Math.PI / 2) * Math.sinh(t);
    const weight = ((Math.PI / 2) * Math.cosh(t)) / Math.cosh(u) ** 2;
    const fromEnd = (2 * half) / (1 + Math.exp(2 * Math.abs(u))); // distance to the nearer end, without cancellation
    if (weight < 1e-30) continue;
    sum += weight * f(u < 0 ? a + fromEnd : b - fromEnd);
  }
  return sum * step * half;
}

/** The same over [0, 1] split at the given points; those outside are left out. */
export function tanhSinhSplit(f: (x: number) => number, splits: readonly number[]): number {
  const cuts = [0, ...splits.filter((x) => x > 0 && x < 1).sort((a, b) => a - b), 1];
  let sum = 0;
  for (let i = 1; i < cuts.length; i++) sum += tanhSinh(f, cuts[i - 1], cuts[i]);
  return sum;
}
