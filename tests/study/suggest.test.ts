import { expect, test } from "vitest";
import { didYouMean, editDistance, nearest } from "../../src/study/suggest.ts";

test.each([
  ["", "", 0],
  ["heel", "heel", 0],
  ["heel", "", 4],
  ["heel", "heal", 1],
  ["widht", "width", 1], // neighbours swapped count once
  ["snad", "sand", 1],
  ["kitten", "sitting", 3],
  ["ca", "abc", 3], // optimal string alignment; the unrestricted distance is 2
])("from %s to %s is %i edits", (a, b, edits) => {
  expect(editDistance(a, b)).toBe(edits);
  expect(editDistance(b, a)).toBe(edits);
});

test("the nearest word is found whatever its case and its joints", () => {
  expect(nearest("Unit Weight", ["height", "unit_weight"])).toBe("unit_weight");
  expect(nearest("unitWeight", ["height", "unit_weight"])).toBe("unit_weight");
  expect(nearest("FRICTION-ANGLE", ["friction_angle"])).toBe("friction_angle");
});

test("a word far from all is near to none", () => {
  expect(nearest("banana", ["heel", "toe", "thickness"])).toBeUndefined();
  expect(nearest("x", [])).toBeUndefined();
  expect(nearest("y".repeat(1000), ["yyy"])).toBeUndefined();
});

test("a hint names the nearest word, or says something else", () => {
  expect(didYouMean("heal", ["heel", "toe"])).toBe('did you mean "heel"?');
  expect(didYouMean("banana", ["heel", "toe"], "known here: heel, toe")).toBe("known here: heel, toe");
});
