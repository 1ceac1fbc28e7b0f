import { expect, test } from "vitest";
import { gumbel } from "../../../src/probability/gumbel.ts";
import { disagreement, readCases } from "../cases.ts";

test("frequency factors equal the printed ones", () => {
  const standard = gumbel({ mean: 0, sd: 1 });
  const faults = readCases(new URL("cases.csv", import.meta.url)).map(({ years, factor }) =>
    disagreement(`${years} years`, standard.upperQuantile(1 / Number(years)), factor),
  );
  expect(faults.filter((fault) => fault !== "")).toEqual([]);
});

const periods: [number, number, number, number, number, number, number, number][] = [
  // mean, sd, mode, scale, years, mode and mean of the largest of those years, yearly level of that return period
  [2, 0.4, 1.8199787, 0.3118787, 50, 3.0400554, 3.2200767, 3.0369104],
  [1.5, 0.3, 1.364984, 0.233909, 50, 2.2800416, 2.4150575, 2.2776828],
  [3, 0.5, 2.7749734, 0.3898484, 100, 4.5702916, 4.7953183, 4.5683342],
];

test.each(periods)(
  "mean %d and sd %d: the largest of many years is the same curve further up",
  (mean, sd, mode, scale, years, modeAfter, meanAfter, level) => {
    const yearly = gumbel({ mean, sd });
    expect(yearly.quantile(Math.exp(-1))).toBeCloseTo(mode, 7); // F(mode) = 1/e
    expect(yearly.quantile(Math.exp(-Math.exp(-1))) - yearly.quantile(Math.exp(-1))).toBeCloseTo(scale, 7);
    expect(yearly.upperQuantile(1 / years)).toBeCloseTo(level, 7);
    const largest = gumbel({ mean: meanAfter, sd });
    expect(yearly.quantile(Math.exp(-1 / years))).toBeCloseTo(modeAfter, 7); // F(x)^T = 1/e
    for (const x of [mode, mean, level, 1.4 * level]) expect(yearly.cdf(x) ** years).toBeCloseTo(largest.cdf(x), 6);
  },
);

test("the chance that the first stays below 3 for fifty years is 0.3207655", () => {
  expect(gumbel({ mean: 2, sd: 0.4 }).cdf(3) ** 50).toBeCloseTo(0.3207655, 7);
});
