import { expect, test } from "vitest";
import { normalCdf } from "../../src/numeric/normal.ts";
import { findDesignPoints } from "../../src/reliability/design-points.ts";
import { curvaturesAt, secondOrder, tangents } from "../../src/reliability/second-order.ts";
import { standardSpace, statesOfMargins, straightLine } from "./straight-line.ts";

test("tangents are unit vectors at right angles to the direction and to each other", () => {
  for (const direction of [
    [1, 0, 0, 0],
    [-1, 0, 0, 0],
    [0.5, -0.5, 0.5, 0.5],
    [0, 0, 0.6, -0.8],
  ]) {
    const all = [Float64Array.from(direction), ...tangents(Float64Array.from(direction))];
    expect(all.length).toBe(4);
    all.forEach((a, i) => {
      all.forEach((b, j) => {
        expect(a.reduce((sum, value, k) => sum + value * b[k], 0)).toBeCloseTo(i === j ? 1 : 0, 12);
      });
    });
  }
});

test("a plane has no curvature, and second order is first order", () => {
  const states = straightLine(3, 5);
  const [point] = findDesignPoints(states, standardSpace(5), "plane").states[0].points;
  const { values, smooth } = curvaturesAt(states, point);
  expect(smooth).toBe(true);
  for (const value of values) expect(Math.abs(value)).toBeLessThan(1e-5);
  const found = secondOrder(3, values)!;
  expect(found.hohenbichlerRackwitz / normalCdf(-3)).toBeCloseTo(1, 4);
});

test("a kink through the point is seen, and no curvature is given", () => {
  const states = straightLine(3, 2);
  const [point] = findDesignPoints(states, standardSpace(2), "kink").states[0].points;
  const kinked = statesOfMargins(2, { bent: ([a, b]) => 3 - a + 0.3 * Math.abs(b - 0.01) });
  // its normal points along the first axis, and the kink lies on the point
  const at = { ...point, point: Float64Array.of(3, 0.01), gradient: Float64Array.of(-1, 0) };
  expect(curvaturesAt(kinked, at)).toEqual({ values: [], smooth: false });
});

test("where the point is no nearest point there is no second-order result", () => {
  expect(secondOrder(3, [-0.4])).toBeUndefined();
  expect(secondOrder(-1, [0.1])).toBeUndefined();
});
