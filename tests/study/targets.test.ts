import { expect, test } from "vitest";
import { normalCdf } from "../../src/numeric/normal.ts";
import { namedTarget, namedTargets, targetNames } from "../../src/study/targets.ts";

test("names are unique, say their period, and lead to their target", () => {
  expect(new Set(targetNames).size).toBe(namedTargets.length);
  for (const { name, period, source } of namedTargets) {
    expect(namedTarget(name)?.name).toBe(name);
    if (period === 1) expect(name).toMatch(/_1_year$/);
    if (period === 50) expect(name).toMatch(/_50_years$/);
    if (period === undefined) expect(name).not.toMatch(/years?$/);
    expect(source).toMatch(/(19|20)\d\d|Model Code/);
  }
  expect(namedTarget("safe_enough")).toBeUndefined();
});

// EN 1990:2002, Table B2: reliability index and the probability printed with it
test.each([
  ["en1990_rc3_1_year", 5.2, 9.9644e-8],
  ["en1990_rc3_50_years", 4.3, 8.5399e-6],
  ["en1990_rc2_1_year", 4.7, 1.3008e-6],
  ["en1990_rc2_50_years", 3.8, 7.2348e-5],
  ["en1990_rc1_1_year", 4.2, 1.3346e-5],
  ["en1990_rc1_50_years", 3.3, 4.8342e-4],
])("%s has index %f", (name, index, probability) => {
  expect(namedTarget(name)?.reliabilityIndex).toBe(index);
  expect(Math.abs(normalCdf(-index) / probability - 1)).toBeLessThan(1e-4);
});

test("what was recalled and not read is marked so", () => {
  const recalled = namedTargets.filter((target) => target.fromMemory).map((target) => target.name.split("_")[0]);
  expect(new Set(recalled)).toEqual(new Set(["iso2394", "usace"]));
});
