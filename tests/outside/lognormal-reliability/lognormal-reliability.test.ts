import { expect, test } from "vitest";
import { secondMomentIndices } from "../../../src/reliability/second-moment.ts";
import { disagreement, readCases } from "../cases.ts";

/** Half a unit in the last digit of 1.234567e-03. */
function halfUnitScientific(printed: string): number {
  const [digits, power] = printed.split("e");
  return 0.5001 * 10 ** (Number(power ?? 0) - (digits.split(".")[1] ?? "").length);
}

test("every row of the table of indices and probabilities is met to its printed digits", () => {
  const rows = readCases(new URL("cases.csv", import.meta.url));
  expect(rows.length).toBeGreaterThan(200);
  const wrong = rows.flatMap((row) => {
    const [mean, v] = [Number(row.F_mean), Number(row.COV_F)];
    const found = secondMomentIndices(mean, mean * v);
    const at = `F ${row.F_mean}, V ${row.COV_F}`;
    return [
      disagreement(`lognormal index at ${at}`, found.reliabilityIndexLognormal, row.beta_LN),
      disagreement(`normal index at ${at}`, found.reliabilityIndexNormal, row.beta_N),
      disagreement(
        `lognormal probability at ${at}`,
        found.probabilityLognormal,
        row.Pf_LN,
        halfUnitScientific(row.Pf_LN),
      ),
      disagreement(`normal probability at ${at}`, found.probabilityNormal, row.Pf_N, halfUnitScientific(row.Pf_N)),
    ].filter((text) => text !== "");
  });
  expect(wrong).toEqual([]);
});
