import { describe, expect, test } from "vitest";
import { displayIn } from "../../src/report/display.ts";
import { lengthOf } from "../../src/report/table.ts";
import { baseSentences, sheetText, terminalCheck } from "../../src/report/terminal-check.ts";
import { gallery, reportInput } from "./gallery.ts";
import { handMade } from "./hand-made.ts";

const { check, study } = handMade;
const options = { width: 100, colour: false };

describe("toehold check on a terminal", () => {
  test("shows factors, forces, base and the calculation, in that order", () => {
    const text = terminalCheck(check, study, options);
    const places = ["Factor of safety", "Forces per metre run", "Base", "Calculation", "Cautions"].map((words) =>
      text.indexOf(words),
    );
    expect(places).toEqual([...places].sort((a, b) => a - b));
    expect(places[0]).toBeGreaterThan(0);
    expect(text).toContain("Sliding                      1.80   162 kN/m  90.0 kN/m");
  });

  test("each step is symbol = formula = numbers = result, with what it is and its source", () => {
    expect(sheetText(check.sheet, displayIn("metric"), options)).toContain(
      [
        "    Ka = tan²(45° − φ/2) = tan²(45° − 35°/2) = 0.271",
        "        active earth pressure coefficient [Rankine (1857)]",
      ].join("\n"),
    );
  });

  test("says which limit states fail, and where the resultant misses the base", () => {
    const failing = {
      ...check,
      marks: ["lost_contact"],
      base: { ...check.base, resultantX: null, eccentricity: null, pressureToe: null, pressureHeel: null },
      limitStates: { sliding: { factorOfSafety: 0.8, resisting: 72, driving: 90, unit: "kN/m" } },
    };
    const text = terminalCheck(failing, study, options);
    expect(text).toContain("At these values the wall fails by sliding.");
    expect(text).toContain("The base has lost contact");
    expect(baseSentences(failing, displayIn("metric"))[1]).toBe("The resultant misses the base.");
  });

  test("shows US units and says in which units numbers are put in", async () => {
    const input = await reportInput(gallery["US units"]);
    const text = terminalCheck(input.check, input.study, options);
    expect(text).toContain("Forces per foot run");
    expect(text).toContain("Numbers put in are in m, kN and kPa");
    expect(text).toMatch(/\d lb\/ft/);
  });

  test.each([50, 80])("breaks at %d columns, but for formulas without a space", async (width) => {
    const input = await reportInput(gallery["key, loads, earthquake and cohesion on a slope"]);
    const lines = terminalCheck(input.check, input.study, { width, colour: false }).split("\n");
    expect(lines.filter((line) => lengthOf(line) > width && line.trim().includes(" ") && !/[=·]/.test(line))).toEqual(
      [],
    );
  });
});
