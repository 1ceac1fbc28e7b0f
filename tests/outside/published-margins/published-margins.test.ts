import { expect, test } from "vitest";
import { marginalOf } from "../../../src/probability/marginal-of.ts";
import { findDesignPoints } from "../../../src/reliability/design-points.ts";
import { importanceSampling } from "../../../src/reliability/importance-sampling.ts";
import { spaceOf, standardSpace, statesOf, statesOfMargins } from "../../reliability/straight-line.ts";

const normal = (mean: number, sd: number) => marginalOf({ kind: "normal", mean, sd });
const lognormal = (mean: number, sd: number) => marginalOf({ kind: "lognormal", mean, sd, shift: 0 });
const order = { seed: "published", precision: 0.02, samples: 200_000 };

test("frame: the index of six lognormals", () => {
  const space = spaceOf([...[1, 2, 3, 4].map(() => lognormal(120, 12)), lognormal(50, 15), lognormal(40, 12)]);
  const resisting = ([a, b, c, d]: readonly number[]): number => a + 2 * b + 2 * c + d;
  const states = statesOf(space, { frame: (x) => resisting(x) / (5 * (x[4] + x[5])) });
  const [point] = findDesignPoints(states, space, "frame").states[0].points;
  expect(Math.abs(point.reliabilityIndex - 2.348166)).toBeLessThan(1e-5);
});

test("parabola: both design points, for every seed, and the probability around them", () => {
  const states = statesOfMargins(2, { parabola: ([a, b]) => 5 - b - 0.5 * (a - 0.1) ** 2 });
  for (let seed = 0; seed < 20; seed++) {
    const { points } = findDesignPoints(states, standardSpace(2), `parabola ${seed}`).states[0];
    expect(points.map(({ reliabilityIndex }) => reliabilityIndex)).toEqual([
      expect.closeTo(2.905696, 5),
      expect.closeTo(3.094258, 5),
    ]);
    const expected = [
      [-2.740845, 0.964799],
      [2.915843, 1.035513],
    ];
    points.forEach(({ point }, i) => {
      for (const j of [0, 1]) expect(Math.abs(point[j] - expected[i][j])).toBeLessThan(5e-4);
    });
  }
  const { points } = findDesignPoints(states, standardSpace(2), "parabola").states[0];
  const found = importanceSampling(states, standardSpace(2), points, order);
  expect(Math.abs(found.probability - 3.0163119e-3)).toBeLessThan(4.9 * found.standardError);
  expect(found.standardError).toBeLessThan(0.03 * found.probability);
});

test("cantilever: index, and probability around its design point", () => {
  const space = spaceOf([normal(1000, 200), normal(250, 37.5)]);
  const states = statesOf(space, {
    // a depth of zero or less has failed
    deflection: ([x, y]) => (y > 0 ? (x > 0 ? (18.46154 * y ** 3) / (74769.23 * x) : 1000) : 0),
  });
  const { points } = findDesignPoints(states, space, "cantilever").states[0];
  expect(Math.abs(points[0].reliabilityIndex - 2.330921)).toBeLessThan(1e-5);
  const found = importanceSampling(states, space, points, order);
  expect(Math.abs(found.probability - 9.51381e-3)).toBeLessThan(4.9 * found.standardError);
});
