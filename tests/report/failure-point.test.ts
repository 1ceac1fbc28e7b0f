import { describe, expect, test } from "vitest";
import { failurePoint } from "../../src/report/failure-point.ts";
import { handMade } from "./hand-made.ts";

const { assess } = handMade;
const sliding = assess.limitStates.sliding!;

describe("where the wall is most likely to fail", () => {
  test("is the mean of the failing samples where no design point is known", () => {
    expect(failurePoint(assess)).toEqual({
      name: "a typical failure",
      how: "The means of the unknowns among 420 failing samples.",
      values: { "soils.sand.friction_angle": 28.5, "water.behind.level": 2.6 },
    });
  });

  test("is the design point of the likeliest limit state where one was found", () => {
    const point = (probability: number, converged = true) => ({
      converged,
      status: "smooth",
      reliabilityIndex: 2.6,
      probability,
      designPoint: { "water.behind.level": 100 * probability },
      importance: {},
      evaluations: 1,
    });
    const limitStates = {
      sliding: { ...sliding, firstOrderReliability: point(0.004) },
      overturning: { ...sliding, firstOrderReliability: point(0.02, false) },
      bearing: { ...sliding, firstOrderReliability: point(0.01) },
    };
    const found = failurePoint({ ...assess, limitStates });
    expect(found?.name).toBe("the most likely failure: bearing failure");
    expect(found?.values).toEqual({ "water.behind.level": 1 });
  });

  test("is nowhere where no failure was seen", () => {
    expect(failurePoint({ ...assess, system: { ...assess.system, failurePicture: [] } })).toBeUndefined();
  });
});
