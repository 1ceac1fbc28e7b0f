import { expect, test } from "vitest";
import { atRestCoefficient } from "../../../src/mechanics/formulas/at-rest.ts";
import { positiveForce, positiveMoment } from "../../../src/mechanics/formulas/linear-pressure.ts";
import { disagreement, radians, readCases } from "../cases.ts";

test("the coefficient at rest agrees with every row of the table", () => {
  const rows = readCases(new URL("cases.csv", import.meta.url));
  expect(rows).toHaveLength(6);
  const wrong = rows
    .map((row) => {
      const k = atRestCoefficient(radians(row.phi_deg), Number(row.OCR), radians(row.beta_deg));
      return disagreement(`K0 at ${Object.values(row).slice(0, 3).join(", ")}`, k, row.K0);
    })
    .filter((text) => text !== "");
  expect(wrong).toEqual([]);
});

test("the published wall at rest with a water table gives its areas and the height of the resultant", () => {
  const k0 = atRestCoefficient(radians(30), 2, 0);
  const atTable = k0 * 100 * 10;
  const added = k0 * (122.4 - 62.4) * 5;
  const parts = [
    {
      force: positiveForce(0, atTable, 10),
      moment: positiveMoment(0, atTable, 10) + 5 * positiveForce(0, atTable, 10),
      printed: 3535,
    },
    { force: positiveForce(atTable, atTable, 5), moment: positiveMoment(atTable, atTable, 5), printed: 3535 },
    { force: positiveForce(0, added, 5), moment: positiveMoment(0, added, 5), printed: 530.3 },
    { force: positiveForce(0, 62.4 * 5, 5), moment: positiveMoment(0, 62.4 * 5, 5), printed: 780 },
  ];
  for (const part of parts) expect(Math.abs(part.force / part.printed - 1)).toBeLessThan(5e-4);
  const total = parts.reduce((sum, part) => sum + part.force, 0);
  const height = parts.reduce((sum, part) => sum + part.moment, 0) / total;
  expect(Math.abs(total - 8381.4)).toBeLessThan(0.05);
  expect(Math.abs(height - 4.83)).toBeLessThan(5e-4);
  expect(Math.abs(height - 4.8)).toBeLessThan(0.05);
});
