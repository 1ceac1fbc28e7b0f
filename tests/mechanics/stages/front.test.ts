import { describe, expect, test } from "vitest";
import { frontStress } from "../../../src/mechanics/stages/front.ts";

const dry = -1e6;

describe("vertical effective stress in front", () => {
  test("is moist weight times depth in dry ground, above and below the underside", () => {
    expect(frontStress(0.4, 1, dry, 0, 18, 20)).toBeCloseTo(18 * 0.6, 12);
    expect(frontStress(-0.5, 1, dry, 0, 18, 20)).toBeCloseTo(18 * 1.5, 12);
  });

  test("is buoyant below the water", () => {
    expect(frontStress(0, 1, 0.4, 0, 18, 20)).toBeCloseTo(18 * 0.6 + (20 - 9.81) * 0.4, 12);
    expect(frontStress(-0.5, 1, 0.4, 0, 18, 20)).toBeCloseTo(18 * 0.6 + (20 - 9.81) * 0.9, 12);
  });

  test("loses what rising seepage carries, down to the underside and no further", () => {
    const i = 0.3;
    expect(frontStress(0, 1, 1, i, 18, 20)).toBeCloseTo((20 - 9.81 * (1 + i)) * 1, 12);
    expect(frontStress(-0.5, 1, 1, i, 18, 20)).toBeCloseTo((20 - 9.81 * (1 + i)) * 1 + (20 - 9.81) * 0.5, 12);
  });

  test("follows a water level below the underside beside a key", () => {
    expect(frontStress(-0.2, 1, -0.3, 0, 18, 20)).toBeCloseTo(18 * 1.2, 12);
    expect(frontStress(-0.5, 1, -0.3, 0, 18, 20)).toBeCloseTo(18 * 1.3 + (20 - 9.81) * 0.2, 12);
  });
});
