import { expect, test } from "vitest";
import {
  positiveCentre,
  positiveForce,
  positiveLength,
  positiveMoment,
  zeroCrossing,
} from "../../../src/mechanics/formulas/linear-pressure.ts";
import { slopingCohesiveForce, slopingCohesiveMoment } from "../../../src/mechanics/formulas/mazindrani-ganjali.ts";
import { activeCoefficientRankine, rootActiveCoefficientRankine } from "../../../src/mechanics/formulas/rankine.ts";
import { disagreement, radians, readCases } from "../cases.ts";

test("crack depth and thrust before and after cracking agree with every row of the table", () => {
  const rows = readCases(new URL("cases.csv", import.meta.url));
  expect(rows).toHaveLength(4);
  const wrong = rows.flatMap((row) => {
    const [c, gamma, height, phi] = [Number(row.c), Number(row.gamma), Number(row.H), radians(row.phi_deg)];
    const ka = activeCoefficientRankine(phi);
    const top = -2 * c * rootActiveCoefficientRankine(phi);
    const foot = ka * gamma * height + top;
    const force = positiveForce(top, foot, height);
    const cracked = zeroCrossing(top, foot, height);
    const curved = slopingCohesiveForce(0, gamma * height, height, c, phi, 0);
    return [
      disagreement(`Ka of ${row.id}`, ka, row.Ka),
      disagreement(`zc of ${row.id}`, cracked, row.zc),
      disagreement(`zc of ${row.id} by the length under pressure`, height - positiveLength(top, foot, height), row.zc),
      disagreement(`zc of ${row.id} by its centre`, height - 2 * positiveCentre(top, foot, height), row.zc),
      disagreement(`P before of ${row.id}`, 0.5 * (top + foot) * height, row.P_before),
      disagreement(`P after of ${row.id}`, force, row.P_after),
      disagreement(`P after of ${row.id} by the formula for slopes`, curved, row.P_after),
      disagreement(`arm of ${row.id}`, positiveMoment(top, foot, height) / force, row.arm_after),
      disagreement(
        `arm of ${row.id} by the formula for slopes`,
        slopingCohesiveMoment(0, gamma * height, height, c, phi, 0) / curved,
        row.arm_after,
      ),
    ].filter((text) => text !== "");
  });
  expect(wrong).toEqual([]);
});
