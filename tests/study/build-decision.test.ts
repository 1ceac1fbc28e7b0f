import { describe, expect, test } from "vitest";
import { everything, plainWith, read } from "./fixtures/read.ts";

const study = read(everything);

describe("evidence", () => {
  test("is results in the unit of their variable, or survival", () => {
    expect(study.evidence).toEqual([
      { kind: "results", of: "soils.sand.friction_angle", results: [34.1, 36, 33.2], error: 3, transformation: 0.04 },
      { kind: "results", of: "water.behind.level", results: [101.3], error: 0.2 },
      {
        kind: "survived",
        under: {
          "water.behind.level": 102.6,
          "loads.surcharge.pressure": { distribution: { kind: "uniform", from: 5, to: 10 }, yearly: false },
        },
      },
    ]);
  });

  test("in US units is turned into house units", () => {
    const text = plainWith(
      ["units: metric", "units: us"],
      ["assessment:", "evidence:\n  - { results: [100], of: soils.sand.unit_weight, error: 2 }\nassessment:"],
    );
    const scaled = text
      .replace("mean: 18, cov", "mean: 110, cov")
      .replace("unit_weight: 24", "unit_weight: 150")
      .replace("unit_weight: 19", "unit_weight: 120")
      .replace("saturated_unit_weight: 22", "saturated_unit_weight: 130");
    const [entry] = read(scaled).evidence;
    expect(entry).toMatchObject({ results: [expect.closeTo(15.708746, 6)], error: expect.closeTo(0.31417492, 6) });
  });
});

describe("a decision", () => {
  test("has options as they are written and investigations as lists", () => {
    expect(study.decision?.options).toEqual([
      { name: "Build as drawn", cost: 0, change: {}, alwaysOpen: false },
      { name: "Heel 0.5 m longer", cost: 21000, change: { "wall.base.heel": 2.9 }, alwaysOpen: true },
      {
        name: "Relief drains",
        cost: 15000,
        change: { "water.behind.level": { uniform: { from: 100, to: 100.8 } } },
        alwaysOpen: false,
      },
    ]);
    expect(study.decision?.investigations).toEqual([
      {
        name: "Six shear-box tests on the sand",
        cost: 6500,
        informs: [{ path: "soils.sand.friction_angle", tests: 6, error: 3.5 }],
      },
      {
        name: "Standpipes read for two winters",
        informs: [{ path: "water.behind.level", tests: 2, error: 0.3, transformation: 0 }],
      },
      {
        name: "One borehole to 8 m",
        cost: 7000,
        informs: [
          { path: "soils.sand.friction_angle", tests: 3 },
          { path: "ground.behind.layers.0.bottom", tests: 1, error: 0.2, transformation: 0.01 },
        ],
      },
    ]);
  });

  test("has one failure cost, or one per limit state", () => {
    expect(study.decision?.failureCost).toEqual({
      sliding: 900000,
      overturning: 900000,
      bearing: 400000,
      eccentricity: 10000,
      deep_seated: 1000000,
    });
    const text = plainWith([
      "assessment:",
      "decision:\n  failure_cost: 5\n  options: [{ name: a, cost: 0 }]\nassessment:",
    ]);
    expect(read(text).decision).toEqual({
      currency: "",
      failureCost: 5,
      mustMeetTarget: false,
      options: [{ name: "a", cost: 0, change: {}, alwaysOpen: false }],
      investigations: [],
    });
  });
});
