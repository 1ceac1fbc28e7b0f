import { expect, test } from "vitest";
import { failureSample } from "../../src/drivers/failure-sample.ts";
import { probabilityDerivatives } from "../../src/drivers/probability-derivatives.ts";
import { normalCdf, normalPdf } from "../../src/numeric/normal.ts";
import type { JointSpace, Marginal } from "../../src/probability/marginal.ts";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import { findDesignPoints } from "../../src/reliability/design-points.ts";
import { failureCentres, mixtureOf, wholeMove } from "../../src/reliability/failure-mixture.ts";
import { firstOrderResult, type RemadeAt } from "../../src/reliability/first-order.ts";
import { spaceOf, statesOf } from "../reliability/straight-line.ts";

const normal = (mean: number, sd: number): Marginal => marginalOf({ kind: "normal", mean, sd });
const ratio = ([r, s]: readonly number[]): number => (s > 0 ? r / s : 1000);

function derivativesOf(space: JointSpace, factor: (x: readonly number[]) => number, remadeAt?: RemadeAt) {
  const states = statesOf(space, { sliding: factor });
  const search = findDesignPoints(states, space, "derivatives").states[0];
  const parts = mixtureOf(failureCentres(search.points), wholeMove);
  const sample = failureSample(states, parts, { seed: "derivatives", samples: 40_000 });
  return probabilityDerivatives(space, sample, 0, firstOrderResult(states, space, search, remadeAt), remadeAt);
}

/** Within 4.9 of its own standard errors: one seed in a million fails; and sharp enough to say something. */
function close(found: { value: number | null; standardError: number | null }, expected: number): void {
  expect(Math.abs(found.value! - expected)).toBeLessThan(4.9 * found.standardError!);
  expect(found.standardError!).toBeLessThan(0.1 * Math.abs(expected));
}

test("resistance and load: those of Φ(−β) in closed form", () => {
  const [r, s] = derivativesOf(spaceOf([normal(15, 1), normal(10, 1)]), ratio);
  const [length, index] = [Math.SQRT2, 5 / Math.SQRT2];
  const density = normalPdf(index);
  close(r.perMean, -density / length);
  close(s.perMean, density / length);
  close(r.perSd, (density * index) / 2);
  close(s.perSd, (density * index) / 2);
  expect([r.path, r.perMean.from]).toEqual(["x1", "score"]);
});

test("correlation is held: closed form with ρ = 0.5", () => {
  const rows = [
    [1, 0],
    [0.5, Math.sqrt(0.75)],
  ];
  const [r, s] = derivativesOf(spaceOf([normal(15, 2), normal(10, 1)], rows), ratio);
  const sd = Math.sqrt(4 + 1 - 2 * 0.5 * 2);
  const index = 5 / sd;
  const density = normalPdf(index);
  close(r.perMean, -density / sd);
  close(s.perMean, density / sd);
  // ∂β/∂σ_R = −β (σ_R − ρ σ_S)/σ²
  close(r.perSd, (density * index * (2 - 0.5)) / (sd * sd));
  // and none to σ_S, since σ_S = ρ σ_R
  expect(Math.abs(s.perSd.value!)).toBeLessThan(4.9 * s.perSd.standardError!);
});

test("a lognormal made anew: derivative of the closed form", () => {
  const p = (mean: number): number => {
    const v = [(3 / mean) ** 2, 0.04];
    const spread = Math.sqrt(Math.log((1 + v[0]) * (1 + v[1])));
    return normalCdf(-Math.log((mean / 10) * Math.sqrt((1 + v[1]) / (1 + v[0]))) / spread);
  };
  const lognormal = (mean: number, sd: number): Marginal => marginalOf({ kind: "lognormal", mean, sd, shift: 0 });
  const space = spaceOf([lognormal(20, 3), lognormal(10, 2)]);
  const [r] = derivativesOf(space, ratio, () => lognormal);
  close(r.perMean, (p(20.01) - p(19.99)) / 0.02);
});

test("a density that ends abruptly takes its derivative from the design point, and says so", () => {
  const space = spaceOf([marginalOf({ kind: "uniform", from: 14, to: 18 }), normal(10, 1.2)]);
  const [r, s] = derivativesOf(space, ratio);
  expect(r.perMean.from).toBe("design_point");
  expect(r.perMean.value).toBeLessThan(0);
  expect(s.perMean.from).toBe("score");
  // p(δ) = (1/4) ∫ Φ((10 − r)/1.2) dr over 14 + δ … 18 + δ: its derivative is a difference at the ends
  const exact = (normalCdf(-8 / 1.2) - normalCdf(-4 / 1.2)) / 4;
  expect(r.perMean.value! / exact).toBeGreaterThan(0.5);
  expect(r.perMean.value! / exact).toBeLessThan(2);
});

test("without a first-order result such a derivative is not known", () => {
  const space = spaceOf([marginalOf({ kind: "uniform", from: 0, to: 1 })]);
  const states = statesOf(space, { f: ([x]) => x + 0.9 });
  const sample = failureSample(states, [], { seed: "none", samples: 1000 });
  expect(probabilityDerivatives(space, sample, "system")[0].perSd).toEqual({
    value: null,
    standardError: null,
    from: "design_point",
  });
});
