import { describe, expect, test } from "vitest";
import { collectFindings } from "../../src/study/findings.ts";
import { keyComplaint, readTree, textPlaces } from "../../src/study/yaml-tree.ts";

function tree(text: string): { tree: unknown; problems: string[] } {
  const at = textPlaces(text);
  const findings = collectFindings(at.places);
  const read = readTree(text, at, findings);
  return {
    tree: read,
    problems: findings.problems.map(
      ({ path, at: place, message }) => `${place?.line}:${place?.column} ${path}: ${message}`,
    ),
  };
}

describe("a tree", () => {
  test("is plain data, YAML 1.2: yes is a text, 0o17 is octal, 034 is thirty-four", () => {
    expect(tree("a: yes\nb: 0o17\nc: 034\nd: ~\ne: 1e-3\nf: [true, 'x']\ng: { h: 12:30 }").tree).toEqual({
      a: "yes",
      b: 15,
      c: 34,
      d: null,
      e: 1e-3,
      f: [true, "x"],
      g: { h: "12:30" },
    });
  });

  test("follows aliases, and keeps keys as they are written", () => {
    expect(tree("a: &x { b: 1 }\nc: *x\n1: one").tree).toEqual({ a: { b: 1 }, c: { b: 1 }, 1: "one" });
  });

  test("may name its plain types", () => {
    expect(tree("a: !!str 1\nb: !!float 2.5\nc: !!map { d: 1 }")).toEqual({
      tree: { a: "1", b: 2.5, c: { d: 1 } },
      problems: [],
    });
  });

  test("is null for a text without content", () => {
    expect(tree("# only a comment\n")).toEqual({ tree: null, problems: [] });
  });

  test("does not start with a byte order mark, even if the text does", () => {
    expect(tree("\uFEFFa: 1").tree).toEqual({ a: 1 });
  });
});

describe("places", () => {
  test("are those of key and value, counted from 1", () => {
    const text = "wall:\n  base:\n    heel:  2.4\nlist:\n  - { a: 1 }\n";
    const at = textPlaces(text);
    readTree(text, at, collectFindings(at.places));
    expect(at.places("wall.base.heel", "key")).toEqual({ line: 3, column: 5 });
    expect(at.places("wall.base.heel", "value")).toEqual({ line: 3, column: 12 });
    expect(at.places("list.0", "value")).toEqual({ line: 5, column: 5 });
    expect(at.places("list.0.a", "value")).toEqual({ line: 5, column: 10 });
    expect(at.places("list.1", "value")).toBeUndefined();
  });

  test("hold with lines that end in CR LF", () => {
    const text = "a: 1\r\nb:\r\n  c: x\r\n";
    const at = textPlaces(text);
    readTree(text, at, collectFindings(at.places));
    expect(at.places("b.c", "value")).toEqual({ line: 3, column: 6 });
  });
});

describe("refused", () => {
  test.each([
    ["a: 1\na: 2", '2:1 a: "a" is given twice'],
    ["a:\n  <<: { b: 1 }", "2:3 a.<<: merge keys (<<) are not part of YAML 1.2"],
    ["a: *b", "1:4 a: *b names no anchor above it"],
    ["a: .inf", "1:4 a: .inf is not a finite number"],
    ["a: !!binary aGk=", "1:13 a: found the tag tag:yaml.org,2002:binary; a study uses no tags"],
    ["a: !!set { b, c }", "1:10 a: found the tag tag:yaml.org,2002:set; a study uses no tags"],
    ["a: !foo 1", "1:4 : Unresolved tag: !foo; a study uses no tags"],
    ["? { a: 1 }\n: 2", "1:3 : found a key that is not a single word"],
    [
      `a: ${"[".repeat(45)}${"]".repeat(45)}`,
      expect.stringContaining("is nested too deeply; at most 40 levels are read"),
    ],
    ["a: 'x", "1:6 : is not valid YAML: Missing closing 'quote"],
  ])("%s", (text, problem) => {
    expect(tree(text).problems).toEqual([problem]);
  });

  test("numbers that only a big integer holds become the nearest number", () => {
    expect(tree("a: 123456789012345678901234567890")).toEqual({
      tree: { a: Number("123456789012345678901234567890") },
      problems: [],
    });
  });
});

test("a key may be anything but a merge, a double or a word of JavaScript's own", () => {
  expect(keyComplaint("heel", {})).toBeUndefined();
  expect(keyComplaint("heel", { heel: 1 })?.message).toBe('"heel" is given twice');
  expect(keyComplaint("valueOf", {})?.message).toBe('"valueOf" cannot be a key');
  expect(keyComplaint(undefined, {})?.hint).toBe("write key: value");
});
