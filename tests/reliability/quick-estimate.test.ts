import { expect, test } from "vitest";
import { normalCdf } from "../../src/numeric/normal.ts";
import { estimateProbability } from "../../src/reliability/quick-estimate.ts";
import { problemOf } from "./known-problems.ts";

const normal = { kind: "normal", mean: 0, sd: 1 } as const;
const order = { seed: "quick", precision: 0.05, samples: 1_000_000 };

test.each([1, 2, 3, 4.5])("finds the probability of a straight line with index %d, common or rare", (index) => {
  const { states, space } = problemOf(
    { "a.x": normal, "b.y": normal },
    { sliding: ([x, y]) => 1 + (index + (x + y) / Math.SQRT2) / 100 },
  );
  const found = estimateProbability(states, space, order);
  // one seed in a million is further off
  expect(Math.abs(found.probability - normalCdf(-index))).toBeLessThan(
    4.89 * Math.max(found.standardError, 0.02 * normalCdf(-index)),
  );
  expect(found.interval[0]).toBeLessThan(found.probability);
  expect(found.method).toBe(index < 2 ? "plain" : "importance");
  expect(found.evaluations).toBeLessThan(20_000);
});

test("says that nothing was found where nothing fails", () => {
  const { states, space } = problemOf({ "a.x": normal }, { sliding: () => 2 });
  expect(estimateProbability(states, space, order)).toMatchObject({ probability: 0, doubts: ["no failure was found"] });
});
