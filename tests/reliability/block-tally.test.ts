import { expect, test } from "vitest";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import { streamBlock } from "../../src/probability/streams.ts";
import {
  createBlockCounter,
  pictureEdges,
  picturesPerBlock,
  type SamplingPlan,
} from "../../src/reliability/block-tally.ts";
import { spaceOf, standardSpace, statesOf, statesOfMargins, straightLine } from "./straight-line.ts";

const plan = (over: Partial<SamplingPlan> = {}): SamplingPlan => ({
  seed: "tally",
  purpose: "plain sampling",
  samples: 2 * streamBlock,
  centres: [1],
  edges: [[0, 0.5, 1, 1.5, 2]],
  ...over,
});

test("a tally does not depend on the size of the compute tile", () => {
  const space = standardSpace(2);
  const g = { line: (u: readonly number[]): number => Math.exp(1 - u[0] - u[1]) };
  const [whole, tiles, odd] = [streamBlock, 512, 777].map((capacity) =>
    createBlockCounter(statesOf(space, g, capacity), space, plan()).tally(1),
  );
  expect(tiles).toEqual(whole);
  expect(odd).toEqual(whole);
});

test("the last block holds what is left of the samples, and is the beginning of the whole block", () => {
  const [states, space] = [straightLine(1), standardSpace(2)];
  const counter = createBlockCounter(states, space, plan({ samples: streamBlock + 10 }));
  expect(counter.tally(1).samples).toBe(10);
  const longer = createBlockCounter(states, space, plan({ samples: streamBlock + 11 }));
  const grown = longer.tally(1).states[0].failures - counter.tally(1).states[0].failures;
  expect([0, 1]).toContain(grown);
});

test("a block outside the run is refused", () => {
  const [states, space] = [straightLine(1), standardSpace(2)];
  const counter = createBlockCounter(states, space, plan());
  expect(() => counter.tally(2)).toThrow("block 2 lies outside a run of 32768 samples");
  expect(() => counter.tally(-1)).toThrow(RangeError);
});

test("the system fails with any limit state, and is counted once", () => {
  const space = standardSpace(1);
  const states = statesOfMargins(1, { low: ([u]) => u + 1, high: ([u]) => 1 - u, both: ([u]) => u + 2 });
  const edges = [0, 1];
  const tally = createBlockCounter(states, space, plan({ centres: [1, 1, 1], edges: [edges, edges, edges] })).tally(0);
  const [low, high, both] = tally.states.map((state) => state.failures);
  expect(both).toBeGreaterThan(0);
  expect(tally.system.failures).toBe(low + high);
});

test("failures among samples marked slope_unstable are kept apart", () => {
  const space = standardSpace(1);
  const states = statesOf(space, { line: ([u]) => Math.exp(u + 1) }, 512, ([u]) => (u < -2 ? 1 : 0));
  const tally = createBlockCounter(states, space, plan()).tally(0);
  expect(tally.stable).toBe(streamBlock - tally.marks.slopeUnstable);
  expect(tally.states[0].failures - tally.states[0].stableFailures).toBe(tally.marks.slopeUnstable);
  expect(tally.system.stableFailures).toBe(tally.states[0].stableFailures);
});

test("the picture holds the first failures of a block, in the values of the unknowns", () => {
  const marginal = marginalOf({ kind: "lognormal", mean: 30, sd: 3, shift: 0 });
  const space = spaceOf([marginal]);
  const states = statesOf(space, { sliding: ([x]) => x / 28 });
  const { picture, failures } = createBlockCounter(states, space, plan()).tally(0).states[0];
  expect(failures).toBeGreaterThan(picturesPerBlock);
  expect(picture.failures).toBe(picturesPerBlock);
  const mean = marginal.mean + picture.sums[0] / picture.failures;
  expect(mean).toBeLessThan(28);
  expect(mean).toBeGreaterThan(25);
  const bins = picture.bins[0];
  expect(bins.length).toBe(pictureEdges.length - 1);
  expect(bins.reduce((sum, count) => sum + count, 0)).toBe(picturesPerBlock);
  const limit = marginal.normalOfQuantile(28);
  expect(bins.filter((_, bin) => pictureEdges[bin] > limit).every((count) => count === 0)).toBe(true);
});
