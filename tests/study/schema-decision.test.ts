import { expect, test } from "vitest";
import { decision, evidence } from "../../src/study/schema-decision.ts";

const options = [{ name: "a", cost: 0 }];

test.each([
  { failure_cost: 5, options },
  { failure_cost: { sliding: 5 }, options },
  { failure_cost: 5, options, investigations: [{ name: "t", informs: "a.b", tests: 2 }] },
  { failure_cost: 5, options, investigations: [{ name: "t", informs: [{ path: "a.b", tests: 2 }] }] },
])("%j is a decision", (value) => {
  expect(decision.safeParse(value).success).toBe(true);
});

test.each([
  { options },
  { failure_cost: -1, options },
  { failure_cost: { slding: 5 }, options },
  { failure_cost: 5, options: [] },
  { failure_cost: 5, options: [{ cost: 0 }] },
  { failure_cost: 5, options: [{ name: "a", cost: -1 }] },
  { failure_cost: 5, options, investigations: [{ name: "t", informs: [] }] },
  { failure_cost: 5, options, investigations: [{ name: "t", informs: "a.b", tests: 0 }] },
])("%j is none", (value) => {
  expect(decision.safeParse(value).success).toBe(false);
});

test("evidence is a list of results or of values survived", () => {
  expect(evidence.safeParse({ results: [1], of: "a.b", error: 1, transformation: 0 }).success).toBe(true);
  expect(evidence.safeParse({ survived: { "a.b": { uniform: { from: 0, to: 1 } } } }).success).toBe(true);
  expect(evidence.safeParse({ results: [], of: "a.b" }).success).toBe(false);
  expect(evidence.safeParse({ results: [1], of: "a.b", transformation: -1 }).success).toBe(false);
});
