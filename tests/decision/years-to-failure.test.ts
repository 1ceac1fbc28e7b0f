import { expect, test } from "vitest";
import { drawFailures } from "../../src/decision/failure-sample.ts";
import { failureMixture } from "../../src/decision/mixture.ts";
import { stratifiedSum } from "../../src/decision/stratified-sample.ts";
import { integrate } from "../../src/numeric/gauss-legendre.ts";
import { normalPdf, normalUpper } from "../../src/numeric/normal.ts";
import { gumbel } from "../../src/probability/gumbel.ts";
import { planeCentre, planeMargin, problemOf, unit } from "./problems.ts";

test("one yearly Gumbel load over fifty years: 1 − F(3)^50 = 1 − 0.3207655, the largest value's own distribution", () => {
  const load = gumbel({ mean: 2, sd: 0.4 });
  const roles = ["yearly"] as const;
  const margin = (z: Float64Array): number => 1 + 0.1 * (3 - load.quantileOfNormal(z[0]));
  const problem = problemOf({
    roles,
    years: 50,
    variables: [],
    options: [{ name: "wall", cost: 0, margins: { sliding: margin } }],
  });
  const centre = planeCentre([1], load.normalOfQuantile(3), 0);
  const plan = { seed: "load", purpose: "test", samples: 65_536, folds: 2 };
  const sample = drawFailures(problem, failureMixture([centre], 1, 1), plan);
  const { value, standardError } = stratifiedSum(sample, sample.failure[0]);
  expect(Math.abs(value - (1 - 0.3207655))).toBeLessThan(4 * standardError); // fails 1 in 16 000
  expect(standardError).toBeLessThan(0.005);
  // the first failure ends the costs
  expect(stratifiedSum(sample, sample.cost[0]).value).toBeCloseTo(1e6 * value, 3);
});

test("ground that is weak this year is weak next year: E[1 − (1 − p)^T] by quadrature", () => {
  const direction = unit([0.8, 0.6]);
  const roles = ["knowledge", "yearly"] as const;
  const problem = problemOf({
    roles,
    years: 20,
    variables: [],
    options: [{ name: "wall", cost: 0, margins: { sliding: planeMargin(direction, 3.5) } }],
  });
  const expected = integrate(
    (k) => normalPdf(k) * -Math.expm1(20 * Math.log1p(-normalUpper((3.5 - 0.8 * k) / 0.6))),
    -8,
    8,
    200,
  );
  const plan = { seed: "ground", purpose: "test", samples: 65_536, folds: 2 };
  const sample = drawFailures(problem, failureMixture([planeCentre(direction, 3.5, 0)], 1, 2), plan);
  const { value, standardError } = stratifiedSum(sample, sample.failure[0]);
  expect(Math.abs(value - expected)).toBeLessThan(4 * standardError); // fails 1 in 16 000
  expect(standardError).toBeLessThan(0.02 * expected);
  expect(value).toBeLessThan(0.8 * -Math.expm1(20 * Math.log1p(-normalUpper(3.5)))); // not 1 − (1 − E p)^T
});

test("a period of one year leaves the failures of the year as they are", () => {
  const problem = problemOf({
    roles: ["yearly"],
    years: 1,
    variables: [],
    options: [{ name: "wall", cost: 0, margins: { sliding: planeMargin([1], 2) } }],
  });
  const plan = { seed: "year", purpose: "test", samples: 4096, folds: 2 };
  const sample = drawFailures(problem, failureMixture([planeCentre([1], 2, 0)], 1, 1), plan);
  expect(new Set(sample.failure[0])).toEqual(new Set([1]));
  expect(stratifiedSum(sample, sample.failure[0]).value / normalUpper(2)).toBeCloseTo(1, 2);
});
