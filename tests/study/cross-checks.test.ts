import { expect, test } from "vitest";
import { plainWith, problemsOf, read } from "./fixtures/read.ts";

test("checks between values run beside what is wrong with single values, and do not guess about those", () => {
  const text = plainWith(
    ["height: 5.0", "height: tall"],
    ["from_toe: 1.8", "from_toe: 3.5"],
    ["    level: 0.5", "    level: 5.7"],
  );
  expect(
    problemsOf(() => read(text))
      .split("\n")
      .filter((line) => !line.startsWith("  ")),
  ).toEqual([
    '6:13 wall.stem.height: found "tall", which is not a number, with or without a unit (m, cm, mm, ft, in)',
    "14:15 wall.shear_key.from_toe: the shear key ends 3.9 m from the toe, beyond the base (3.7 m wide)",
    // the crest is unknown, so nothing is said about the water in front
  ]);
});

test("notes wait until nothing is wrong", () => {
  const text = plainWith(["unit_weight: 24", "unit_weight: 27"], ["    level: 1.0\n", "    level: -1.0\n"]);
  expect(problemsOf(() => read(text))).toContain("is below the underside");
  expect(read(plainWith(["unit_weight: 24", "unit_weight: 27"])).notices).toHaveLength(1);
});
