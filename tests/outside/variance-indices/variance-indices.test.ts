import { expect, test } from "vitest";
import { type VarianceIndex, type VarianceIndices, varianceIndices } from "../../../src/drivers/variance-indices.ts";
import { marginalOf } from "../../../src/probability/marginal-of.ts";
import { spaceOf, statesOf } from "../../reliability/straight-line.ts";
import { readCases } from "../cases.ts";

const rows = readCases(new URL("cases.csv", import.meta.url));
const numbers = (text: string): readonly number[] => text.split(" ").map(Number);

function ishigami([a, b]: readonly number[]): VarianceIndices {
  const space = spaceOf(Array.from({ length: 3 }, () => marginalOf({ kind: "uniform", from: -Math.PI, to: Math.PI })));
  const f = ([x, y, z]: readonly number[]): number =>
    30 + Math.sin(x) + a * Math.sin(y) ** 2 + b * z ** 4 * Math.sin(x);
  return varianceIndices(statesOf(space, { f }), space, { seed: "ishigami", points: 1024 })[0];
}

function gFunction(a: readonly number[]): VarianceIndices {
  const space = spaceOf(a.map(() => marginalOf({ kind: "uniform", from: 0, to: 1 })));
  const f = (x: readonly number[]): number =>
    x.reduce((product, value, i) => (product * (Math.abs(4 * value - 2) + a[i])) / (1 + a[i]), 1);
  return varianceIndices(statesOf(space, { f }), space, { seed: "g", points: 1024 })[0];
}

/** Student's t of 15 degrees of freedom at 97.5 %, with which the intervals are made. */
const t = 2.131449545559323;

function close(found: VarianceIndex, expected: number, what: string): void {
  const standardError = (found.interval[1] - found.value) / t;
  expect(Math.abs(found.value - expected), what).toBeLessThan(5 * standardError + 2e-3);
}

test("first-order and total indices agree with the closed forms within their error", () => {
  expect(rows.length).toBe(4);
  for (const row of rows) {
    const found = row.function === "g" ? gFunction(numbers(row.parameters)) : ishigami(numbers(row.parameters));
    numbers(row.first).forEach((expected, i) => {
      close(found.first[i], expected, `${row.function} ${row.parameters} first ${i}`);
    });
    numbers(row.total).forEach((expected, i) => {
      close(found.total[i], expected, `${row.function} ${row.parameters} total ${i}`);
    });
    if (row.variance !== "") expect(Math.abs(found.variance / Number(row.variance) - 1)).toBeLessThan(0.02);
    // and the error is small enough to say something
    for (const { value, interval } of [...found.first, ...found.total]) expect(interval[1] - value).toBeLessThan(0.03);
  }
});
