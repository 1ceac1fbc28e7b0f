import { describe, expect, test } from "vitest";
import { jsonOf, runWith } from "../fake-io.ts";

const yard = new URL("../../../studies/two-soils-high-water/study.yaml", import.meta.url).pathname;
const slope = new URL("../../../studies/sloping-fill-us/study.yaml", import.meta.url).pathname;
const heel = ["--vary", "wall.base.heel", "--from", "2.8", "--to", "4.2", "--points", "3"];

describe("toehold size", () => {
  test("says which value meets the target and what factors of safety that amounts to", async () => {
    const ran = await runWith(["size", yard, ...heel]);
    expect(ran.code).toBe(0);
    expect(ran.out).toMatch(
      /Heel length: 3\.\d+ m meets the target of 1 in 1030 \(index 3\.10\); higher values are surer\./,
    );
    expect(ran.out).toContain("There the factors of safety at the means are: sliding 2.");
    expect(ran.out).toContain("licensed engineer");
  });

  test("gives the keys of the result file", async () => {
    const result = (await jsonOf(["size", yard, ...heel, "--json"])) as Record<string, unknown>;
    expect(result).toMatchObject({ kind: "size", vary: "wall.base.heel", unit: "m" });
    expect(result.meets_target_at).toBeGreaterThan(3);
    const [first] = result.points as Record<string, unknown>[];
    expect(Object.keys(first)).toEqual(
      expect.arrayContaining(["value", "probability", "reliability_index", "factor_at_mean"]),
    );
  });

  test("reads and shows the study's own units, and makes a table of indices of two dimensions", async () => {
    const ran = await runWith([
      "size",
      slope,
      "--vary",
      "wall.base.heel",
      "--from",
      "5",
      "--to",
      "7",
      "--points",
      "2",
      "--vary",
      "wall.base.toe",
      "--from",
      "2",
      "--to",
      "3",
      "--points",
      "2",
    ]);
    expect(ran.code).toBe(0);
    expect(ran.out).toContain("Heel length, ft ↓   Toe length, ft →");
    expect(ran.out).toMatch(/\n5\.00 +\d\.\d\d +\d\.\d\d\n7\.00 +\d\.\d\d +\d\.\d\d\n/);
  });

  test.each([
    [["size", yard], 2, "size needs one --vary PATH"],
    [["size", yard, "--vary", "wall.base.heel", "--from", "2"], 2, "each --vary needs its --from and its --to"],
    [["size", yard, "--vary", "wall.base.heel", "--from", "two", "--to", "3"], 2, "it must be a number"],
    [["size", yard, "--vary", "wall.base.heal", "--from", "2", "--to", "3"], 1, "is not a number of this study"],
  ])("%j ends with %d and says why", async (args, code, words) => {
    const ran = await runWith(args);
    expect(ran.code).toBe(code);
    expect(ran.err).toContain(words);
  });
});
