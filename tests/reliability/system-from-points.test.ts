import { expect, test } from "vitest";
import { normalCdf } from "../../src/numeric/normal.ts";
import { findDesignPoints } from "../../src/reliability/design-points.ts";
import {
  correlationOfModes,
  ditlevsenBounds,
  systemFromPoints,
  unionOfModes,
} from "../../src/reliability/system-from-points.ts";
import { standardSpace, statesOfMargins } from "./straight-line.ts";

test("two limit states at a right angle fail independently", () => {
  const states = statesOfMargins(2, { sliding: (u) => 2 - u[0], bearing: (u) => 2.5 - u[1] });
  const search = findDesignPoints(states, standardSpace(2), "right angle");
  const points = search.states.flatMap((state) => state.points);
  expect(correlationOfModes(points)[0][1]).toBeCloseTo(0, 5);
  const [p, q] = [normalCdf(-2), normalCdf(-2.5)];
  expect(systemFromPoints(points).probability / (p + q - p * q)).toBeCloseTo(1, 3);
});

test("the same failure twice counts once", () => {
  const found = unionOfModes(
    [2, 2],
    [
      [1, 1],
      [1, 1],
    ],
  );
  expect(found.probability / normalCdf(-2)).toBeCloseTo(1, 6);
  expect(found.ditlevsen[1] / normalCdf(-2)).toBeCloseTo(1, 6);
});

test("nothing to fail has probability 0", () => {
  expect(systemFromPoints([])).toEqual({ probability: 0, standardError: 0, cornell: [0, 0], ditlevsen: [0, 0] });
});

test("Ditlevsen's bounds of two modes are exact", () => {
  expect(ditlevsenBounds([0.1, 0.05], () => 0.02)).toEqual([expect.closeTo(0.13, 15), expect.closeTo(0.13, 15)]);
});
