import { expect, test } from "vitest";
import { conditionedStates, fragilityCurve } from "../../src/drivers/fragility-curve.ts";
import { normalCdf } from "../../src/numeric/normal.ts";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import { spaceOf, statesOf } from "../reliability/straight-line.ts";

const normal = (mean: number, sd: number) => marginalOf({ kind: "normal", mean, sd });
const order = { seed: "fragility", precision: 0.05, samples: 100_000 };
const ratio = ([r, s]: readonly number[]): number => (s > 0 ? r / s : 1000);

test("resistance given the load is Φ((s − μ)/σ), down to rare failures", () => {
  const space = spaceOf([normal(15, 1), normal(10, 2)]);
  const states = statesOf(space, { sliding: ratio });
  const values = [9, 10.5, 12, 14, 15, 16.5];
  const curve = fragilityCurve(states, space, 1, { ...order, event: "system", values });
  expect(curve.map(({ value }) => value)).toEqual(values);
  for (const { value, probability, standardError } of curve) {
    const exact = normalCdf((value - 15) / 1);
    expect(Math.abs(probability - exact)).toBeLessThan(4.9 * standardError); // one seed in a million fails
    expect(standardError).toBeLessThan(0.12 * exact);
  }
  expect(curve[0].method).toBe("importance");
  expect(curve[4].method).toBe("plain");
});

test("correlation moves the others along", () => {
  const rho = 0.6;
  const space = spaceOf(
    [normal(15, 1), normal(10, 2)],
    [
      [1, 0],
      [rho, Math.sqrt(1 - rho * rho)],
    ],
  );
  const states = statesOf(space, { sliding: ratio });
  const [{ probability, standardError }] = fragilityCurve(states, space, 1, { ...order, event: 0, values: [14] });
  // given s = 14, two standard deviations up, the resistance is normal with mean 15 + 2 ρ and sd √(1 − ρ²)
  const exact = normalCdf((14 - (15 + 2 * rho)) / Math.sqrt(1 - rho * rho));
  expect(Math.abs(probability - exact)).toBeLessThan(4.9 * standardError);
});

test("without values it runs over the likely range, and rises with the load", () => {
  const space = spaceOf([normal(15, 1), normal(10, 2)]);
  const curve = fragilityCurve(statesOf(space, { sliding: ratio }), space, 1, { ...order, precision: 0.1, event: 0 });
  expect(curve.length).toBe(21);
  expect(curve[0].value).toBeCloseTo(10 - 2 * 3.090232306167813, 10);
  const likely = curve.filter(({ probability }) => probability > 1e-6);
  expect(likely.length).toBeGreaterThan(5);
  likely.slice(1).forEach(({ probability }, i) => {
    expect(probability).toBeGreaterThan(likely[i].probability);
  });
});

test("one limit state of several stands alone", () => {
  const space = spaceOf([normal(0, 1), normal(0, 1)]);
  const states = statesOf(space, { a: ([x, y]) => Math.exp(2 - x - 0 * y), b: ([x, y]) => Math.exp(1 - y + 0 * x) });
  const at = (event: number | "system"): number =>
    fragilityCurve(states, space, 0, { ...order, event, values: [0] })[0].probability;
  expect(at(0)).toBe(0);
  expect(at("system")).toBe(at(1));
  expect(Math.abs(at(1) - normalCdf(-1))).toBeLessThan(4.9 * Math.sqrt((0.159 * 0.841) / 2048));
});

test("the held unknown is at its value whatever the draw", () => {
  const space = spaceOf(
    [normal(0, 1), normal(0, 1)],
    [
      [1, 0],
      [0.6, 0.8],
    ],
  );
  const states = statesOf(space, { second: ([, y]) => 10 + y });
  const factors = [new Float64Array(3)];
  const z = [Float64Array.of(1, -2, 0.3), Float64Array.of(0.4, 2, -1)];
  conditionedStates(states, space.rows[1], 1.25).evaluate(z, 3, factors, new Uint8Array(3), true);
  for (const factor of factors[0]) expect(factor).toBeCloseTo(11.25, 12);
});

test("a value outside the support, and an unknown that there is not, are refused by name", () => {
  const space = spaceOf([marginalOf({ kind: "uniform", from: 1, to: 2 })]);
  const states = statesOf(space, { f: ([x]) => x });
  expect(() => fragilityCurve(states, space, 0, { ...order, event: 0, values: [3] })).toThrow(
    "x1: 3 is outside 1 to 2",
  );
  expect(() => fragilityCurve(states, space, 4, { ...order, event: 0 })).toThrow(RangeError);
  expect(() => fragilityCurve(states, space, 0, { ...order, event: 2 })).toThrow("there is no limit state 2");
});
