import { expect, test } from "vitest";
import { normalUpper } from "../../../src/numeric/normal.ts";
import type { Marginal } from "../../../src/probability/marginal.ts";
import { marginalOf } from "../../../src/probability/marginal-of.ts";
import { type BestOfMethods, bestEstimate } from "../../../src/reliability/best-estimate.ts";
import type { LimitStates } from "../../../src/reliability/limit-states.ts";
import { fourBranches } from "../../reliability/four-branches.ts";
import { spaceOf, standardSpace, statesOf, statesOfMargins, straightLine } from "../../reliability/straight-line.ts";
import { readCases } from "../cases.ts";

const normal = (mean: number, sd: number): Marginal => marginalOf({ kind: "normal", mean, sd });
const lognormal = (mean: number, sd: number): Marginal => marginalOf({ kind: "lognormal", mean, sd, shift: 0 });

type Case = readonly [name: string, estimate: () => BestOfMethods, expected: number];
const order = { seed: "closed", precision: 0.05, samples: 150_000 };

const inNormals = (name: string, states: LimitStates, expected: number, samples = order.samples): Case => [
  name,
  () => bestEstimate(states, standardSpace(states.dimension), { ...order, samples }),
  expected,
];
const inValues = (
  name: string,
  marginals: readonly Marginal[],
  factor: (x: readonly number[]) => number,
  expected: number,
): Case => {
  const space = spaceOf(marginals);
  return [name, () => bestEstimate(statesOf(space, { factor }), space, order), expected];
};
const rows = (folder: string) => readCases(new URL(`../${folder}/cases.csv`, import.meta.url));

const ratio = ([r, s]: readonly number[]): number => (s > 0 ? r / s : 1000);
const cubes = ([x, y]: readonly number[]): number => Math.exp((x ** 3 + y ** 3 - 18) / 1000);
const oscillator = ([c1, c2, m, r, t, force]: readonly number[]): number => {
  const stiffness = c1 + c2;
  return (3 * r) / Math.abs(((2 * force) / stiffness) * Math.sin((Math.sqrt(stiffness / m) * t) / 2));
};
const oscillating = (mean: number, sd: number): readonly Marginal[] => [
  normal(1, 0.1),
  normal(0.1, 0.01),
  normal(1, 0.05),
  normal(0.5, 0.05),
  normal(1, 0.2),
  normal(mean, sd),
];

const closedForms: readonly Case[] = [
  inValues("normal R − S", [normal(15, 2), normal(10, 1.5)], ratio, 2.275013e-2),
  inValues("lognormal 20/10", [lognormal(20, 4), lognormal(10, 2.5)], ratio, 1.295728e-2),
  inValues("lognormal 3/1", [lognormal(3, 0.45), lognormal(1, 0.3)], ratio, 2.979966e-4),
  inValues("lognormal 2/1", [lognormal(2, 0.2), lognormal(1, 0.2)], ratio, 7.067778e-4),
  ...[2.5, 4.5].map((b) => inNormals(`hyperplane ${b}`, straightLine(b, 12), normalUpper(b))),
  ...rows("hyperspheres").map(({ n, radius, Pf_outside }) =>
    inNormals(
      `sphere of ${radius} in ${n}`,
      statesOfMargins(Number(n), { sphere: (u) => Number(radius) - Math.hypot(...u) }),
      Number(Pf_outside),
      // no point stands out, so that all that is allowed is used
      50_000,
    ),
  ),
];

const components: readonly Case[] = [
  inNormals(
    "exponentials",
    statesOfMargins(2, { a: ([x, y]) => Math.exp(0.4 * (x + 2) + 6.2) - Math.exp(0.3 * y + 5) - 200 }, 500),
    3.621505e-3,
  ),
  inNormals("a narrow valley", statesOfMargins(2, { c: ([x, y]) => 3 - y + (4 * x) ** 4 }), 1.781589e-4),
  inValues("cubes", [normal(10, 5), normal(10, 5)], cubes, 5.48762e-3),
  inValues("cubes, unequal", [normal(10, 5), normal(9.9, 5)], cubes, 5.708461e-3),
  inValues(
    "fourth powers",
    [normal(10, 5), normal(10, 5)],
    ([x, y]) => Math.exp((x ** 4 + 2 * y ** 4 - 20) / 1e4),
    1.852524e-3,
  ),
  inValues(
    "plastic moment",
    [normal(40, 5), normal(50, 2.5), normal(1000, 200)],
    ([y, z, m]) => (m > 0 ? (y * z) / m : 1000),
    1.176882e-3,
  ),
  inNormals("four branches", fourBranches(6), 4.457331e-3),
];

const paraboloids: readonly Case[] = rows("paraboloids").map(({ beta, curvatures, Pf_exact }) => {
  const k = curvatures.split(" ").map(Number);
  const last = k.length;
  const g = (u: readonly number[]): number => {
    let margin = Number(beta) - u[last];
    for (let i = 0; i < last; i++) margin += 0.5 * k[i] * u[i] * u[i];
    return margin;
  };
  return inNormals(`paraboloid ${beta}, ${curvatures}`, statesOfMargins(last + 1, { g }), Number(Pf_exact));
});

const published: readonly Case[] = [
  inValues(
    "frame",
    [...[1, 2, 3, 4].map(() => lognormal(120, 12)), lognormal(50, 15), lognormal(40, 12)],
    ([a, b, c, d, e, f]) => (a + 2 * b + 2 * c + d) / (5 * (e + f)),
    1.2205183e-2,
  ),
  inNormals("parabola", statesOfMargins(2, { p: ([a, b]) => 5 - b - 0.5 * (a - 0.1) ** 2 }), 3.0163119e-3),
  inValues(
    "cantilever",
    [normal(1000, 200), normal(250, 37.5)],
    ([x, y]) => (y > 0 ? (x > 0 ? (18.46154 * y ** 3) / (74769.23 * x) : 1000) : 0),
    9.51381e-3,
  ),
  inValues("oscillator", oscillating(1, 0.2), oscillator, 2.8595594e-2),
  inValues("oscillator, rare", oscillating(0.6, 0.1), oscillator, 9.130976e-6),
  inValues("oscillator, rarer", oscillating(0.45, 0.075), oscillator, 1.5144407e-8),
];

/** Four of its own standard errors: one case in 16 000 is outside. */
test.each([
  ["closed forms", closedForms],
  ["nonlinear components and a series system", components],
  ["paraboloids", paraboloids],
  ["published problems", published],
] as const)("the best estimate is within its stated error: %s", (_, cases) => {
  const covered = cases.map(([name, estimate, expected]) => {
    const { probability, standardError, interval, crossCheck } = estimate();
    expect(Math.abs(probability - expected), name).toBeLessThan(4 * standardError);
    expect(crossCheck?.agrees, name).toBe(true);
    return interval[0] <= expected && expected <= interval[1];
  });
  // of 21, 7, 21 and 6: fewer are covered once in 2000 sets of seeds at worst
  expect(covered.filter(Boolean).length).toBeGreaterThanOrEqual(cases.length - 4);
});
