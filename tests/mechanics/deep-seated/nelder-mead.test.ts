import { expect, test } from "vitest";
import { descend } from "../../../src/mechanics/deep-seated/nelder-mead.ts";

test("finds the least value of a bowl", () => {
  const { x, value } = descend(([a, b]) => 1 + (a - 3) ** 2 + 10 * (b + 1) ** 2, [0, 0], [1, 1], 1e-14, 400);
  expect(x[0]).toBeCloseTo(3, 5);
  expect(x[1]).toBeCloseTo(-1, 5);
  expect(value).toBeCloseTo(1, 10);
});

test("leaves a coordinate with a step of 0 as it is", () => {
  const { x } = descend(([a, b]) => (a - 3) ** 2 + b ** 2, [0, 2], [1, 0], 1e-12, 300);
  expect(x[1]).toBe(2);
  expect(x[0]).toBeCloseTo(3, 4);
});

test("keeps out of where the value is infinite", () => {
  const { x, value } = descend(([a]) => (a < 1 ? Number.POSITIVE_INFINITY : a), [4], [1], 1e-12, 300);
  expect(x[0]).toBeGreaterThanOrEqual(1);
  expect(value).toBeLessThan(1.001);
});
