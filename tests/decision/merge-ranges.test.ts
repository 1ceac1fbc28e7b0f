import { expect, test } from "vitest";
import { mergeRanges } from "../../src/decision/merge-ranges.ts";

const range = (from: number, to: number, chance: number, choice: string) => ({ from, to, chance, choice });
const same = (a: string, b: string): boolean => a === b;

test("neighbours with the same choice become one range", () => {
  expect(mergeRanges([range(0, 1, 0.5, "a"), range(1, 2, 0.2, "a"), range(2, 3, 0.3, "b")], same, 0)).toEqual([
    range(0, 2, 0.7, "a"),
    range(2, 3, 0.3, "b"),
  ]);
});

test("a range that is next to impossible joins the likelier of its neighbours", () => {
  const found = mergeRanges([range(0, 1, 0.6, "a"), range(1, 2, 1e-6, "b"), range(2, 3, 0.399999, "c")], same, 1e-4);
  expect(found.map(({ choice }) => choice)).toEqual(["a", "c"]);
  expect(found[0].to).toBe(2);
});
