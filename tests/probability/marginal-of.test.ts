import { expect, test } from "vitest";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import type { Distribution } from "../../src/study/study.ts";

test("every kind of the study file is served and says its own word", () => {
  const all: Distribution[] = [
    { kind: "normal", mean: 34, sd: 3 },
    { kind: "lognormal", mean: 34, sd: 3, shift: 0 },
    { kind: "truncated_normal", mean: 34, sd: 3, from: 28, to: 42 },
    { kind: "uniform", from: 0.5, to: 2.5 },
    { kind: "triangular", from: 0, peak: 0.8, to: 3 },
    { kind: "beta", from: 0, to: 4, mean: 1.2, sd: 0.6 },
    { kind: "gumbel", mean: 1.4, sd: 0.5 },
    { kind: "weibull", shape: 1.8, scale: 1.2, shift: 0 },
    { kind: "gamma", mean: 1.2, sd: 0.4 },
    { kind: "mixture", parts: [{ share: 1, of: { kind: "uniform", from: 0, to: 1 } }] },
    { kind: "measured", values: [33.1, 35.4, 31.8, 36], as: "lognormal", varianceReduction: 1 },
  ];
  for (const distribution of all) expect(marginalOf(distribution).kind).toBe(distribution.kind);
});

const wrong: [Distribution, string][] = [
  [{ kind: "normal", mean: 34, sd: 0 }, "normal: sd is 0, must be above 0"],
  [{ kind: "normal", mean: Number.NaN, sd: 1 }, "normal: mean is NaN, must be a finite number"],
  [{ kind: "lognormal", mean: 2, sd: 1, shift: 3 }, "lognormal: mean - shift is -1, must be above 0"],
  [
    { kind: "truncated_normal", mean: 0, sd: 1, from: 60, to: 61 },
    "truncated normal: nothing is left of a mean of 0 and sd of 1 between 60 and 61",
  ],
  [
    { kind: "truncated_normal", mean: 0, sd: 1, from: 2, to: 1 },
    "truncated normal: from is 2, must lie below to, which is 1",
  ],
  [{ kind: "uniform", from: 2, to: 2 }, "uniform: to - from is 0, must be above 0"],
  [{ kind: "triangular", from: 0, peak: 4, to: 3 }, "triangular: peak is 4, must lie between 0 and 3"],
  [{ kind: "beta", from: 0, to: 4, mean: 5, sd: 1 }, "beta: mean is 5, must lie between 0 and 4"],
  [
    { kind: "beta", from: 0, to: 4, mean: 2, sd: 2 },
    "beta: sd is 2, must stay below 2 with that mean between those ends",
  ],
  [{ kind: "gumbel", mean: 1, sd: -1 }, "gumbel: sd is -1, must be above 0"],
  [{ kind: "weibull", shape: 0, scale: 1, shift: 0 }, "weibull: shape is 0, must be above 0"],
  [{ kind: "gamma", mean: 1, sd: 20 }, "gamma: sd is 20, must not exceed ten times the mean"],
  [
    { kind: "mixture", parts: [{ share: 0.5, of: { kind: "uniform", from: 0, to: 1 } }] },
    "mixture: the shares add up to 0.5, must add up to 1",
  ],
  [
    { kind: "measured", values: [1, 2, 3], as: "normal", varianceReduction: 1 },
    "measured: 3 values, needs at least four",
  ],
  [
    { kind: "measured", values: [1, 2, 3, -4], as: "lognormal", varianceReduction: 1 },
    "measured: a value is -4, must be above 0",
  ],
  [
    { kind: "measured", values: [2, 2, 2, 2], as: "normal", varianceReduction: 1 },
    "measured: all values are 2, which leaves no spread",
  ],
];

test.each(wrong)("%j is refused with what is allowed", (distribution, message) => {
  expect(() => marginalOf(distribution)).toThrow(new RangeError(message));
});
