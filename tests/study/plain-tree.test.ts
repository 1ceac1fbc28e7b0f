import { expect, test } from "vitest";
import { plainTree } from "../../src/study/plain-tree.ts";
import { noPlaces } from "./fixtures/read.ts";

test("a tree is copied deeply; what is undefined is left out", () => {
  const value = { a: [1, "x", true, null], b: { c: undefined, d: Object.assign(Object.create(null), { e: 1 }) } };
  const copy = plainTree(value, noPlaces()) as typeof value;
  expect(copy).toEqual({ a: [1, "x", true, null], b: { d: { e: 1 } } });
  expect(copy.a).not.toBe(value.a);
});

test.each([
  ["a function", { a: () => 1 }, "a: found a function; plain data is needed"],
  ["a date", { a: new Date(0) }, "a: found a object; plain data is needed"],
  ["a map", { a: new Map() }, "a: found a object; plain data is needed"],
  ["a big integer", { a: 1n }, "a: found a bigint; plain data is needed"],
  ["no number", { a: [Number.NaN] }, "a.0: NaN is not a finite number"],
  ["a reserved key", JSON.parse('{ "a": { "__proto__": 1 } }'), 'a.__proto__: "__proto__" cannot be a key'],
])("%s is refused", (_, value, problem) => {
  const findings = noPlaces();
  plainTree(value, findings);
  expect(findings.problems.map(({ path, message }) => `${path}: ${message}`)).toEqual([problem]);
});

test("a tree that holds itself is refused, not followed for ever", () => {
  const value: Record<string, unknown> = {};
  value.a = value;
  const findings = noPlaces();
  plainTree(value, findings);
  expect(findings.problems[0].message).toBe("is nested too deeply; at most 40 levels are read");
});
