import { expect, test } from "vitest";
import { lazyTable } from "../../src/drivers/lazy-table.ts";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import { standardNormal } from "../reliability/straight-line.ts";

test("a smooth function is met to its second derivative over 8192", () => {
  const sine = lazyTable(standardNormal, Math.sin);
  for (let u = -8.99; u < 9; u += 0.0137) expect(Math.abs(sine(u) - Math.sin(u))).toBeLessThan(1.0001 / 8192);
});

test("beyond its reach it is the function itself", () => {
  const square = lazyTable(standardNormal, (u) => u * u);
  expect(square(9.3)).toBe(9.3 * 9.3);
  expect(square(-20)).toBe(400);
});

test("nothing is computed twice, and nothing that is not asked for", () => {
  let calls = 0;
  const counted = lazyTable(standardNormal, (u) => {
    calls++;
    return u;
  });
  for (let round = 0; round < 100; round++) expect(counted(0.3)).toBeCloseTo(0.3, 14);
  expect(calls).toBe(2);
});

test("where the value of the unknown jumps nothing is smoothed over", () => {
  const gap = marginalOf({
    kind: "mixture",
    parts: [
      { share: 0.5, of: { kind: "uniform", from: 0, to: 1 } },
      { share: 0.5, of: { kind: "uniform", from: 5, to: 6 } },
    ],
  });
  expect(gap.jumps.length).toBe(1);
  const value = lazyTable(gap, (u) => gap.quantileOfNormal(u));
  expect(value(-1e-9)).toBeLessThan(1.001);
  expect(value(1e-9)).toBeGreaterThan(4.999);
});
