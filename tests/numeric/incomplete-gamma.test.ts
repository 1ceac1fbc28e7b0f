import { expect, test } from "vitest";
import { gammaDensity, gammaLower, gammaQuantile, gammaUpper } from "../../src/numeric/incomplete-gamma.ts";

test("shape 1 is exponential, in both tails", () => {
  for (const x of [1e-12, 0.3, 1.9, 2.1, 40, 600]) {
    expect(gammaLower(1, x) / -Math.expm1(-x)).toBeCloseTo(1, 13);
    expect(gammaUpper(1, x) / Math.exp(-x)).toBeCloseTo(1, 12);
  }
});

test("a large shape, where a library in wide use is off by 2 %, obeys its recurrence and its median", () => {
  // Q(a + 1, x) − Q(a, x) = xᵃ e⁻ˣ/Γ(a + 1) = x/a · density
  for (const a of [400, 1600, 10_000]) {
    expect(gammaUpper(a + 1, a) - gammaUpper(a, a)).toBeCloseTo(gammaDensity(a, a), 14);
    expect(gammaQuantile(a, 0.5, false)).toBeCloseTo(a - 1 / 3 + 8 / (405 * a), 5); // Ramanujan's expansion of the median
  }
});

test("the two tails add up to one where the method changes", () => {
  for (const a of [0.05, 1, 30, 2000]) {
    for (const x of [a + 0.999, a + 1, a + 1.001]) expect(gammaLower(a, x) + gammaUpper(a, x)).toBeCloseTo(1, 14);
  }
});

test("ends: nothing below 0, all below infinity, densities at 0", () => {
  expect([
    gammaLower(2, 0),
    gammaUpper(2, -1),
    gammaLower(2, Number.POSITIVE_INFINITY),
    gammaUpper(2, Number.POSITIVE_INFINITY),
  ]).toEqual([0, 1, 1, 0]);
  expect([gammaDensity(2, 0), gammaDensity(1, 0), gammaDensity(0.5, 0), gammaDensity(3, -1)]).toEqual([
    0,
    1,
    Number.POSITIVE_INFINITY,
    0,
  ]);
});

test("quantiles undo both tails for shapes from 0.02 to 5000 down to 1e-15", () => {
  for (const a of [0.02, 0.3, 1, 7.5, 150, 5000]) {
    for (const p of [1e-15, 1e-8, 0.01, 0.4, 0.9]) {
      const low = gammaQuantile(a, p, false);
      if (low > 1e-300) expect(gammaLower(a, low) / p).toBeCloseTo(1, 11);
      expect(gammaUpper(a, gammaQuantile(a, p, true)) / p).toBeCloseTo(1, 11);
    }
  }
});
