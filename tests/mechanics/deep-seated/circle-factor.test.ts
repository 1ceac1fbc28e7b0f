import { expect, test } from "vitest";
import { resistingMoment } from "../../../src/mechanics/deep-seated/bishop.ts";
import { circleFactor, leftOut, liesAbove } from "../../../src/mechanics/deep-seated/circle-factor.ts";
import { laid, layCircle } from "./laid-circle.ts";
import { dice, ordinaryGround, randomGround } from "./random-ground.ts";
import { thinSlices } from "./thin-slices.ts";

test("the factor does not depend on where the iteration begins", () => {
  const roll = dice(3);
  for (let i = 0; i < 200; i++) {
    const found = laid(randomGround(roll), [3 * roll(), 2 * roll(), 3 * roll()]);
    if (found === undefined) continue;
    const factors = [1e-3, 1, 90].map((start) => circleFactor(found.arc, start));
    if (factors[0] === leftOut) expect(factors).toEqual([leftOut, leftOut, leftOut]);
    else for (const factor of factors) expect(Math.abs(factor - factors[0])).toBeLessThanOrEqual(1e-8 * factors[0]);
  }
});

test("at its factor a circle is in balance, and its least m_α is 0.2 or more; a circle that is left out has none such", () => {
  const roll = dice(8);
  let out = 0;
  for (let i = 0; i < 80; i++) {
    const ground = randomGround(roll);
    const found = laid(ground, [1.5 * roll(), 2 * roll(), 3 * roll()]);
    if (found === undefined) continue;
    const factor = circleFactor(found.arc, 1);
    if (factor === leftOut) {
      out++;
      const slices = thinSlices(ground, found.circle, 500);
      if (Number.isFinite(slices.factor) && slices.factor > 0) expect(slices.leastTilt).toBeLessThan(0.21);
    } else if (factor > 0 && factor < 1000) {
      expect(resistingMoment(found.arc, factor) / found.arc.driving / factor).toBeCloseTo(1, 6);
      expect(factor).toBeGreaterThanOrEqual(found.arc.least * (1 - 1e-9));
      expect(factor).toBeLessThanOrEqual(found.arc.greatest * (1 + 1e-9));
    }
  }
  expect(out).toBeGreaterThan(5);
});

test("one look says whether a factor lies above a bound", () => {
  const found = layCircle(ordinaryGround(), [1, 0.8, 0.5]);
  const factor = circleFactor(found.arc, 1);
  expect(liesAbove(found.arc, factor * 0.999)).toBe(true);
  expect(liesAbove(found.arc, factor * 1.001)).toBe(false);
});
