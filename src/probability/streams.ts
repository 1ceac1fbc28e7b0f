import seedrandom from "seedrandom";
import { type GeneratorState, nextUniform, setState } from "./xoshiro.ts";
import { fillFromZiggurat } from "./ziggurat.ts";

/*
 * A stream of random numbers belongs to a seed text, a purpose, a coordinate's key and a block of samples, never to a
 * worker or to a place in a list: so the numbers are the same for any number of workers, and adding a variable or an
 * option moves no draw of the others. seedrandom turns the four into 128 bits of state; within a block a fast generator
 * goes on from there.
 */

/** Samples in a block; one stream fills one column of one block. */
export const streamBlock = 16_384;

/** One state serves all streams in turn: every fill starts its stream anew and runs to its end. */
const state: GeneratorState = new Int32Array(4);

/**
 * Fills the first `count` entries of `out` with independent standard normals.
 *
 * A shorter fill of the same stream gives the same numbers, as many as asked for.
 *
 * @param seed any text; the study's
 * @param purpose what the numbers are for: two purposes never share a stream
 * @param key of the coordinate
 * @param block number of the block, from 0
 * @param count at most `streamBlock`
 */
export function fillNormals(
  seed: string,
  purpose: string,
  key: string,
  block: number,
  out: Float64Array,
  count: number,
): void {
  startStream(seed, purpose, key, block, count);
  fillFromZiggurat(state, out, count);
}

/** As `fillNormals`, with uniform numbers in (0, 1): midpoints of 2^53 equal cells, neither end included. */
export function fillUniforms(
  seed: string,
  purpose: string,
  key: string,
  block: number,
  out: Float64Array,
  count: number,
): void {
  startStream(seed, purpose, key, block, count);
  for (let i = 0; i < count; i++) out[i] = nextUniform(state);
}

function startStream(seed: string, purpose: string, key: string, block: number, count: number): void {
  if (!(count >= 0 && count <= streamBlock))
    throw new RangeError(`${count} samples do not fit a block of ${streamBlock}`);
  const random = seedrandom(streamName(seed, purpose, key, block));
  setState(state, random.int32(), random.int32(), random.int32(), random.int32());
}

/**
 * The four parts as one text that no other four parts share. The block comes first, and everything beyond ASCII is
 * escaped, because seedrandom keeps eight bits of each character.
 */
export function streamName(seed: string, purpose: string, key: string, block: number): string {
  const escaped = (character: string): string => `\\u${character.charCodeAt(0).toString(16).padStart(4, "0")}`;
  return JSON.stringify([block, purpose, key, seed]).replace(/[^ -~]/g, escaped);
}
