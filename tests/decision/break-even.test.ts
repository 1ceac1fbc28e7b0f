import { expect, test } from "vitest";
import { costEnvelope } from "../../src/decision/break-even.ts";

test("the best option changes where the lines of cost cross, and only between those that are best somewhere", () => {
  const lines = [
    { price: 0, failureCost: 100 },
    { price: 40, failureCost: 60 }, // nowhere the best
    { price: 30, failureCost: 20 },
    { price: 60, failureCost: 5 },
  ];
  expect(costEnvelope(lines)).toEqual([
    { at: 0.375, below: 0, above: 2 },
    { at: 2, below: 2, above: 3 },
  ]);
});

test("an option that is cheap and safe is best at any failure cost", () => {
  expect(
    costEnvelope([
      { price: 10, failureCost: 5 },
      { price: 0, failureCost: 1 },
    ]),
  ).toEqual([]);
});
