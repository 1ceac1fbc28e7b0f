import { describe, expect, test } from "vitest";
import { formatProblem, StudyError } from "../src/errors.ts";

describe("problems of a study", () => {
  test("are a place, a path, a message and a hint, each left out where it is missing", () => {
    expect(
      formatProblem(
        {
          path: "soils.fill.friction_angle",
          at: { line: 14, column: 21 },
          message: "340 is outside 0 to 60 degrees",
          hint: "did you mean 34.0?",
        },
        "wall.yaml",
      ),
    ).toBe("wall.yaml:14:21 soils.fill.friction_angle: 340 is outside 0 to 60 degrees\n  hint: did you mean 34.0?");
    expect(formatProblem({ path: "", message: "the file is empty" })).toBe("the file is empty");
    expect(formatProblem({ path: "a.b", message: "x" })).toBe("a.b: x");
  });

  test("are all in one error, in the order of the lines", () => {
    const error = new StudyError([
      { path: "b", message: "second", at: { line: 9, column: 1 } },
      { path: "a", message: "first", at: { line: 2, column: 5 } },
    ]);
    expect(error.message).toBe("2:5 a: first\n9:1 b: second");
    expect(error.problems.map((problem) => problem.path)).toEqual(["a", "b"]);
    expect(error.name).toBe("StudyError");
  });
});
