import { expect, test } from "vitest";
import { findRisingRoot, findRoot } from "../../src/numeric/root.ts";

test("Brent's search finds roots to the last digit, in few steps", () => {
  const cube = findRoot((x) => x ** 3 - 2, 0, 4);
  expect(cube.x).toBeCloseTo(Math.cbrt(2), 15);
  expect(cube.converged).toBe(true);
  expect(cube.iterations).toBeLessThan(15);
  expect(findRoot(Math.cos, 3, 0).x).toBeCloseTo(Math.PI / 2, 15); // ends in either order
  expect(findRoot((x) => x - 1e-200, -1, 1).x).toBe(1e-200);
});

test("a root on an end, a steep root and a jump are found", () => {
  expect(findRoot((x) => x, 0, 1).x).toBe(0);
  expect(findRoot((x) => Math.atan(1e9 * (x - 0.3)), -50, 7).x).toBeCloseTo(0.3, 14);
  expect(findRoot((x) => (x < 0.7 ? -1 : 1), 0, 1).x).toBeCloseTo(0.7, 14);
});

test("the tolerance ends the search early", () => {
  const rough = findRoot((x) => Math.exp(x) - 5, 0, 4, 1e-3);
  expect(Math.abs(rough.x - Math.log(5))).toBeLessThan(1e-3);
  expect(rough.iterations).toBeLessThan(findRoot((x) => Math.exp(x) - 5, 0, 4).iterations);
});

test("a bracket without a change of sign is refused with both values", () => {
  expect(() => findRoot((x) => x * x + 1, -1, 2)).toThrow(
    new RangeError("no change of sign between f(-1) = 2 and f(2) = 5"),
  );
  expect(() => findRoot(() => Number.NaN, 0, 1)).toThrow(RangeError);
});

test("Newton's search survives a flat stretch, a bad start and a slope that is no number", () => {
  const flat = {
    value: (x: number) => Math.max(x, 2) - 2 + Math.min(x, 1) - 0.5,
    slope: (x: number) => (x > 1 && x < 2 ? 0 : 1),
  };
  expect(findRisingRoot(flat, -10, 10, 1.5).x).toBeCloseTo(0.5, 14);
  const steep = { value: (x: number) => Math.atan(x - 1), slope: (x: number) => 1 / (1 + (x - 1) ** 2) };
  expect(findRisingRoot(steep, -1e6, 1e6, 9e5).x).toBeCloseTo(1, 14); // plain Newton runs away from here
  const blind = { value: (x: number) => x - 0.25, slope: () => Number.NaN };
  const found = findRisingRoot(blind, 0, 1, 0.9);
  expect(found.x).toBeCloseTo(0.25, 14);
  expect(found.converged).toBe(true);
});
