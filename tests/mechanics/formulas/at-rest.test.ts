import { expect, test } from "vitest";
import { atRestCoefficient } from "../../../src/mechanics/formulas/at-rest.ts";
import { radians } from "../../outside/cases.ts";

test("normally consolidated level ground has 1 − sin φ", () => {
  expect(atRestCoefficient(radians(30), 1, 0)).toBeCloseTo(0.5, 15);
  expect(atRestCoefficient(0, 1, 0)).toBe(1);
});

test("overconsolidation enters by its root and the slope by 1 + sin β", () => {
  expect(atRestCoefficient(radians(30), 4, 0)).toBeCloseTo(1, 15);
  expect(atRestCoefficient(radians(30), 1, radians(30))).toBeCloseTo(0.75, 15);
});

test("a sample of the overconsolidation ratio below 0 counts as 0", () => {
  expect(atRestCoefficient(radians(30), -1, 0)).toBe(0);
});
