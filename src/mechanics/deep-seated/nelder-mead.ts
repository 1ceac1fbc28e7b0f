/** What a descent found. */
export interface Descent {
  readonly x: Float64Array;
  readonly value: number;
}

/**
 * Least value of a function near a point by Nelder and Mead's simplex: needs no derivatives, and takes a value of infinity for
 * "not allowed". Deterministic. It may stop on a ridge, so callers start it anew from where it stopped.
 *
 * @param steps length of the first simplex along each coordinate; 0 leaves a coordinate as it is
 * @param tolerance relative spread of the values over the simplex at which it stops
 * @source J. A. Nelder and R. Mead (1965), A simplex method for function minimization, The Computer Journal 7, 308–313
 */
export function descend(
  f: (x: Float64Array) => number,
  from: ArrayLike<number>,
  steps: readonly number[],
  tolerance: number,
  most: number,
): Descent {
  const free = steps.flatMap((step, i) => (step === 0 ? [] : [i]));
  const points = [Float64Array.from(from)];
  for (const i of free) {
    const point = Float64Array.from(from);
    point[i] += steps[i];
    points.push(point);
  }
  let corners: Descent[] = points.map((x) => ({ x, value: f(x) }));
  let used = corners.length;
  const n = free.length;
  const along = (centre: Float64Array, worst: Float64Array, t: number): Descent => {
    const x = Float64Array.from(centre, (c, i) => c + t * (c - worst[i]));
    used++;
    return { x, value: f(x) };
  };
  while (used < most) {
    corners.sort((a, b) => a.value - b.value);
    const [best, worst, second] = [corners[0], corners[n], corners[n - 1]];
    if (worst.value - best.value <= tolerance * Math.abs(best.value)) break;
    const centre = Float64Array.from(best.x, (_, i) => {
      let sum = 0;
      for (let k = 0; k < n; k++) sum += corners[k].x[i];
      return sum / n;
    });
    const reflected = along(centre, worst.x, 1);
    if (reflected.value < best.value) {
      const expanded = along(centre, worst.x, 2);
      corners[n] = expanded.value < reflected.value ? expanded : reflected;
    } else if (reflected.value < second.value) corners[n] = reflected;
    else {
      const outside = reflected.value < worst.value;
      const contracted = along(centre, worst.x, outside ? 0.5 : -0.5);
      if (contracted.value < Math.min(reflected.value, worst.value)) corners[n] = contracted;
      else {
        corners = corners.map((corner, i) => {
          if (i === 0) return corner;
          const x = Float64Array.from(corner.x, (value, k) => 0.5 * (value + best.x[k]));
          used++;
          return { x, value: f(x) };
        });
      }
    }
  }
  return corners.reduce((a, b) => (b.value < a.value ? b : a));
}
