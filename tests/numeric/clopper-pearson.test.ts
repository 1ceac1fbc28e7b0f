import { expect, test } from "vitest";
import { clopperPearson } from "../../src/numeric/clopper-pearson.ts";

test("no failure gives 0 and the closed form of the upper end", () => {
  for (const n of [1, 20, 1000, 1e6, 1e9]) {
    const [lower, upper] = clopperPearson(0, n);
    expect(lower).toBe(0);
    expect(upper / -Math.expm1(Math.log(0.025) / n)).toBeCloseTo(1, 10);
  }
});

test("nothing but failures is the mirror image of none", () => {
  const [lower, upper] = clopperPearson(50, 50);
  expect(upper).toBe(1);
  expect(lower).toBeCloseTo(1 - clopperPearson(0, 50)[1], 14);
});

test("each end leaves exactly half of the error in its tail of the binomial distribution", () => {
  const [lower, upper] = clopperPearson(3, 40, 0.9);
  const binomial = (k: number, p: number): number => {
    let ways = 1;
    for (let i = 0; i < k; i++) ways *= (40 - i) / (i + 1);
    return ways * p ** k * (1 - p) ** (40 - k);
  };
  const below = [0, 1, 2, 3].reduce((sum, k) => sum + binomial(k, upper), 0);
  const above = 1 - [0, 1, 2].reduce((sum, k) => sum + binomial(k, lower), 0);
  expect(below).toBeCloseTo(0.05, 12);
  expect(above).toBeCloseTo(0.05, 12);
});

test("the interval of a large sample tends to the normal one", () => {
  const [lower, upper] = clopperPearson(40_000, 1e9);
  expect(lower / (4e-5 - 1.959964 * Math.sqrt(4e-5 / 1e9))).toBeCloseTo(1, 3);
  expect(upper / (4e-5 + 1.959964 * Math.sqrt(4e-5 / 1e9))).toBeCloseTo(1, 3);
});

test("counts that make no sense are refused", () => {
  expect(() => clopperPearson(5, 4)).toThrow(new RangeError("5 failures in 4 samples"));
  expect(() => clopperPearson(0, 0)).toThrow(RangeError);
  expect(() => clopperPearson(1, 10, 95)).toThrow(new RangeError("95 is no level of confidence"));
});
