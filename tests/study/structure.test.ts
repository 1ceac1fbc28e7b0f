import { describe, expect, test } from "vitest";
import { z } from "zod";
import {
  checkStructure,
  flow,
  inner,
  joined,
  knownKeys,
  metaOf,
  schemaOf,
  shown,
  withoutEmpty,
} from "../../src/study/structure.ts";
import { noPlaces } from "./fixtures/read.ts";

const schema = z.strictObject({
  width: z
    .number()
    .gt(0)
    .meta({ description: "Width of it", examples: [2] }),
  kind: z.enum(["round", "square"]).optional(),
  list: z
    .array(z.strictObject({ on: z.boolean() }))
    .min(1)
    .optional(),
  names: z
    .record(z.string().regex(/^[a-z]+$/, { error: "is not a name" }), z.strictObject({ text: z.string() }))
    .optional(),
  either: z
    .union([z.string(), z.array(z.string())])
    .optional()
    .meta({ wanted: "a path, or a list of them," }),
});

function problems(value: unknown): string[] {
  const findings = noPlaces();
  const sound = checkStructure(schema, value, "top", findings);
  expect(sound).toBe(findings.problems.length === 0);
  return findings.problems.map(
    ({ path, message, hint }) => `${path}: ${message}${hint === undefined ? "" : ` | ${hint}`}`,
  );
}

describe("a value that does not fit its schema is answered in words", () => {
  test.each<[unknown, string[]]>([
    [{ width: 2 }, []],
    [{}, ["top.width: is missing (width of it) | for example width: 2"]],
    [{ width: null }, ["top.width: is empty | give a value, or leave the key out"]],
    [{ width: 0 }, ["top.width: found 0; a number above 0 is needed"]],
    [{ width: "2_000" }, ['top.width: found "2_000"; a plain number is needed | write 2000']],
    [{ width: 2, wdith: 3 }, ['top.wdith: unknown key "wdith" | did you mean "width"?']],
    [{ width: 2, colour: 3 }, ['top.colour: unknown key "colour" | known here: width, kind, list, names, either']],
    [{ width: 2, kind: "rund" }, ['top.kind: found "rund"; allowed: round, square | did you mean "round"?']],
    [{ width: 2, kind: 7 }, ["top.kind: found 7; allowed: round, square"]],
    [{ width: 2, list: [] }, ["top.list: found a list of 0; a list of at least 1 is needed"]],
    [
      { width: 2, list: {} },
      [
        "top.list: found a group of keys; a list is needed | put the entries in [ ] or on lines of their own that begin with -",
      ],
    ],
    [
      { width: 2, list: [{ on: "yes" }] },
      ['top.list.0.on: found "yes"; true or false is needed | write true or false, without quotes'],
    ],
    [{ width: 2, list: [{ on: true }, 3] }, ["top.list.1: found 3; a group of keys is needed"]],
    [{ width: 2, names: { a: { text: 5 } } }, ['top.names.a.text: found 5; a text is needed | put it in quotes: "5"']],
    [{ width: 2, names: { A: { text: "x" } } }, ["top.names.A: is not a name"]],
    [{ width: 2, either: 3 }, ["top.either: found 3; a path, or a list of them, is needed"]],
    [7, ["top: found 7; a group of keys is needed"]],
  ])("%j", (value, expected) => {
    expect(problems(value)).toEqual(expected);
  });

  test("a long list of allowed words is not written out", () => {
    const findings = noPlaces();
    const words = Array.from({ length: 20 }, (_, i) => `word_number_${i}`) as [string, ...string[]];
    checkStructure(z.enum(words), "nonsense", "x", findings);
    expect(findings.problems[0]).toMatchObject({
      message: 'found "nonsense"; 20 names are allowed',
      hint: "for example word_number_0, word_number_1, word_number_2; toehold schema lists them all",
    });
  });
});

test("what a schema knows about its keys can be asked", () => {
  expect(knownKeys(schema)).toEqual(["width", "kind", "list", "names", "either"]);
  expect(knownKeys(z.number())).toEqual([]);
  expect(inner(schema.shape.kind)).toBeInstanceOf(z.ZodEnum);
  expect(schemaOf(schemaOf(schema, "list"), "0")).toBeInstanceOf(z.ZodObject);
  expect(schemaOf(schemaOf(schema, "names"), "anything")).toBeInstanceOf(z.ZodObject);
  expect(schemaOf(schema, "toString")).toBeUndefined();
  expect(metaOf(schema.shape.width).description).toBe("Width of it");
});

test("empty groups and lists count as left out, empty values do not", () => {
  const value = { width: null, list: null, names: { a: null, b: { text: null } } };
  expect(withoutEmpty(value, schema)).toEqual({ width: null, names: { b: { text: null } } });
  expect(withoutEmpty({ list: [{ on: null }, null] }, schema)).toEqual({ list: [{ on: null }, null] });
  expect(withoutEmpty("text", schema)).toBe("text");
});

test("values are shown short, and as one would write them", () => {
  expect(shown("x".repeat(100))).toHaveLength(40);
  expect(shown([1, 2])).toBe("a list of 2");
  expect(flow({ a: [1, { b: "c" }] })).toBe("{ a: [1, { b: c }] }");
  expect([joined("a", "b"), joined("", "b"), joined("a", "")]).toEqual(["a.b", "b", "a"]);
});
