import { expect, test } from "vitest";
import { gumbel } from "../../src/probability/gumbel.ts";

test("the upper tail falls like an exponential, the lower like an exponential of one", () => {
  const x = gumbel({ mean: 1.4, sd: 0.5 });
  const scale = (0.5 * Math.sqrt(6)) / Math.PI;
  expect(x.ccdf(12) / x.ccdf(12 + scale)).toBeCloseTo(Math.E, 9);
  expect(x.cdf(-1)).toBeLessThan(1e-70);
  expect(x.pdf(-50)).toBe(0);
});

test("skewed towards high values: the median lies below the mean", () => {
  const x = gumbel({ mean: 0, sd: 1 });
  expect(x.quantile(0.5)).toBeCloseTo((-0.5772156649015329 - Math.log(Math.log(2))) * (Math.sqrt(6) / Math.PI), 14);
});
