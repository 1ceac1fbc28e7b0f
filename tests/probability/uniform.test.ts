import { expect, test } from "vitest";
import { uniform } from "../../src/probability/uniform.ts";

test("mean, sd and ends", () => {
  const x = uniform({ from: 0.5, to: 2.5 });
  expect([x.mean, x.lowest, x.highest, x.pdf(1), x.pdf(3)]).toEqual([1.5, 0.5, 2.5, 0.5, 0]);
  expect(x.sd).toBeCloseTo(2 / Math.sqrt(12), 15);
});

test("both ends are met exactly", () => {
  const x = uniform({ from: 0.1, to: 0.7 });
  expect([x.quantile(0), x.quantile(1), x.upperQuantile(0), x.upperQuantile(1)]).toEqual([0.1, 0.7, 0.7, 0.1]);
  expect([x.cdf(0.7), x.ccdf(0.7), x.cdf(9), x.ccdf(-9)]).toEqual([1, 0, 1, 1]);
});
