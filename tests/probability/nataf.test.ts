import { describe, expect, test } from "vitest";
import { integrate, panels } from "../../src/numeric/gauss-legendre.ts";
import { normalPdf } from "../../src/numeric/normal.ts";
import type { Marginal } from "../../src/probability/marginal.ts";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import { attainableCorrelation, correlationOfNormals } from "../../src/probability/nataf.ts";
import type { Distribution } from "../../src/study/study.ts";

/** One of every kind, with the kinks and the jump that make quadrature hard. */
const kinds: Distribution[] = [
  { kind: "normal", mean: 34, sd: 3 },
  { kind: "lognormal", mean: 34, sd: 8, shift: 10 },
  { kind: "truncated_normal", mean: 34, sd: 3, from: 30, to: 36 },
  { kind: "uniform", from: 0.5, to: 2.5 },
  { kind: "triangular", from: 0, peak: 0.8, to: 3 },
  { kind: "beta", from: 0, to: 4, mean: 1.2, sd: 0.6 },
  { kind: "gumbel", mean: 1.4, sd: 0.5 },
  { kind: "weibull", shape: 1.3, scale: 1.2, shift: 0 },
  { kind: "gamma", mean: 1.2, sd: 0.9 },
  {
    kind: "mixture",
    parts: [
      { share: 0.9, of: { kind: "triangular", from: 0, peak: 0.4, to: 1 } },
      { share: 0.1, of: { kind: "uniform", from: 1.5, to: 4.5 } },
    ],
  },
  { kind: "measured", values: [33.1, 35.4, 31.8, 36], as: "lognormal", varianceReduction: 1 },
];
const marginals = kinds.map(marginalOf);

/**
 * Second method: the correlation of the variables as a double integral, E[g₁(z) E[g₂(r z + √(1 − r²) w) | z]], on panels
 * that end on the breaks of either.
 */
function correlationByDoubleIntegral(a: Marginal, b: Marginal, r: number): number {
  const g = (m: Marginal, u: number): number => (m.quantileOfNormal(u) - m.mean) / m.sd;
  const s = Math.sqrt(1 - r * r);
  const over = (points: number[], f: (x: number) => number, nodes: number): number =>
    points.slice(1).reduce((sum, to, i) => sum + integrate(f, points[i], to, nodes), 0);
  const inner = (z: number): number => {
    const breaks = [...b.kinks, ...b.jumps].map((at) => (at - r * z) / s);
    return over(panels(-8.5, 8.5, breaks, 1.4), (w) => g(b, r * z + s * w) * normalPdf(w), 10);
  };
  return over(panels(-8.5, 8.5, [...a.kinks, ...a.jumps], 0.7), (z) => g(a, z) * inner(z) * normalPdf(z), 10);
}

describe("every pair of kinds", () => {
  const pairs = marginals.flatMap((a, i) =>
    marginals.slice(0, i + 1).map((b): [string, Marginal, Marginal] => [`${a.kind} with ${b.kind}`, a, b]),
  );

  test.each(pairs)("%s: the correlation asked for comes back from a double integral", (_, a, b) => {
    const [least, largest] = attainableCorrelation(a, b);
    for (const rho of [a.kind < b.kind ? 0.4 * largest : 0.6 * least]) {
      const found = correlationOfNormals(a, b, rho);
      if (!found.possible) throw new Error("not found");
      // the double integral meets a square root at the end of the mixture's triangular part
      expect(Math.abs(correlationByDoubleIntegral(a, b, found.coefficient) - rho)).toBeLessThan(
        a.kind === "mixture" || b.kind === "mixture" ? 1e-5 : 1e-7,
      );
      expect(found.error).toBeLessThan(1e-9);
    }
  });

  test.each(pairs)("%s: order does not matter, the sign does, and more asks for more", (_, a, b) => {
    const [least, largest] = attainableCorrelation(a, b);
    let last = -1;
    for (const share of [-0.9, 0.3, 0.9]) {
      const rho = share < 0 ? -share * least : share * largest;
      const found = correlationOfNormals(a, b, rho);
      const turned = correlationOfNormals(b, a, rho);
      if (!found.possible || !turned.possible) throw new Error("not found");
      expect(turned.coefficient).toBeCloseTo(found.coefficient, 8);
      expect(found.coefficient).toBeGreaterThan(last);
      expect(Math.sign(found.coefficient)).toBe(Math.sign(share));
      expect(Math.abs(found.coefficient)).toBeGreaterThan(Math.abs(rho) - 1e-9); // no transformation strengthens a correlation
      last = found.coefficient;
    }
  });
});

describe("what two distributions allow", () => {
  test("alike, anything from the mirror image to 1", () => {
    const [uniform, gamma] = [marginals[3], marginals[8]];
    expect(attainableCorrelation(uniform, uniform)).toEqual([-1, 1]);
    expect(attainableCorrelation(gamma, gamma)[1]).toBeCloseTo(1, 9);
    expect(attainableCorrelation(gamma, gamma)[0]).toBeGreaterThan(-0.9);
  });

  test("a uniform and an exponential variable, plus and minus √3/2", () => {
    // E[X ln X] type integral: corr(U, −ln(1 − U)) = (1/4)/(1/√12) = √3/2, analytic
    const exponential = marginalOf({ kind: "weibull", shape: 1, scale: 2, shift: 0 });
    const [least, largest] = attainableCorrelation(marginals[3], exponential);
    expect(largest).toBeCloseTo(Math.sqrt(3) / 2, 10);
    expect(least).toBeCloseTo(-Math.sqrt(3) / 2, 10);
    expect(correlationOfNormals(marginals[3], exponential, 0.8660254).possible).toBe(true);
    expect(correlationOfNormals(marginals[3], exponential, 0.867)).toEqual({
      possible: false,
      range: [least, largest],
    });
  });

  test("lognormal variables by their formula", () => {
    const wide = marginalOf({ kind: "lognormal", mean: 1, sd: 2, shift: 0 });
    const logVariance = Math.log(5);
    expect(attainableCorrelation(wide, wide)[0]).toBeCloseTo(Math.expm1(-logVariance) / 4, 12);
    expect(correlationOfNormals(wide, wide, -0.3).possible).toBe(false);
  });
});

describe("the series agrees with formulas", () => {
  const alike = (a: Distribution, b: Distribution): [Marginal, Marginal] => [marginalOf(a), marginalOf(b)];

  test("of lognormal pairs, reached through a mixture of one part", () => {
    const lognormal: Distribution = { kind: "lognormal", mean: 30, sd: 12, shift: 0 };
    const [formula, series] = alike(lognormal, { kind: "mixture", parts: [{ share: 1, of: lognormal }] });
    for (const rho of [-0.6, 0.2, 0.9]) {
      const exact = correlationOfNormals(formula, formula, rho);
      const found = correlationOfNormals(series, series, rho);
      if (!exact.possible || !found.possible) throw new Error("not found");
      expect(found.coefficient).toBeCloseTo(exact.coefficient, 9);
    }
  });

  test("of uniform pairs up to 0.98", () => {
    const uniform: Distribution = { kind: "uniform", from: 0, to: 2 };
    const [formula, series] = alike(uniform, { kind: "mixture", parts: [{ share: 1, of: uniform }] });
    for (const rho of [-0.98, 0.5, 0.98]) {
      const exact = correlationOfNormals(formula, formula, rho);
      const found = correlationOfNormals(series, series, rho);
      if (!exact.possible || !found.possible) throw new Error("not found");
      expect(Math.abs(found.coefficient - exact.coefficient)).toBeLessThan(Math.max(found.error, 1e-9));
    }
  });

  test("of a normal with a uniform variable: ρ √(π/3)", () => {
    const found = correlationOfNormals(marginals[0], marginals[3], 0.5);
    if (!found.possible) throw new Error("not found");
    expect(found.coefficient).toBeCloseTo(0.5 * Math.sqrt(Math.PI / 3), 10);
  });
});

test("close to 1, where a jump leaves the series slow, the error returned covers the error made", () => {
  // two values far apart: x(u) is a step, and its correlation is that of two thresholds, (4/2π)·asin r for equal halves
  const narrow = (at: number): Distribution => ({ kind: "uniform", from: at, to: at + 1e-10 });
  const step = marginalOf({
    kind: "mixture",
    parts: [
      { share: 0.5, of: narrow(0) },
      { share: 0.5, of: narrow(1) },
    ],
  });
  for (const rho of [0.5, 0.9, 0.97]) {
    const found = correlationOfNormals(step, step, rho);
    if (!found.possible) throw new Error("not found");
    const exact = Math.sin((Math.PI / 2) * rho);
    expect(Math.abs(found.coefficient - exact)).toBeLessThan(found.error + 1e-8);
    expect(found.error).toBeLessThan(1e-3);
  }
});
