import { expect, test } from "vitest";
import { bivariateNormal } from "../../../src/numeric/bivariate-normal.ts";
import { anyNormalAbove, multivariateNormal } from "../../../src/numeric/multivariate-normal.ts";
import { readCases } from "../cases.ts";

const effort = { relativeError: 2e-3, evaluations: 60_000 };

test("every row of equally correlated modes: any fails, all fail", () => {
  const rows = readCases(new URL("cases.csv", import.meta.url));
  expect(rows.length).toBe(40);
  for (const row of rows) {
    const n = Number(row.n);
    const rho = Number(row.rho);
    const correlation = Array.from({ length: n }, (_, i) => Array.from({ length: n }, (_, j) => (i === j ? 1 : rho)));
    const any = anyNormalAbove(new Array(n).fill(Number(row.beta)), correlation, effort);
    const all = multivariateNormal(new Array(n).fill(-Number(row.beta)), correlation, effort);
    for (const [found, printed] of [
      [any, row.Pf_series],
      [all, row.Pf_parallel],
    ] as const) {
      const value = Number(printed);
      expect(Math.abs(found.probability - value), JSON.stringify(row)).toBeLessThan(
        5 * found.standardError + 1e-8 * value,
      );
      expect(found.standardError / value, JSON.stringify(row)).toBeLessThan(2e-2);
    }
  }
});

test("four different modes: any fails, and each pair together", () => {
  const betas = [2.5, 2.8, 3, 3.2];
  const correlation = [
    [1, 0.6, 0.3, 0.2],
    [0.6, 1, 0.5, 0.1],
    [0.3, 0.5, 1, 0.4],
    [0.2, 0.1, 0.4, 1],
  ];
  const found = anyNormalAbove(betas, correlation, { relativeError: 1e-6, evaluations: 400_000 });
  expect(Math.abs(found.probability - 1.0028879e-2)).toBeLessThan(5 * found.standardError + 5e-9);
  expect(found.standardError).toBeLessThan(1e-7);
  const pairs: [number, number, number][] = [
    [0, 1, 5.516661e-4],
    [0, 2, 7.663409e-5],
    [1, 2, 1.257347e-4],
    [0, 3, 2.255799e-5],
    [1, 3, 4.713003e-6],
    [2, 3, 2.76739e-5],
  ];
  for (const [i, j, printed] of pairs) {
    expect(bivariateNormal(-betas[i], -betas[j], correlation[i][j]) / printed).toBeCloseTo(1, 6);
  }
});
