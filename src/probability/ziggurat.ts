import { normalUpper } from "../numeric/normal.ts";
import { type GeneratorState, nextUniform, nextWord } from "./xoshiro.ts";

/*
 * The area under exp(−x²/2), x ≥ 0, is covered by 256 layers of equal area: a base layer with the tail, and rectangles
 * stacked on it. A point drawn in a layer lies under the curve for certain where it falls left of the next layer's edge
 * (98.8 % of the draws); otherwise it is tested, and in the base layer the tail beyond its edge is drawn exactly.
 *
 * G. Marsaglia and W. W. Tsang (2000), The ziggurat method for generating random variables, J. Stat. Softw. 5 (8), took
 * layer and place from the same bits, which shows in the sum of squares; as J. A. Doornik (2005), An improved ziggurat
 * method to generate normal random samples, advises, the layer has its own bits here. The tail is G. Marsaglia (1964),
 * Generating a variable from the tail of the normal distribution, Technometrics 6, 101–102.
 *
 * The place in a layer is an odd multiple of 2^−31 of its width (a lattice of at most 4e-9): both signs are alike and no
 * value is 0. The tail has 53 bits; the largest value possible is about 12.
 */

const layers = 256;
/** Where the tail begins; the layers then close at the top (a test checks it). */
const tailStart = 3.6541528853610088;

/** Height of the curve. */
function curve(x: number): number {
  return Math.exp(-0.5 * x * x);
}

/** Edges x of the layers, from the base (as wide as its area demands) to the top, 0. */
export function layerEdges(): Float64Array {
  const area = tailStart * curve(tailStart) + Math.sqrt(2 * Math.PI) * normalUpper(tailStart);
  const edges = new Float64Array(layers + 1);
  edges[0] = area / curve(tailStart);
  edges[1] = tailStart;
  for (let i = 2; i < layers; i++) edges[i] = Math.sqrt(-2 * Math.log(area / edges[i - 1] + curve(edges[i - 1])));
  return edges; // edges[layers] stays 0
}

const edges = layerEdges();
const heights = edges.map(curve);
/** Width of a layer in units of a 31-bit draw with sign. */
const unit = edges.slice(0, layers).map((x) => x * 2 ** -31);
/** A draw w below this (its magnitude, for a negative one −w − 1) lies left of the next layer's edge. */
const core = Int32Array.from(unit, (width, layer) => Math.max(0, Math.floor(edges[layer + 1] / width) - 1));

/** Whether a draw needs no test. */
function inCore(w: number, layer: number): boolean {
  return (w ^ (w >> 31)) < core[layer];
}

/** Group of four that the count cuts short. */
const lastFour = new Float64Array(4);

/**
 * Fills the first `count` entries with standard normals. Allocates nothing.
 *
 * Values come in groups of four: one word holds the four layers, four more the places in them; draws outside the core
 * then take words of their own, in order. So a shorter fill gives the same values.
 */
export function fillFromZiggurat(state: GeneratorState, out: Float64Array, count: number): void {
  const whole = count & ~3;
  fillGroups(state, out, whole);
  if (count > whole) {
    fillGroups(state, lastFour, 4);
    for (let i = whole; i < count; i++) out[i] = lastFour[i - whole];
  }
}

/**
 * `nextWord` is written out five times, with the state in locals, and four values are tested at once: called in a loop
 * of one value at a time it takes twice as long. A test holds the words against `nextWord`.
 */
function fillGroups(state: GeneratorState, out: Float64Array, count: number): void {
  let s0 = state[0] | 0;
  let s1 = state[1] | 0;
  let s2 = state[2] | 0;
  let s3 = state[3] | 0;
  for (let i = 0; i < count; i += 4) {
    let sum = (s0 + s3) | 0;
    const layersOfFour = (((sum << 7) | (sum >>> 25)) + s0) | 0;
    let t = s1 << 9;
    s2 ^= s0;
    s3 ^= s1;
    s1 ^= s2;
    s0 ^= s3;
    s2 ^= t;
    s3 = (s3 << 11) | (s3 >>> 21);

    sum = (s0 + s3) | 0;
    const w0 = (((sum << 7) | (sum >>> 25)) + s0) | 0;
    t = s1 << 9;
    s2 ^= s0;
    s3 ^= s1;
    s1 ^= s2;
    s0 ^= s3;
    s2 ^= t;
    s3 = (s3 << 11) | (s3 >>> 21);

    sum = (s0 + s3) | 0;
    const w1 = (((sum << 7) | (sum >>> 25)) + s0) | 0;
    t = s1 << 9;
    s2 ^= s0;
    s3 ^= s1;
    s1 ^= s2;
    s0 ^= s3;
    s2 ^= t;
    s3 = (s3 << 11) | (s3 >>> 21);

    sum = (s0 + s3) | 0;
    const w2 = (((sum << 7) | (sum >>> 25)) + s0) | 0;
    t = s1 << 9;
    s2 ^= s0;
    s3 ^= s1;
    s1 ^= s2;
    s0 ^= s3;
    s2 ^= t;
    s3 = (s3 << 11) | (s3 >>> 21);

    sum = (s0 + s3) | 0;
    const w3 = (((sum << 7) | (sum >>> 25)) + s0) | 0;
    t = s1 << 9;
    s2 ^= s0;
    s3 ^= s1;
    s1 ^= s2;
    s0 ^= s3;
    s2 ^= t;
    s3 = (s3 << 11) | (s3 >>> 21);

    const layer0 = layersOfFour & 255;
    const layer1 = (layersOfFour >>> 8) & 255;
    const layer2 = (layersOfFour >>> 16) & 255;
    const layer3 = layersOfFour >>> 24;
    out[i] = (w0 | 1) * unit[layer0];
    out[i + 1] = (w1 | 1) * unit[layer1];
    out[i + 2] = (w2 | 1) * unit[layer2];
    out[i + 3] = (w3 | 1) * unit[layer3];
    if (inCore(w0, layer0) && inCore(w1, layer1) && inCore(w2, layer2) && inCore(w3, layer3)) continue;

    state[0] = s0;
    state[1] = s1;
    state[2] = s2;
    state[3] = s3;
    if (!inCore(w0, layer0)) out[i] = outsideTheCore(state, layer0, w0);
    if (!inCore(w1, layer1)) out[i + 1] = outsideTheCore(state, layer1, w1);
    if (!inCore(w2, layer2)) out[i + 2] = outsideTheCore(state, layer2, w2);
    if (!inCore(w3, layer3)) out[i + 3] = outsideTheCore(state, layer3, w3);
    s0 = state[0] | 0;
    s1 = state[1] | 0;
    s2 = state[2] | 0;
    s3 = state[3] | 0;
  }
  state[0] = s0;
  state[1] = s1;
  state[2] = s2;
  state[3] = s3;
}

/** The draws that need a test: near the edge of a layer, or the tail; drawn again until one is accepted. */
function outsideTheCore(state: GeneratorState, firstLayer: number, firstDraw: number): number {
  let layer = firstLayer;
  let w = firstDraw;
  for (;;) {
    const x = (w | 1) * unit[layer];
    if (Math.abs(x) < edges[layer + 1]) return x;
    if (layer === 0) return x < 0 ? -tailBeyond(state) : tailBeyond(state);
    const height = heights[layer] + ((nextWord(state) >>> 0) + 0.5) * 2 ** -32 * (heights[layer + 1] - heights[layer]);
    if (height < curve(x)) return x;
    layer = nextWord(state) & 255;
    w = nextWord(state);
  }
}

/** Marsaglia's tail: x with density exp(−x²/2) beyond the start of the tail. */
function tailBeyond(state: GeneratorState): number {
  for (;;) {
    const beyond = -Math.log(nextUniform(state)) / tailStart;
    const trial = -Math.log(nextUniform(state));
    if (trial + trial > beyond * beyond) return tailStart + beyond;
  }
}
