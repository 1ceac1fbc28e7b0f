/**
 * xoshiro128++ 1.0: 32 bits a step from 128 bits of state, period 2^128 − 1.
 *
 * All its bits are equally good (the scrambler is "++"), and 32-bit arithmetic is what JavaScript does fast.
 *
 * @source D. Blackman and S. Vigna (2021), Scrambled linear pseudorandom number generators, ACM Trans. Math. Softw. 47,
 *   article 36; reference outputs in tests/outside/xoshiro
 */

/** Four 32-bit words, not all zero; every draw moves them on. */
export type GeneratorState = Int32Array;

/** Sets the state; all zeros, which would stay zero for ever, become a one. */
export function setState(state: GeneratorState, s0: number, s1: number, s2: number, s3: number): void {
  state[0] = s0;
  state[1] = s1;
  state[2] = s2;
  state[3] = (s0 | s1 | s2 | s3) === 0 ? 1 : s3;
}

/** The next output, as a signed 32-bit integer. */
export function nextWord(state: GeneratorState): number {
  const s0 = state[0];
  const s1 = state[1];
  const sum = (s0 + state[3]) | 0;
  const s2 = state[2] ^ s0;
  const s3 = state[3] ^ s1;
  state[1] = s1 ^ s2;
  state[0] = s0 ^ s3;
  state[2] = s2 ^ (s1 << 9);
  state[3] = (s3 << 11) | (s3 >>> 21);
  return (((sum << 7) | (sum >>> 25)) + s0) | 0;
}

/** The next uniform number in (0, 1), from two outputs: midpoints of 2^53 equal cells, neither end included. */
export function nextUniform(state: GeneratorState): number {
  const high = nextWord(state) >>> 5;
  const low = nextWord(state) >>> 6;
  return (high * 67108864 + low + 0.5) / 9007199254740992;
}
