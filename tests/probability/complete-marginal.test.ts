import { expect, test } from "vitest";
import { completeMarginal, requireFinite, requirePositive } from "../../src/probability/complete-marginal.ts";

/** Exponential, by its bare formulas. */
const bare = {
  kind: "exponential",
  mean: 1,
  sd: 1,
  lowest: 0,
  highest: Number.POSITIVE_INFINITY,
  pdf: (x: number) => Math.exp(-x),
  cdf: (x: number) => (x <= 0 ? 0 : -Math.expm1(-x)),
  ccdf: (x: number) => (x <= 0 ? 1 : Math.exp(-x)),
  quantile: (p: number) => -Math.log1p(-p),
  upperQuantile: (q: number) => -Math.log(q),
};

test("both images in normal space follow from the tails", () => {
  const x = completeMarginal(bare);
  expect(x.quantileOfNormal(0)).toBeCloseTo(Math.LN2, 15);
  expect(x.quantileOfNormal(-9) / 1.1285884059538408e-19).toBeCloseTo(1, 12); // Φ(−9)
  expect(x.quantileOfNormal(9)).toBeCloseTo(-Math.log(1.1285884059538408e-19), 12);
  for (const u of [-30, -3, 0, 4, 30]) expect(x.normalOfQuantile(x.quantileOfNormal(u))).toBeCloseTo(u, 12);
  expect(x.normalOfQuantile(-1)).toBe(Number.NEGATIVE_INFINITY);
});

test("beyond the reach of probabilities the value stays finite", () => {
  const x = completeMarginal(bare);
  expect(x.quantileOfNormal(80)).toBe(x.quantileOfNormal(37.5));
  expect(x.quantileOfNormal(-80)).toBeGreaterThan(0);
});

test("kinks and jumps are empty unless stated, a shorter way is used where there is one", () => {
  expect([completeMarginal(bare).kinks, completeMarginal(bare).jumps]).toEqual([[], []]);
  expect(completeMarginal({ ...bare, jumps: [1], quantileOfNormal: () => 7 }).quantileOfNormal(0)).toBe(7);
});

test("parameters are refused by name and value", () => {
  expect(() => requirePositive("gumbel", "sd", Number.POSITIVE_INFINITY)).toThrow(
    "gumbel: sd is Infinity, must be above 0",
  );
  expect(() => requireFinite("normal", "mean", Number.NaN)).toThrow("normal: mean is NaN, must be a finite number");
});
