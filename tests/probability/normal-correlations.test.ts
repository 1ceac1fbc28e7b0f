import { expect, test } from "vitest";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import {
  correlationMatrix,
  factorByName,
  normalCorrelations,
  worstPair,
} from "../../src/probability/normal-correlations.ts";

const normal = marginalOf({ kind: "normal", mean: 0, sd: 1 });
const uniform = marginalOf({ kind: "uniform", from: 0, to: 1 });
const unknowns = [
  { path: "a", marginal: normal },
  { path: "b", marginal: uniform },
  { path: "c", marginal: uniform },
];

test("the study's coefficients become those of the normals, and keep their place for messages", () => {
  const { pairs, problems, notices } = normalCorrelations(unknowns, [
    { between: ["a", "b"], coefficient: 0.5 },
    { between: ["c", "b"], coefficient: -0.3 },
  ]);
  expect([problems, notices]).toEqual([[], []]);
  expect(pairs.map(({ first, second, path, stated }) => [first, second, path, stated])).toEqual([
    [0, 1, "correlations.0", 0.5],
    [2, 1, "correlations.1", -0.3],
  ]);
  expect(pairs[0].coefficient).toBeCloseTo(0.5 * Math.sqrt(Math.PI / 3), 9);
  expect(pairs[1].coefficient).toBeCloseTo(2 * Math.sin((-Math.PI * 0.3) / 6), 14);
});

test("all that is wrong comes at once", () => {
  const { problems } = normalCorrelations(unknowns, [
    { between: ["a", "b"], coefficient: 0.99 }, // a normal and a uniform variable reach √(3/π) = 0.977
    { between: ["b", "b"], coefficient: 0.1 },
  ]);
  expect(problems.map(({ path, message }) => `${path}: ${message}`)).toEqual([
    "correlations.0: a and b cannot have a correlation of 0.99: their distributions allow -0.977 to 0.977",
    "correlations.1: b and b: a variable has no correlation with itself",
  ]);
});

test("rows follow the names, whatever the order of the study", () => {
  const pairs = [{ first: 0, second: 1, coefficient: 0.6 }];
  const straight = factorByName(correlationMatrix(2, pairs), ["a", "b"]);
  const turned = factorByName(correlationMatrix(2, pairs), ["b", "a"]);
  if (!("rows" in straight && "rows" in turned)) throw new Error("refused");
  expect(straight.rows.map((row) => [...row])).toEqual([
    [1, 0],
    [0.6, 0.8],
  ]);
  expect(turned.rows.map((row) => [...row])).toEqual([
    [0.8, 0.6],
    [0, 1],
  ]);
});

test("the pair blamed is the one that does most", () => {
  const pair = (first: number, second: number, coefficient: number) => ({
    first,
    second,
    coefficient,
    stated: coefficient,
    path: `${first}${second}`,
  });
  const pairs = [pair(0, 1, 0.5), pair(1, 2, 0.9), pair(0, 2, -0.9)];
  expect(worstPair(pairs, [1, -0.2, 1])?.path).toBe("02");
  expect(worstPair([], [1])).toBeUndefined();
});
