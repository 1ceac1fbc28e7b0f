import { expect, test } from "vitest";
import { deviance, gamma, logGamma, stirlingError } from "../../src/numeric/gamma.ts";

test("the gamma function of whole numbers is the factorial", () => {
  for (let n = 1, factorial = 1; n < 15; factorial *= n, n++) expect(gamma(n) / factorial).toBeCloseTo(1, 13);
});

test("the gamma function of a half is √π, and x Γ(x) = Γ(x + 1) on either side of where the method changes", () => {
  expect(gamma(0.5)).toBeCloseTo(Math.sqrt(Math.PI), 14);
  for (const x of [0.01, 0.7, 8.99, 9.01, 9.999, 10, 10.01, 25]) {
    expect(logGamma(x + 1) - logGamma(x)).toBeCloseTo(Math.log(x), 13);
  }
});

test("the error of Stirling's formula tends to 1/(12 x)", () => {
  expect(stirlingError(1e6) * 12e6).toBeCloseTo(1, 12);
  expect(stirlingError(1)).toBeCloseTo(1 - 0.5 * Math.log(2 * Math.PI), 14);
});

test("the deviance vanishes like a square about its middle, without losing digits", () => {
  expect(deviance(7, 7)).toBe(0);
  expect(deviance(1e6, 1e6 + 1) / (0.5 / 1e6)).toBeCloseTo(1, 5);
  for (const m of [0.5, 2.4, 2.46, 3.6, 3.7, 100]) expect(deviance(3, m)).toBeCloseTo(3 * Math.log(3 / m) + m - 3, 14);
});
