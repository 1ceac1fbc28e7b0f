import { describe, expect, test } from "vitest";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import { piecewise } from "../../src/probability/piecewise.ts";

const none = { kinks: [], jumps: [] };

test("a smooth function is asked a few hundred times and met to 1e-10", () => {
  let asked = 0;
  const exact = (u: number): number => {
    asked++;
    return Math.exp(0.4 * u) + Math.atan(u);
  };
  const standIn = piecewise(exact, none, 6);
  expect(asked).toBeLessThan(400);
  for (let u = -6.5; u <= 6.5; u += 0.0137) expect(standIn(u)).toBeCloseTo(Math.exp(0.4 * u) + Math.atan(u), 9);
});

test("outside the reach and at a point where no polynomial holds the function itself answers", () => {
  const odd = (u: number): number => (u > 0.3 ? 1 : 0);
  const standIn = piecewise(odd, none, 6);
  for (const u of [-7, 7, 0.3, 0.300001, 0.3 + 1e-12, 0.299999]) expect(standIn(u)).toBe(odd(u));
  for (let u = -6; u <= 6; u += 0.0173) expect(standIn(u)).toBeCloseTo(odd(u), 9);
});

describe("a mixture with a gap, whose triangular part ends like a square root", () => {
  const marginal = marginalOf({
    kind: "mixture",
    parts: [
      { share: 0.9, of: { kind: "triangular", from: 0, peak: 0.4, to: 1 } },
      { share: 0.1, of: { kind: "triangular", from: 1.5, peak: 3, to: 4.5 } },
    ],
  });
  const standIn = piecewise(marginal.quantileOfNormal, marginal, 6);
  const [jump] = marginal.jumps;

  test("is met on both sides of the jump, however near", () => {
    for (let k = 1; k < 40; k++) {
      for (const u of [jump - 2 ** -k * 1.3, jump + 2 ** -k * 1.3]) {
        expect(Math.abs(standIn(u) - marginal.quantileOfNormal(u))).toBeLessThan(1e-9 * marginal.sd);
      }
    }
    expect(standIn(jump - 1e-6)).toBeLessThan(1);
    expect(standIn(jump + 1e-6)).toBeGreaterThan(1.5);
  });

  test("and everywhere else", () => {
    for (let u = -6; u <= 6; u += 0.0093) {
      expect(Math.abs(standIn(u) - marginal.quantileOfNormal(u))).toBeLessThan(1e-9 * marginal.sd);
    }
  });
});
