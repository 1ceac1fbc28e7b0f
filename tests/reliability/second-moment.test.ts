import { expect, test } from "vitest";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import {
  factorsAt,
  firstOrderSecondMoment,
  oneAtATime,
  secondMomentIndices,
} from "../../src/reliability/second-moment.ts";
import { spaceOf, statesOf } from "./straight-line.ts";

const normal = (mean: number, sd: number) => marginalOf({ kind: "normal", mean, sd });
const independent = (): number => 0;

test("points beyond the capacity are evaluated in several calls", () => {
  const space = spaceOf([normal(0, 1)]);
  const states = statesOf(space, { square: ([x]) => x * x }, 4);
  const points = Array.from({ length: 11 }, (_, i) => [i]);
  expect(factorsAt(states, points).map(([factor]) => factor)).toEqual(points.map(([x]) => x * x));
  expect(states.evaluations.exact).toBe(11);
});

test("one variable at a time moves from the means", () => {
  const space = spaceOf([normal(2, 1), normal(5, 3)]);
  expect(oneAtATime(space, (place) => [place - 1, place + 1])).toEqual([
    [2, 5],
    [-1, 5],
    [1, 5],
    [2, 0],
    [2, 2],
  ]);
});

test("of a sum it gives the exact mean and variance, with shares that sum to 1", () => {
  const space = spaceOf([normal(3, 1), normal(1, 2)]);
  const [moment] = firstOrderSecondMoment(statesOf(space, { sum: ([a, b]) => a + 0.5 * b }), space, independent);
  expect(moment.mean).toBeCloseTo(3.5, 12);
  expect(moment.sd).toBeCloseTo(Math.SQRT2, 12);
  expect(moment.contributions).toEqual({ x1: expect.closeTo(0.5, 12), x2: expect.closeTo(0.5, 12) });
});

test("correlation enters the variance, and a share can be negative", () => {
  const space = spaceOf([normal(3, 1), normal(1, 0.2)]);
  const [moment] = firstOrderSecondMoment(statesOf(space, { sum: ([a, b]) => a - b }), space, () => 0.6);
  expect(moment.sd ** 2).toBeCloseTo(1 - 2 * 0.6 * 0.2 + 0.04, 12);
  expect(moment.contributions.x2).toBeCloseTo((0.04 - 0.12) / 0.8, 12);
  expect(moment.contributions.x1 + moment.contributions.x2).toBeCloseTo(1, 12);
});

test("a factor that nothing moves has no spread and shares of 0", () => {
  const space = spaceOf([normal(3, 1)]);
  const [moment] = firstOrderSecondMoment(statesOf(space, { fixed: () => 1.5 }), space, independent);
  expect(moment).toMatchObject({ mean: 1.5, sd: 0, reliabilityIndexNormal: 1000, reliabilityIndexLognormal: 1000 });
  expect(moment.contributions.x1).toBe(0);
  expect(moment.probabilityNormal).toBeLessThan(1e-300);
});

test("a factor of 0 at the means fails for certain, without a number that is none", () => {
  const indices = secondMomentIndices(0, 0);
  expect(indices.reliabilityIndexNormal).toBe(-1000);
  expect(indices.reliabilityIndexLognormal).toBe(-1000);
  expect(indices.probabilityNormal).toBe(1);
  expect(Object.values(secondMomentIndices(0, 0.3)).every(Number.isFinite)).toBe(true);
});

test("a mean factor of exactly 1 without spread is on the line", () => {
  expect(secondMomentIndices(1, 0)).toMatchObject({ reliabilityIndexNormal: 0, probabilityNormal: 0.5 });
});
