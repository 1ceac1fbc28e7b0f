import { expect, test } from "vitest";
import { shortened } from "../../src/report/shortened.ts";
import { textWidth } from "../../src/report/text-width.ts";

test("wide letters are wider than narrow ones, and width grows with the size", () => {
  expect(textWidth("mmm")).toBeGreaterThan(2 * textWidth("iii"));
  expect(textWidth("Water level", 24)).toBeCloseTo(2 * textWidth("Water level", 12), 10);
  expect(textWidth("")).toBe(0);
});

test.each([
  // width at 12 px in Chromium with DejaVu Sans, one of the widest of the usual faces
  ["Friction angle of Medium sand", 178],
  ["Water level behind the wall", 162],
  ["1 in 35 500", 69],
])("%s is as wide as in a browser, within 15 %%", (words, width) => {
  expect(textWidth(words)).toBeGreaterThan(0.85 * width);
  expect(textWidth(words)).toBeLessThan(1.15 * width);
});

test("words are cut only where they are too long", () => {
  expect(shortened("Medium sand", 11)).toBe("Medium sand");
  expect(shortened("Medium sand", 8)).toBe("Medium…");
});
