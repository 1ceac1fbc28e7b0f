import { expect, test } from "vitest";
import { rankCorrelations, ranksOf } from "../../src/drivers/rank-correlation.ts";
import { spaceOf, standardNormal, standardSpace, statesOf } from "../reliability/straight-line.ts";

test("equal values share the mean of their ranks", () => {
  expect(Array.from(ranksOf(Float64Array.of(3, 1, 3, 2)))).toEqual([3.5, 1, 3.5, 2]);
});

test("of a sum of normals it is that of the bivariate normal: 6/π asin(ρ/2)", () => {
  const space = standardSpace(2);
  const [[a, b]] = rankCorrelations(statesOf(space, { f: ([x, y]) => 50 + 3 * x - 4 * y }), space, "ranks");
  const expected = (rho: number): number => (6 / Math.PI) * Math.asin(rho / 2);
  // standard error about √(1.06/4096) = 0.016 at most: one seed in a million is off by 4.9 of these
  expect(Math.abs(a.value - expected(0.6))).toBeLessThan(0.079);
  expect(Math.abs(b.value - expected(-0.8))).toBeLessThan(0.079);
  expect(a.interval[0]).toBeLessThan(a.value);
  expect(a.interval[1]).toBeGreaterThan(a.value);
});

test("a rising function of one unknown has rank correlation 1, however bent", () => {
  const space = standardSpace(2);
  const [[a, b]] = rankCorrelations(statesOf(space, { f: ([x]) => Math.exp(x) }), space, "bent");
  expect(a.value).toBe(1);
  expect(a.interval[1]).toBeLessThanOrEqual(1);
  expect(b.interval[0]).toBeLessThan(0);
  expect(b.interval[1]).toBeGreaterThan(0);
});

test("a correlated unknown shares in what the other does", () => {
  const space = spaceOf(
    [standardNormal, standardNormal],
    [
      [1, 0],
      [0.8, 0.6],
    ],
  );
  const [[, b]] = rankCorrelations(statesOf(space, { f: ([x]) => 20 + x }), space, "shared");
  expect(Math.abs(b.value - (6 / Math.PI) * Math.asin(0.4))).toBeLessThan(0.079);
});

test("a factor that nothing moves has none, with the widest interval", () => {
  const space = standardSpace(1);
  expect(rankCorrelations(statesOf(space, { f: () => 2 }), space, "flat")).toEqual([[{ value: 0, interval: [-1, 1] }]]);
});
