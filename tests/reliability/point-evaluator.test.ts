import { expect, test } from "vitest";
import { between, cosine, marginOf, norm, pointEvaluator, scaled } from "../../src/reliability/point-evaluator.ts";
import { standardSpace, statesOf } from "./straight-line.ts";

test("the margin is 0 at a factor of 1, with slope 1 and curvature −1 on both sides, and bounded where contact is lost", () => {
  expect(marginOf(1)).toBe(0);
  expect(marginOf(0)).toBe(-2);
  expect(marginOf(1000)).toBeCloseTo(Math.log(1000), 12);
  const h = 1e-4;
  for (const side of [h, -h]) {
    expect(marginOf(1 + side) / side).toBeCloseTo(1, 3);
    expect((marginOf(1 + side) - side) / (side * side)).toBeCloseTo(-0.5, 3);
  }
});

test("margins rise with the factor", () => {
  const factors = [0, 0.2, 0.9, 0.999, 1, 1.001, 1.5, 40, 1000];
  const margins = factors.map(marginOf);
  expect([...margins].sort((a, b) => a - b)).toEqual(margins);
});

test("points beyond the capacity are looked at in several calls, and the system has the least margin", () => {
  const states = statesOf(standardSpace(1), { a: ([u]) => 2 + u, b: ([u]) => 2 - u }, 4);
  const evaluator = pointEvaluator(states);
  const points = Array.from({ length: 9 }, (_, i) => Float64Array.of(i / 4 - 1));
  const [a, b] = evaluator.factors(points);
  expect(Array.from(a)).toEqual(points.map(([u]) => 2 + u));
  expect(Array.from(evaluator.margins("system", points))).toEqual(points.map((_, i) => marginOf(Math.min(a[i], b[i]))));
  expect(evaluator.margins(1, points)[8]).toBeCloseTo(marginOf(1), 14);
  expect(states.evaluations).toEqual({ exact: 27, batched: 0 });
});

test("no points give no margins", () => {
  const evaluator = pointEvaluator(statesOf(standardSpace(1), { a: () => 2 }));
  expect(evaluator.margins("system", []).length).toBe(0);
});

test("lengths, angles and the way between two points", () => {
  const [a, b] = [Float64Array.of(3, 4), Float64Array.of(0, 2)];
  expect(norm(a)).toBe(5);
  expect(cosine(a, b)).toBeCloseTo(0.8, 12);
  expect(cosine(a, Float64Array.of(0, 0))).toBe(0);
  expect(Array.from(between(a, b, 0.5))).toEqual([1.5, 3]);
  expect(Array.from(scaled(a, 2))).toEqual([6, 8]);
});
