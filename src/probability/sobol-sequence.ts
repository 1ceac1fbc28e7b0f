import { sobolDirectionData } from "./sobol-directions.ts";
import { fillUniforms } from "./streams.ts";

/** Dimensions with direction numbers; beyond them a caller must draw at random. */
export const sobolDimensions: number = sobolDirectionData.split("\n").length + 1;

const bits = 32;

/** Direction numbers v₁ … v₃₂ of a dimension (from 0), as binary fractions of 32 bits. */
function directionNumbers(dimension: number): Uint32Array {
  const v = new Uint32Array(bits);
  if (dimension === 0) {
    for (let k = 0; k < bits; k++) v[k] = 1 << (bits - 1 - k);
    return v;
  }
  const [degree, inner, ...m] = sobolDirectionData.split("\n")[dimension - 1].split(" ").map(Number);
  for (let k = 0; k < bits; k++) {
    if (k < degree) v[k] = m[k] << (bits - 1 - k);
    else {
      v[k] = v[k - degree] ^ (v[k - degree] >>> degree);
      for (let j = 1; j < degree; j++) if ((inner >>> (degree - 1 - j)) & 1) v[k] ^= v[k - j];
    }
  }
  return v;
}

/** A low-discrepancy sequence in the unit cube; goes on where it stopped. */
export interface SobolSequence {
  /** Fills the first `count` entries of each column with the next points; values lie in [0, 1). */
  fill(columns: readonly Float64Array[], count: number): void;
}

/**
 * Sobol' sequence in Gray-code order, from the origin on.
 *
 * @param dimension at most `sobolDimensions`
 * @throws RangeError beyond that
 * @source I. M. Sobol' (1967); I. A. Antonov and V. M. Saleev (1979), USSR Comput. Math. Math. Phys. 19, 252–256 (Gray code)
 */
export function sobolSequence(dimension: number): SobolSequence {
  return sequenceOf(
    Array.from({ length: dimension }, (_, j) => directionNumbers(checked(j))),
    new Uint32Array(dimension),
    0,
  );
}

/**
 * The same sequence scrambled: each point is uniform over the cube, and the points together keep their even spread, so that
 * the mean over replicates is unbiased and their spread gives an honest error.
 *
 * Each dimension's direction numbers are multiplied by a random lower triangular matrix of bits, and all its points share a
 * random digital shift. Values are middles of 2⁻³² cells, so neither 0 nor 1 occurs.
 *
 * @param keys one per dimension; name the streams of random bits together with seed, purpose and replicate
 * @throws RangeError beyond `sobolDimensions`
 * @source J. Matoušek (1998), On the L2-discrepancy for anchored boxes, J. Complexity 14, 527–556 (linear matrix scrambling)
 */
export function scrambledSobolSequence(
  keys: readonly string[],
  seed: string,
  purpose: string,
  replicate: number,
): SobolSequence {
  const uniforms = new Float64Array(bits + 1);
  const shifts = new Uint32Array(keys.length);
  const directions = keys.map((key, j) => {
    fillUniforms(seed, purpose, key, replicate, uniforms, bits + 1);
    shifts[j] = Math.floor(uniforms[bits] * 2 ** bits);
    return scrambled(directionNumbers(checked(j)), uniforms);
  });
  return sequenceOf(directions, shifts, 2 ** -(bits + 1));
}

function checked(dimension: number): number {
  if (dimension >= sobolDimensions)
    throw new RangeError(`${dimension + 1} dimensions exceed the ${sobolDimensions} of the Sobol' sequence`);
  return dimension;
}

/** L·v in bits, L lower triangular with ones on its diagonal and random bits below it. */
function scrambled(v: Uint32Array, uniforms: Float64Array): Uint32Array {
  const rows = Uint32Array.from({ length: bits }, (_, i) => {
    const random = Math.floor(uniforms[i] * 2 ** bits);
    // bits above the diagonal (towards the less significant) are cleared, the diagonal bit is set
    const diagonal = 1 << (bits - 1 - i);
    return ((random & ~(diagonal | (diagonal - 1))) | diagonal) >>> 0;
  });
  return v.map((number) => {
    let out = 0;
    for (let i = 0; i < bits; i++) if (parity(rows[i] & number)) out |= 1 << (bits - 1 - i);
    return out >>> 0;
  });
}

function parity(word: number): number {
  let w = word ^ (word >>> 16);
  w ^= w >>> 8;
  w ^= w >>> 4;
  return (0x6996 >>> (w & 15)) & 1;
}

function sequenceOf(directions: readonly Uint32Array[], start: Uint32Array, middle: number): SobolSequence {
  const state = Uint32Array.from(start);
  let index = 0;
  return {
    fill(columns, count) {
      for (let i = 0; i < count; i++) {
        for (let j = 0; j < state.length; j++) columns[j][i] = state[j] * 2 ** -bits + middle;
        // the next point differs by the direction number of the lowest zero bit of the index
        const place = 31 - Math.clz32(~index & (index + 1));
        for (let j = 0; j < state.length; j++) state[j] ^= directions[j][place];
        index++;
      }
    },
  };
}
