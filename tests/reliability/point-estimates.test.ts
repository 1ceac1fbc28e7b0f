import { expect, test } from "vitest";
import type { Marginal } from "../../src/probability/marginal.ts";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import {
  eigenvectorPointEstimates,
  mostForTwoPoints,
  twoPointEstimates,
} from "../../src/reliability/point-estimates.ts";
import { spaceOf, standardSpace, statesOf } from "./straight-line.ts";

const normal = (mean: number, sd: number): Marginal => marginalOf({ kind: "normal", mean, sd });

test("both methods give the exact moments of a sum, with correlation", () => {
  const space = spaceOf([normal(3, 1), normal(2, 0.5), normal(1, 0.2)]);
  const states = statesOf(space, { sum: ([a, b, c]) => a + 2 * b - c });
  const rho = (i: number, j: number): number => (i + j === 1 ? 0.6 : i === j ? 1 : 0);
  const variance = 1 + 1 + 0.04 + 2 * 0.6 * 1 * 1;
  for (const [found] of [twoPointEstimates(states, space, rho)!, eigenvectorPointEstimates(states, space, rho)!]) {
    expect(found.mean).toBeCloseTo(6, 12);
    expect(found.sd ** 2).toBeCloseTo(variance, 10);
  }
});

test("2n points lie √n standard deviations out, and see the mean of a square", () => {
  const space = spaceOf([normal(2, 0.1), normal(3, 0.2)]);
  const [found] = eigenvectorPointEstimates(statesOf(space, { f: ([a, b]) => a * a + b * b }), space, () => 0)!;
  expect(found.points).toBe(4);
  expect(found.mean).toBeCloseTo(4.01 + 9.04, 12);
});

test("more unknowns than a hand method can take have no two-point estimate, but 2n points", () => {
  const space = standardSpace(mostForTwoPoints + 1);
  const states = statesOf(space, { f: () => 2 });
  expect(twoPointEstimates(states, space, () => 0)).toBeUndefined();
  expect(eigenvectorPointEstimates(states, space, () => 0)![0]).toMatchObject({
    points: 26,
    sd: expect.closeTo(0, 12),
  });
});

test("every limit state has its own", () => {
  const space = standardSpace(1);
  const found = twoPointEstimates(statesOf(space, { a: () => 1.5, b: ([u]) => 2 + u }), space, () => 0)!;
  expect(found.map(({ mean, sd }) => [mean, sd])).toEqual([
    [1.5, 0],
    [2, 1],
  ]);
});
