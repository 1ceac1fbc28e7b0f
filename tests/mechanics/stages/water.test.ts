import { describe, expect, test } from "vitest";
import { waterPressureBehind } from "../../../src/mechanics/stages/earth-pressure.ts";
import { crackedWaterMoment, crackedWaterThrust, hydraulicGradient } from "../../../src/mechanics/stages/water.ts";

/** Midpoint sum of the pressure diagram: the second method. Its error is the jump at the crack, below 60 kPa, times a step of 3e-5 m times 6 m. */
function integrate(pressure: (z: number) => number, top: number, steps = 200_000): { force: number; moment: number } {
  let [force, moment] = [0, 0];
  const step = top / steps;
  for (let k = 0; k < steps; k++) {
    const z = (k + 0.5) * step;
    force += pressure(z) * step;
    moment += pressure(z) * z * step;
  }
  return { force, moment };
}

describe("water behind with a full crack", () => {
  test.each([
    [6, 4, 3, 0],
    [6, 4, 5, 0],
    [6, 4, 3, 0.2],
    [6, 0, 3, 0],
    [6, 6, 3, 0.1],
    [6, 2.5, 0, 0],
  ])("top %d, crack %d, water %d, gradient %d agrees with a sum over the diagram", (top, crack, level, gradient) => {
    const found = integrate((z) => waterPressureBehind(z, level, gradient, top, crack), top);
    expect(crackedWaterThrust(top, crack, level, gradient)).toBeCloseTo(found.force, 2);
    expect(crackedWaterMoment(top, crack, level, gradient)).toBeCloseTo(found.moment, 2);
  });

  test("a crack of no depth leaves the hydrostatic triangle, acting at a third of its height", () => {
    const force = crackedWaterThrust(6, 6, 3, 0);
    expect(force).toBeCloseTo(0.5 * 9.81 * 9, 12);
    expect(crackedWaterMoment(6, 6, 3, 0) / force).toBeCloseTo(1, 12);
  });
});

describe("the hydraulic gradient", () => {
  test("is the difference of head over the path down the back, under the base and up in front", () => {
    expect(hydraulicGradient(3, 1, 4, 0.5)).toBeCloseTo(2 / (3 + 4 + 0.5), 15);
    expect(hydraulicGradient(3, 0.2, 4, 0.5)).toBeCloseTo(2.8 / (3 + 4 + 0.2), 15);
  });

  test("is zero where the levels are equal and turns round where the front is higher", () => {
    expect(hydraulicGradient(2, 2, 3, 1)).toBe(0);
    expect(hydraulicGradient(1, 2, 3, 2)).toBeLessThan(0);
  });
});
