import { expect, test } from "vitest";
import {
  logNormalCdf,
  logNormalPdf,
  logNormalUpper,
  normalCdf,
  normalPdf,
  normalQuantile,
  normalUpper,
  normalUpperQuantile,
} from "../../src/numeric/normal.ts";

test("the lower and the upper tail are mirror images and add up to one", () => {
  for (let z = -12; z <= 12; z += 0.17) {
    expect(normalCdf(-z)).toBe(normalUpper(z));
    expect(Math.abs(normalCdf(z) + normalUpper(z) - 1)).toBeLessThan(3e-16);
  }
});

test("the quantile undoes the probability in both tails", () => {
  for (let z = 0.05; z <= 37; z += 0.31) {
    expect(Math.abs(normalUpperQuantile(normalUpper(z)) / z - 1)).toBeLessThan(5e-15);
    expect(Math.abs(normalQuantile(normalCdf(-z)) / -z - 1)).toBeLessThan(5e-15);
  }
});

test("the quantile meets the ends and the middle", () => {
  expect(normalQuantile(0)).toBe(Number.NEGATIVE_INFINITY);
  expect(normalQuantile(1)).toBe(Number.POSITIVE_INFINITY);
  expect(normalUpperQuantile(0)).toBe(Number.POSITIVE_INFINITY);
  expect(normalQuantile(0.5)).toBe(0);
});

test("at infinity nothing or everything is left", () => {
  const infinity = Number.POSITIVE_INFINITY;
  expect([normalPdf(infinity), normalUpper(infinity), normalCdf(infinity), normalUpper(-infinity)]).toEqual([
    0, 0, 1, 1,
  ]);
});

test("a number that is no probability is refused by its value", () => {
  expect(() => normalQuantile(1.5)).toThrow(new RangeError("1.5 is no probability"));
  expect(() => normalQuantile(Number.NaN)).toThrow(RangeError);
});

test("logarithms agree with the functions where these do not underflow, and go on where they do", () => {
  for (let z = -30; z <= 30; z += 0.9) {
    expect(logNormalUpper(z)).toBeCloseTo(Math.log(normalUpper(z)), 11);
    expect(logNormalCdf(z)).toBeCloseTo(Math.log(normalCdf(z)), 11);
    expect(logNormalPdf(z)).toBeCloseTo(Math.log(normalPdf(z)), 11);
  }
  expect(normalUpper(50)).toBe(0);
  expect(logNormalUpper(50)).toBeCloseTo(-1254.831360823, 6); // ln φ(50) − ln 50, less 1/50²
});
