import { expect, test } from "vitest";
import { positiveForce, positiveMoment } from "../../../src/mechanics/formulas/linear-pressure.ts";
import { activeCoefficientRankine } from "../../../src/mechanics/formulas/rankine.ts";
import { disagreement, radians, readCases } from "../cases.ts";

test("the active coefficient is about 0.29 at 33 degrees and 0.24 at 38", () => {
  const wrong = readCases(new URL("cases.csv", import.meta.url)).map((row) =>
    disagreement(`Ka at ${row.phi_deg}`, activeCoefficientRankine(radians(row.phi_deg)), row.Ka),
  );
  expect(wrong).toEqual(["", ""]);
});

test("a triangle of pressure acts at a third of its height and a rectangle at half", () => {
  expect(positiveMoment(0, 40, 6) / positiveForce(0, 40, 6)).toBeCloseTo(2, 12);
  expect(positiveMoment(12, 12, 6) / positiveForce(12, 12, 6)).toBeCloseTo(3, 12);
});
