import { expect, test } from "vitest";
import { decadeLabels, decades, labelRoom, labelsOf } from "../../../src/report/charts/common.ts";
import { handMade } from "../hand-made.ts";

test("decades run from below the least probability to 1, and are never fewer than three", () => {
  expect(decades(2.8e-5)).toEqual({ floor: 1e-5, values: [1e-5, 1e-4, 1e-3, 1e-2, 1e-1, 1] });
  expect(decades(0.9).values).toHaveLength(3);
  expect(decades(1e-30).floor).toBeGreaterThanOrEqual(1e-13);
});

test("there is a label for every decade", () => {
  const labels = [...decadeLabels.matchAll(/\["([^"]*)", "([^"]*)"\]/g)];
  expect(labels).toHaveLength(14);
  expect(labels[3].slice(1)).toEqual(["10⁻³", "1 in 1000"]);
});

test("paths read as their labels, cut where they are long", () => {
  const label = labelsOf(handMade.assess, 12);
  expect(label("water.behind.level")).toBe("Water level…");
  expect(label("not.there")).toBe("not.there");
  expect(labelRoom(["Water level"])).toBeGreaterThan(50);
});
