import { expect, test } from "vitest";
import { cautiousValues, driverTable } from "../../src/drivers/driver-table.ts";
import { tornado } from "../../src/drivers/tornado.ts";
import { lowAndHigh, pictureOf } from "./low-and-high.ts";

test("the strongest comes first, with its harmful end", async () => {
  const [bars] = tornado(lowAndHigh.states, lowAndHigh.space);
  const table = driverTable(lowAndHigh.space, {
    shares: { "a.x": 0.5, "b.y": 0.4, "c.z": 0 },
    tornado: bars,
    picture: await pictureOf(lowAndHigh),
  });
  expect(table.map((row) => [row.path, row.adverse])).toEqual([
    ["a.x", "low"],
    ["b.y", "high"],
    ["c.z", "unclear"],
  ]);
});

test("without shares the shift given failure ranks", async () => {
  const table = driverTable(lowAndHigh.space, { picture: await pictureOf(lowAndHigh) });
  expect(table.at(-1)?.path).toBe("c.z");
  expect(table.every((row) => row.share === null)).toBe(true);
  expect(Math.abs(table[0].shiftGivenFailure!)).toBeGreaterThan(1);
});

test("takes the end from the tornado where no sample failed", () => {
  const [bars] = tornado(lowAndHigh.states, lowAndHigh.space);
  const table = driverTable(lowAndHigh.space, { tornado: bars, picture: [] });
  expect(table.map((row) => row.shiftGivenFailure)).toEqual([null, null, null]);
  expect(Object.fromEntries(table.map((row) => [row.path, row.adverse]))).toMatchObject({
    "a.x": "low",
    "b.y": "high",
  });
});

test("cautious values stand at the adverse 5 % fractile, what does not matter at its mean", () => {
  const [bars] = tornado(lowAndHigh.states, lowAndHigh.space);
  const values = cautiousValues(lowAndHigh.space, bars);
  expect(values["a.x"]).toBeCloseTo(-1.6448536269514722, 12);
  expect(values["b.y"]).toBeCloseTo(1.6448536269514722, 12);
  expect(values["c.z"]).toBe(5);
});
