import { expect, test } from "vitest";
import {
  bearingFactorNc,
  bearingFactorNgammaEn1997,
  bearingFactorNgammaMeyerhof,
  bearingFactorNgammaVesic,
  bearingFactorNq,
} from "../../../src/mechanics/formulas/bearing-factors.ts";
import { disagreement, radians, readCases } from "../cases.ts";

const factors: Readonly<Record<string, (frictionAngle: number) => number>> = {
  Nc: bearingFactorNc,
  Nq: bearingFactorNq,
  Ngamma_Meyerhof: bearingFactorNgammaMeyerhof,
  Ngamma_Vesic: bearingFactorNgammaVesic,
  Ngamma_EN1997_AnnexD: bearingFactorNgammaEn1997,
};

test("Nc, Nq and the three Nγ agree with every row of the table", () => {
  const rows = readCases(new URL("cases.csv", import.meta.url));
  expect(rows).toHaveLength(46);
  const wrong = rows.flatMap((row) =>
    Object.entries(factors)
      .map(([name, factor]) => disagreement(`${name} at ${row.phi_deg}`, factor(radians(row.phi_deg)), row[name]))
      .filter((text) => text !== ""),
  );
  expect(wrong).toEqual([]);
});

test("the published factors come out to their printed digits", () => {
  const rows = readCases(new URL("published.csv", import.meta.url));
  expect(rows).toHaveLength(15);
  const wrong = rows
    .map((row) => disagreement(`${row.factor} at ${row.phi_deg}`, factors[row.factor](radians(row.phi_deg)), row.value))
    .filter((text) => text !== "");
  expect(wrong).toEqual([]);
});
