import { expect, test } from "vitest";
import { studySchema } from "../../src/study/schema.ts";
import { checkStructure, knownKeys } from "../../src/study/structure.ts";
import { everything, noPlaces, plain, read } from "./fixtures/read.ts";

test("the schema has the headings of the format, in its order", () => {
  expect(knownKeys(studySchema)).toEqual([
    "title",
    "notes",
    "units",
    "wall",
    "soils",
    "ground",
    "water",
    "loads",
    "model",
    "correlations",
    "assessment",
    "evidence",
    "decision",
  ]);
});

test("the schema accepts the fixtures", () => {
  for (const text of [plain, everything]) {
    const findings = noPlaces();
    expect(checkStructure(studySchema, read(text).document, "", findings)).toBe(true);
  }
});
