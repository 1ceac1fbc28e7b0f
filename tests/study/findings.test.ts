import { describe, expect, test } from "vitest";
import { collectFindings, type Places, withoutEchoes } from "../../src/study/findings.ts";

const places: Places = (path, part) => {
  if (path === "set") return null;
  if (path === "wall") return { line: 2, column: part === "key" ? 1 : 7 };
  if (path === "list.0" && part === "value") return { line: 5, column: 3 };
  return path === "" ? { line: 1, column: 1 } : undefined;
};

describe("a problem", () => {
  test("stands at its value, its key, or the nearest parent that is in the file", () => {
    const findings = collectFindings(places);
    findings.problem("wall", "value");
    findings.keyProblem("wall", "key");
    findings.problem("wall.base.heel", "is missing");
    findings.problem("list.0.part", "is missing");
    findings.problem("other", "is missing");
    findings.problem("set.part", "is wrong");
    findings.placedProblem({ line: 9, column: 9 }, "x", "there");
    expect(findings.problems.map(({ at }) => (at ? `${at.line}:${at.column}` : "nowhere"))).toEqual([
      "2:7",
      "2:1",
      "2:1",
      "5:3",
      "1:1",
      "nowhere",
      "9:9",
    ]);
  });

  test("is told once, as a note is", () => {
    const findings = collectFindings(places);
    for (let i = 0; i < 3; i++) {
      findings.problem("wall", "is wrong", "a hint");
      findings.notice("wall", "is odd");
    }
    expect(findings.problems).toEqual([
      { path: "wall", at: { line: 2, column: 7 }, message: "is wrong", hint: "a hint" },
    ]);
    expect(findings.notices).toEqual([{ path: "wall", message: "is odd" }]);
  });

  test("beyond the two hundredth is only counted", () => {
    const findings = collectFindings(places);
    for (let i = 0; i < 250; i++) findings.problem(`k${i}`, "is wrong");
    expect(findings.problems).toHaveLength(201);
    expect(findings.problems[200].message).toBe("has 50 more problems than are listed here");
  });
});

test("a misspelt key is not told again as a missing one", () => {
  const misspelt = { path: "wall.base.heal", message: 'unknown key "heal"', hint: 'did you mean "heel"?' };
  const echo = { path: "wall.base.heel", message: "is missing (length of the heel)" };
  const other = { path: "wall.base.toe", message: "is missing (length of the toe)" };
  expect(withoutEchoes([misspelt, echo, other])).toEqual([misspelt, other]);
});
