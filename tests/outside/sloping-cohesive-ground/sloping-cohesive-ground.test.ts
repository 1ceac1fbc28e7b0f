import { expect, test } from "vitest";
import {
  slopingCohesiveForce,
  slopingCohesiveMoment,
  slopingCohesivePressure,
} from "../../../src/mechanics/formulas/mazindrani-ganjali.ts";
import { disagreement, radians, readCases } from "../cases.ts";

test("pressure, force and moment of cohesive ground on a slope agree with integration at 40 digits", () => {
  const rows = readCases(new URL("cases.csv", import.meta.url));
  expect(rows).toHaveLength(200);
  const wrong = rows.flatMap((row, i) => {
    const [s0, s1, length, c] = [row.top_stress, row.bottom_stress, row.length, row.cohesion].map(Number);
    const phi = radians(row.phi_deg);
    const beta = radians(row.beta_deg);
    const rounding = 1e-14 * Math.max(s0, s1, c);
    const near = (printed: string, scale: number): number => 1e-11 * Math.abs(Number(printed)) + rounding * scale;
    const force = slopingCohesiveForce(s0, s1, length, c, phi, beta);
    const moment = slopingCohesiveMoment(s0, s1, length, c, phi, beta);
    return [
      disagreement(
        `p of row ${i + 1}`,
        slopingCohesivePressure(s0, c, phi, beta),
        row.top_pressure,
        near(row.top_pressure, 1),
      ),
      disagreement(`force of row ${i + 1}`, force, row.force, near(row.force, length)),
      disagreement(`moment of row ${i + 1}`, moment, row.moment, near(row.moment, length ** 2)),
    ].filter((text) => text !== "");
  });
  expect(wrong).toEqual([]);
});
