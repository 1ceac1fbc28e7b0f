import { expect, test } from "vitest";
import { centralGradient, refineSmoothPoint, searchDesignPoint } from "../../src/reliability/design-point.ts";
import { norm, type Point } from "../../src/reliability/point-evaluator.ts";
import { segmentsOf } from "../../src/reliability/segments.ts";
import { standardSpace } from "./straight-line.ts";

const none = segmentsOf(standardSpace(2), () => 0);
const marginsOf =
  (g: (z: Point) => number) =>
  (points: readonly Point[]): Float64Array =>
    Float64Array.from(points, g);
const origin = Float64Array.of(0, 0);

test("a plane is met in a few steps", () => {
  const found = searchDesignPoint(
    marginsOf(([a, b]) => 5 - 0.6 * a - 0.8 * b),
    none,
    origin,
  );
  expect(found.status).toBe("smooth");
  expect(found.iterations).toBeLessThan(6);
  expect(Array.from(found.point)).toEqual([expect.closeTo(3, 5), expect.closeTo(4, 5)]);
});

test("a surface that bends sharply is met all the same", () => {
  const found = searchDesignPoint(
    marginsOf(([a, b]) => 3 - a + 2 * b * b),
    none,
    Float64Array.of(1, 2),
  );
  expect(found.status).toBe("smooth");
  expect(norm(found.point)).toBeCloseTo(3, 5);
});

test("a search that comes near to a known point ends there and says none", () => {
  const g = marginsOf(([a, b]) => 3 - a + 0.3 * b * b);
  const start = Float64Array.of(0, 1);
  expect(searchDesignPoint(g, none, start).status).toBe("smooth");
  expect(searchDesignPoint(g, none, start, [Float64Array.of(3, 0)]).status).toBe("none");
});

test("without a slope there is nowhere to go", () => {
  expect(
    searchDesignPoint(
      marginsOf(() => 1),
      none,
      origin,
    ).status,
  ).toBe("none");
});

test("refining gives more digits where full steps swing out", () => {
  const g = marginsOf(([a, b]) => 3 - a - 0.3 * b + 1.5 * b * b);
  const start = searchDesignPoint(g, none, origin);
  const { point } = refineSmoothPoint(g, start);
  const gradient = centralGradient(g, point);
  // the gradient points at the origin, and the point lies on the surface
  expect(Math.abs(point[0] * gradient[1] - point[1] * gradient[0])).toBeLessThan(1e-6);
  expect(Math.abs(g([point])[0])).toBeLessThan(1e-9);
});
