import { expect, test } from "vitest";
import { bivariateNormal } from "../../src/numeric/bivariate-normal.ts";
import { anyNormalAbove, multivariateNormal } from "../../src/numeric/multivariate-normal.ts";
import { normalCdf, normalUpper } from "../../src/numeric/normal.ts";

const identity = (n: number): number[][] =>
  Array.from({ length: n }, (_, i) => Array.from({ length: n }, (_, j) => (i === j ? 1 : 0)));

test("independent variables multiply, exactly", () => {
  const { probability, standardError } = multivariateNormal([-3, 1, -2, 0.5], identity(4));
  expect(probability / (normalCdf(-3) * normalCdf(1) * normalCdf(-2) * normalCdf(0.5))).toBeCloseTo(1, 12);
  expect(standardError).toBeLessThan(1e-15);
});

test("none, one, and variables without a limit", () => {
  expect(multivariateNormal([], [])).toEqual({ probability: 1, standardError: 0 });
  expect(multivariateNormal([-2], [[1]]).probability).toBe(normalCdf(-2));
  const infinity = Number.POSITIVE_INFINITY;
  expect(multivariateNormal([infinity, -2, infinity], identity(3)).probability).toBe(normalCdf(-2));
});

test("two variables agree with the bivariate distribution within the stated error, in the tail too", () => {
  for (const [h, k, r] of [
    [-1, 0.5, 0.6],
    [-4, -3, 0.5],
    [-5, -5, -0.3],
    [-3, -3.2, 0.99],
  ]) {
    const found = multivariateNormal(
      [h, k],
      [
        [1, r],
        [r, 1],
      ],
    );
    const exact = bivariateNormal(h, k, r);
    expect(Math.abs(found.probability - exact)).toBeLessThan(5 * found.standardError + 1e-12 * exact);
    expect(found.standardError / exact).toBeLessThan(1e-4);
  }
});

test("variables that are one, and variables that exclude each other", () => {
  const one = multivariateNormal(
    [-2, -2.5],
    [
      [1, 1],
      [1, 1],
    ],
  );
  expect(one.probability).toBeCloseTo(normalCdf(-2.5), 12);
  expect(
    multivariateNormal(
      [-1, -1],
      [
        [1, -1],
        [-1, 1],
      ],
    ).probability,
  ).toBe(0);
});

test("any of several: a rare mode beside a common one is not lost", () => {
  const found = anyNormalAbove(
    [3, 8],
    [
      [1, 0.2],
      [0.2, 1],
    ],
  );
  expect(found.probability).toBeGreaterThan(normalUpper(3));
  expect(found.probability).toBeLessThan(normalUpper(3) + normalUpper(8) * 1.0001);
  const twice = anyNormalAbove(
    [3, 3],
    [
      [1, 1],
      [1, 1],
    ],
  );
  expect(twice.probability / normalUpper(3)).toBeCloseTo(1, 12);
});

test("the same question has the same answer, and less effort a larger error", () => {
  const correlation = [
    [1, 0.5, 0.5],
    [0.5, 1, 0.5],
    [0.5, 0.5, 1],
  ];
  const [first, second] = [
    multivariateNormal([-2, -2, -2], correlation),
    multivariateNormal([-2, -2, -2], correlation),
  ];
  expect(first).toEqual(second);
  const rough = multivariateNormal([-2, -2, -2], correlation, { relativeError: 1e-2, evaluations: 1e4 });
  expect(rough.standardError).toBeGreaterThan(first.standardError);
});
