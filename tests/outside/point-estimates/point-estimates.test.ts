import { expect, test } from "vitest";
import { type CorrelationOf, twoPointEstimates } from "../../../src/reliability/point-estimates.ts";
import { firstOrderSecondMoment } from "../../../src/reliability/second-moment.ts";
import { problemOf } from "../../reliability/known-problems.ts";

const normal = (mean: number, sd: number) => ({ kind: "normal", mean, sd }) as const;

test.each([
  ["x y", { "a.x": normal(2, 1), "b.y": normal(3, 1) }, ([x, y]: readonly number[]) => x * y, 0, 6, 14, 1e-9],
  [
    "x y, correlated",
    { "a.x": normal(2, 1), "b.y": normal(3, 1) },
    ([x, y]: readonly number[]) => x * y,
    0.5,
    6.5,
    19.75,
    1e-9,
  ],
  ["x cubed", { "a.x": normal(2, 0.5) }, ([x]: readonly number[]) => x ** 3, 0, 9.5, 37.515625, 1e-9],
  ["exp x", { "a.x": normal(0, 0.3) }, ([x]: readonly number[]) => Math.exp(x), 0, 1.0453385, 0.0927326, 0.51e-7],
])("two-point estimates of %s are the printed ones", (_, distributions, factor, rho, mean, variance, tolerance) => {
  const { states, space } = problemOf(distributions as Parameters<typeof problemOf>[0], { f: factor });
  const correlation: CorrelationOf = () => rho;
  const [found] = twoPointEstimates(states, space, correlation)!;
  expect(Math.abs(found.mean - mean)).toBeLessThan(tolerance);
  expect(Math.abs(found.sd ** 2 - variance)).toBeLessThan(tolerance);
});

const wall = problemOf(
  { "fill.weight": normal(18, 0.9), "fill.angle": normal(34, 3.4), "base.angle": normal(25, 2.5) },
  {
    sliding: ([gamma, phi, delta]) => {
      const radians = Math.PI / 180;
      const ka = Math.tan((45 - phi / 2) * radians) ** 2;
      return ((90 + 10 * gamma) * Math.tan(delta * radians)) / (0.5 * gamma * 5.5 ** 2 * ka);
    },
  },
);

test("the reference wall: eight points and the derivative at the means", () => {
  const [points] = twoPointEstimates(wall.states, wall.space, () => 0)!;
  expect(Math.abs(points.mean - 1.662576)).toBeLessThan(0.51e-6);
  expect(Math.abs(points.sd - 0.305465)).toBeLessThan(0.51e-6);
  expect(points.points).toBe(8);
  const [tangent] = firstOrderSecondMoment(wall.states, wall.space, () => 0, 1e-3);
  expect(Math.abs(tangent.sd - 0.300504)).toBeLessThan(0.51e-6);
  expect(Math.abs(tangent.reliabilityIndexNormal - 2.115647)).toBeLessThan(3e-6);
  expect(Math.abs(tangent.reliabilityIndexLognormal - 2.610023)).toBeLessThan(3e-6);
});
