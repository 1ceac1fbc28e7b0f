import fc from "fast-check";
import { expect, test } from "vitest";
import { nearestPoint, nonnegativeLeastSquares } from "../../src/numeric/nonnegative-least-squares.ts";

const dot = (a: ArrayLike<number>, b: ArrayLike<number>): number => {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += a[i] * b[i];
  return sum;
};

test("without a binding bound it is the plain least-squares solution", () => {
  const { x, residual } = nonnegativeLeastSquares(
    [
      [1, 0, 1],
      [0, 1, 1],
    ],
    [1, 2, 3],
  );
  expect(Array.from(x)).toEqual([expect.closeTo(1, 12), expect.closeTo(2, 12)]);
  expect(Math.hypot(...residual)).toBeLessThan(1e-12);
});

test("an entry that would be negative is 0", () => {
  const { x } = nonnegativeLeastSquares(
    [
      [1, 0],
      [1, 1],
    ],
    [-1, 1],
  );
  expect(x[0]).toBe(0);
  expect(x[1]).toBe(0);
});

test("nothing points the right way: all entries are 0", () => {
  expect(Array.from(nonnegativeLeastSquares([[-1, 0]], [1, 0]).x)).toEqual([0]);
  expect(nonnegativeLeastSquares([], [1]).x.length).toBe(0);
});

test("two columns that are the same do no harm", () => {
  const { residual } = nonnegativeLeastSquares(
    [
      [1, 1],
      [1, 1],
      [1, 0],
    ],
    [2, 1],
  );
  expect(Math.hypot(...residual)).toBeLessThan(1e-10);
});

test("the conditions of the minimum hold: no negative entry, and no descent along any column", () => {
  const entry = fc.double({ min: -3, max: 3, noNaN: true });
  fc.assert(
    fc.property(
      fc
        .integer({ min: 1, max: 6 })
        .chain((rows) =>
          fc.tuple(
            fc.array(fc.array(entry, { minLength: rows, maxLength: rows }), { minLength: 1, maxLength: 8 }),
            fc.array(entry, { minLength: rows, maxLength: rows }),
          ),
        ),
      ([columns, f]) => {
        const { x, residual } = nonnegativeLeastSquares(columns, f);
        for (let j = 0; j < columns.length; j++) {
          expect(x[j]).toBeGreaterThanOrEqual(0);
          const slope = dot(columns[j], residual);
          expect(slope).toBeLessThan(1e-7);
          if (x[j] > 0) expect(slope).toBeGreaterThan(-1e-7);
        }
      },
    ),
    { seed: 11, numRuns: 500 },
  );
});

test("the nearest point of a half-space is the foot of its normal", () => {
  const found = nearestPoint([[-3, -4]], [-10]);
  expect(found.feasible).toBe(true);
  if (!found.feasible) return;
  expect(Array.from(found.point)).toEqual([expect.closeTo(1.2, 12), expect.closeTo(1.6, 12)]);
  expect(found.multipliers[0]).toBeCloseTo(0.4, 12);
});

test("the nearest point of a corner meets both bounds", () => {
  const found = nearestPoint(
    [
      [-1, 0.5],
      [-1, -0.5],
    ],
    [-2, -2],
  );
  if (!found.feasible) throw new Error("no point");
  expect(Array.from(found.point)).toEqual([expect.closeTo(2, 12), expect.closeTo(0, 12)]);
  expect(Array.from(found.multipliers)).toEqual([expect.closeTo(1, 12), expect.closeTo(1, 12)]);
});

test("the origin itself is nearest where it meets every bound", () => {
  const found = nearestPoint([[1, 2]], [3]);
  expect(found).toEqual({ feasible: true, point: Float64Array.of(0, 0), multipliers: Float64Array.of(0) });
});

test("half-spaces without a common point have none", () => {
  expect(
    nearestPoint(
      [
        [1, 0],
        [-1, 0],
      ],
      [-1, -1],
    ).feasible,
  ).toBe(false);
});

test("the nearest point is the combination of its normals that the multipliers say", () => {
  const entry = fc.double({ min: -2, max: 2, noNaN: true });
  const row = fc.array(entry, { minLength: 4, maxLength: 4 });
  fc.assert(
    fc.property(fc.array(row, { minLength: 1, maxLength: 6 }), row, (normals, inside) => {
      // bounds that `inside` meets, so that there is a point
      const bounds = normals.map((normal) => dot(normal, inside));
      const found = nearestPoint(normals, bounds);
      if (!found.feasible) throw new Error("no point");
      for (let i = 0; i < 4; i++) {
        const combined = normals.reduce((sum, normal, j) => sum - found.multipliers[j] * normal[i], 0);
        expect(found.point[i]).toBeCloseTo(combined, 6);
      }
      normals.forEach((normal, j) => {
        expect(dot(normal, found.point)).toBeLessThan(bounds[j] + 1e-6);
      });
      expect(Math.hypot(...found.point)).toBeLessThan(Math.hypot(...inside) + 1e-6);
    }),
    { seed: 12, numRuns: 300 },
  );
});
