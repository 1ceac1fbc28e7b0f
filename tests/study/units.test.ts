import { describe, expect, test } from "vitest";
import { type Dimension, displayUnit, fromPlain, plainUnit, readMeasure, usualUnits } from "../../src/study/units.ts";

const house = (text: string, dimension: Dimension, units: "metric" | "us" = "metric"): number => {
  const measure = readMeasure(text, dimension, units);
  if (!("value" in measure)) throw new Error(measure.message);
  return measure.value;
};

/** Relative difference below 1e-12: the factors are exact by definition, so only rounding is left. */
const same = (found: number, expected: number): void => {
  expect(Math.abs(found - expected)).toBeLessThanOrEqual(1e-12 * Math.abs(expected));
};

describe("a text with a unit", () => {
  test.each<[string, Dimension, number]>([
    ["2.5 m", "length", 2.5],
    ["250 cm", "length", 2.5],
    ["2500mm", "length", 2.5],
    ["1 ft", "length", 0.3048],
    ["12 in", "length", 0.3048],
    ["-3 ft", "level", -0.9144],
    ["18 kN/m3", "unit_weight", 18],
    ["18 kN/m³", "unit_weight", 18],
    ["18 kN / m^3", "unit_weight", 18],
    ["18000 N/m3", "unit_weight", 18],
    ["0.018 MN/m3", "unit_weight", 18],
    ["10 kPa", "pressure", 10],
    ["10 kN/m2", "pressure", 10],
    ["0.01 MPa", "pressure", 10],
    ["30 kN/m", "line_force", 30],
    ["30 deg", "angle", 30],
    ["30°", "angle", 30],
    ["1e-1 rad", "angle", 18 / Math.PI],
    ["8 %", "ratio", 0.08],
    ["+.5", "ratio", 0.5],
    ["45 deg", "slope", 45],
  ])("%s is read", (text, dimension, expected) => same(house(text, dimension), expected));

  // 1 lbf = 0.45359237 kg · 9.80665 m/s² exactly; 1 ft = 0.3048 m exactly
  const pound = (0.45359237 * 9.80665) / 1000;
  test.each<[string, Dimension, number]>([
    ["120 lb/ft3", "unit_weight", (120 * pound) / 0.3048 ** 3],
    ["120 lbf/ft3", "unit_weight", (120 * pound) / 0.3048 ** 3],
    ["120 pcf", "unit_weight", (120 * pound) / 0.3048 ** 3],
    ["0.12 kip/ft3", "unit_weight", (120 * pound) / 0.3048 ** 3],
    ["250 psf", "pressure", (250 * pound) / 0.3048 ** 2],
    ["250 lb/ft2", "pressure", (250 * pound) / 0.3048 ** 2],
    ["2 ksf", "pressure", (2000 * pound) / 0.3048 ** 2],
    ["10 psi", "pressure", (1440 * pound) / 0.3048 ** 2],
    ["2 kip/ft", "line_force", (2000 * pound) / 0.3048],
    ["150 plf", "line_force", (150 * pound) / 0.3048],
  ])("%s is read, the pound being a force", (text, dimension, expected) => same(house(text, dimension), expected));

  test("agrees with the conversion tables of the trade to their printed digits", () => {
    expect(house("1 lb/ft3", "unit_weight")).toBeCloseTo(0.15709, 5); // 1 pcf = 0.15709 kN/m3, common practice
    expect(house("1 psf", "pressure")).toBeCloseTo(0.04788, 5); // 1 psf = 47.88 Pa, common practice
    expect(house("1 psi", "pressure")).toBeCloseTo(6.895, 3); // 1 psi = 6.895 kPa, common practice
    expect(house("1 kip/ft", "line_force")).toBeCloseTo(14.594, 3); // common practice
  });

  test.each([
    ["1v:2h", (Math.atan(0.5) * 180) / Math.PI],
    ["1V : 1.5H", (Math.atan(1 / 1.5) * 180) / Math.PI],
    ["2v:1h", (Math.atan(2) * 180) / Math.PI],
    ["0v:1h", 0],
  ])("a slope may be %s", (text, expected) => same(house(text, "slope") + 1, expected + 1));

  test.each<[string, Dimension, string, string | undefined]>([
    ["0v:0h", "slope", "a slope of 0v:0h has no direction", undefined],
    ["1v:2h", "angle", 'found "1v:2h", whose unit is not one of this value\'s (deg, rad)', undefined],
    [
      "5 furlongs",
      "length",
      'found "5 furlongs", whose unit is not one of this value\'s (m, cm, mm, ft, in)',
      undefined,
    ],
    [
      "1.9 t/m3",
      "unit_weight",
      'found "1.9 t/m3", whose unit is not one of this value\'s (kN/m3, lb/ft3, pcf)',
      'that is a density; as a unit weight it is "18.6 kN/m3"',
    ],
    [
      "3 PSF",
      "pressure",
      'found "3 PSF", whose unit is not one of this value\'s (kPa, kN/m2, MPa, lb/ft2, psf, ksf, psi)',
      "did you mean psf?",
    ],
    [
      "1,250 psf",
      "pressure",
      'found "1,250 psf", whose unit is not one of this value\'s (kPa, kN/m2, MPa, lb/ft2, psf, ksf, psi)',
      "write 1.250 with a decimal point, or 1250 without a comma",
    ],
    [
      "3 constructor",
      "length",
      'found "3 constructor", whose unit is not one of this value\'s (m, cm, mm, ft, in)',
      undefined,
    ],
    ["1e999 m", "length", 'found "1e999 m", which is too large', undefined],
    ["", "ratio", 'found "", which is not a number, with or without a unit (%)', undefined],
  ])("%s is refused", (text, dimension, message, hint) => {
    expect(readMeasure(text, dimension, "metric")).toEqual({ message, hint });
  });
});

describe("plain numbers", () => {
  test("are in house units where the study is metric", () => {
    for (const dimension of [
      "length",
      "level",
      "angle",
      "slope",
      "unit_weight",
      "pressure",
      "line_force",
      "ratio",
    ] as const) {
      expect(fromPlain(1.25, dimension, "metric")).toBe(1.25);
    }
  });

  test.each<[Dimension, string]>([
    ["length", "1 ft"],
    ["level", "1 ft"],
    ["unit_weight", "1 lb/ft3"],
    ["pressure", "1 lb/ft2"],
    ["line_force", "1 lb/ft"],
    ["angle", "1 deg"],
    ["ratio", "1"],
  ])("of a %s are %s where the study is in US units", (dimension, text) => {
    same(fromPlain(1, dimension, "us"), house(text, dimension));
    same(house("1", dimension, "us"), house(text, dimension));
  });
});

describe("units of results", () => {
  const dimensions = [
    "length",
    "level",
    "angle",
    "slope",
    "unit_weight",
    "pressure",
    "line_force",
    "moment",
    "ratio",
  ] as const;

  test.each(["metric", "us"] as const)("turn house values into %s ones and back", (units) => {
    for (const dimension of dimensions) {
      const { factor, unit } = displayUnit(dimension, units);
      expect(unit).not.toBe("");
      if (dimension !== "moment") same(fromPlain(7 * factor, dimension, units), 7);
      if (units === "metric") expect(factor).toBe(1);
    }
  });

  test("are written with their signs", () => {
    expect(displayUnit("unit_weight", "metric").unit).toBe("kN/m³");
    expect(displayUnit("unit_weight", "us").unit).toBe("lb/ft³");
    expect(displayUnit("pressure", "us").unit).toBe("lb/ft²");
    expect(displayUnit("angle", "us")).toEqual({ unit: "°", factor: 1 });
    expect(displayUnit("ratio", "us")).toEqual({ unit: "–", factor: 1 });
    expect(displayUnit("moment", "metric")).toEqual({ unit: "kNm/m", factor: 1 });
    same(displayUnit("moment", "us").factor, 1 / 4.4482216152605e-3);
    same(displayUnit("length", "us").factor, 1 / 0.3048);
  });

  test("a plain unit is one that a text may be written with", () => {
    for (const units of ["metric", "us"] as const) {
      for (const dimension of dimensions) {
        const unit = plainUnit(dimension, units);
        if (dimension === "moment" || unit === "") continue;
        same(house(`3 ${unit}`, dimension), fromPlain(3, dimension, units));
      }
    }
  });

  test("every usual unit is understood", () => {
    for (const dimension of dimensions) {
      for (const unit of usualUnits(dimension)) {
        const text = unit === "1v:2h" ? unit : `1 ${unit}`;
        expect(house(text, dimension)).toBeGreaterThan(0);
      }
    }
  });
});
