import { expect, test } from "vitest";
import { probabilityChart } from "../../../src/report/charts/probabilities.ts";
import { handMade } from "../hand-made.ts";

type Rows = readonly { name: string; probability: number | null; low: number; high: number; kind: string }[];
const rowsOf = (spec: object): Rows => (spec as { data: { values: Rows } }).data.values;
const { assess } = handMade;

test("no failure seen is a bar up to its upper limit, without a point", () => {
  const none = rowsOf(probabilityChart(assess).spec).find((row) => row.name === "Overturning");
  expect(none).toMatchObject({ probability: null, kind: "none", high: 3.7e-5 });
});

test("every bar lies on the axis, whatever its lower end", () => {
  const rows = rowsOf(probabilityChart(assess).spec);
  expect(rows.map((row) => row.name)).toEqual(["Sliding", "Overturning", "Bearing failure", "The wall"]);
  for (const row of rows) {
    expect(row.low).toBeGreaterThan(0);
    expect(row.high).toBeGreaterThanOrEqual(row.low);
  }
});

test("with yearly values one year and the period stand side by side", () => {
  const period = {
    years: 50,
    probability: 0.05,
    standardError: 0.002,
    interval: [0.046, 0.054] as const,
    periods: 10_000,
    failures: 500,
    yearlyGivenSurvival: [0.001],
  };
  const rows = rowsOf(probabilityChart({ ...assess, system: { ...assess.system, period } }).spec);
  expect(rows.map((row) => row.name)).toEqual([
    "Sliding, one year",
    "Overturning, one year",
    "Bearing failure, one year",
    "Any, one year",
    "The wall, 50 years",
  ]);
});
