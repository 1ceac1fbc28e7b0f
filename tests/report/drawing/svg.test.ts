import { describe, expect, test } from "vitest";
import { fixed, label, spread, text } from "../../../src/report/drawing/svg.ts";

describe("labels in one column", () => {
  test("stay where they belong while there is room", () => {
    expect(spread([10, 40, 90], 15, 0, 100)).toEqual([10, 40, 90]);
  });

  test("give way downwards, and upwards from the end of the column", () => {
    expect(spread([10, 12, 14], 15, 0, 100)).toEqual([10, 25, 40]);
    expect(spread([80, 95, 98], 15, 0, 100)).toEqual([70, 85, 100]);
  });
});

test("coordinates have one decimal and no minus nought", () => {
  expect(fixed(-0.01)).toBe("0");
  expect(fixed(12.345)).toBe("12.3");
});

test("words are escaped and keep the colour they are given", () => {
  expect(text(1, 2, "<a>")).toContain(">&#60;a&#62;</text>");
  expect(label(1, 2, "a", 'fill="#123456"').match(/fill="/g)).toHaveLength(1);
});
