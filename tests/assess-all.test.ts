import { describe, expect, test } from "vitest";
import { assess } from "../src/assess.ts";
import type { AssessResult } from "../src/results.ts";
import { readDocument } from "../src/study/read-study.ts";
import { gallery } from "./report/gallery.ts";

describe("an assessment with every measure", async () => {
  const study = readDocument(gallery.plain);
  const options = { samples: 20_000, precision: 0 };
  const result: AssessResult = await assess(study, { ...options, all: true });
  const sliding = result.limitStates.sliding;

  test("ranks every unknown once, by weights that sum to 1", () => {
    const ranking = sliding?.allDrivers?.ranking ?? [];
    expect(ranking.map(({ path }) => path).sort()).toEqual(result.variables.map(({ path }) => path).sort());
    expect(ranking.map(({ rank }) => rank)).toEqual(ranking.map((_, i) => i + 1));
    expect(ranking.reduce((sum, { weight }) => sum + weight, 0)).toBeCloseTo(1, 9);
  });

  test("shows the hand methods beside each other, near the sampled moments", () => {
    const hands = sliding?.handMethods;
    const sampled = sliding?.monteCarlo;
    for (const method of [hands?.smallSteps, hands?.twoPoints, hands?.eigenvectorPoints]) {
      expect(method?.mean).toBeCloseTo(sampled?.factorMean ?? Number.NaN, 0);
      expect((method?.sd ?? 0) / (sampled?.factorSd ?? Number.NaN)).toBeGreaterThan(0.7);
      expect((method?.sd ?? 0) / (sampled?.factorSd ?? Number.NaN)).toBeLessThan(1.3);
    }
  });

  test("the union of half-spaces lies within its bounds, Ditlevsen's within Cornell's", () => {
    const points = result.system.fromDesignPoints;
    const [low, high] = points?.cornell ?? [1, 0];
    const [lower, upper] = points?.ditlevsen ?? [1, 0];
    expect(lower).toBeGreaterThanOrEqual(low - 1e-15);
    expect(upper).toBeLessThanOrEqual(high + 1e-15);
    expect(points?.probability).toBeGreaterThan(0.99 * lower);
    expect(points?.probability).toBeLessThan(1.01 * upper);
  });

  test("the fragility curve of the strongest unknown leads from one end to the other", () => {
    const curve = result.system.fragility?.[0];
    const probabilities = curve?.points.map(({ probability }) => probability) ?? [];
    expect(probabilities).toHaveLength(21);
    expect(Math.max(...probabilities) / Math.max(Math.min(...probabilities), 1e-12)).toBeGreaterThan(10);
  });

  test("costs nothing where it is not asked for", async () => {
    const short = await assess(study, options);
    expect(short.limitStates.sliding).not.toHaveProperty("allDrivers");
    expect(short.system).not.toHaveProperty("fragility");
    expect(short.bestEstimate).toEqual(result.bestEstimate);
  });
});
