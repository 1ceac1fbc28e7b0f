import { readFileSync } from "node:fs";
import { expect, test } from "vitest";
import {
  logNormalUpper,
  normalCdf,
  normalPdf,
  normalQuantile,
  normalUpper,
  normalUpperQuantile,
} from "../../../src/numeric/normal.ts";

const lines = readFileSync(new URL("cases.csv", import.meta.url), "utf8")
  .trim()
  .split("\n")
  .slice(1);
const cases = lines.map((line) => {
  const [quantity, argument, value] = line.split(",");
  return { quantity, argument: Number(argument), value: Number(value) };
});

const functions: Record<string, [(x: number) => number, (x: number) => number]> = {
  pdf: [normalPdf, (z) => normalPdf(-z)],
  upper: [normalUpper, (z) => normalCdf(-z)],
  log_upper: [logNormalUpper, logNormalUpper],
  upper_quantile: [normalUpperQuantile, (q) => -normalQuantile(q)],
};

test.each(Object.keys(functions))("%s agrees with 50-digit arithmetic to 2e-15 over its whole range", (quantity) => {
  const rows = cases.filter((row) => row.quantity === quantity);
  expect(rows.length).toBeGreaterThan(50);
  for (const row of rows) {
    for (const value of functions[quantity]) {
      const difference = Math.abs(value(row.argument) - row.value);
      const allowed = row.value === 0 ? 0 : 2e-15 * Math.abs(row.value);
      expect(difference, `${quantity} at ${row.argument}`).toBeLessThanOrEqual(allowed);
    }
  }
});

test("normal probabilities equal the printed table of Abramowitz and Stegun", () => {
  expect(normalCdf(1)).toBeCloseTo(0.841344746068543, 15);
  expect(normalCdf(2)).toBeCloseTo(0.97724986805182, 14);
  expect(normalCdf(3)).toBeCloseTo(0.99865010196837, 15);
  expect(normalPdf(1)).toBeCloseTo(0.241970724519143, 15);
  expect(-Math.log10(normalUpper(5))).toBeCloseTo(6.54265, 5);
  expect(-Math.log10(normalUpper(10))).toBeCloseTo(23.11805, 5);
  expect(-Math.log10(normalUpper(20))).toBeCloseTo(88.5601, 5);
});
