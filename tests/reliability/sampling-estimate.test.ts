import { expect, test } from "vitest";
import { logarithmicInterval, spreadOf } from "../../src/reliability/sampling-estimate.ts";

test("the interval on the logarithm is the same factor up and down", () => {
  const [low, high] = logarithmicInterval(1e-6, 1e-7);
  expect(high / 1e-6).toBeCloseTo(Math.exp(0.1959963984540054), 12);
  expect(1e-6 / low).toBeCloseTo(high / 1e-6, 12);
});

test("it never passes 1, and an estimate of 0 says nothing", () => {
  expect(logarithmicInterval(0.9, 0.3)[1]).toBe(1);
  expect(logarithmicInterval(0, 0)).toEqual([0, 1]);
});

test("a wider quantile, as for few replicates, gives a wider interval", () => {
  expect(logarithmicInterval(1e-3, 1e-4, 2.365)[1]).toBeGreaterThan(logarithmicInterval(1e-3, 1e-4)[1]);
});

test("the coefficient of variation of an estimate of 0 is infinite", () => {
  expect(spreadOf({ probability: 0, standardError: 0 })).toBe(Number.POSITIVE_INFINITY);
  expect(spreadOf({ probability: 0.2, standardError: 0.01 })).toBeCloseTo(0.05, 12);
});
