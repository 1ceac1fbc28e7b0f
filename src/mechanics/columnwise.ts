/** y = formula(a, b, …) for one sample. */
export type Formula = (...values: number[]) => number;

/** The same over columns: y[i] = formula(a[i], b[i], …) for i below n. Columns beyond the formula's own are ignored. */
export type Loop = (
  y: Float64Array,
  n: number,
  a: Float64Array,
  b: Float64Array,
  c: Float64Array,
  d: Float64Array,
  e: Float64Array,
  f: Float64Array,
  g: Float64Array,
) => void;

const loops = new Map<Formula, Loop>();

/**
 * Ties a formula to its loop. One loop shared by all formulas would call each through a pointer and box its numbers, at 25 ns
 * a sample; a loop written out beside its formula is compiled for it alone, at about 1 ns.
 */
export function columnwise<F extends Formula>(formula: F, loop: Loop): F {
  loops.set(formula, loop);
  return formula;
}

/** The formula's own loop, or the shared slow one for what is rarely sampled. */
export function loopOf(formula: Formula): Loop {
  return (
    loops.get(formula) ??
    ((y, n, a, b, c, d, e, f, g) => {
      for (let i = 0; i < n; i++) y[i] = formula(a[i], b[i], c[i], d[i], e[i], f[i], g[i]);
    })
  );
}
