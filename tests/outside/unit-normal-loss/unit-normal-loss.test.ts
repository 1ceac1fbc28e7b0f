import { expect, test } from "vitest";
import { unitNormalLoss } from "../../../src/decision/linear-loss.ts";
import { disagreement, readCases } from "../cases.ts";

test("the unit normal loss agrees with every row of the table", () => {
  const wrong = readCases(new URL("cases.csv", import.meta.url)).map(({ z, L }) =>
    disagreement(`L(${z})`, unitNormalLoss(Number(z)), L),
  );
  expect(wrong.filter((line) => line !== "")).toEqual([]);
});
