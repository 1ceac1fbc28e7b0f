import { expect, test } from "vitest";
import { resistingMoment } from "../../../src/mechanics/deep-seated/bishop.ts";
import { circleFactor } from "../../../src/mechanics/deep-seated/circle-factor.ts";
import { laid, layCircle } from "./laid-circle.ts";
import { dice, ordinaryGround, randomGround } from "./random-ground.ts";
import { thinSlices } from "./thin-slices.ts";

test.each([
  { slices: 20_000, walls: 2, seed: 21, close: 2e-4 },
  { slices: 1500, walls: 20, seed: 22, close: 3e-3 },
])("agrees with $slices plain slices on $walls walls of every kind", ({ slices: count, walls, seed, close }) => {
  const roll = dice(seed);
  let compared = 0;
  while (compared < walls) {
    const ground = randomGround(roll);
    const found = laid(ground, [0.2 + 2 * roll(), 2 * roll(), 3 * roll()]);
    if (found === undefined) continue;
    const factor = circleFactor(found.arc, 1);
    if (!(factor < 50)) continue;
    const slices = thinSlices(ground, found.circle, count);
    // what differs is the slices, each that holds a change of ground by a part of itself
    expect(Math.abs(found.arc.driving / slices.driving - 1)).toBeLessThan(close);
    expect(Math.abs(factor / slices.factor - 1)).toBeLessThan(close);
    compared++;
  }
});

test("two slice counts close in on the integral", () => {
  const ground = ordinaryGround({ loads: { surcharge: 10, strips: [{ pressure: 30, from: 1, width: 2 }], lines: [] } });
  const found = layCircle(ground, [1, 0.8, 0.5]);
  const factor = circleFactor(found.arc, 1);
  const errors = [500, 20_000].map((n) => Math.abs(thinSlices(ground, found.circle, n).factor / factor - 1));
  expect(errors[1]).toBeLessThan(errors[0]);
  expect(errors[1]).toBeLessThan(5e-5);
});

test("resistance over factor falls with the factor, wherever m_α is above 0: what makes the factor of a circle unique", () => {
  const roll = dice(6);
  let compared = 0;
  for (let i = 0; i < 60; i++) {
    const found = laid(randomGround(roll), [2 * roll(), 2 * roll(), 2 * roll()]);
    if (found === undefined || !(found.arc.least < found.arc.greatest)) continue;
    const low = Math.max(found.arc.least, 0.05);
    const high = Math.min(found.arc.greatest, 50);
    const ratios = Array.from({ length: 12 }, (_, k) => {
      const factor = low * (high / low) ** (k / 11);
      return resistingMoment(found.arc, factor) / factor;
    });
    for (let k = 1; k < ratios.length; k++) {
      expect(ratios[k]).toBeLessThanOrEqual(ratios[k - 1] * (1 + 1e-9));
      compared++;
    }
  }
  expect(compared).toBeGreaterThan(200);
});
