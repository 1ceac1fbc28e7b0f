import { expect, test } from "vitest";
import { weibull } from "../../src/probability/weibull.ts";

test("shape 1 is exponential beyond the shift", () => {
  const x = weibull({ shape: 1, scale: 2, shift: 5 });
  expect([x.mean, x.sd].map((value) => Math.round(value * 1e12) / 1e12)).toEqual([7, 2]);
  expect(x.ccdf(9)).toBeCloseTo(Math.exp(-2), 15);
  expect([x.pdf(4), x.pdf(5), x.cdf(5)]).toEqual([0, 0.5, 0]);
});

test("the density at the shift follows the shape", () => {
  expect(weibull({ shape: 2, scale: 1 }).pdf(0)).toBe(0);
  expect(weibull({ shape: 0.5, scale: 1 }).pdf(0)).toBe(Number.POSITIVE_INFINITY);
});

test("the sd keeps its digits where the shape is large and the spread small", () => {
  // for a large shape X is nearly scale·exp(−E/shape) with E Gumbel: sd → scale·π/(√6·shape)
  expect(weibull({ shape: 1e5, scale: 1 }).sd * 1e5).toBeCloseTo(Math.PI / Math.sqrt(6), 4);
});

test("a shape that leaves no finite sd is refused", () => {
  expect(() => weibull({ shape: 0.005, scale: 1 })).toThrow("weibull: shape is 0.005, too small for a finite sd");
});
