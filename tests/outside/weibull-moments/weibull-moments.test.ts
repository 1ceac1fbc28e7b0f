import { expect, test } from "vitest";
import { weibull } from "../../../src/probability/weibull.ts";
import { disagreement, readCases } from "../cases.ts";

const printed = new Map(readCases(new URL("cases.csv", import.meta.url)).map(({ x, gamma }) => [Number(x), gamma]));

test("the mean of a variable with scale 1 is the printed gamma function", () => {
  const faults = [...printed].map(([x, gamma]) =>
    disagreement(`shape ${1 / (x - 1)}`, weibull({ shape: 1 / (x - 1), scale: 1 }).mean, gamma),
  );
  expect(faults.filter((fault) => fault !== "")).toEqual([]);
});

test("mean square and shift follow it too", () => {
  for (const [half, whole] of [
    [1.05, 1.1],
    [1.1, 1.2],
    [1.2, 1.4],
    [1.25, 1.5],
  ]) {
    const variable = weibull({ shape: 1 / (half - 1), scale: 1, shift: 3 });
    expect(Math.abs(variable.sd ** 2 + (variable.mean - 3) ** 2 - Number(printed.get(whole)))).toBeLessThan(1e-10);
    expect(variable.mean).toBeCloseTo(3 + Number(printed.get(half)), 9);
  }
});

test("Rayleigh's distribution has a coefficient of variation of 0.5227", () => {
  const rayleigh = weibull({ shape: 2, scale: 5 });
  expect(rayleigh.sd / rayleigh.mean).toBeCloseTo(Math.sqrt(4 / Math.PI - 1), 12);
  expect(rayleigh.sd / rayleigh.mean).toBeCloseTo(0.5227, 4);
});
