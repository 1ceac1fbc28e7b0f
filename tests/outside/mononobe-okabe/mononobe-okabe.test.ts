import { expect, test } from "vitest";
import { activeCoefficientCoulomb } from "../../../src/mechanics/formulas/coulomb.ts";
import { activeCoefficientMononobeOkabe, seismicAngle } from "../../../src/mechanics/formulas/mononobe-okabe.ts";
import { disagreement, radians, readCases } from "../cases.ts";

/** The table's δ are 0, ⅓, ½ and ⅔ of φ, printed to six decimals. */
function wallFriction(phiDeg: number, printed: number): number {
  const sixths = Math.round((6 * printed) / phiDeg);
  expect(Math.abs((sixths * phiDeg) / 6 - printed)).toBeLessThan(6e-7);
  return radians((sixths * phiDeg) / 6);
}

test("the seismic angle and the coefficient agree with every row of the table", () => {
  const rows = readCases(new URL("cases.csv", import.meta.url));
  expect(rows).toHaveLength(2496);
  const wrong = rows.flatMap((row) => {
    const psi = seismicAngle(Number(row.kh), Number(row.kv), 1);
    const delta = wallFriction(Number(row.phi_deg), Number(row.delta_deg));
    const k = activeCoefficientMononobeOkabe(
      radians(row.phi_deg),
      delta,
      radians(row.theta_deg),
      radians(row.beta_deg),
      psi,
    );
    const at = Object.values(row).slice(0, 6).join(", ");
    return [
      disagreement(`ψ at ${at}`, (psi * 180) / Math.PI, row.psi_deg),
      disagreement(`KAE at ${at}`, k, row.KAE),
    ].filter((text) => text !== "");
  });
  expect(wrong).toEqual([]);
});

test("the published coefficients for a smooth vertical face come out to their three decimals", () => {
  const rows = readCases(new URL("published.csv", import.meta.url));
  expect(rows).toHaveLength(25);
  const wrong = rows
    .map((row) => {
      const psi = seismicAngle(Number(row.kh), 0, 1);
      const k = activeCoefficientMononobeOkabe(radians(row.phi_deg), 0, 0, 0, psi);
      return disagreement(`KAE at kh ${row.kh}, φ ${row.phi_deg}`, k, row.KAE);
    })
    .filter((text) => text !== "");
  expect(wrong).toEqual([]);
});

test("the published thrusts in pounds and the height of the resultant come out", () => {
  const phi = radians(35);
  const delta = radians(17.5);
  const shaken = activeCoefficientMononobeOkabe(phi, delta, 0, 0, seismicAngle(0.3, 0, 1));
  const still = activeCoefficientCoulomb(phi, delta, 0, 0);
  expect(Math.abs(shaken - 0.47433)).toBeLessThan(5e-7);
  expect(Math.abs(still - 0.246123)).toBeLessThan(5e-7);
  const half = 0.5 * 105 * 10 ** 2;
  expect(Math.abs(half * shaken - 2488.5)).toBeLessThan(half * 5e-4); // KAE printed to three decimals
  expect(Math.abs(half * still - 1291.5)).toBeLessThan(half * 5e-4);
  const height = (still * (10 / 3) + (shaken - still) * 6) / shaken;
  expect(Math.abs(height - 4.616)).toBeLessThan(5e-4);
});
