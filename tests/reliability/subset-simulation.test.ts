import { describe, expect, test } from "vitest";
import { gammaUpper } from "../../src/numeric/incomplete-gamma.ts";
import { normalUpper } from "../../src/numeric/normal.ts";
import { momentsOf, samplesPerLevel, subsetSimulation } from "../../src/reliability/subset-simulation.ts";
import { statesOfMargins, straightLine } from "./straight-line.ts";

const order = { precision: 0.9, samples: 1_000_000 };

describe("subset simulation", () => {
  test.each([
    ["a plane at one in a million", straightLine(4.753424308822899, 4), 1e-6],
    // all points of a sphere are equally near: nothing for a search to hold on to
    ["a sphere in ten dimensions", statesOfMargins(10, { sphere: (u) => 6 - Math.hypot(...u) }), gammaUpper(5, 18)],
  ])("%s: covered in nearly all of 12 seeds", (_, states, expected) => {
    const runs = Array.from({ length: 12 }, (_, seed) =>
      subsetSimulation(states, { ...order, seed: `subset ${seed}` }),
    );
    const covered = runs.filter(({ interval: [low, high] }) => low <= expected && expected <= high).length;
    expect(covered).toBeGreaterThanOrEqual(8); // at 95 % coverage fewer come once in 6000
    for (const run of runs) {
      expect(run.runs).toHaveLength(8);
      expect(run.doubts).toEqual([]);
      expect(Math.abs(Math.log(run.probability / expected))).toBeLessThan(1);
    }
  });

  test("adds runs, eight at a time, until the precision is reached", () => {
    const found = subsetSimulation(straightLine(2.5, 2), { seed: "more", precision: 0.03, samples: 3_000_000 });
    expect(found.runs.length % 8).toBe(0);
    expect(found.runs.length).toBeGreaterThan(8);
    expect(found.standardError / found.probability).toBeLessThanOrEqual(0.03);
  });

  test("common failures need no level beyond the first", () => {
    const found = subsetSimulation(straightLine(0.5, 2), { ...order, seed: "common" });
    expect(new Set(found.levels)).toEqual(new Set([1]));
    expect(found.evaluations).toBe(8 * samplesPerLevel);
    expect(Math.abs(found.probability - normalUpper(0.5))).toBeLessThan(5.5 * Math.sqrt((0.3085 * 0.6915) / 16_000));
  });

  test("factors that are all alike end it with a doubt, and not with a figure", () => {
    const found = subsetSimulation(statesOfMargins(2, { flat: () => 2 }), { ...order, seed: "flat" });
    expect(found).toMatchObject({ probability: 0, interval: [0, 1] });
    expect(found.doubts[0]).toContain("could not be parted");
  });

  test("the same seed gives the same bits", () => {
    const run = (): unknown => subsetSimulation(straightLine(3, 2), { ...order, seed: "bits" });
    expect(run()).toEqual(run());
  });
});

test("mean and standard error of independent estimates", () => {
  const { probability, standardError } = momentsOf([1, 2, 3, 4]);
  expect(probability).toBe(2.5);
  expect(standardError).toBeCloseTo(Math.sqrt(5 / 3 / 4), 12);
});
