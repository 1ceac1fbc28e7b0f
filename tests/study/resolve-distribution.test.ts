import { describe, expect, test } from "vitest";
import { resolveDistribution, showWith, withUnit } from "../../src/study/resolve-distribution.ts";
import { noPlaces } from "./fixtures/read.ts";

function resolved(
  kind: string,
  given: Record<string, number>,
  sd = Number.NaN,
  as: "normal" | "lognormal" = "normal",
): unknown {
  const findings = noPlaces();
  const distribution = resolveDistribution(kind, given, sd, as, { path: "x", findings, show: showWith("m", 1) });
  return distribution ?? findings.problems.map(({ path, message }) => `${path}: ${message}`);
}

describe("bounds", () => {
  test("must be in order, and apart", () => {
    expect(resolved("uniform", { from: 1, to: 1 })).toEqual(["x.to: to must be above from; both are 1 m"]);
    expect(resolved("uniform", { from: 2, to: 1 })).toEqual(["x.to: to 1 m is below from 2 m"]);
    expect(resolved("triangular", { from: 1, peak: 1, to: 1 })).toEqual(["x.to: to must be above from; both are 1 m"]);
    expect(resolved("range", { lowest: 1, likely: 3, highest: 2, width_in_sd: 4 })).toEqual([
      "x.highest: highest 2 m is below likely 3 m",
    ]);
  });

  test("may touch the peak", () => {
    expect(resolved("triangular", { from: 1, peak: 1, to: 2 })).toEqual({
      kind: "triangular",
      from: 1,
      peak: 1,
      to: 2,
    });
    expect(resolved("triangular", { from: 1, peak: 2, to: 2 })).toEqual({
      kind: "triangular",
      from: 1,
      peak: 2,
      to: 2,
    });
  });
});

describe("a distribution that cannot be", () => {
  test.each<[string, Record<string, number>, number, string]>([
    ["lognormal", { mean: 1, shift: 1 }, 1, "x.mean: mean 1 m must be above its shift 1 m"],
    ["gamma", { mean: 0 }, 1, "x.mean: mean 0 m must be above 0"],
    [
      "beta",
      { from: 0, to: 1, mean: 0.5 },
      0.5,
      "x: no beta distribution between 0 m and 1 m with mean 0.5 m has sd 0.5 m; it must be below 0.5 m",
    ],
    ["beta", { from: 0, to: 1, mean: 0 }, 0.1, "x.mean: mean 0 m must lie between from 0 m and to 1 m"],
    [
      "truncated_normal",
      { mean: 0, from: 7, to: 9 },
      1,
      "x: from 7 m to 9 m leaves next to nothing of a normal distribution with mean 0 m and sd 1 m",
    ],
  ])("%s %j with sd %f is refused", (kind, given, sd, problem) => {
    expect(resolved(kind, given, sd)).toEqual([problem]);
  });

  test("a lognormal range needs a likely value above 0", () => {
    expect(resolved("range", { lowest: -1, likely: 0, highest: 1, width_in_sd: 4 }, Number.NaN, "lognormal")).toEqual([
      "x.likely: likely 0 m must be above 0 for a lognormal distribution",
    ]);
  });

  test("a cut far out on either side may stand while something is left", () => {
    expect(resolved("truncated_normal", { mean: 0, from: 4, to: 9 }, 1)).toMatchObject({ kind: "truncated_normal" });
    expect(resolved("truncated_normal", { mean: 0, from: -9, to: -4 }, 1)).toMatchObject({ kind: "truncated_normal" });
  });
});

test("what could not be read is not told again", () => {
  expect(resolved("normal", { mean: Number.NaN }, 1)).toEqual([]);
  expect(resolved("normal", { mean: 1 }, Number.NaN)).toEqual([]);
  expect(resolved("uniform", { from: Number.NaN, to: 1 })).toEqual([]);
});

test("a kind that is none is a broken promise", () => {
  expect(() => resolved("cauchy", {})).toThrow(RangeError);
});

test("numbers are shown in the study's units, one degree without an s", () => {
  expect(showWith("ft", 1 / 0.3048)(3.048)).toBe("10 ft");
  expect([withUnit("1", "degrees"), withUnit("2", "degrees"), withUnit("0.5", "")]).toEqual([
    "1 degree",
    "2 degrees",
    "0.5",
  ]);
});
