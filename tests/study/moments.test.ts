import { describe, expect, test } from "vitest";
import { integrate, panels } from "../../src/numeric/gauss-legendre.ts";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import { distributionMean, distributionMoments, distributionSd, meanOf } from "../../src/study/moments.ts";
import { quantitiesOf } from "../../src/study/quantities.ts";
import type { Distribution } from "../../src/study/study.ts";
import { fixture, read } from "./fixtures/read.ts";

/** Mean and sd of an unnormalised density by composite quadrature: the second method beside the closed forms. */
function byQuadrature(
  density: (x: number) => number,
  from: number,
  to: number,
  breaks: readonly number[] = [],
): { mean: number; sd: number } {
  const points = panels(from, to, breaks, (to - from) / 400);
  const moment = (f: (x: number) => number): number => {
    let sum = 0;
    for (let i = 1; i < points.length; i++) sum += integrate((x) => f(x) * density(x), points[i - 1], points[i], 10);
    return sum;
  };
  const mass = moment(() => 1);
  const mean = moment((x) => x) / mass;
  return { mean, sd: Math.sqrt(moment((x) => (x - mean) ** 2) / mass) };
}

const bell =
  (m: number, s: number) =>
  (x: number): number =>
    Math.exp(-0.5 * ((x - m) / s) ** 2);

function expectMoments(distribution: Distribution, expected: { mean: number; sd: number }, tolerance = 1e-9): void {
  const { mean, sd } = distributionMoments(distribution);
  expect(Math.abs(mean - expected.mean)).toBeLessThan(tolerance * (Math.abs(expected.mean) + expected.sd));
  expect(Math.abs(sd - expected.sd)).toBeLessThan(tolerance * expected.sd);
}

describe("mean and sd in closed form", () => {
  test("are what was given where they were given", () => {
    for (const kind of ["normal", "gumbel", "gamma"] as const) {
      expect(distributionMoments({ kind, mean: 34, sd: 2.7 })).toEqual({ mean: 34, sd: 2.7 });
    }
    expect(distributionMoments({ kind: "lognormal", mean: 34, sd: 2.7, shift: 10 })).toEqual({ mean: 34, sd: 2.7 });
    expect(distributionMoments({ kind: "beta", from: 0, to: 4, mean: 1.2, sd: 0.6 })).toEqual({ mean: 1.2, sd: 0.6 });
  });

  test("of uniform and triangular agree with quadrature", () => {
    expectMoments(
      { kind: "uniform", from: 0.5, to: 2.5 },
      byQuadrature(() => 1, 0.5, 2.5),
    );
    const density = (x: number): number => (x < 0.8 ? x / 0.8 : (3 - x) / 2.2);
    expectMoments({ kind: "triangular", from: 0, peak: 0.8, to: 3 }, byQuadrature(density, 0, 3, [0.8]));
    expectMoments({ kind: "triangular", from: 0, peak: 0, to: 3 }, { mean: 1, sd: Math.sqrt(0.5) });
  });

  test.each([
    [34, 2.7, 28, 42],
    [34, 2.7, 36, 42], // cut above the mean of the parent
    [34, 2.7, 20, 30], // cut below it
    [0, 1, 4, 9], // far out in the tail, where Φ(b) − Φ(a) would lose its digits
    [0, 1, -1, 1],
  ])("of a normal distribution (%f, %f) cut to %f … %f agree with quadrature", (mean, sd, from, to) => {
    expectMoments({ kind: "truncated_normal", mean, sd, from, to }, byQuadrature(bell(mean, sd), from, to));
  });

  test("of a cut that takes nothing away are those of the parent", () => {
    expectMoments({ kind: "truncated_normal", mean: 34, sd: 2.7, from: -500, to: 500 }, { mean: 34, sd: 2.7 });
  });

  test("of a Weibull distribution agree with quadrature and with its exponential and Rayleigh cases", () => {
    const density = (x: number): number => x ** 0.8 * Math.exp(-(x ** 1.8));
    const { mean, sd } = byQuadrature(density, 0, 12);
    expectMoments(
      { kind: "weibull", shape: 1.8, scale: 1.2, shift: 0.5 },
      { mean: 0.5 + 1.2 * mean, sd: 1.2 * sd },
      1e-6,
    );
    expectMoments({ kind: "weibull", shape: 1, scale: 2, shift: 0 }, { mean: 2, sd: 2 });
    expectMoments(
      { kind: "weibull", shape: 2, scale: Math.SQRT2, shift: 0 },
      { mean: Math.sqrt(Math.PI / 2), sd: Math.sqrt(2 - Math.PI / 2) },
    );
  });

  test("of a mixture agree with quadrature", () => {
    const inside = (x: number, a: number, b: number): number => (x > a && x < b ? 1 / (b - a) : 0);
    const density = (x: number): number => 0.9 * inside(x, 0, 1) + 0.1 * inside(x, 2, 4);
    const parts = [
      { share: 0.9, of: { kind: "uniform", from: 0, to: 1 } },
      { share: 0.1, of: { kind: "uniform", from: 2, to: 4 } },
    ] as const;
    expectMoments({ kind: "mixture", parts }, byQuadrature(density, 0, 4, [1, 2]));
  });

  test("of measured values are those of the predictive distribution", () => {
    // by hand: 33, 34, 35, 36 have mean 34.5 and variance 5/3; Student's variance with 3 degrees of freedom is 3
    const values = [33, 34, 35, 36];
    expectMoments(
      { kind: "measured", values, as: "normal", varianceReduction: 1 },
      { mean: 34.5, sd: Math.sqrt((5 / 3) * 1.25 * 3) },
    );
    expectMoments(
      { kind: "measured", values, as: "normal", varianceReduction: 0.25 },
      { mean: 34.5, sd: Math.sqrt((5 / 3) * 0.5 * 3) },
    );
    const logs = [1, 2, 3, 4].map((x) => 0.1 * x);
    const variance = 0.01 * (5 / 3) * 1.25 * 3;
    const mean = Math.exp(0.25 + variance / 2);
    expectMoments(
      { kind: "measured", values: logs.map(Math.exp), as: "lognormal", varianceReduction: 1 },
      { mean, sd: mean * Math.sqrt(Math.exp(variance) - 1) },
    );
  });

  test("are there singly, and for certain numbers", () => {
    const distribution = { kind: "normal", mean: 3, sd: 2 } as const;
    expect([
      distributionMean(distribution),
      distributionSd(distribution),
      meanOf(7),
      meanOf({ distribution, yearly: false }),
    ]).toEqual([3, 2, 7, 3]);
  });
});

test("mean and sd are those of the marginals that sampling uses", () => {
  const names = [
    "everything",
    "gravity",
    "plain",
    "../../../studies/two-soils-high-water/study",
    "../../../studies/sloping-fill-us/study",
  ];
  const distributions = names.flatMap((name) =>
    quantitiesOf(read(fixture(name))).flatMap(({ quantity }) =>
      typeof quantity === "number" ? [] : [quantity.distribution],
    ),
  );
  expect(new Set(distributions.map(({ kind }) => kind)).size).toBe(11);
  for (const distribution of distributions) {
    const { mean, sd } = marginalOf(distribution);
    expectMoments(distribution, { mean, sd }, 1e-11);
  }
});
