import { expect, test } from "vitest";
import { measured } from "../../../src/probability/measured.ts";
import { normal } from "../../../src/probability/normal.ts";
import { disagreement, readCases } from "../cases.ts";

const rows = readCases(new URL("cases.csv", import.meta.url));

/** n values with mean 0 and sd 1 (n − 1): equally spaced. */
function standardSample(n: number): number[] {
  const raw = Array.from({ length: n }, (_, i) => i - (n - 1) / 2);
  const sd = Math.sqrt(raw.reduce((sum, x) => sum + x * x, 0) / (n - 1));
  return raw.map((x) => 30 + (3 * x) / sd);
}

test("the 5 % fractile of measured values follows the table for an unknown coefficient of variation", () => {
  const faults = rows.map(({ n, unknown }) => {
    const factor = (30 - measured({ values: standardSample(Number(n)), as: "normal" }).quantile(0.05)) / 3;
    return disagreement(`${n} tests`, factor, unknown, 0.02);
  });
  expect(faults.filter((fault) => fault !== "")).toEqual([]);
});

test("with a known coefficient of variation the same predictive distribution is normal", () => {
  const faults = rows.map(({ n, known }) => {
    const spread = Math.sqrt(1 + 1 / Number(n));
    return disagreement(`${n} tests`, -normal({ mean: 0, sd: spread }).quantile(0.05), known, 0.02);
  });
  expect(faults.filter((fault) => fault !== "")).toEqual([]);
});
