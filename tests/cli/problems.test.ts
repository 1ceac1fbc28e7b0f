import { expect, test } from "vitest";
import { problemText } from "../../src/cli/problems.ts";
import { StudyError } from "../../src/errors.ts";

test("each problem has its place, the line, a caret under the column and its hint; the end counts them", () => {
  const text = "title: Bay 3\nwall:\n  stem: { height: 340 }\n";
  const error = new StudyError(
    [
      {
        path: "wall.stem.height",
        at: { line: 3, column: 19 },
        message: "340 m is outside 0.01 to 100 m",
        hint: "did you mean 3.4?",
      },
      { path: "soils", at: { line: 1, column: 1 }, message: "is missing" },
    ],
    "bay.yaml",
  );
  expect(problemText(error, text)).toBe(`bay.yaml:1:1 soils: is missing
  1 | title: Bay 3
    | ^

bay.yaml:3:19 wall.stem.height: 340 m is outside 0.01 to 100 m
  3 |   stem: { height: 340 }
    |                   ^
  hint: did you mean 3.4?

2 problems in the study; nothing was computed and nothing was written.
`);
});

test("a problem without a place, or beyond the text, is told without a line", () => {
  const error = new StudyError([
    { path: "a.b", message: "is wrong" },
    { path: "", at: { line: 9, column: 1 }, message: "ends early" },
  ]);
  expect(problemText(error, "one line")).toBe(
    "a.b: is wrong\n\n9:1 ends early\n\n2 problems in the study; nothing was computed and nothing was written.\n",
  );
});

test("of a very long line the part around the place is shown, and the caret stands under it", () => {
  const text = `${"x".repeat(300)}HERE${"y".repeat(300)}`;
  const lines = problemText(new StudyError([{ path: "", at: { line: 1, column: 301 }, message: "m" }]), text).split(
    "\n",
  );
  expect(lines[1].length).toBeLessThan(120);
  expect(lines[1].slice(lines[2].indexOf("^"))).toMatch(/^HERE/);
});

test("the caret stands right after tabs, with Windows line ends, and where control characters hide", () => {
  const text = "a: 1\r\n\tb: \u001b[2J2\r\n";
  const shown = problemText(new StudyError([{ path: "b", at: { line: 2, column: 5 }, message: "m" }]), text);
  expect(shown).toContain("  2 |  b: \ufffd[2J2\n    |     ^\n");
});
