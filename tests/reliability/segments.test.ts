import { expect, test } from "vitest";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import { dot } from "../../src/reliability/point-evaluator.ts";
import { segmentsOf } from "../../src/reliability/segments.ts";
import { spaceOf, standardNormal, standardSpace } from "./straight-line.ts";

const drains = marginalOf({
  kind: "mixture",
  parts: [
    { share: 0.9, of: { kind: "uniform", from: 0, to: 1 } },
    { share: 0.1, of: { kind: "uniform", from: 2, to: 3 } },
  ],
});
const jump = 1.2815515655446004; // Φ⁻¹(0.9)
const middle = (from: number, to: number): number => (from > 0 ? from + 1 : to - 1);

test("a space without jumps is one segment without sides", () => {
  const segments = segmentsOf(standardSpace(3), middle);
  expect(segments.of(Float64Array.of(9, -9, 0))).toEqual([]);
  expect(segments.sides([])).toEqual([]);
  expect(segments.otherMiddles).toEqual([]);
});

test("a jump parts space in two, along the row of its unknown", () => {
  const space = spaceOf(
    [drains, standardNormal],
    [
      [0.6, 0.8],
      [0, 1],
    ],
  );
  const segments = segmentsOf(space, middle);
  const beyond = Float64Array.of(0.6 * 1.3, 0.8 * 1.3);
  expect(segments.of(Float64Array.of(0, 0))).toEqual([0]);
  expect(segments.of(beyond)).toEqual([1]);
  const [home] = segments.sides([0]);
  expect(home.bound).toBeCloseTo(jump, 6);
  expect(dot(home.normal, beyond)).toBeGreaterThan(home.bound);
  const [far] = segments.sides([1]);
  expect(dot(far.normal, beyond)).toBeLessThan(far.bound);
  // and the start in the other segment lies there
  expect(segments.otherMiddles.map(segments.of)).toEqual([[1]]);
  expect(dot(space.rows[0], segments.otherMiddles[0])).toBeCloseTo(jump + 1, 6);
});
