import { expect, test } from "vitest";
import { lognormal } from "../../../src/probability/lognormal.ts";
import { disagreement, readCases } from "../cases.ts";

test("parameters, median and 5 % fractile equal the printed ones", () => {
  const faults = readCases(new URL("cases.csv", import.meta.url)).flatMap((row) => {
    const variable = lognormal({ mean: Number(row.mean), sd: Number(row.mean) * Number(row.variation) });
    const lambda = Math.log(variable.quantileOfNormal(0));
    return [
      disagreement("zeta", Math.log(variable.quantileOfNormal(1)) - lambda, row.zeta, 1e-6 * Number(row.zeta)),
      disagreement("lambda", lambda, row.lambda, 1e-6 * Number(row.lambda)),
      disagreement("median", variable.quantile(0.5), row.median, 1e-6 * Number(row.median)),
      disagreement("5 % fractile", variable.quantile(0.05), row.fractile, 1e-6 * Number(row.fractile)),
    ];
  });
  expect(faults.length).toBe(8);
  expect(faults.filter((fault) => fault !== "")).toEqual([]);
});
