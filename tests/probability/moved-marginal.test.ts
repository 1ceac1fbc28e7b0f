import { expect, test } from "vitest";
import type { Marginal } from "../../src/probability/marginal.ts";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import { movementsOf, stretchAt } from "../../src/probability/moved-marginal.ts";

const gumbel = (mean: number, sd: number): Marginal => marginalOf({ kind: "gumbel", mean, sd });

test("of a normal: shift and stretch in closed form", () => {
  const { mean, sd, edged } = movementsOf(marginalOf({ kind: "normal", mean: 5, sd: 2 }));
  expect(edged).toBe(false);
  expect(mean.ofValue(1)).toBe(1);
  expect(mean.ofNormal(1.3)).toBeCloseTo(-0.5, 8);
  expect(sd.ofValue(1.5)).toBeCloseTo(1.5, 12);
  expect(mean.ofLogDensity(8)).toBeCloseTo(3 / 4, 6);
  expect(sd.ofLogDensity(8)).toBeCloseTo((9 / 4 - 1) / 2, 6);
});

test("shifting and stretching a Gumbel is the same as making it anew", () => {
  const moved = movementsOf(gumbel(3, 0.7));
  const remade = movementsOf(gumbel(3, 0.7), gumbel);
  for (const u of [-2, 0.3, 2.5]) {
    const x = gumbel(3, 0.7).quantileOfNormal(u);
    for (const what of ["mean", "sd"] as const) {
      expect(remade[what].ofValue(u)).toBeCloseTo(moved[what].ofValue(u), 5);
      expect(remade[what].ofNormal(u)).toBeCloseTo(moved[what].ofNormal(u), 5);
      expect(remade[what].ofLogDensity(x)).toBeCloseTo(moved[what].ofLogDensity(x), 4);
    }
  }
});

test("a lognormal made anew moves otherwise than one that is shifted", () => {
  const lognormal = (mean: number, sd: number): Marginal => marginalOf({ kind: "lognormal", mean, sd, shift: 0 });
  const { mean } = movementsOf(lognormal(10, 3), lognormal);
  // logMean = ln m − ½ ln(1 + v²), logSd² = ln(1 + v²)
  const value = (m: number): number => {
    const s2 = Math.log1p(9 / (m * m));
    return Math.exp(Math.log(m) - 0.5 * s2 - 2 * Math.sqrt(s2));
  };
  expect(mean.ofValue(-2)).toBeCloseTo((value(10.001) - value(9.999)) / 0.002, 5);
});

test("a density that ends abruptly is edged, one that runs out is not", () => {
  expect(movementsOf(marginalOf({ kind: "uniform", from: 1, to: 2 })).edged).toBe(true);
  expect(movementsOf(marginalOf({ kind: "truncated_normal", mean: 3, sd: 1, from: 2, to: 9 })).edged).toBe(true);
  expect(movementsOf(marginalOf({ kind: "triangular", from: 0, peak: 1, to: 3 })).edged).toBe(false);
  expect(movementsOf(marginalOf({ kind: "lognormal", mean: 3, sd: 1, shift: 0 })).edged).toBe(false);
});

test("the stretch of a value is its sd for a normal, and finite across a gap", () => {
  expect(stretchAt(marginalOf({ kind: "normal", mean: 0, sd: 3 }), 1)).toBeCloseTo(3, 8);
  expect(Number.isFinite(stretchAt(marginalOf({ kind: "uniform", from: 0, to: 1 }), 3))).toBe(true);
});
