import { describe, expect, test } from "vitest";
import { z } from "zod";
import { fieldOfPath, fieldOfPattern, fields } from "../../src/study/fields.ts";
import { studySchema } from "../../src/study/schema.ts";
import { inner, schemaOf } from "../../src/study/structure.ts";

/** Patterns of all leaves of the schema that carry a row of the table, with the path they are found at. */
function leaves(schema: z.ZodType | undefined, path: string): [path: string, pattern: string][] {
  const here = inner(schema);
  const pattern = here?.meta()?.field;
  if (typeof pattern === "string") return [[path, pattern]];
  const join = (key: string): string => (path === "" ? key : `${path}.${key}`);
  if (here instanceof z.ZodObject)
    return Object.keys(here.shape).flatMap((key) => leaves(schemaOf(here, key), join(key)));
  if (here instanceof z.ZodArray || here instanceof z.ZodRecord) return leaves(schemaOf(here, "*"), join("*"));
  return [];
}

describe("the table of fields", () => {
  test("and the schema name the same numeric fields, each at its own path", () => {
    const found = leaves(studySchema, "");
    for (const [path, pattern] of found) expect(path).toBe(pattern);
    expect(found.map(([path]) => path).sort()).toEqual(fields.map((field) => field.pattern).sort());
  });

  test("has each pattern once, a sound range, and a default and an example within it", () => {
    expect(new Set(fields.map((field) => field.pattern)).size).toBe(fields.length);
    for (const { pattern, lowest, highest, default: fallback, example, label, description, required } of fields) {
      expect(lowest, pattern).toBeLessThan(highest);
      expect(example, pattern).toBeGreaterThanOrEqual(lowest);
      expect(example, pattern).toBeLessThanOrEqual(highest);
      if (fallback !== undefined) {
        expect(fallback, pattern).toBeGreaterThanOrEqual(lowest);
        expect(fallback, pattern).toBeLessThanOrEqual(highest);
        expect(required, pattern).toBe(false);
      }
      expect(label.length, pattern).toBeGreaterThan(3);
      expect(description.length, pattern).toBeGreaterThan(10);
    }
  });

  test("keeps the limits that mechanics names: friction angles 0 to 60 degrees, unit weights from 1, strengths from 0", () => {
    for (const field of fields) {
      if (field.dimension === "angle" || field.dimension === "slope")
        expect([field.lowest, field.highest]).toEqual([0, 60]);
      if (field.dimension === "unit_weight") expect(field.lowest).toBeGreaterThanOrEqual(1);
      if (field.dimension === "pressure" || field.dimension === "line_force") expect(field.lowest).toBe(0);
      if (field.dimension === "length") expect(field.lowest).toBeGreaterThanOrEqual(0);
      if (field.pattern.startsWith("model.factors.")) expect(field.lowest).toBe(0);
    }
  });
});

describe("the field of a path", () => {
  test.each([
    ["soils.fill.friction_angle", "soils.*.friction_angle"],
    ["soils.Ton-2_b.cohesion", "soils.*.cohesion"],
    ["loads.strips.0.pressure", "loads.strips.*.pressure"],
    ["loads.strips.12.width", "loads.strips.*.width"],
    ["wall.base.heel", "wall.base.heel"],
  ])("%s is %s", (path, pattern) => {
    expect(fieldOfPath(path)?.pattern).toBe(pattern);
  });

  test.each([
    "",
    "wall",
    "wall.base",
    "wall.base.heal",
    "soils.friction_angle",
    "soils..friction_angle",
    "loads.strips.a.width",
    "loads.strips.01.width",
    "loads.strips.-1.width",
    "title",
  ])("%s is none", (path) => {
    expect(fieldOfPath(path)).toBeUndefined();
  });

  test("a pattern that is none is a broken promise", () => {
    expect(() => fieldOfPattern("wall.base.heal")).toThrow(RangeError);
  });
});
