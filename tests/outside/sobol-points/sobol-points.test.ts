import { expect, test } from "vitest";
import { sobolDimensions, sobolSequence } from "../../../src/probability/sobol-sequence.ts";
import { readCases } from "../cases.ts";

test("the first 32 points in 8 dimensions are the published ones, to the last bit", () => {
  const columns = Array.from({ length: 8 }, () => new Float64Array(32));
  sobolSequence(8).fill(columns, 32);
  const cases = readCases(new URL("cases.csv", import.meta.url));
  expect(cases.length).toBe(32);
  cases.forEach((row, i) => {
    expect(columns.map((column) => column[i])).toEqual(columns.map((_, j) => Number(row[`x${j + 1}`])));
  });
});

test("all 100 dimensions agree with another implementation over 256 points, to the last bit", () => {
  const columns = Array.from({ length: sobolDimensions }, () => new Float64Array(256));
  sobolSequence(sobolDimensions).fill(columns, 256);
  const cases = readCases(new URL("dimensions.csv", import.meta.url));
  expect(cases.length).toBe(sobolDimensions);
  cases.forEach((row, j) => {
    expect(columns[j].reduce((sum, x, i) => sum + i * x, 0)).toBe(Number(row.weighted_sum));
    expect(columns[j][255]).toBe(Number(row.x255));
  });
});
