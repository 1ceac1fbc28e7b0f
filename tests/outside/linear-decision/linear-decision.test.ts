import { expect, test } from "vitest";
import { perfectInformationLinear, testValueLinear } from "../../../src/decision/linear-loss.ts";
import { disagreement, readCases } from "../cases.ts";

const decision = { slope: 50, breakEven: 33, mean: 34, sd: 3 };
const rows = readCases(new URL("cases.csv", import.meta.url));

test("the value of tests agrees with every row, and never exceeds that of perfect information", () => {
  expect(rows.length).toBeGreaterThan(10);
  const wrong = rows.flatMap(({ n_tests, EVSI, EVPI }) => [
    disagreement(`value of ${n_tests}`, testValueLinear(decision, Number(n_tests), 4), EVSI),
    disagreement("perfect information", perfectInformationLinear(decision), EVPI),
  ]);
  expect(wrong.filter((line) => line !== "")).toEqual([]);
  expect(testValueLinear(decision, 0, 4)).toBe(0);
  expect(testValueLinear(decision, 1e9, 4)).toBeCloseTo(perfectInformationLinear(decision), 6);
});

test("at a price of 2 a test, four tests have the greatest net value", () => {
  const net = [1, 2, 3, 4, 5, 6, 7].map((n) => testValueLinear(decision, n, 4) - 2 * n);
  expect(1 + net.indexOf(Math.max(...net))).toBe(4);
  expect(disagreement("net", net[3], "20.7339876")).toBe("");
});
