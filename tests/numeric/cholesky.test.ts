import { describe, expect, test } from "vitest";
import { cholesky, solveWithFactor } from "../../src/numeric/cholesky.ts";

function quadraticForm(matrix: readonly ArrayLike<number>[], v: ArrayLike<number>): number {
  let sum = 0;
  for (let i = 0; i < matrix.length; i++)
    for (let j = 0; j < matrix.length; j++) sum += v[i] * matrix[Math.max(i, j)][Math.min(i, j)] * v[j];
  return sum;
}

describe("a positive definite matrix", () => {
  const matrix = [[4], [2, 5], [-2, 1, 6]];
  const result = cholesky(matrix);
  if (!result.definite) throw new Error("refused");

  test("is the product of its factor with its transpose", () => {
    expect(result.factor.map((row) => [...row])).toEqual([
      [2, 0, 0],
      [1, 2, 0],
      [-1, 1, 2],
    ]);
  });

  test("is solved by it", () => {
    const x = solveWithFactor(result.factor, [4, 8, 5]);
    expect([4 * x[0] + 2 * x[1] - 2 * x[2], 2 * x[0] + 5 * x[1] + x[2], -2 * x[0] + x[1] + 6 * x[2]]).toEqual([
      4, 8, 5,
    ]);
  });
});

test("a matrix without full rank has a column of zeros", () => {
  const result = cholesky([[1], [1, 1], [0.5, 0.5, 1]]);
  if (!result.definite) throw new Error("refused");
  expect(result.factor[1][1]).toBe(0);
  expect([...result.factor[2]]).toEqual([0.5, 0, Math.sqrt(0.75)]);
});

test("zeros between groups stay exactly zero", () => {
  const result = cholesky([[1], [0, 1], [0.3, 0, 1], [0, 0.7, 0, 1]]);
  if (!result.definite) throw new Error("refused");
  expect(result.factor[3][0]).toBe(0);
  expect(result.factor[3][2]).toBe(0);
  expect(result.factor[2][1]).toBe(0);
});

test.each([
  ["a negative pivot", [[1], [0.9, 1], [-0.3, 0.9, 1]]],
  ["one variable twice that differs towards a third", [[1], [1, 1], [0.5, 0.1, 1]]],
  ["the same the other way", [[1], [-1, 1], [0.4, 0.4, 1]]],
])("%s is refused, with a direction in which the form is negative", (_, matrix) => {
  const result = cholesky(matrix);
  if (result.definite) throw new Error("accepted");
  expect(result.row).toBe(2);
  expect(quadraticForm(matrix, result.direction)).toBeLessThan(-1e-3);
});
