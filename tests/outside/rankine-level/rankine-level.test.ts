import { expect, test } from "vitest";
import { atRestCoefficient } from "../../../src/mechanics/formulas/at-rest.ts";
import {
  activeCoefficientRankine,
  passiveCoefficientRankine,
  rootActiveCoefficientRankine,
} from "../../../src/mechanics/formulas/rankine.ts";
import { disagreement, radians, readCases } from "../cases.ts";

test("Rankine's coefficients and Jaky's agree with every row of the table to its printed digits", () => {
  const rows = readCases(new URL("cases.csv", import.meta.url));
  expect(rows).toHaveLength(46);
  const wrong = rows.flatMap((row) => {
    const phi = radians(row.phi_deg);
    return [
      disagreement(`Ka at ${row.phi_deg}`, activeCoefficientRankine(phi), row.Ka),
      disagreement(`Ka by its root at ${row.phi_deg}`, rootActiveCoefficientRankine(phi) ** 2, row.Ka),
      disagreement(`Kp at ${row.phi_deg}`, passiveCoefficientRankine(phi), row.Kp),
      disagreement(`K0 at ${row.phi_deg}`, atRestCoefficient(phi, 1, 0), row.K0_jaky),
    ].filter((text) => text !== "");
  });
  expect(wrong).toEqual([]);
});
