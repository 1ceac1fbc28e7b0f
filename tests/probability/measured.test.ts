import { expect, test } from "vitest";
import { studentUpperQuantile } from "../../src/numeric/student-t.ts";
import { measured } from "../../src/probability/measured.ts";

const values = [33.1, 35.4, 31.8, 36];
const mean = 34.075;
const sd = Math.sqrt(values.reduce((sum, x) => sum + (x - mean) ** 2, 0) / 3);

test("as normal: mean plus s √(1 + 1/n) times Student's t", () => {
  const x = measured({ values, as: "normal" });
  expect(x.quantile(0.05)).toBeCloseTo(mean - sd * Math.sqrt(1.25) * studentUpperQuantile(0.05, 3), 12);
  expect(x.mean).toBeCloseTo(mean, 13);
  expect(x.sd).toBeCloseTo(sd * Math.sqrt(1.25 * 3), 12); // the variance of t with 3 degrees of freedom is 3
});

test("averaging replaces the 1 by its variance reduction", () => {
  const x = measured({ values, as: "normal", varianceReduction: 0.2 });
  expect(x.sd).toBeCloseTo(sd * Math.sqrt((0.2 + 0.25) * 3), 12);
});

test("as lognormal: the logarithm is normal, widened by (n − 1)/(n − 3)", () => {
  const logs = values.map(Math.log);
  const logMean = logs.reduce((a, b) => a + b) / 4;
  const logVariance = (logs.reduce((sum, x) => sum + (x - logMean) ** 2, 0) / 3) * 1.25 * 3;
  const x = measured({ values, as: "lognormal" });
  expect(x.kind).toBe("measured");
  expect(Math.log(x.quantileOfNormal(1))).toBeCloseTo(logMean + Math.sqrt(logVariance), 13);
  expect(x.mean).toBeCloseTo(Math.exp(logMean + logVariance / 2), 12);
  expect(x.sd / x.mean).toBeCloseTo(Math.sqrt(Math.expm1(logVariance)), 12);
});

test("a variance reduction above 1 is refused", () => {
  expect(() => measured({ values, as: "normal", varianceReduction: 1.2 })).toThrow(
    "measured: the variance reduction is 1.2, must lie between 0 and 1",
  );
});
