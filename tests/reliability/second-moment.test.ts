import { describe, expect, test } from "vitest";
import { firstOrderSecondMoment, secondMomentIndices } from "../../src/reliability/second-moment.ts";
import { systemBounds } from "../../src/reliability/system-bounds.ts";
import { problemOf } from "./straight-line.ts";

const normal = (mean: number, sd: number) => ({ kind: "normal", mean, sd }) as const;

describe("first-order second-moment", () => {
  test("is exact for a linear factor, and its shares sum to 1", () => {
    const { states, space } = problemOf({ "a.x": normal(2, 0.3), "b.y": normal(1, 0.4) }, { sliding: ([x, y]) => x + 2 * y });
    const [found] = firstOrderSecondMoment(states, space, () => 0);
    expect(found.mean).toBeCloseTo(4, 14);
    expect(found.sd).toBeCloseTo(Math.hypot(0.3, 0.8), 14);
    expect(found.contributions["b.y"]).toBeCloseTo(0.64 / 0.73, 14);
    expect(found.contributions["a.x"] + found.contributions["b.y"]).toBeCloseTo(1, 14);
  });

  test("takes the correlation into the variance, and a share can be below zero", () => {
    const { states, space } = problemOf({ "a.x": normal(2, 0.3), "b.y": normal(1, 0.4) }, { sliding: ([x, y]) => 3 + x - 2 * y });
    const rho = 0.6;
    const [found] = firstOrderSecondMoment(states, space, () => rho);
    expect(found.sd ** 2).toBeCloseTo(0.09 + 0.64 - 2 * rho * 0.3 * 0.8, 13);
    expect(found.contributions["a.x"]).toBeLessThan(0);
    expect(found.contributions["a.x"] + found.contributions["b.y"]).toBeCloseTo(1, 13);
  });

  test("gives finite numbers where nothing varies or the mean is zero", () => {
    const { states, space } = problemOf({ "a.x": normal(2, 0.3) }, { sliding: () => 1.5 });
    const [found] = firstOrderSecondMoment(states, space, () => 0);
    expect(found).toMatchObject({ mean: 1.5, sd: 0, reliabilityIndexNormal: 40, reliabilityIndexLognormal: 40, contributions: { "a.x": 0 } });
    expect(secondMomentIndices(0, 0.1).probabilityLognormal).toBeCloseTo(1, 12);
  });
});

describe("bounds from the limit states alone", () => {
  test("are the largest probability and the sum, at most 1", () => {
    expect(systemBounds([0.1, 0.2])).toEqual([0.2, 0.30000000000000004]);
    expect(systemBounds([0.7, 0.8])).toEqual([0.8, 1]);
    expect(systemBounds([])).toEqual([0, 0]);
  });
});
