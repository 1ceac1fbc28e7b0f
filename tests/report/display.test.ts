import { describe, expect, test } from "vitest";
import { capitalised, displayIn, limitStateName, limitStateWords } from "../../src/report/display.ts";

describe("house values in the study's units", () => {
  test("metric values keep their unit, US values are converted", () => {
    expect(displayIn("metric").quantity(104.4, "kN/m")).toBe("104 kN/m");
    expect(displayIn("us").quantity(1, "m")).toBe("3.28 ft");
    // 1 kPa = 20.885 lb/ft², 1 kN/m³ = 6.366 lb/ft³
    expect(displayIn("us").quantity(1, "kPa")).toBe("20.9 lb/ft²");
    expect(displayIn("us").quantity(1, "kN/m³")).toBe("6.37 lb/ft³");
    expect(displayIn("us").quantity(1, "m²")).toBe("10.8 ft²");
  });

  test("angles stand beside their sign and ratios alone", () => {
    expect(displayIn("us").quantity(33.04, "°")).toBe("33.0°");
    expect(displayIn("metric").quantity(0.85, "–")).toBe("0.850");
    expect(displayIn("metric").quantity(2, "furlong")).toBe("2.00 furlong");
  });

  test("lengths of a drawing have two decimals and no minus nought", () => {
    expect(displayIn("metric").length(3)).toBe("3.00");
    expect(displayIn("metric").length(-0.001)).toBe("0.00");
    expect(displayIn("metric").length(-1.5)).toBe("−1.50");
    expect(displayIn("us").length(100)).toBe("328.1");
  });

  test("limit states have words for a sentence and a name for a line", () => {
    expect(limitStateWords.bearing).toBe("bearing failure");
    expect(limitStateName("bearing")).toBe("Bearing failure");
    expect(limitStateName("eccentricity")).toBe("Eccentricity");
    expect(capitalised("a typical failure")).toBe("A typical failure");
  });
});
