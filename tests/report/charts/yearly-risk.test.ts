import { expect, test } from "vitest";
import { yearlyRiskChart } from "../../../src/report/charts/yearly-risk.ts";

const period = {
  years: 50,
  probability: 0.01,
  standardError: 0.001,
  interval: [0.008, 0.012] as const,
  periods: 10_000,
  yearlyGivenSurvival: Array.from({ length: 50 }, (_, k) => 2e-4 + (k % 2 ? 1e-4 : -1e-4)),
};
const yearsOf = (spec: object): readonly string[] =>
  (spec as { data: { values: { year: string }[] } }).data.values.map((row) => row.year);

test("with many failures every year has its bar", () => {
  expect(yearsOf(yearlyRiskChart({ ...period, failures: 1000 }).spec)).toHaveLength(50);
});

test("with few failures years are taken together, so that noise is not drawn as a course", () => {
  const years = yearsOf(yearlyRiskChart({ ...period, failures: 100 }).spec);
  expect(years[0]).toBe("1 to 10");
  expect(years.at(-1)).toBe("41 to 50");
});

test("years that no period reached are left out", () => {
  const yearlyGivenSurvival = [0.5, 1, null, null];
  const chart = yearlyRiskChart({ ...period, years: 4, failures: 10_000, yearlyGivenSurvival });
  expect(yearsOf(chart.spec)).toEqual(["1", "2"]);
});
