import { Ajv } from "ajv";
import { describe, expect, test } from "vitest";
import { parse } from "yaml";
import { fields } from "../../src/study/fields.ts";
import { studyJsonSchema } from "../../src/study/json-schema.ts";
import { everything, fixture, plain } from "./fixtures/read.ts";

type Json = Record<string, unknown>;
const schema = studyJsonSchema();
const validate = new Ajv({ strict: false, allErrors: true }).compile(schema);

function complaints(text: string): string[] {
  validate(parse(text, { version: "1.2" }));
  return (validate.errors ?? []).map(({ instancePath, message }) => `${instancePath} ${message}`);
}

describe("the JSON Schema", () => {
  test.each(["two-soils-high-water", "sloping-fill-us"])("accepts the shipped study %s", (name) => {
    expect(complaints(fixture(`../../../studies/${name}/study`))).toEqual([]);
  });

  test("accepts every key and every form of the format", () => {
    for (const text of [plain, everything, fixture("gravity")]) expect(complaints(text)).toEqual([]);
  });

  test.each([
    ["height: 5.0", "height: tall"],
    ["height: 5.0", "hieght: 5.0"],
    ["    height: 5.0\n", ""],
    ["mean: 36, sd: 2.5", "mean: 36, std: 2.5"],
    ["{ normal: { mean: 36, sd: 2.5 } }", "{ cauchy: { mean: 36 } }"],
    ["{ normal: { mean: 36, sd: 2.5 } }", "340"],
    ["slope: 0", "slope: -3"],
    ["ratio: 0.80", "ratio: 80"],
    ["earth_pressure: rankine", "earth_pressure: rankin"],
    ["coefficient: 0.4", "coefficient: 1"],
    ["samples: 1000000", "samples: 0.5"],
    ["- { soil: sand }", "- { bottom: 3 }"],
  ])("refuses what stands in place of %s: %s", (replace, by) => {
    expect(plain.split(replace)).toHaveLength(2);
    expect(complaints(plain.replace(replace, by))).not.toEqual([]);
  });
});

describe("every key of the JSON Schema", () => {
  const keys: [path: string, schema: Json][] = [];
  collect(schema, "");
  for (const [name, definition] of Object.entries(schema.definitions as Record<string, Json>))
    collect(definition, `definitions.${name}`);

  function collect(json: Json, path: string): void {
    for (const [key, below] of Object.entries((json.properties as Record<string, Json>) ?? {})) {
      keys.push([path === "" ? key : `${path}.${key}`, below]);
      collect(below, path === "" ? key : `${path}.${key}`);
    }
    for (const key of ["items", "additionalProperties"])
      if (typeof json[key] === "object") collect(json[key] as Json, `${path}.*`);
    for (const branch of (json.anyOf as Json[]) ?? []) collect(branch, path);
  }

  const isGroup = (json: Json): boolean => json.type === "object" || json.type === "array";

  test("has a description, and an example unless it is a group of keys", () => {
    expect(keys.length).toBeGreaterThan(150);
    expect(
      keys.filter(([, json]) => typeof json.description !== "string" || json.description === "").map(([path]) => path),
    ).toEqual([]);
    expect(keys.filter(([, json]) => !isGroup(json) && !Array.isArray(json.examples)).map(([path]) => path)).toEqual(
      [],
    );
  });

  test("of a number has its unit, its range and its default", () => {
    const byPath = new Map(keys);
    for (const field of fields) {
      const json = byPath.get(field.pattern);
      expect(json, field.pattern).toBeDefined();
      expect(json!["x-unit"], field.pattern).not.toBe("");
      expect(json!.description, field.pattern).toContain("Range: ");
      expect(json!.default, field.pattern).toBe(field.default);
      expect(json!["x-default"], field.pattern).toBe(field.defaultText);
    }
  });

  test("carries nothing that is meant for this program only", () => {
    const text = JSON.stringify(schema);
    for (const word of ["field", "number", "wanted", "distribution"]) expect(text).not.toContain(`"${word}":`);
    expect(text.length).toBeLessThan(200_000);
  });

  test("has examples that its own schema accepts", () => {
    const ajv = new Ajv({ strict: false });
    ajv.addSchema({ $id: "study", definitions: schema.definitions });
    const wrong = keys.filter(([, json]) => {
      const check = ajv.compile(JSON.parse(JSON.stringify(json).replaceAll('"#/definitions/', '"study#/definitions/')));
      return !((json.examples as unknown[]) ?? []).every((example) => check(example));
    });
    expect(wrong.map(([path]) => path)).toEqual([]);
  });
});
