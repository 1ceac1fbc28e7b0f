import { readFileSync } from "node:fs";
import { expect, test } from "vitest";
import { readStudy } from "../../src/study/read-study.ts";
import { readValues } from "../../src/study/read-values.ts";

const study = readStudy(readFileSync(new URL("fixtures/plain.yaml", import.meta.url), "utf8"));

test("values are read with and without a unit, and a file may hold none", () => {
  const text = 'soils.sand.friction_angle: 31\nwater.behind.level: "10 ft"\n';
  const values = readValues(text, study);
  expect(values["soils.sand.friction_angle"]).toBe(31);
  expect(values["water.behind.level"]).toBeCloseTo(3.048, 12);
  expect(readValues("# nothing yet\n", study)).toEqual({});
});

test.each([
  [
    "soils.snad.friction_angle: 31",
    '1:1 soils.snad.friction_angle: is not an uncertain value of this study\n  hint: did you mean "soils.sand.friction_angle"?',
  ],
  [
    "wall.base.heel: 3",
    "1:1 wall.base.heel: is not an uncertain value of this study\n  hint: uncertain here: soils.fill.friction_angle, soils.sand.unit_weight, soils.sand.friction_angle, water.behind.level",
  ],
  [
    "water.behind.level: 1\nsoils.sand.friction_angle: 310",
    "2:28 soils.sand.friction_angle: 310 is outside 0 to 60 degrees\n  hint: did you mean 31.0?",
  ],
  [
    "water.behind.level: { normal: { mean: 1, sd: 1 } }",
    "1:21 water.behind.level: found a group of keys; a number, or a text with a number and a unit, is needed",
  ],
  ["- 3", "1:1 found a list of 1; lines of path: value are needed\n  hint: for example soils.sand.friction_angle: 31"],
])("%s is refused", (text, message) => {
  expect(() => readValues(text, study)).toThrow(expect.objectContaining({ message }));
});
