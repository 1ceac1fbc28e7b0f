import { expect, test } from "vitest";
import { normalQuantile } from "../../src/numeric/normal.ts";
import { triangular } from "../../src/probability/triangular.ts";

test("the peak is the one kink, at the u of its chance", () => {
  const x = triangular({ from: 0, peak: 0.8, to: 3 });
  expect(x.kinks).toEqual([normalQuantile(0.8 / 3)]);
  expect(x.quantileOfNormal(x.kinks[0])).toBeCloseTo(0.8, 14);
  expect(x.pdf(0.8)).toBeCloseTo(2 / 3, 15);
});

test("a peak on an end leaves no kink", () => {
  expect(triangular({ from: 0, peak: 0, to: 3 }).kinks).toEqual([]);
  const right = triangular({ from: 0, peak: 3, to: 3 });
  expect([right.kinks, right.cdf(1.5), right.ccdf(3), right.pdf(3)]).toEqual([[], 0.25, 0, 2 / 3]);
});

test("mean and sd", () => {
  const x = triangular({ from: 0, peak: 0.8, to: 3 });
  expect(x.mean).toBeCloseTo(3.8 / 3, 14);
  expect(x.sd ** 2).toBeCloseTo((9 + 0.64 - 2.4) / 18, 14);
});
