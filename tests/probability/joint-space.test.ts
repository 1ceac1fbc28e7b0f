import { describe, expect, test } from "vitest";
import { StudyError } from "../../src/errors.ts";
import { jointSpace, type StatedUnknown } from "../../src/probability/joint-space.ts";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import type { Correlation } from "../../src/study/study.ts";

function unknown(path: string, more: Partial<StatedUnknown> = {}): StatedUnknown {
  return { path, marginal: marginalOf({ kind: "normal", mean: 30, sd: 3 }), yearly: false, ...more };
}

function between(first: string, second: string, coefficient: number): Correlation {
  return { between: [first, second], coefficient };
}

function covariance(rows: readonly Float64Array[]): number[][] {
  return rows.map((a) => rows.map((b) => a.reduce((sum, x, i) => sum + x * b[i], 0)));
}

function problemsOf(make: () => unknown): readonly { path: string; message: string }[] {
  try {
    make();
  } catch (error) {
    if (error instanceof StudyError) return error.problems;
    throw error;
  }
  return [];
}

describe("without the split", () => {
  test("there is one coordinate for an unknown, and its key is the path", () => {
    const space = jointSpace([unknown("b"), unknown("a")], [], false);
    expect(space.coordinates).toEqual([
      { key: "b", part: "knowledge", yearly: false },
      { key: "a", part: "knowledge", yearly: false },
    ]);
    expect(space.rows.map((row) => [...row])).toEqual([
      [1, 0],
      [0, 1],
    ]);
  });

  test("the rows give the correlation of the normals, and have unit length", () => {
    const correlations = [between("a", "b", 0.5), between("b", "c", -0.4), between("a", "c", 0.2)];
    const space = jointSpace([unknown("c"), unknown("a"), unknown("b")], correlations, false);
    const found = covariance(space.rows);
    const expected = [
      [1, 0.2, -0.4],
      [0.2, 1, 0.5],
      [-0.4, 0.5, 1],
    ];
    for (let i = 0; i < 3; i++) for (let j = 0; j < 3; j++) expect(found[i][j]).toBeCloseTo(expected[i][j], 14);
    expect(space.correlation.map((row) => [...row])).toEqual(expected);
  });

  test("neither an unrelated variable nor another order changes a row by a single bit", () => {
    const correlations = [between("m", "k", 0.3), between("m", "p", 0.6)];
    const rowOf = (paths: string[], path: string): Record<string, number> => {
      const space = jointSpace(
        paths.map((name) => unknown(name)),
        correlations,
        false,
      );
      const row = space.rows[paths.indexOf(path)];
      return Object.fromEntries(
        space.coordinates.map(({ key }, i) => [key, row[i]]).filter(([, weight]) => weight !== 0),
      );
    };
    const before = ["k", "m", "p"].map((path) => rowOf(["k", "m", "p"], path));
    expect(["k", "m", "p"].map((path) => rowOf(["p", "zz", "m", "aa", "k", "l"], path))).toEqual(before);
    expect(Object.keys(rowOf(["p", "zz", "m", "aa", "k", "l"], "zz"))).toEqual(["zz"]);
  });

  test("variables that are one are allowed: a correlation of 1 leaves a matrix without full rank", () => {
    const correlations = [between("a", "b", 1), between("b", "c", 0.5), between("a", "c", 0.5)];
    const found = covariance(jointSpace([unknown("a"), unknown("b"), unknown("c")], correlations, false).rows);
    expect(found[0][1]).toBeCloseTo(1, 12);
    expect(found[1][2]).toBeCloseTo(0.5, 12);
  });
});

describe("refusals name the correlation and its pair", () => {
  test("a pair whose distributions do not allow it, with what they allow", () => {
    const skewed = unknown("b", { marginal: marginalOf({ kind: "gamma", mean: 1, sd: 1 }) });
    const flat = unknown("a", { marginal: marginalOf({ kind: "uniform", from: 0, to: 1 }) });
    expect(problemsOf(() => jointSpace([flat, skewed], [between("a", "b", 0.9)], false))).toMatchObject([
      {
        path: "correlations.0",
        message: "a and b cannot have a correlation of 0.9: their distributions allow -0.866 to 0.866",
      },
    ]);
  });

  test("a matrix that is not positive definite", () => {
    const correlations = [
      between("a", "b", 0.9),
      between("b", "c", 0.9),
      between("a", "c", -0.3),
      between("c", "d", 0.1),
    ];
    const [problem] = problemsOf(() =>
      jointSpace(
        ["a", "b", "c", "d"].map((path) => unknown(path)),
        correlations,
        false,
      ),
    );
    expect(problem.path).toBe("correlations.0");
    expect(problem.message).toBe(
      "a and b cannot have a correlation of 0.9 beside the others: b with c 0.9, a with c -0.3",
    );
  });

  test("variables that are one but differ towards a third", () => {
    const correlations = [between("a", "b", 1), between("a", "c", 0.5), between("b", "c", 0.1)];
    const [problem] = problemsOf(() =>
      jointSpace(
        ["a", "b", "c"].map((path) => unknown(path)),
        correlations,
        false,
      ),
    );
    expect(problem.message).toMatch(/cannot have a correlation of/);
  });

  test("a pair that stands twice and a variable with itself, together", () => {
    const correlations = [between("a", "b", 0.1), between("b", "a", 0.2), between("a", "a", 1)];
    expect(
      problemsOf(() => jointSpace([unknown("a"), unknown("b")], correlations, false)).map(({ message }) => message),
    ).toEqual([
      "b and a: the pair stands in correlations.0 already",
      "a and a: a variable has no correlation with itself",
    ]);
  });

  test("a certain number in a pair is a notice, not a refusal", () => {
    expect(jointSpace([unknown("a")], [between("a", "wall.unit_weight", 0.5)], false).notices).toEqual([
      { path: "correlations.0", message: "the correlation has no effect: wall.unit_weight is a certain number" },
    ]);
  });
});
