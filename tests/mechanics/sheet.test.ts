import { describe, expect, test } from "vitest";
import { check } from "../../src/check.ts";
import { fourFigures } from "../../src/mechanics/sheet.ts";
import { readDocument } from "../../src/study/read-study.ts";
import { gallery } from "../report/gallery.ts";

const lines = check(readDocument(gallery["nothing uncertain"])).sheet;

describe("the calculation sheet", () => {
  test("goes from the outline to the limit states, as one would by hand", () => {
    const order = [...new Set(lines.map((line) => line.heading.split(",")[0]))];
    expect(order).toEqual([
      "Outline",
      "Water",
      "Earth pressure",
      "Earth thrust",
      "Weights",
      "Base",
      "Sliding",
      "Overturning",
      "Bearing",
    ]);
  });

  test("puts the numbers into the formula, angles in degrees", () => {
    const ka = lines.find((line) => line.symbol === "Ka");
    expect(ka).toMatchObject({
      formula: "tan²(45° − φ/2)",
      substituted: "tan²(45° − 35°/2)",
      source: "Rankine (1857)",
      unit: "–",
    });
    expect(ka?.value).toBeCloseTo(0.27099, 5); // Rankine's table, 35°
  });

  test("can be followed: numbers put into a sum or a ratio give the result", () => {
    const weights = lines.find((line) => line.symbol === "ΣW");
    const sum = weights?.substituted.split(" + ").reduce((total, number) => total + Number(number), 0) ?? 0;
    expect(sum).toBeCloseTo(weights?.value ?? 0, 0);
  });

  test("leaves out stretches of no length", () => {
    // the water stands in the lower soil, so the upper has no wet part
    expect(
      lines.filter((line) => line.heading === "Earth pressure, Gravel fill" && line.text.startsWith("below water")),
    ).toEqual([]);
    expect(
      lines.filter((line) => line.heading === "Earth pressure, Medium sand" && line.text.startsWith("below water"))
        .length,
    ).toBeGreaterThan(3);
  });

  test.each([
    [0, "0"],
    [35, "35"],
    [0.27099, "0.271"],
    [1234.56, "1235"],
    [-2.5, "−2.5"],
    [1.23456e-7, "1.235e-7"],
  ])("%d is written %s beside a formula", (value, text) => {
    expect(fourFigures(value)).toBe(text);
  });
});
