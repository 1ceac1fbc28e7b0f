// The heavy runs are stored (source.md says how to run them anew); a few seeds are run again here and held against them.
import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { findDesignPoints } from "../../../src/reliability/design-points.ts";
import type { SamplingEstimate } from "../../../src/reliability/sampling-estimate.ts";
import { importanceOf, rareOrder } from "./methods.ts";
import { modelOf, type NamedWall } from "./walls.ts";

interface Known {
  readonly probability: number;
  readonly standardError: number;
}
interface Spread {
  readonly median: number;
  readonly of99in100: number;
  readonly largest: number;
}
interface Rare {
  readonly cost: readonly {
    readonly wall: NamedWall;
    readonly unknowns: number;
    readonly truth: Known;
    readonly seeds: number;
    readonly evaluations: Spread;
    readonly coefficientOfVariation: Spread;
    readonly seconds: Spread;
    readonly farthestInStandardErrors: number;
    readonly first: readonly (Known & { readonly evaluations: number })[];
  }[];
  readonly drains: {
    readonly wall: NamedWall;
    readonly seeds: number;
    readonly withBothPoints: number;
    readonly first: { readonly least: number; readonly most: number };
    readonly second: { readonly least: number; readonly most: number };
    readonly farthestInStandardErrors: number;
  };
}

const stored = <T>(name: string): T => JSON.parse(readFileSync(new URL(`${name}.json`, import.meta.url), "utf8")) as T;

/** A stored run and the same seed now: half a standard error allows for a sample that a rounding moves across the edge. */
function expectAsStored(found: Pick<SamplingEstimate, "probability">, before: Known, what: string): void {
  expect(Math.abs(found.probability - before.probability), what).toBeLessThan(0.5 * before.standardError);
}

describe("rare failures of a wall with ten unknowns", () => {
  const { cost, drains } = stored<Rare>("rare");

  test.each(cost.map((row) => [row.truth.probability.toExponential(1), row] as const))(
    "%s to 5 per cent: a median of at most 8000 evaluations, 20 000 in 99 of 100 seeds, under 0.1 s",
    (_, {
      wall,
      unknowns,
      truth,
      seeds,
      evaluations,
      coefficientOfVariation,
      seconds,
      farthestInStandardErrors,
      first,
    }) => {
      expect(unknowns).toBe(10);
      expect(seeds).toBe(100);
      expect(evaluations.median).toBeLessThanOrEqual(8000);
      expect(evaluations.of99in100).toBeLessThanOrEqual(20_000);
      expect(coefficientOfVariation.median).toBeLessThan(0.05);
      expect(seconds.median).toBeLessThan(0.1);
      expect(farthestInStandardErrors).toBeLessThan(4);
      first.forEach((before, seed) => {
        const found = importanceOf(modelOf(wall), rareOrder(`rare ${seed}`));
        expectAsStored(found, before, `seed ${seed}`);
        expect(found.evaluations).toBeLessThan(20_000);
        expect(Math.abs(found.probability - truth.probability)).toBeLessThan(4 * found.standardError);
      });
    },
  );

  test("drains that work or are blocked: both design points of bearing in 100 of 100 seeds", () => {
    expect([drains.seeds, drains.withBothPoints]).toEqual([100, 100]);
    for (const { least, most } of [drains.first, drains.second]) expect(most - least).toBeLessThan(1e-3);
    expect(drains.farthestInStandardErrors).toBeLessThan(4);
    const { states, space } = modelOf(drains.wall);
    const bearing = states.names.indexOf("bearing");
    for (let seed = 100; seed < 105; seed++) {
      const found = findDesignPoints(states, space, `drains ${seed}`).states[bearing].points;
      expect(found[0].reliabilityIndex).toBeCloseTo(drains.first.least, 3);
      expect(found[1].reliabilityIndex).toBeCloseTo(drains.second.least, 3);
    }
  });
});
