import { describe, expect, test } from "vitest";
import { normalQuantile } from "../../src/numeric/normal.ts";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import { mixture } from "../../src/probability/mixture.ts";

const drained = marginalOf({ kind: "triangular", from: 0, peak: 0.4, to: 1 });
const blocked = marginalOf({ kind: "triangular", from: 1.5, peak: 3, to: 4.5 });

describe("drains that work or are blocked", () => {
  const level = mixture([
    { share: 0.9, of: drained },
    { share: 0.1, of: blocked },
  ]);

  test("mean and sd are those of the parts together", () => {
    expect(level.mean).toBeCloseTo(0.9 * drained.mean + 0.3, 14);
    const square = 0.9 * (drained.sd ** 2 + drained.mean ** 2) + 0.1 * (blocked.sd ** 2 + 9);
    expect(level.sd).toBeCloseTo(Math.sqrt(square - level.mean ** 2), 13);
  });

  test("it jumps once, where nine tenths are through, and bends at the two peaks", () => {
    expect(level.jumps).toEqual([normalQuantile(0.9)]);
    expect(level.kinks).toHaveLength(2);
    expect(level.kinks[0]).toBeCloseTo(normalQuantile(0.9 * 0.4), 12);
    expect(level.kinks[1]).toBeCloseTo(normalQuantile(0.95), 12);
    expect(level.quantileOfNormal(level.jumps[0] - 1e-9)).toBeLessThan(1);
    expect(level.quantileOfNormal(level.jumps[0] + 1e-9)).toBeGreaterThan(1.5);
  });

  test("in the gap nothing changes", () => {
    expect([level.pdf(1.2), level.cdf(1.01), level.cdf(1.49)]).toEqual([0, 0.9, 0.9]);
  });
});

test("parts that overlap bend it where one begins and where one ends", () => {
  const both = mixture([
    { share: 0.5, of: marginalOf({ kind: "uniform", from: 0, to: 2 }) },
    { share: 0.5, of: marginalOf({ kind: "uniform", from: 1, to: 3 }) },
  ]);
  expect(both.jumps).toEqual([]);
  expect(both.kinks.map((u) => Math.round(both.quantileOfNormal(u) * 1e9) / 1e9)).toEqual([1, 2]);
});

test("narrow parts without ends, far apart, have their jump too", () => {
  const both = mixture([
    { share: 0.3, of: marginalOf({ kind: "normal", mean: 0, sd: 0.01 }) },
    { share: 0.7, of: marginalOf({ kind: "normal", mean: 5, sd: 0.01 }) },
  ]);
  expect(both.jumps).toHaveLength(1);
  expect(both.jumps[0]).toBeCloseTo(normalQuantile(0.3), 9);
});

test("a mixture within a mixture keeps its inner gap, unless another part fills it", () => {
  const inner = mixture([
    { share: 0.5, of: marginalOf({ kind: "uniform", from: 0, to: 1 }) },
    { share: 0.5, of: marginalOf({ kind: "uniform", from: 2, to: 3 }) },
  ]);
  const above = mixture([
    { share: 0.6, of: inner },
    { share: 0.4, of: marginalOf({ kind: "uniform", from: 5, to: 6 }) },
  ]);
  expect(above.jumps.map((u) => Math.round(1e6 * above.cdf(above.quantileOfNormal(u - 1e-7))) / 1e6)).toEqual([
    0.3, 0.6,
  ]);
  const filled = mixture([
    { share: 0.6, of: inner },
    { share: 0.4, of: marginalOf({ kind: "uniform", from: 0.5, to: 2.5 }) },
  ]);
  expect(filled.jumps).toEqual([]);
});

test("shares within rounding of 1 are taken as they are meant, a part without share is left out", () => {
  const third = 0.333333;
  const parts = [0, 1, 2].map((from) => ({ share: third, of: marginalOf({ kind: "uniform", from, to: from + 1 }) }));
  expect(mixture(parts.map((part, i) => (i === 2 ? { ...part, share: 0.333334 } : part))).cdf(3)).toBe(1);
  expect(mixture([...parts.slice(0, 1).map(({ of }) => ({ share: 1, of })), { share: 0, of: blocked }]).highest).toBe(
    1,
  );
});
