import { expect, test } from "vitest";
import {
  activeCoefficientRankine,
  activeCoefficientRankineSloping,
  passiveCoefficientRankine,
  rootActiveCoefficientRankine,
} from "../../../src/mechanics/formulas/rankine.ts";
import { radians } from "../../outside/cases.ts";

test("Ka is a third at 30 degrees and exactly 1 without friction", () => {
  expect(activeCoefficientRankine(radians(30))).toBeCloseTo(1 / 3, 15);
  expect(activeCoefficientRankine(0)).toBe(1);
  expect(rootActiveCoefficientRankine(0)).toBe(1);
  expect(passiveCoefficientRankine(0)).toBe(1);
});

test("the root is tan(45° − φ/2) and its square is Ka", () => {
  for (let deg = 0; deg <= 60; deg += 0.5) {
    const root = rootActiveCoefficientRankine(radians(deg));
    expect(Math.abs(root / Math.tan(Math.PI / 4 - radians(deg) / 2) - 1)).toBeLessThan(1e-14);
    expect(Math.abs((root * root) / activeCoefficientRankine(radians(deg)) - 1)).toBeLessThan(3e-15);
  }
});

test("on level ground the coefficient for slopes is the plain one", () => {
  for (let deg = 0; deg <= 60; deg += 0.5)
    expect(activeCoefficientRankineSloping(radians(deg), 0)).toBeCloseTo(activeCoefficientRankine(radians(deg)), 15);
});

test("at a slope equal to the friction angle the coefficient is cos φ, and stays cos β where the slope is steeper", () => {
  expect(activeCoefficientRankineSloping(radians(30), radians(30))).toBeCloseTo(Math.cos(radians(30)), 15);
  expect(activeCoefficientRankineSloping(radians(30), radians(40))).toBeCloseTo(Math.cos(radians(40)), 15);
  expect(activeCoefficientRankineSloping(0, radians(45))).toBeCloseTo(Math.cos(radians(45)), 15);
});

test("just below the limit the coefficient differs from cos φ by the square root of the distance", () => {
  const phi = radians(30);
  const step = 1e-10;
  // r = √(sin 2φ · step), K = cos φ (1 − 2 r / cos φ + …)
  const expected = Math.cos(phi) - 2 * Math.sqrt(Math.sin(2 * phi) * step);
  expect(activeCoefficientRankineSloping(phi, phi - step)).toBeCloseTo(expected, 8);
});
