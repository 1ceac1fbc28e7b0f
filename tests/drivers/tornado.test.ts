import { expect, test } from "vitest";
import { tornado } from "../../src/drivers/tornado.ts";
import { lowAndHigh } from "./low-and-high.ts";

test("the widest bar comes first, and what does not matter has none", () => {
  const [bars] = tornado(lowAndHigh.states, lowAndHigh.space);
  expect(bars.at(-1)).toEqual({ path: "c.z", factorAt5: 1.02, factorAt95: 1.02 });
  const sign = bars[0].path === "a.x" ? 1 : -1;
  expect(bars[0].factorAt95 - bars[0].factorAt5).toBeCloseTo((sign * 2 * 1.6448536269514722) / 100, 12);
});

test("two points for every unknown and one at the means are all it takes", () => {
  const before = lowAndHigh.states.evaluations.exact;
  tornado(lowAndHigh.states, lowAndHigh.space);
  expect(lowAndHigh.states.evaluations.exact - before).toBe(7);
});
