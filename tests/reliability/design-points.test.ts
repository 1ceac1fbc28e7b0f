import { describe, expect, test } from "vitest";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import { type DesignPoint, findDesignPoints } from "../../src/reliability/design-points.ts";
import type { LimitStates } from "../../src/reliability/limit-states.ts";
import { spaceOf, standardNormal, standardSpace, statesOf, statesOfMargins, straightLine } from "./straight-line.ts";

const found = (states: LimitStates, space = standardSpace(states.dimension), seed = "points"): readonly DesignPoint[] =>
  findDesignPoints(states, space, seed).states[0].points;

const drains = marginalOf({
  kind: "mixture",
  parts: [
    { share: 0.9, of: { kind: "triangular", from: 0, peak: 0.4, to: 1 } },
    { share: 0.1, of: { kind: "triangular", from: 1.5, peak: 3, to: 4.5 } },
  ],
});

describe("the search for design points", () => {
  test("finds the foot of a plane in ten dimensions, far out", () => {
    const [point, ...others] = found(straightLine(5.6, 10));
    expect(others).toEqual([]);
    expect(point.status).toBe("smooth");
    expect(point.reliabilityIndex).toBeCloseTo(5.6, 9);
    for (const value of point.point) expect(value).toBeCloseTo(5.6 / Math.sqrt(10), 5);
  });

  test("counts its evaluations where the limit states do", () => {
    const states = straightLine(3, 4);
    const search = findDesignPoints(states, standardSpace(4), "count");
    expect(search.evaluations).toBe(states.evaluations.exact + states.evaluations.batched);
    expect(search.evaluations).toBeLessThan(500);
  });

  test("the same seed gives the same bits, another seed the same points", () => {
    const [a] = found(straightLine(3, 4), undefined, "a");
    expect(found(straightLine(3, 4), undefined, "a")[0]).toEqual(a);
    expect(found(straightLine(3, 4), undefined, "b")[0].reliabilityIndex).toBeCloseTo(a.reliabilityIndex, 9);
  });

  test("finds two regions on opposite sides", () => {
    const points = found(statesOfMargins(5, { either: (u) => Math.min(3 - u[0], 3.5 + u[0] + 0.1 * u[1] ** 2) }));
    expect(points.map(({ reliabilityIndex }) => reliabilityIndex)).toEqual([
      expect.closeTo(3, 6),
      expect.closeTo(3.5, 6),
    ]);
    expect(Math.sign(points[1].point[0])).toBe(-1);
  });

  test("a corner of failure, where two pieces must fail together, is held by both", () => {
    // nearest point with u1 ≥ 2 − 0.3 u2 and u1 ≥ 2 + 0.6 u2: (2, 0)
    const [point] = found(statesOfMargins(3, { both: (u) => Math.max(2 - u[0] - 0.3 * u[1], 2 - u[0] + 0.6 * u[1]) }));
    expect(point.status).toBe("corner");
    expect(Math.abs(point.reliabilityIndex - 2)).toBeLessThan(2e-4);
  });

  test("a corner of safety, where either piece fails alone, gives the foot of each", () => {
    const g = (u: readonly number[]): number => Math.min(3 - u[0] - 0.3 * u[1], 3.02 - u[0] + 0.3 * u[1]);
    const points = found(statesOfMargins(3, { either: g }));
    const length = Math.hypot(1, 0.3);
    expect(points[0].status).toBe("smooth");
    expect(points[0].reliabilityIndex).toBeCloseTo(3 / length, 6);
    expect(points.every(({ reliabilityIndex }) => reliabilityIndex <= 3.02 / length + 1e-6)).toBe(true);
  });

  test("drains that work or are blocked: the nearer point beyond the gap is found for every seed", () => {
    const space = spaceOf([drains, standardNormal, standardNormal]);
    const factor = (x: readonly number[]): number => Math.exp(2.2 - 0.5 * x[0] - 0.4 * (x[1] + x[2]));
    for (let seed = 0; seed < 20; seed++) {
      const [nearest] = found(statesOf(space, { sliding: factor }), space, `gap ${seed}`);
      expect(nearest.status).toBe("smooth");
      expect(nearest.reliabilityIndex).toBeCloseTo(2.058208, 4);
    }
  });

  test("where failure begins with the jump itself, the side of the jump holds the point", () => {
    const space = spaceOf([drains, standardNormal]);
    const [nearest] = found(statesOf(space, { sliding: ([x, u]) => (x > 1.2 ? 0.9 : 5) - 0.01 * u }), space);
    expect(nearest.status).toBe("corner");
    expect(nearest.reliabilityIndex).toBeCloseTo(1.2815515655446004, 6); // Φ⁻¹(0.9)
  });

  test("an origin that fails has an index below zero", () => {
    const [point] = found(straightLine(-1.3, 4));
    expect(point.reliabilityIndex).toBeCloseTo(-1.3, 8);
  });

  test("nothing that fails within reach gives no point", () => {
    expect(found(statesOfMargins(3, { never: (u) => 30 - u[0] }))).toEqual([]);
    expect(found(statesOf(standardSpace(2), { flat: () => 3 }))).toEqual([]);
  });

  test("a margin without a nearest direction still gives points on the surface", () => {
    const points = found(statesOfMargins(3, { sphere: (u) => 4 - Math.hypot(...u) }));
    expect(points.length).toBeGreaterThan(1);
    for (const point of points) expect(point.reliabilityIndex).toBeCloseTo(4, 6);
  });
});
