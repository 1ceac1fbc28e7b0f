import { expect, test } from "vitest";
import { normalCdf } from "../../../src/numeric/normal.ts";
import { namedTarget } from "../../../src/study/targets.ts";
import { type Case, readCases } from "../cases.ts";

/** `cost large; consequences minor` -> jcss_cost_large_consequences_minor_1_year, and so on. */
function nameOf({ source, class_or_level: level, reference_period_years: period }: Case): string | undefined {
  const words = level.toLowerCase().replace(/[; ]+/g, "_");
  if (source.startsWith("EN 1990")) return `en1990_${words}_${period === "1" ? "1_year" : `${period}_years`}`;
  if (source.includes("Table 7.1")) return `jcss_${words}_1_year`;
  if (source.startsWith("USACE")) return `usace_${words}`;
  return undefined;
}

test("every ultimate target of the table can be named, with its index, period and probability", () => {
  const rows = readCases(new URL("cases.csv", import.meta.url));
  const named = rows.filter((row) => nameOf(row) !== undefined);
  expect([rows.length, named.length]).toEqual([25, 22]);
  for (const row of named) {
    const target = namedTarget(nameOf(row)!);
    expect(target?.reliabilityIndex, nameOf(row)).toBe(Number(row.beta));
    expect(target?.period, nameOf(row)).toBe(
      row.reference_period_years === "" ? undefined : Number(row.reference_period_years),
    );
    expect(normalCdf(-Number(row.beta)).toExponential(4), nameOf(row)).toBe(Number(row.Pf).toExponential(4));
  }
});
