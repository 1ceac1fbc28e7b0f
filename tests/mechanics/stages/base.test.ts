import { describe, expect, test } from "vitest";
import { basePressures } from "../../../src/mechanics/read-out.ts";
import { cappedRatio } from "../../../src/mechanics/stages/base.ts";
import { unitWeightBelow } from "../../../src/mechanics/stages/bearing.ts";
import { compressedLength, drainedResistance, undrainedResistance } from "../../../src/mechanics/stages/sliding.ts";

describe("factors of safety", () => {
  test("lie between 0 and the cap, and a driving action of zero or less gives the cap", () => {
    expect(cappedRatio(3, 2)).toBe(1.5);
    expect(cappedRatio(-3, 2)).toBe(0);
    expect(cappedRatio(3, 0)).toBe(1000);
    expect(cappedRatio(3, -1)).toBe(1000);
    expect(cappedRatio(1e9, 1)).toBe(1000);
  });
});

describe("the base", () => {
  test("is compressed over three times the nearer distance of the resultant, at most its width", () => {
    expect(compressedLength(2 * 0.5, 3)).toBeCloseTo(1.5, 12); // x_R = 0.5 m
    expect(compressedLength(2 * 1.4, 3)).toBe(3);
    expect(compressedLength(-1, 3)).toBe(0);
  });

  test("resists by friction, adhesion and passive resistance, the factor on the first two alone", () => {
    expect(drainedResistance(200, 0.5, 10, 2, 0.9, 30)).toBeCloseTo(0.9 * (100 + 20) + 30, 12);
    expect(undrainedResistance(50, 2, 0.9, 30)).toBeCloseTo(0.9 * 100 + 30, 12);
    expect(undrainedResistance(50, -2, 0.9, 30)).toBe(30);
  });

  test("presses as a trapezium within the middle third and as a triangle beyond it", () => {
    expect(basePressures(300, 1.5, 3)).toEqual({ toe: 100, heel: 100 });
    expect(basePressures(300, 1, 3)).toEqual({ toe: 200, heel: 0 });
    const far = basePressures(300, 0.6, 3);
    expect(far?.toe).toBeCloseTo((2 * 300) / (3 * 0.6), 12);
    expect(far?.heel).toBe(0);
    expect(basePressures(300, 2.4, 3)).toEqual({ toe: 0, heel: (2 * 300) / (3 * (3 - 2.4)) });
    expect(basePressures(-1, 1, 3)).toBeNull();
  });

  test("rests on ground whose unit weight goes from buoyant to moist as the water falls by the effective width", () => {
    expect(unitWeightBelow(18, 20, 0, 2)).toBeCloseTo(20 - 9.81, 12);
    expect(unitWeightBelow(18, 20, 1, 2)).toBeCloseTo((20 - 9.81 + 18) / 2, 12);
    expect(unitWeightBelow(18, 20, 5, 2)).toBeCloseTo(18, 12);
  });
});
