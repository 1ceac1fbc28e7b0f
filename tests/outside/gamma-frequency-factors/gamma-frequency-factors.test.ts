import { expect, test } from "vitest";
import { gamma } from "../../../src/probability/gamma.ts";
import { disagreement, readCases } from "../cases.ts";

test("frequency factors of the gamma distribution equal the printed ones", () => {
  const faults = readCases(new URL("cases.csv", import.meta.url)).map(({ skew, chance, factor }) => {
    const shape = 4 / Number(skew) ** 2;
    const variable = gamma({ mean: shape, sd: Math.sqrt(shape) });
    const found = (variable.upperQuantile(Number(chance)) - shape) / Math.sqrt(shape);
    return disagreement(`skew ${skew}, chance ${chance}`, found, factor);
  });
  expect(faults.length).toBe(20);
  expect(faults.filter((fault) => fault !== "")).toEqual([]);
});
