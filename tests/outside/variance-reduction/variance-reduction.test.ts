import { expect, test } from "vitest";
import { varianceReduction } from "../../../src/study/variance-function.ts";
import { disagreement, readCases } from "../cases.ts";

test("the variance functions agree with every row of the table to its printed digits", () => {
  const rows = readCases(new URL("cases.csv", import.meta.url));
  expect(rows).toHaveLength(11);
  const models = {
    exponential: "exponential",
    gaussian: "gaussian",
    triangular: "triangular",
    simple: "vanmarcke_simple",
  } as const;
  const wrong = rows.flatMap((row) =>
    (Object.keys(models) as (keyof typeof models)[])
      .map((model) =>
        disagreement(
          `${model} at L/δ ${row.L_over_delta}`,
          varianceReduction(model, Number(row.L_over_delta), 1),
          row[models[model]],
        ),
      )
      .filter((text) => text !== ""),
  );
  expect(wrong).toEqual([]);
});
