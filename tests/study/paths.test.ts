import { describe, expect, test } from "vitest";
import { isReservedKey, valueAt, valueAtKeys, withValueAt } from "../../src/study/paths.ts";

const tree = {
  wall: { base: { heel: 2.4 } },
  loads: { strips: [{ width: 2 }] },
  title: "a",
  decision: { change: { "wall.base.heel": 3 } },
};

describe("a value at a path", () => {
  test("is found in mappings and lists", () => {
    expect(valueAt(tree, "wall.base.heel")).toBe(2.4);
    expect(valueAt(tree, "loads.strips.0.width")).toBe(2);
    expect(valueAt(tree, "")).toBe(tree);
    expect(valueAtKeys(tree, ["decision", "change", "wall.base.heel"])).toBe(3);
  });

  test.each([
    "wall.base.toe",
    "wall.base.heel.mean",
    "loads.strips.1",
    "loads.strips.length",
    "loads.strips.x",
    "title.length",
    "constructor.name",
    "__proto__",
    "wall.toString",
  ])("is undefined at %s", (path) => {
    expect(valueAt(tree, path)).toBeUndefined();
  });
});

describe("setting a value", () => {
  test("leaves the tree as it was and makes missing parents", () => {
    const before = structuredClone(tree);
    const result = withValueAt(tree, "water.behind.level", 1);
    expect(result).toEqual({ tree: { ...tree, water: { behind: { level: 1 } } } });
    expect(tree).toEqual(before);
  });

  test("makes a list where a place in one is named, and may add the next entry", () => {
    expect(withValueAt({}, "loads.lines.0.force", 30)).toEqual({ tree: { loads: { lines: [{ force: 30 }] } } });
    expect(valueAt((withValueAt(tree, "loads.strips.1.width", 3) as { tree: unknown }).tree, "loads.strips.1")).toEqual(
      { width: 3 },
    );
  });

  test("fills an empty parent", () => {
    expect(withValueAt({ water: null }, "water.behind.level", 1)).toEqual({
      tree: { water: { behind: { level: 1 } } },
    });
  });

  test.each([
    ["loads.strips.2.width", 'has no entry "2": loads.strips has 1, counted from 0'],
    ["loads.strips.x.width", 'has no entry "x": loads.strips has 1, counted from 0'],
    ["title.part", "leads nowhere: title is a single value"],
    ["wall..heel", "is not a path: names are joined by single dots"],
    ["", "is not a path: names are joined by single dots"],
    ["__proto__.polluted", "is not a path of a study"],
    ["wall.constructor.prototype", "is not a path of a study"],
  ])("at %s is refused", (path, message) => {
    expect(withValueAt(tree, path, 1)).toEqual({ message });
    expect(({} as Record<string, unknown>).polluted).toBeUndefined();
  });
});

test("reserved keys are those of JavaScript's own objects", () => {
  for (const key of ["__proto__", "constructor", "prototype", "toString", "hasOwnProperty"])
    expect(isReservedKey(key)).toBe(true);
  for (const key of ["sand", "fill", "proto", "value"]) expect(isReservedKey(key)).toBe(false);
});
