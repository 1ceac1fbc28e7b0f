/**
 * A stand-in for a slow function of u that is smooth between known breaks: Chebyshev polynomials of degree 15 on pieces
 * that end on the breaks, halved until the polynomial holds and, towards a jump, by halves (x(u) may start there like a
 * square root). Some 30 ns a value instead of microseconds, from a few hundred values of the function.
 *
 * The error is below 1e-10 of the spread |y(1) − y(−1)| + |y(0)|·1e-3; where no polynomial holds, and outside the reach, the
 * function itself answers. tests/probability/piecewise
 */

const nodeCount = 16;
/** Nodes of a piece on [−1, 1], and the cosines that turn values there into coefficients. */
const nodes = Float64Array.from({ length: nodeCount }, (_, k) => Math.cos((Math.PI * (k + 0.5)) / nodeCount));
const cosines = Array.from({ length: nodeCount }, (_, n) =>
  Float64Array.from({ length: nodeCount }, (_, k) => (Math.cos((Math.PI * n * (k + 0.5)) / nodeCount) * 2) / nodeCount),
);

const firstWidth = 1.5;
/** Pieces narrower than this are left to the function. */
const leastWidth = 2 ** -16;

interface Piece {
  readonly from: number;
  readonly to: number;
  /** Absent: ask the function. */
  readonly coefficients?: Float64Array;
}

/**
 * @param y the function
 * @param kinks points where y bends, @param jumps where it jumps
 * @param reach the stand-in serves |u| ≤ reach
 */
export function piecewise(
  y: (u: number) => number,
  breaks: { readonly kinks: readonly number[]; readonly jumps: readonly number[] },
  reach: number,
): (u: number) => number {
  const tolerance = 1e-11 * (Math.abs(y(1) - y(-1)) + 1e-3 * Math.abs(y(0)) + Number.MIN_VALUE);
  const pieces: Piece[] = [];
  const points = cuts(breaks, reach);
  for (let i = 1; i < points.length; i++) addPieces(pieces, y, points[i - 1], points[i], tolerance);
  const starts = Float64Array.from(pieces, ({ from }) => from);
  const middles = Float64Array.from(pieces, ({ from, to }) => 0.5 * (from + to));
  const scales = Float64Array.from(pieces, ({ from, to }) => 2 / (to - from));
  const table = new Float64Array(nodeCount * pieces.length).fill(Number.NaN);
  pieces.forEach(({ coefficients }, i) => {
    if (coefficients) table.set(coefficients, nodeCount * i);
  });
  return (u) => {
    if (!(u > -reach && u < reach)) return y(u);
    const piece = lastBelow(starts, u);
    const value = clenshaw(table, nodeCount * piece, (u - middles[piece]) * scales[piece]);
    return Number.isNaN(value) ? y(u) : value;
  };
}

/** Where pieces begin and end at first: breaks, halves towards jumps, and no piece wider than `firstWidth`. */
function cuts({ kinks, jumps }: Parameters<typeof piecewise>[1], reach: number): number[] {
  const graded = jumps.flatMap((at) => {
    const steps = Array.from({ length: 15 }, (_, k) => 2 ** -k);
    return [at, ...steps.flatMap((step) => [at - step, at + step])];
  });
  const inside = [-reach, ...kinks, ...graded, reach].filter((u) => u >= -reach && u <= reach).sort((a, b) => a - b);
  const points = [inside[0]];
  for (const end of inside.slice(1)) {
    const start = points[points.length - 1];
    if (end - start < 1e-12) continue;
    const count = Math.ceil((end - start) / firstWidth);
    for (let i = 1; i <= count; i++) points.push(i === count ? end : start + ((end - start) * i) / count);
  }
  return points;
}

function addPieces(pieces: Piece[], y: (u: number) => number, from: number, to: number, tolerance: number): void {
  const middle = 0.5 * (from + to);
  const half = 0.5 * (to - from);
  if (to - from < leastWidth) {
    pieces.push({ from, to });
    return;
  }
  const values = nodes.map((x) => y(middle + half * x));
  const coefficients = new Float64Array(nodeCount);
  for (let n = 0; n < nodeCount; n++) for (let k = 0; k < nodeCount; k++) coefficients[n] += cosines[n][k] * values[k];
  coefficients[0] *= 0.5;
  const left = Math.max(...[13, 14, 15].map((n) => Math.abs(coefficients[n])));
  if (left <= tolerance) {
    pieces.push({ from, to, coefficients });
    return;
  }
  addPieces(pieces, y, from, middle, tolerance);
  addPieces(pieces, y, middle, to, tolerance);
}

/** Place of the last entry that is not above u. */
function lastBelow(sorted: Float64Array, u: number): number {
  let low = 0;
  let high = sorted.length - 1;
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if (sorted[middle] <= u) low = middle;
    else high = middle - 1;
  }
  return low;
}

/** Sum of the Chebyshev polynomials of one piece at x in [−1, 1], by Clenshaw's recurrence. */
function clenshaw(table: Float64Array, start: number, x: number): number {
  const twice = 2 * x;
  let last = 0;
  let value = 0;
  for (let n = start + nodeCount - 1; n > start; n--) {
    const next = twice * value - last + table[n];
    last = value;
    value = next;
  }
  return x * value - last + table[start];
}
