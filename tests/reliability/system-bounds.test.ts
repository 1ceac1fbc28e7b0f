import { expect, test } from "vitest";
import { systemBounds } from "../../src/reliability/system-bounds.ts";

test("the system fails at least as often as its weakest part and at most as often as all together", () => {
  expect(systemBounds([0.01, 0.2, 0.05])).toEqual([0.2, expect.closeTo(0.26, 12)]);
});

test("the upper bound does not exceed 1, and nothing to fail gives 0", () => {
  expect(systemBounds([0.7, 0.6])).toEqual([0.7, 1]);
  expect(systemBounds([])).toEqual([0, 0]);
});
