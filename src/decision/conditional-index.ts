import type { LimitStates } from "../reliability/limit-states.ts";

const rounds = 4;
const farthest = 8;

/**
 * Where a limit state fails along a line: the distance s with F(z + s·direction) = 1, for many points z at once, by a few
 * rounds of the secant rule from a first guess. Failure lies beyond s; Φ(−s) is its chance if it does so along the whole front.
 *
 * Only for predictions: a distance that has not settled is left where it is.
 *
 * @param z columns of points, `direction` removed from them
 * @param guess overwritten with the distances, held to ±8
 * @returns evaluations spent
 */
export function refineIndices(
  states: LimitStates,
  state: number,
  z: readonly Float64Array[],
  direction: Float64Array,
  guess: Float64Array,
): number {
  const { capacity, names } = states;
  const factors = names.map(() => new Float64Array(capacity));
  const marks = new Uint8Array(capacity);
  const columns = z.map(() => new Float64Array(capacity));
  const margin = new Float64Array(guess.length);
  const evaluate = (s: Float64Array): void => {
    for (let start = 0; start < s.length; start += capacity) {
      const n = Math.min(capacity, s.length - start);
      for (let j = 0; j < columns.length; j++)
        for (let i = 0; i < n; i++) columns[j][i] = z[j][start + i] + s[start + i] * direction[j];
      states.evaluate(columns, n, factors, marks, false);
      for (let i = 0; i < n; i++) margin[start + i] = marginOf(factors[state][i]);
    }
  };
  for (let i = 0; i < guess.length; i++) guess[i] = held(guess[i]);
  evaluate(guess);
  let [before, marginBefore] = [guess.slice(), margin.slice()];
  for (let i = 0; i < guess.length; i++) guess[i] = held(guess[i] + (margin[i] > 0 ? 0.4 : -0.4));
  for (let round = 1; round < rounds; round++) {
    evaluate(guess);
    const [last, lastMargin] = [guess.slice(), margin.slice()];
    for (let i = 0; i < guess.length; i++) {
      const slope = (lastMargin[i] - marginBefore[i]) / (last[i] - before[i]);
      if (!(slope < -1e-9)) continue;
      const step = -lastMargin[i] / slope;
      guess[i] = held(last[i] + Math.min(Math.max(step, -2), 2));
    }
    before = last;
    marginBefore = lastMargin;
  }
  return rounds * guess.length;
}

/** Falls through 0 at F = 1, and stays bounded where contact is lost. */
function marginOf(factor: number): number {
  return (factor - 1) / (factor + 1);
}

function held(s: number): number {
  return Math.min(Math.max(s, -farthest), farthest);
}
