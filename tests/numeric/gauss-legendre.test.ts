import { expect, test } from "vitest";
import { gaussLegendre, integrate, panels } from "../../src/numeric/gauss-legendre.ts";

test("a rule of n nodes integrates powers up to 2n − 1 exactly and not the next", () => {
  for (const n of [1, 2, 5, 16, 64]) {
    const { nodes, weights } = gaussLegendre(n);
    const moment = (k: number): number => nodes.reduce((sum, x, i) => sum + weights[i] * x ** k, 0);
    for (let k = 0; k < 2 * n; k++) expect(moment(k)).toBeCloseTo(k % 2 === 0 ? 2 / (k + 1) : 0, 13);
    if (n <= 5) expect(Math.abs(moment(2 * n) - 2 / (2 * n + 1))).toBeGreaterThan(1e-4);
  }
});

test("the five-node rule has the printed nodes and weights", () => {
  // Abramowitz and Stegun (1964), table 25.4, from memory
  const { nodes, weights } = gaussLegendre(5);
  expect(nodes[4]).toBeCloseTo(0.906179845938664, 14);
  expect(nodes[3]).toBeCloseTo(0.538469310105683, 14);
  expect(weights[4]).toBeCloseTo(0.236926885056189, 14);
  expect(weights[2]).toBeCloseTo(0.568888888888889, 14);
});

test("a smooth integral comes out to the last digits", () => {
  expect(integrate(Math.exp, 0, 2)).toBeCloseTo(Math.exp(2) - 1, 13);
});

test("panels end on every break and are no wider than asked", () => {
  expect(panels(0, 1, [0.25, 5, -1], 0.5)).toEqual([0, 0.25, 0.625, 1]);
  expect(panels(-1, 1, [], 4)).toEqual([-1, 1]);
});
