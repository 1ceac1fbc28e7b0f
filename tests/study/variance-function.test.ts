import { describe, expect, test } from "vitest";
import { integrate, panels } from "../../src/numeric/gauss-legendre.ts";
import { type VarianceFunction, varianceReduction } from "../../src/study/variance-function.ts";

const correlation: Readonly<Record<Exclude<VarianceFunction, "simple">, (r: number) => number>> = {
  exponential: (r) => Math.exp(-2 * r),
  gaussian: (r) => Math.exp(-Math.PI * r * r),
  triangular: (r) => Math.max(0, 1 - r),
};
const models = Object.keys(correlation) as (keyof typeof correlation)[];

/** Γ² = (2/L) ∫ (1 − τ/L) ρ dτ, numerically. */
function byDefinition(rho: (r: number) => number, length: number): number {
  const points = panels(0, length, [1], 0.05 * Math.max(1, length));
  let sum = 0;
  for (let i = 1; i < points.length; i++)
    sum += integrate((r) => (1 - r / length) * rho(r), points[i - 1], points[i], 20);
  return (2 * sum) / length;
}

describe("a variance function", () => {
  test.each(models)("%s is the integral of its correlation model", (model) => {
    for (const length of [1e-6, 1e-4, 9e-4, 1.1e-3, 9e-3, 1.1e-2, 0.3, 0.99, 1, 1.01, 3, 17, 80]) {
      const expected = byDefinition(correlation[model], length);
      expect(Math.abs(varianceReduction(model, length, 1) / expected - 1), `${model} at ${length}`).toBeLessThan(1e-9);
    }
  });

  test.each(models)(
    "%s has a correlation model whose integral over the whole line is the scale of fluctuation",
    (model) => {
      const points = panels(0, 30, [1], 0.1);
      let area = 0;
      for (let i = 1; i < points.length; i++) area += 2 * integrate(correlation[model], points[i - 1], points[i], 20);
      expect(Math.abs(area - 1)).toBeLessThan(1e-12);
    },
  );

  test.each([...models, "simple"] as const)("%s falls from 1 towards δ/L, and depends on L/δ alone", (model) => {
    let last = 1;
    for (let length = 0.001; length < 1000; length *= 1.3) {
      const found = varianceReduction(model, length, 1);
      expect(found).toBeLessThanOrEqual(last);
      expect(varianceReduction(model, 3 * length, 3)).toBeCloseTo(found, 12);
      last = found;
    }
    expect(varianceReduction(model, 1e6, 1) * 1e6).toBeCloseTo(1, 4);
    expect(varianceReduction(model, 1e-9, 1)).toBeCloseTo(1, 8);
  });
});
