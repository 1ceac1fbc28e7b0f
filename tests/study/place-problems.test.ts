import { expect, test } from "vitest";
import { StudyError } from "../../src/errors.ts";
import { placeProblems } from "../../src/study/place-problems.ts";

const text =
  "title: A\ncorrelations:\n  - { between: [a.b, c.d], coefficient: 0.9 }\n  - { between: [a.b, e.f], coefficient: 0.9 }\n";

test("a problem found after reading gets the file and the place of its path", () => {
  const placed = placeProblems(new StudyError([{ path: "correlations.1", message: "cannot be" }]), text, "wall.yaml");
  expect(placed.message).toBe("wall.yaml:4:5 correlations.1: cannot be");
});

test("or the place of the nearest part of its path that stands in the text, and the start of the text where nothing does", () => {
  const problems = [
    { path: "correlations.0.nothing.here", message: "one" },
    { path: "water.level", message: "two" },
  ];
  expect(placeProblems(new StudyError(problems), text, "wall.yaml").message.split("\n").sort()).toEqual([
    "wall.yaml:1:1 water.level: two",
    "wall.yaml:3:5 correlations.0.nothing.here: one",
  ]);
});

test("what has its place and file keeps them", () => {
  const error = new StudyError([{ path: "title", message: "x", at: { line: 9, column: 9 } }], "other.yaml");
  expect(placeProblems(error, text, "wall.yaml")).toBe(error);
});
