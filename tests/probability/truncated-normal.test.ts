import { expect, test } from "vitest";
import { normalUpper } from "../../src/numeric/normal.ts";
import { truncatedNormal } from "../../src/probability/truncated-normal.ts";

test("half a normal has mean √(2/π) and variance 1 − 2/π", () => {
  const x = truncatedNormal({ mean: 0, sd: 1, from: 0, to: Number.POSITIVE_INFINITY });
  expect(x.mean).toBeCloseTo(Math.sqrt(2 / Math.PI), 13);
  expect(x.sd ** 2).toBeCloseTo(1 - 2 / Math.PI, 12);
  expect(x.ccdf(2)).toBeCloseTo(2 * normalUpper(2), 15);
  expect(x.upperQuantile(1e-12)).toBeGreaterThan(7);
});

test("mean and sd given are the parent's, those reported are of what is left", () => {
  const x = truncatedNormal({ mean: 34, sd: 2.7, from: 34, to: 42 });
  expect(x.mean).toBeGreaterThan(34);
  expect(x.sd).toBeLessThan(2.7);
});

test("a far tail is exponential near its cut: mean and sd 1/8 beyond 8", () => {
  const x = truncatedNormal({ mean: 0, sd: 1, from: 8, to: Number.POSITIVE_INFINITY });
  const mills = Math.exp(-32) / Math.sqrt(2 * Math.PI) / normalUpper(8); // mean of the tail, analytic
  expect(x.mean).toBeCloseTo(mills, 11);
  expect(x.sd).toBeCloseTo(Math.sqrt(1 + 8 * mills - mills ** 2), 9);
});

test("a narrow cut is nearly uniform and keeps its digits", () => {
  const x = truncatedNormal({ mean: 0, sd: 1, from: 0.3, to: 0.3 + 1e-6 });
  expect((x.quantile(0.25) - 0.3) / 1e-6).toBeCloseTo(0.25, 6);
  expect(x.sd / (1e-6 / Math.sqrt(12))).toBeCloseTo(1, 6);
});

test("near an end at 0 the distance from it is good to twelve digits", () => {
  const x = truncatedNormal({ mean: 3, sd: 1, from: 0, to: 9 });
  expect(x.quantile(1e-15) / 1e-15 / (x.quantile(1e-12) / 1e-12)).toBeCloseTo(1, 9);
  expect(x.cdf(x.quantile(1e-15)) / 1e-15).toBeCloseTo(1, 12);
});
