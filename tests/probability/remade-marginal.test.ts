import { expect, test } from "vitest";
import { remadeMarginal } from "../../src/probability/remade-marginal.ts";

test("a kind with mean and standard deviation as parameters is made anew and keeps the rest", () => {
  const lognormal = remadeMarginal({ kind: "lognormal", mean: 10, sd: 2, shift: 1 })!(11, 2.5);
  expect(lognormal).toMatchObject({ kind: "lognormal", mean: 11, sd: 2.5, lowest: 1 });
  const beta = remadeMarginal({ kind: "beta", from: 0, to: 4, mean: 1.2, sd: 0.6 })!(1.3, 0.5);
  expect(beta.mean).toBeCloseTo(1.3, 12);
  expect([beta.lowest, beta.highest]).toEqual([0, 4]);
});

test("a kind with other parameters is not", () => {
  expect(remadeMarginal({ kind: "uniform", from: 0, to: 1 })).toBeUndefined();
  expect(remadeMarginal({ kind: "truncated_normal", mean: 3, sd: 1, from: 2, to: 5 })).toBeUndefined();
  expect(
    remadeMarginal({ kind: "measured", values: [1, 2, 3, 4], as: "normal", varianceReduction: 1 }),
  ).toBeUndefined();
});
