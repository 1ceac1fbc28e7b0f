import { expect, test } from "vitest";
import { activeCoefficientRankineSloping } from "../../../src/mechanics/formulas/rankine.ts";
import { disagreement, halfUnit, radians, readCases } from "../cases.ts";

test("the coefficient along the slope and its parts agree with every row of the table", () => {
  const rows = readCases(new URL("cases.csv", import.meta.url));
  expect(rows.length).toBeGreaterThan(100);
  const wrong = rows.flatMap((row) => {
    const beta = radians(row.beta_deg);
    const k = activeCoefficientRankineSloping(radians(row.phi_deg), beta);
    const at = `at ${row.phi_deg}, ${row.beta_deg}`;
    return [
      disagreement(`along the slope ${at}`, k, row.Ka_along_slope),
      disagreement(`horizontal ${at}`, k * Math.cos(beta), row.Ka_horizontal),
      disagreement(`vertical ${at}`, k * Math.sin(beta), row.Ka_vertical),
      disagreement(`passive ${at}`, Math.cos(beta) ** 2 / k, row.Kp_along_slope),
    ].filter((text) => text !== "");
  });
  expect(wrong).toEqual([]);
});

test("the published values for sloping ground come out to their three decimals", () => {
  const rows = readCases(new URL("published.csv", import.meta.url));
  expect(rows).toHaveLength(31);
  const wrong = rows
    .map((row) =>
      disagreement(
        `Ka at ${row.phi_deg}, ${row.beta_deg}`,
        activeCoefficientRankineSloping(radians(row.phi_deg), radians(row.beta_deg)),
        row.Ka,
        halfUnit(row.Ka),
      ),
    )
    .filter((text) => text !== "");
  expect(wrong).toEqual([]);
});
