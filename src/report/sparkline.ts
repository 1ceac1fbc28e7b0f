const steps = "▁▂▃▄▅▆▇█";

/** A density as a row of blocks, for a terminal: the mean of the curve over equal stretches, the highest as a full block. */
export function sparkline(
  { x, y }: { readonly x: readonly number[]; readonly y: readonly number[] },
  cells = 10,
): string {
  const values = Array.from({ length: cells }, (_, cell) => {
    const from = Math.floor((cell * x.length) / cells);
    const part = y.slice(from, Math.max(Math.floor(((cell + 1) * x.length) / cells), from + 1)).filter(Number.isFinite);
    return part.reduce((sum, value) => sum + value, 0) / Math.max(part.length, 1);
  });
  const top = Math.max(...values, 1e-300);
  return values.map((value) => steps[Math.min(Math.floor((value / top) * steps.length), steps.length - 1)]).join("");
}
