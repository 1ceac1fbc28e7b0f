import { expect, test } from "vitest";
import { beta } from "../../src/probability/beta.ts";

test("shapes 1 and 1 are uniform", () => {
  const x = beta({ from: 2, to: 6, mean: 4, sd: 4 / Math.sqrt(12) });
  for (const p of [1e-12, 0.3, 0.8]) expect(x.quantile(p)).toBeCloseTo(2 + 4 * p, 12);
  expect(x.pdf(3)).toBeCloseTo(0.25, 12);
});

test("shapes 2 and 1 rise like a triangle", () => {
  const x = beta({ from: 0, to: 3, mean: 2, sd: Math.sqrt(0.5) });
  expect(x.cdf(1)).toBeCloseTo(1 / 9, 13);
  expect(x.quantile(1e-14) / 3e-7).toBeCloseTo(1, 12);
});

test("nothing lies outside", () => {
  const x = beta({ from: 0, to: 4, mean: 1.2, sd: 0.6 });
  expect([x.pdf(-1), x.cdf(-1), x.ccdf(-1), x.cdf(5), x.ccdf(5)]).toEqual([0, 0, 1, 1, 0]);
  expect([x.normalOfQuantile(-1), x.normalOfQuantile(5)]).toEqual([Number.NEGATIVE_INFINITY, Number.POSITIVE_INFINITY]);
});
