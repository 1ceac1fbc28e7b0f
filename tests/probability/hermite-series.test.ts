import { expect, test } from "vitest";
import { hermiteSeries, normalRule } from "../../src/probability/hermite-series.ts";
import { marginalOf } from "../../src/probability/marginal-of.ts";

test("a normal variable is its first term", () => {
  const { coefficients, rest } = hermiteSeries(marginalOf({ kind: "normal", mean: 3, sd: 2 }), 10);
  expect([...coefficients]).toEqual([0, 1]);
  expect(rest).toBe(0);
});

test("a lognormal variable has the coefficients sⁿ/√(n! (exp s² − 1))", () => {
  const s = 0.8;
  const { coefficients } = hermiteSeries(
    marginalOf({ kind: "lognormal", mean: 1, sd: Math.sqrt(Math.expm1(s * s)), shift: 0 }),
    12,
  );
  for (let n = 1, factorial = 1; n <= 12; n++) {
    factorial *= n;
    expect(coefficients[n]).toBeCloseTo(s ** n / Math.sqrt(factorial * Math.expm1(s * s)), 12);
  }
});

test("what is left out is what the squares lack, and shrinks with more terms", () => {
  const step = marginalOf({
    kind: "mixture",
    parts: [
      { share: 0.5, of: { kind: "uniform", from: 0, to: 1e-9 } },
      { share: 0.5, of: { kind: "uniform", from: 1, to: 1 + 1e-9 } },
    ],
  });
  const few = hermiteSeries(step, 16);
  const [first, rest] = [few.coefficients[1], few.rest];
  expect(first).toBeCloseTo(Math.sqrt(2 / Math.PI), 8); // of the sign of u, analytic
  const more = hermiteSeries(step, 400);
  expect(more.coefficients.length).toBe(401);
  expect(more.rest).toBeLessThan(0.3 * rest);
  expect(more.rest).toBeCloseTo(1 - more.coefficients.reduce((sum, a) => sum + a * a, 0), 14);
});

test("a heavy tail is followed to where its variance is complete", () => {
  const student = marginalOf({ kind: "measured", values: [33, 35, 31, 36], as: "normal", varianceReduction: 1 });
  expect(hermiteSeries(student, 200).rest).toBeLessThan(1e-9);
});

test("the rule has weight 1 and ends its panels on breaks", () => {
  const { u, weight } = normalRule(
    [marginalOf({ kind: "uniform", from: 0, to: 1 })],
    { kinks: [0.3], jumps: [1.1] },
    0.5,
  );
  expect(weight.reduce((sum, w) => sum + w, 0)).toBeCloseTo(1, 13);
  const below = u.reduce((sum, at, i) => sum + (at < 1.1 ? weight[i] : 0), 0);
  expect(below).toBeCloseTo(0.8643339390536173, 12); // Φ(1.1)
});
