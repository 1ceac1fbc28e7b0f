import { expect, test } from "vitest";
import { lognormal, lognormalOfLogs } from "../../src/probability/lognormal.ts";

test("the shift is part of the mean, and the sd is that of the variable", () => {
  const plain = lognormal({ mean: 10, sd: 3 });
  const shifted = lognormal({ mean: 15, sd: 3, shift: 5 });
  expect(shifted.lowest).toBe(5);
  for (const u of [-4, 0, 1.7]) expect(shifted.quantileOfNormal(u)).toBeCloseTo(5 + plain.quantileOfNormal(u), 13);
  expect([shifted.mean, shifted.sd]).toEqual([15, 3]);
});

test("there is nothing at or below the shift", () => {
  const x = lognormal({ mean: 15, sd: 3, shift: 5 });
  expect([x.cdf(5), x.ccdf(4), x.pdf(5), x.normalOfQuantile(5)]).toEqual([0, 1, 0, Number.NEGATIVE_INFINITY]);
});

test("the same curve comes from the moments of the logarithm", () => {
  const logVariance = Math.log(1.09);
  const x = lognormalOfLogs({
    kind: "lognormal",
    mean: 10,
    sd: 3,
    shift: 0,
    logMean: Math.log(10) - logVariance / 2,
    logSd: Math.sqrt(logVariance),
  });
  expect(x.quantile(0.05)).toBeCloseTo(lognormal({ mean: 10, sd: 3 }).quantile(0.05), 13);
});
