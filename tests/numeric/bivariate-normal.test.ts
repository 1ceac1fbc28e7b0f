import { expect, test } from "vitest";
import { bivariateNormal } from "../../src/numeric/bivariate-normal.ts";
import { normalCdf } from "../../src/numeric/normal.ts";

test("order does not matter, and a limit at infinity leaves the other variable", () => {
  expect(bivariateNormal(-1, 2, 0.4)).toBe(bivariateNormal(2, -1, 0.4));
  expect(bivariateNormal(-1.3, Number.POSITIVE_INFINITY, 0.4)).toBe(normalCdf(-1.3));
  expect(bivariateNormal(Number.NEGATIVE_INFINITY, 1, 0.4)).toBe(0);
});

test("uncorrelated limits multiply, correlation ±1 leaves one variable", () => {
  expect(bivariateNormal(-2, -3, 0)).toBe(normalCdf(-2) * normalCdf(-3));
  expect(bivariateNormal(-2, -3, 1)).toBe(normalCdf(-3));
  expect(bivariateNormal(-2, 3, -1)).toBeCloseTo(normalCdf(-2) - normalCdf(-3), 15);
  expect(bivariateNormal(-2, 1, -1)).toBe(0);
});

test("the four quadrants about a point add up to one, close to correlation 1 too", () => {
  for (const r of [-0.99999, -0.9, 0.3, 0.98, 0.9999999]) {
    for (const [h, k] of [
      [0.3, -0.7],
      [2, 2.1],
      [-1, -1],
    ]) {
      const sum =
        bivariateNormal(h, k, r) + bivariateNormal(-h, k, -r) + bivariateNormal(h, -k, -r) + bivariateNormal(-h, -k, r);
      expect(sum).toBeCloseTo(1, 12);
    }
  }
});

test("a small chance keeps its digits: the slope in h is φ(h) Φ((k − r h)/√(1 − r²))", () => {
  for (const [h, k, r] of [
    [-8, -7, 0.5],
    [-12, -3, -0.2],
    [-20, -20, 0.9],
  ]) {
    const d = 1e-4;
    const slope = (bivariateNormal(h + d, k, r) - bivariateNormal(h - d, k, r)) / (2 * d);
    const exact = (Math.exp(-0.5 * h * h) / Math.sqrt(2 * Math.PI)) * normalCdf((k - r * h) / Math.sqrt(1 - r * r));
    expect(slope / exact).toBeCloseTo(1, 5);
  }
});

test("a number that is no correlation is refused", () => {
  expect(() => bivariateNormal(0, 0, 1.1)).toThrow(new RangeError("1.1 is no correlation"));
});
