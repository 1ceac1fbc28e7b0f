import { expect, test } from "vitest";
import type { Marginal } from "../../../src/probability/marginal.ts";
import { marginalOf } from "../../../src/probability/marginal-of.ts";
import { type DesignPoint, findDesignPoints } from "../../../src/reliability/design-points.ts";
import { refined } from "../../../src/reliability/first-order.ts";
import { fourBranches } from "../../reliability/four-branches.ts";
import { spaceOf, standardSpace, statesOf, statesOfMargins } from "../../reliability/straight-line.ts";

const normal = (mean: number, sd: number): Marginal => marginalOf({ kind: "normal", mean, sd });
const lognormal = (mean: number, cov: number): Marginal =>
  marginalOf({ kind: "lognormal", mean, sd: mean * cov, shift: 0 });

/** exp(margin/scale): a factor of safety that fails where the margin is below 0. */
const points = (
  marginals: readonly Marginal[],
  factor: (x: readonly number[]) => number,
  rows?: readonly (readonly number[])[],
): readonly DesignPoint[] => {
  const space = spaceOf(marginals, rows);
  const states = statesOf(space, { g: factor });
  return refined(states, findDesignPoints(states, space, "outside").states[0].points);
};

const inNormals = (g: (u: readonly number[]) => number, scale: number): readonly DesignPoint[] =>
  findDesignPoints(statesOfMargins(2, { g }, scale), standardSpace(2), "outside").states[0].points;

const six = 0.501e-6;

test.each([
  ["a", inNormals((u) => Math.exp(0.4 * (u[0] + 2) + 6.2) - Math.exp(0.3 * u[1] + 5) - 200, 500), 2.709902],
  ["c", inNormals((u) => 3 - u[1] + (4 * u[0]) ** 4, 1), 3],
  ["d", points([normal(10, 5), normal(10, 5)], ([x, y]) => Math.exp((x ** 3 + y ** 3 - 18) / 1000)), 2.240091],
  ["e", points([normal(10, 5), normal(9.9, 5)], ([x, y]) => Math.exp((x ** 3 + y ** 3 - 18) / 1000)), 2.225988],
  ["f", points([normal(10, 5), normal(10, 5)], ([x, y]) => Math.exp((x ** 4 + 2 * y ** 4 - 20) / 1e4)), 2.365454],
  ["g", points([normal(40, 5), normal(50, 2.5), normal(1000, 200)], ([y, z, m]) => (y * z) / m), 3.049073],
  [
    "h",
    points([normal(40, 5), normal(50, 2.5), normal(1000, 200)], ([y, z, m]) => (y * z) / m, [
      [1, 0, 0],
      [0.4, Math.sqrt(0.84), 0],
      [0, 0, 1],
    ]),
    2.862867,
  ],
  ["normal resistance and load", points([normal(15, 2), normal(10, 1.5)], ([r, s]) => r / s), 2],
  ["lognormal 20/10", points([lognormal(20, 0.2), lognormal(10, 0.25)], ([r, s]) => r / s), 2.22749],
  ["lognormal 3/1", points([lognormal(3, 0.15), lognormal(1, 0.3)], ([r, s]) => r / s), 3.433431],
  ["lognormal 2/1", points([lognormal(2, 0.1), lognormal(1, 0.2)], ([r, s]) => r / s), 3.191869],
])("%s: the index agrees to six decimals", (_, found, index) => {
  expect(Math.abs(found[0].reliabilityIndex - index)).toBeLessThan(six);
  expect(found[0].status).toBe("smooth");
});

test("d, f and g: the design point agrees to five decimals", () => {
  const [d] = points([normal(10, 5), normal(10, 5)], ([x, y]) => Math.exp((x ** 3 + y ** 3 - 18) / 1000));
  const [f] = points([normal(10, 5), normal(10, 5)], ([x, y]) => Math.exp((x ** 4 + 2 * y ** 4 - 20) / 1e4));
  const [g] = points([normal(40, 5), normal(50, 2.5), normal(1000, 200)], ([y, z, m]) => (y * z) / m);
  const printed = [
    [d, [-1.58398, -1.58398]],
    [f, [-1.63684, -1.70766]],
    [g, [-2.28993, -0.67668, 1.8961]],
  ] as const;
  for (const [{ point }, expected] of printed)
    expected.forEach((value, i) => {
      expect(Math.abs(point[i] - value)).toBeLessThan(0.51e-5);
    });
});

test("four branches: all four design points at distance 3 are found, for every seed", () => {
  for (let seed = 0; seed < 20; seed++) {
    const found = findDesignPoints(fourBranches(6), standardSpace(2), `branches ${seed}`).states[0].points;
    expect(found.length).toBe(4);
    for (const { reliabilityIndex } of found) expect(reliabilityIndex).toBeCloseTo(3, 5);
  }
});
