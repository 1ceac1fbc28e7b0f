import { expect, test } from "vitest";
import { activeCoefficientCoulomb } from "../../../src/mechanics/formulas/coulomb.ts";
import { disagreement, radians, readCases } from "../cases.ts";

test("Coulomb's coefficient and its horizontal part agree with every row of the table", () => {
  const rows = readCases(new URL("cases.csv", import.meta.url));
  expect(rows).toHaveLength(1160);
  const wrong = rows.flatMap((row) => {
    const delta = radians(row.delta_deg);
    const theta = radians(row.theta_deg);
    const k = activeCoefficientCoulomb(radians(row.phi_deg), delta, theta, radians(row.beta_deg));
    const at = Object.values(row).slice(0, 4).join(", ");
    return [
      disagreement(`Ka at ${at}`, k, row.Ka),
      disagreement(`horizontal part at ${at}`, k * Math.cos(delta + theta), row.Ka_horizontal),
    ].filter((text) => text !== "");
  });
  expect(wrong).toEqual([]);
});

test("the published coefficients come out to their printed digits", () => {
  const rows = readCases(new URL("published.csv", import.meta.url));
  expect(rows).toHaveLength(43);
  const wrong = rows
    .map((row) => {
      const k = activeCoefficientCoulomb(radians(row.phi_deg), radians(row.delta_deg), radians(row.theta_deg), 0);
      return disagreement(`Ka at ${row.phi_deg}, ${row.delta_deg}, ${row.theta_deg}`, k, row.Ka);
    })
    .filter((text) => text !== "");
  expect(wrong).toEqual([]);
});

test("the published thrust of 51.85 kN/m on a wall of 4.6 m comes out within 0.2 %", () => {
  const k = activeCoefficientCoulomb(radians(30), radians(20), 0, 0);
  expect(Math.abs(k - 0.297314)).toBeLessThan(5e-7);
  const thrust = 0.5 * k * 16.5 * 4.6 ** 2;
  expect(Math.abs(thrust - 51.902)).toBeLessThan(5e-4);
  expect(Math.abs(thrust / 51.85 - 1)).toBeLessThan(2e-3);
});
