import { expect, test } from "vitest";
import { varianceIndices } from "../../src/drivers/variance-indices.ts";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import { spaceOf, standardSpace, statesOf } from "../reliability/straight-line.ts";

const normal = (mean: number, sd: number) => marginalOf({ kind: "normal", mean, sd });
const rho = 0.5;
const correlatedRows = [
  [1, 0, 0],
  [rho, Math.sqrt(1 - rho * rho), 0],
  [0, 0, 1],
];

test("under correlation they are what knowing one alone, or all but one, takes away: closed form of a sum", () => {
  const space = spaceOf([normal(10, 1), normal(10, 2), normal(10, 1)], correlatedRows);
  const [found] = varianceIndices(statesOf(space, { sum: ([x, y, z]) => x + y + z }), space, { seed: "sum" });
  // Var = 1 + 4 + 1 + 2·ρ·2 = 8; E[F | x1] moves by (1 + ρ·2) u1; x1 alone moves it by √(1 − ρ²)
  expect(found.correlated).toBe(true);
  expect(found.variance).toBeCloseTo(8, 0);
  const expectedFirst = [(1 + 2 * rho) ** 2 / 8, (2 + rho) ** 2 / 8, 1 / 8];
  const expectedTotal = [(1 - rho * rho) / 8, (4 * (1 - rho * rho)) / 8, 1 / 8];
  for (let i = 0; i < 3; i++) {
    // sixteen replicates of 1024 quasi-random points: an error of 0.01 would be far outside
    expect(Math.abs(found.first[i].value - expectedFirst[i])).toBeLessThan(0.01);
    expect(Math.abs(found.total[i].value - expectedTotal[i])).toBeLessThan(0.01);
  }
});

test("the same seed gives the same bits, another the same within the intervals", () => {
  const space = standardSpace(2);
  const of = (seed: string) =>
    varianceIndices(statesOf(space, { f: ([a, b]) => 5 + a + a * b }), space, { seed, points: 256 });
  expect(of("a")).toEqual(of("a"));
  const [one, other] = [of("a")[0], of("b")[0]];
  expect(one.first[0].value).not.toBe(other.first[0].value);
  expect(Math.abs(one.first[0].value - other.first[0].value)).toBeLessThan(0.1);
});

test("where factors reach the cap, the indices are of the margin", () => {
  const space = standardSpace(2);
  const [found] = varianceIndices(statesOf(space, { f: ([a, b]) => Math.exp(3 * a + b) }), space, { seed: "cap" });
  expect(found.of).toBe("margin");
  // ln F = 3 a + b above 1; below it the margin is bounded, so only nearly 0.9
  expect(found.first[0].value).toBeGreaterThan(0.8);
});

test("an unknown without influence has index 0, and a factor that nothing moves has no index at all", () => {
  const space = standardSpace(2);
  const [a, b] = varianceIndices(statesOf(space, { one: ([x]) => 10 + x, none: () => 2 }), space, { seed: "none" });
  expect(Math.abs(a.total[1].value)).toBeLessThan(1e-12);
  expect(a.first[0].value).toBeCloseTo(1, 2);
  expect(b.first.map(({ value }) => value)).toEqual([0, 0]);
  expect(b.variance).toBe(0);
});

test("beyond the dimensions of the sequence points are random, and the result stands", () => {
  const space = standardSpace(60);
  const f = (u: readonly number[]): number => 100 + 2 * u[0] + u[59];
  const [found] = varianceIndices(statesOf(space, { f }), space, { seed: "many", points: 128 });
  expect(found.first[0].interval[0]).toBeLessThan(0.8);
  expect(found.first[0].interval[1]).toBeGreaterThan(0.8);
  expect(Math.abs(found.total[59].value - 0.2)).toBeLessThan(0.05);
});
