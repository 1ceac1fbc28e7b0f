import { expect, test } from "vitest";
import { gamma } from "../../src/probability/gamma.ts";

test("an sd equal to the mean is exponential", () => {
  const x = gamma({ mean: 2, sd: 2 });
  expect(x.ccdf(3)).toBeCloseTo(Math.exp(-1.5), 14);
  expect(x.upperQuantile(1e-15)).toBeCloseTo(-2 * Math.log(1e-15), 11);
});

test("a small coefficient of variation tends to the normal distribution", () => {
  const x = gamma({ mean: 20, sd: 0.02 });
  expect((x.quantileOfNormal(2) - 20) / 0.02).toBeCloseTo(2, 2);
  expect(x.lowest).toBe(0);
});
