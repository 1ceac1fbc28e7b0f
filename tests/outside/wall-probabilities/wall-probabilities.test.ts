// The heavy runs are stored (source.md says how to run them anew); a few seeds are run again here and held against them.
import { describe, expect, test } from "vitest";
import { bestEstimate } from "../../../src/reliability/best-estimate.ts";
import { findDesignPoints } from "../../../src/reliability/design-points.ts";
import type { SamplingEstimate } from "../../../src/reliability/sampling-estimate.ts";
import { importanceOf, rareOrder } from "./methods.ts";
import { type BatteryRow, type Known, type Rare, stored } from "./stored.ts";
import { modelOf, thirtyWalls } from "./walls.ts";

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

describe("the best estimate on thirty walls", () => {
  const battery = stored<readonly BatteryRow[]>("battery");
  const apart = (a: Known, b: Known): number =>
    Math.abs(a.probability - b.probability) / Math.hypot(a.standardError, b.standardError);
  const binomial = ({ samples, failures }: NonNullable<BatteryRow["counted"]>): Known => ({
    probability: failures / samples,
    standardError: Math.sqrt(failures) / samples,
  });

  test("what is held for true is confirmed by a method that knows no design points", () => {
    expect(battery.map(({ wall }) => wall)).toEqual(thirtyWalls);
    for (const { wall, sharp, counted, subset } of battery) {
      const other = counted === undefined ? subset! : binomial(counted);
      expect(counted === undefined).toBe(sharp.probability < 1e-4);
      // one in 16 000 for each wall
      expect(apart(other, sharp), `${wall.kind} ${wall.heel}`).toBeLessThan(4);
      expect(other.standardError / other.probability).toBeLessThan(0.12);
    }
  });

  test("it is within its stated error on all of them, and its cross-check agrees", () => {
    for (const { wall, best, sharp } of battery) {
      expect(apart(best, sharp), `${wall.kind} ${wall.heel}`).toBeLessThan(4);
      expect(best.agrees, wall.kind).toBe(true);
    }
    const covered = battery.filter(({ best: { interval }, sharp: { probability } }) => {
      return interval[0] <= probability && probability <= interval[1];
    });
    // 95 % of 30; an honest interval covers fewer than 25 once in 300
    expect(covered.length).toBeGreaterThanOrEqual(25);
  });

  test("two of them run again give what is stored", () => {
    for (const place of [4, 19]) {
      const { wall, best } = battery[place];
      const { states, space } = modelOf(wall);
      const found = bestEstimate(states, space, { seed: "battery", precision: 0.05, samples: 1_000_000 });
      expect(found.method).toBe(best.method);
      expectAsStored(found, best, wall.kind);
    }
  });
});
