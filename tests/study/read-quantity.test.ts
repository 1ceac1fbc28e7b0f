import { describe, expect, test } from "vitest";
import { fieldOfPath } from "../../src/study/fields.ts";
import { readQuantity } from "../../src/study/read-quantity.ts";
import type { Units } from "../../src/study/study.ts";
import { noPlaces } from "./fixtures/read.ts";

const path = "soils.sand.friction_angle";

function reading(
  raw: unknown,
  at = path,
  units: Units = "metric",
): { quantity: unknown; source?: string; problems: string[] } {
  const findings = noPlaces();
  const { quantity, source } = readQuantity(raw, at, fieldOfPath(at)!, { units, findings });
  return {
    quantity,
    ...(source !== undefined && { source }),
    problems: findings.problems.map((one) => `${one.path}: ${one.message}`),
  };
}

const distributionOf = (raw: unknown, at = path, units: Units = "metric"): unknown => {
  const { quantity, problems } = reading(raw, at, units);
  expect(problems).toEqual([]);
  return (quantity as { distribution: unknown }).distribution;
};

describe("a certain value", () => {
  test("is a number, a text with a unit, or either with its source", () => {
    expect(reading(34)).toEqual({ quantity: 34, problems: [] });
    expect(reading("34 deg")).toEqual({ quantity: 34, problems: [] });
    expect(reading("34")).toEqual({ quantity: 34, problems: [] });
    expect(reading({ value: 34, source: "table" })).toEqual({ quantity: 34, source: "table", problems: [] });
  });

  test("in US units is turned into house units", () => {
    expect(reading(120, "soils.sand.unit_weight", "us").quantity).toBeCloseTo(18.8505, 4);
    expect(reading("18 kN/m3", "soils.sand.unit_weight", "us").quantity).toBe(18);
    expect(reading(34, path, "us").quantity).toBe(34);
  });
});

describe("every form of the format page", () => {
  test.each<[unknown, unknown]>([
    [{ normal: { mean: 34, cov: 0.08 } }, { kind: "normal", mean: 34, sd: 2.72 }],
    [{ normal: { mean: 34, sd: "2 deg" } }, { kind: "normal", mean: 34, sd: 2 }],
    [{ lognormal: { mean: 34, sd: 2.7 } }, { kind: "lognormal", mean: 34, sd: 2.7, shift: 0 }],
    [{ lognormal: { mean: 34, sd: 2.7, shift: 20 } }, { kind: "lognormal", mean: 34, sd: 2.7, shift: 20 }],
    [
      { truncated_normal: { mean: 34, sd: 2.7, from: 28, to: 42 } },
      { kind: "truncated_normal", mean: 34, sd: 2.7, from: 28, to: 42 },
    ],
    [
      { truncated_normal: { mean: 62, sd: 9, from: 28, to: 42 } },
      { kind: "truncated_normal", mean: 62, sd: 9, from: 28, to: 42 },
    ], // the parent's mean may lie outside
    [{ uniform: { from: 30, to: 36 } }, { kind: "uniform", from: 30, to: 36 }],
    [{ triangular: { from: 30, peak: 30, to: 36 } }, { kind: "triangular", from: 30, peak: 30, to: 36 }],
    [{ beta: { from: 28, to: 40, mean: 34, sd: 2 } }, { kind: "beta", from: 28, to: 40, mean: 34, sd: 2 }],
    [{ gumbel: { mean: 34, sd: 2 } }, { kind: "gumbel", mean: 34, sd: 2 }],
    [{ weibull: { shape: 18, scale: 35 } }, { kind: "weibull", shape: 18, scale: 35, shift: 0 }],
    [{ gamma: { mean: 34, sd: 2 } }, { kind: "gamma", mean: 34, sd: 2 }],
    [{ range: { lowest: 28, likely: 34, highest: 40 } }, { kind: "normal", mean: 34, sd: 3 }],
    [
      { range: { lowest: 28, likely: 34, highest: 40, width_in_sd: 6, as: "lognormal" } },
      { kind: "lognormal", mean: 34, sd: 2, shift: 0 },
    ],
    [
      { measured: [33.1, 35.4, "31.8 deg", 36] },
      { kind: "measured", values: [33.1, 35.4, 31.8, 36], as: "normal", varianceReduction: 1 },
    ],
    [
      { measured: [33.1, 35.4, 31.8, 36], as: "lognormal", scale_of_fluctuation: 1.5, averaged_over: 6 },
      { kind: "measured", values: [33.1, 35.4, 31.8, 36], as: "lognormal", varianceReduction: 0.25 },
    ],
    [
      {
        mixture: [
          { share: 0.9, of: { uniform: { from: 30, to: 31 } } },
          { share: "10 %", of: { range: { lowest: 33, likely: 34, highest: 35 } } },
        ],
      },
      {
        kind: "mixture",
        parts: [
          { share: 0.9, of: { kind: "uniform", from: 30, to: 31 } },
          { share: 0.1, of: { kind: "normal", mean: 34, sd: 0.5 } },
        ],
      },
    ],
  ])("%j", (raw, expected) => {
    expect(distributionOf(raw)).toEqual(expected);
  });

  test("cov of a negative mean counts its size", () => {
    expect(distributionOf({ normal: { mean: -0.1, cov: 0.5 } }, "loads.earthquake.kv")).toEqual({
      kind: "normal",
      mean: -0.1,
      sd: 0.05,
    });
  });

  test("in US units, values and spreads alike", () => {
    const found = distributionOf({ normal: { mean: 120, sd: 6 } }, "soils.sand.unit_weight", "us") as {
      mean: number;
      sd: number;
    };
    expect(found.mean / found.sd).toBeCloseTo(20, 12);
    expect(found.sd).toBeCloseTo(0.942525, 6);
    const averaged = {
      normal: { mean: 34 },
      scatter: { inherent: 0.1, scale_of_fluctuation: 3, averaged_over: "1.8288 m" },
    };
    expect(
      (reading(averaged, path, "us").quantity as { scatter: { varianceReduction: number } }).scatter.varianceReduction,
    ).toBeCloseTo(0.5, 12);
  });

  test("a slope may be a ratio inside a distribution, its spread an angle", () => {
    const found = distributionOf(
      { truncated_normal: { mean: "1v:2h", sd: 1, from: "1v:3h", to: "1v:1.5h" } },
      "ground.behind.slope",
    ) as { mean: number; sd: number };
    expect(found.mean).toBeCloseTo(26.565051, 6);
    expect(found.sd).toBe(1);
    expect(reading({ normal: { mean: 20, sd: "1v:9h" } }, "ground.behind.slope").problems).toEqual([
      'ground.behind.slope.normal.sd: found "1v:9h", whose unit is not one of this value\'s (deg, rad)',
    ]);
  });
});

describe("scatter", () => {
  const scatter = {
    inherent: 0.09,
    scale_of_fluctuation: 1.5,
    averaged_over: 6,
    measurement: 0.03,
    transformation: 0.05,
    tests: 4,
  };

  test("makes up the spread and states how much of it is knowledge", () => {
    // by hand: Γ² = 1.5/6; cov² = 0.25·0.0081 + (0.0081 + 0.0009)/4 + 0.0025 = 0.006775
    const { quantity, problems } = reading({ lognormal: { mean: 33 }, scatter });
    expect(problems).toEqual([]);
    expect(quantity).toEqual({
      distribution: { kind: "lognormal", mean: 33, sd: 33 * Math.sqrt(0.006775), shift: 0 },
      yearly: false,
      knowledge: expect.closeTo(1 - 0.002025 / 0.006775, 12),
      scatter: {
        inherent: 0.09,
        scaleOfFluctuation: 1.5,
        averagedOver: 6,
        averaging: "simple",
        measurement: 0.03,
        transformation: 0.05,
        tests: 4,
        varianceReduction: 0.25,
      },
    });
  });

  test("with terms left out takes them as 0, one test, and no averaging", () => {
    const { quantity } = reading({ normal: { mean: 33 }, scatter: { inherent: 0.1 } });
    expect(quantity).toMatchObject({
      distribution: { sd: expect.closeTo(33 * Math.sqrt(0.02), 12) },
      knowledge: expect.closeTo(0.5, 12),
      scatter: { varianceReduction: 1, tests: 1, measurement: 0 },
    });
    expect(reading({ normal: { mean: 33 }, scatter: { transformation: 0.1 } }).quantity).toMatchObject({
      knowledge: 1,
    });
  });

  test("averages by the variance function that is named", () => {
    const { quantity } = reading({ normal: { mean: 33 }, scatter: { ...scatter, averaging: "exponential" } });
    expect((quantity as { scatter: { varianceReduction: number } }).scatter.varianceReduction).toBeCloseTo(
      (Math.exp(-8) + 7) / 32,
      12,
    );
  });

  test("stands only where a coefficient of variation could, and adds up to something", () => {
    expect(reading({ uniform: { from: 30, to: 36 }, scatter }).problems).toEqual([
      "soils.sand.friction_angle.scatter: scatter cannot stand beside uniform: it takes the place of cov",
    ]);
    expect(reading({ normal: { mean: 33 }, scatter: {} }).problems).toContain(
      "soils.sand.friction_angle.scatter: scatter adds up to no spread at all",
    );
  });
});

describe("the stated share of knowledge", () => {
  test("is that of the few tests where values were measured", () => {
    expect(reading({ measured: [33, 34, 35, 36] }).quantity).toMatchObject({ knowledge: 0.25 / 1.25 });
    expect(reading({ measured: [33, 34, 35, 36], scale_of_fluctuation: 1, averaged_over: 4 }).quantity).toMatchObject({
      knowledge: 0.5,
    });
  });

  test("is what a yearly variable says, or 0, whatever else it holds", () => {
    const yearly = { gumbel: { mean: 1.4, sd: 0.5 }, yearly: true };
    expect(reading(yearly, "water.behind.level").quantity).toMatchObject({ yearly: true, knowledge: 0 });
    expect(reading({ ...yearly, knowledge: "20 %" }, "water.behind.level").quantity).toMatchObject({ knowledge: 0.2 });
    expect(
      reading({ measured: [1, 2, 3, 4], yearly: true, knowledge: 0.1 }, "water.behind.level").quantity,
    ).toMatchObject({ knowledge: 0.1 });
  });

  test("is not stated by a plain distribution", () => {
    expect(reading({ normal: { mean: 34, sd: 2 } }).quantity).not.toHaveProperty("knowledge");
  });
});

test("a range keeps the engineer's words", () => {
  expect(reading({ range: { lowest: 28, likely: 34, highest: 39 } }).quantity).toMatchObject({
    range: { lowest: 28, likely: 34, highest: 39, widthInSd: 4 },
  });
});

test("a mean that follows from other numbers is judged too", () => {
  expect(reading({ weibull: { shape: 2, scale: 100 } }).problems).toEqual([
    "soils.sand.friction_angle: the mean of this distribution, 88.62, is outside 0 to 60 degrees",
  ]);
});
