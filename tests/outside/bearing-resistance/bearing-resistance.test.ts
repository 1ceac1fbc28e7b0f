import { expect, test } from "vitest";
import {
  bearingFactorNc,
  bearingFactorNgammaEn1997,
  bearingFactorNq,
  inclinationBase,
  inclinationNc,
  inclinationNgamma,
  inclinationNq,
  meyerhofInclinationNgamma,
  meyerhofInclinationNq,
  undrainedInclination,
} from "../../../src/mechanics/formulas/bearing-factors.ts";
import { activeCoefficientRankine } from "../../../src/mechanics/formulas/rankine.ts";
import { type Case, disagreement, radians, readCases } from "../cases.ts";

// The wall the load comes from: stem 50 kN/m, slab 40, soil over the heel 180, dry sand of φ 34° over 5.5 m.
const vertical = 270;
const horizontal = 0.5 * activeCoefficientRankine(radians(34)) * 18 * 5.5 ** 2;
const eccentricity = 1.6 - (510 - (horizontal * 5.5) / 3) / vertical;
const effectiveWidth = 3.2 - 2 * eccentricity;
const surcharge = 15.2;

function drained(row: Case): Record<string, number> {
  const phi = radians(row.phi_deg);
  const c = Number(row.c);
  const tanPhi = Math.tan(phi);
  const bracket = inclinationBase(horizontal, vertical, effectiveWidth, c, 1 / tanPhi);
  const iq = inclinationNq(bracket);
  const igamma = inclinationNgamma(bracket);
  const ic = inclinationNc(iq, bearingFactorNc(phi), tanPhi);
  const own = 0.5 * 19 * effectiveWidth * bearingFactorNgammaEn1997(phi) * igamma;
  return { iq, igamma, ic, q_ult: c * bearingFactorNc(phi) * ic + surcharge * bearingFactorNq(phi) * iq + own };
}

function undrained(row: Case): Record<string, number> {
  const cu = Number(row.cu);
  const ic = undrainedInclination(horizontal, effectiveWidth, cu);
  return { ic, q_ult: (Math.PI + 2) * cu * ic + surcharge };
}

test("the load on the base agrees with the printed one", () => {
  expect(disagreement("H", horizontal, "76.969137")).toBe("");
  expect(disagreement("e", eccentricity, "0.2337411")).toBe("");
  expect(disagreement("B′", effectiveWidth, "2.7325179")).toBe("");
});

test("inclination factors, capacity and resistance agree with every row of the table", () => {
  const rows = readCases(new URL("cases.csv", import.meta.url));
  expect(rows).toHaveLength(3);
  const wrong = rows.flatMap((row) => {
    const found = row.soil === "drained" ? drained(row) : undrained(row);
    found.R = found.q_ult * effectiveWidth;
    found.R_over_V = found.R / vertical;
    return ["iq", "igamma", "ic", "q_ult", "R", "R_over_V"]
      .filter((name) => row[name] !== "")
      .map((name) => disagreement(`${name} of ${row.id}`, found[name], row[name]))
      .filter((text) => text !== "");
  });
  expect(wrong).toEqual([]);
});

test("Meyerhof's inclination factors agree with every row of the table", () => {
  const rows = readCases(new URL("inclination.csv", import.meta.url));
  expect(rows).toHaveLength(7);
  const wrong = rows.flatMap((row) => {
    const alpha = radians(row.load_inclination_deg);
    return [
      disagreement(`iq at ${row.load_inclination_deg}`, meyerhofInclinationNq(alpha), row.iq, 1e-9),
      disagreement(
        `iγ at ${row.load_inclination_deg}`,
        meyerhofInclinationNgamma(alpha, radians(row.phi_deg)),
        row.igamma,
        1e-9,
      ),
    ].filter((text) => text !== "");
  });
  expect(wrong).toEqual([]);
});
