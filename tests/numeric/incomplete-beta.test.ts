import { expect, test } from "vitest";
import { betaDensity, betaLower, betaQuantile } from "../../src/numeric/incomplete-beta.ts";

test("closed forms: powers, the arcsine law, a symmetric middle", () => {
  for (const x of [1e-14, 0.2, 0.77, 1 - 1e-9]) {
    expect(betaLower(x, 1 - x, 3, 1) / x ** 3).toBeCloseTo(1, 13);
    expect(betaLower(x, 1 - x, 0.5, 0.5) / ((2 / Math.PI) * Math.asin(Math.sqrt(x)))).toBeCloseTo(1, 7);
  }
  for (const a of [0.1, 2, 77, 4000]) expect(betaLower(0.5, 0.5, a, a)).toBeCloseTo(0.5, 13);
});

test("the complement is used: a point a hair from 1 keeps its digits", () => {
  const y = 1e-20;
  expect(betaLower(y, 1, 2, 3) / (6 * y * y)).toBeCloseTo(1, 12); // 12 ∫ t (1 − t)² dt = 6 y² …
  expect(betaLower(1 - y, y, 3, 2)).toBe(1);
});

test("a thousand million trials: the upper end after no failure keeps ten digits", () => {
  const { x } = betaQuantile(0.025, 1, 1e9, true);
  expect(x / -Math.expm1(Math.log(0.025) / 1e9)).toBeCloseTo(1, 10);
});

test("densities at the ends follow the shapes", () => {
  expect([betaDensity(0, 1, 0.5, 2), betaDensity(0, 1, 1, 3), betaDensity(0, 1, 2, 2)]).toEqual([
    Number.POSITIVE_INFINITY,
    3,
    0,
  ]);
  expect([betaDensity(1, 0, 2, 0.5), betaDensity(1, 0, 3, 1), betaDensity(-0.1, 1.1, 2, 2)]).toEqual([
    Number.POSITIVE_INFINITY,
    3,
    0,
  ]);
});

test("quantiles undo both tails, with the distance from the nearer end", () => {
  for (const a of [0.1, 0.9, 3, 60, 2000]) {
    for (const b of [0.1, 1, 5, 300]) {
      for (const p of [1e-15, 1e-6, 0.1, 0.6]) {
        for (const upper of [false, true]) {
          const { x, y } = betaQuantile(p, a, b, upper);
          if (Math.min(x, y) < 1e-290) continue; // shapes below 1 crowd on an end until the distance underflows
          const found = upper ? betaLower(y, x, b, a) : betaLower(x, y, a, b);
          expect(found / p, `${p} ${a} ${b} ${upper}`).toBeCloseTo(1, 11);
        }
      }
    }
  }
});
