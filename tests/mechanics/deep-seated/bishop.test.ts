import { expect, test } from "vitest";
import { layArc, makeArc } from "../../../src/mechanics/deep-seated/arc.ts";
import { resistingMoment } from "../../../src/mechanics/deep-seated/bishop.ts";
import { circleAt, type SlipCircle } from "../../../src/mechanics/deep-seated/circle.ts";
import { circleFactor, leftOut, liesAbove } from "../../../src/mechanics/deep-seated/circle-factor.ts";
import { circleLimits } from "../../../src/mechanics/deep-seated/circle-limits.ts";
import type { DeepSeatedGround } from "../../../src/mechanics/deep-seated/ground.ts";
import { wallProfile } from "../../../src/mechanics/deep-seated/profile.ts";
import { dice, ordinaryGround, randomGround, undrained } from "./random-ground.ts";
import { thinSlices } from "./thin-slices.ts";

function laid(ground: DeepSeatedGround, place: readonly number[]) {
  const circle: SlipCircle = { x: 0, z: 0, radius: 0, entryX: 0, entryZ: 0, exitX: 0, exitZ: 0 };
  if (!circleAt(circleLimits(ground), place, circle)) return undefined;
  const profile = wallProfile(ground);
  const arc = makeArc(profile);
  layArc(profile, circle, arc);
  return { arc, circle };
}

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
  const found = laid(ground, [1, 0.8, 0.5]);
  if (found === undefined) throw new RangeError("no circle");
  const factor = circleFactor(found.arc, 1);
  const errors = [500, 20_000].map((n) => Math.abs(thinSlices(ground, found.circle, n).factor / factor - 1));
  expect(errors[1]).toBeLessThan(errors[0]);
  expect(errors[1]).toBeLessThan(5e-5);
});

test("without friction the factor is strength times arc times radius over the moment of the weights, in closed form", () => {
  // no base, a thin wall as heavy as the ground: a vertical step of 4 m in one clay, loaded by 15 kPa behind
  const clay = undrained(40, 18);
  const wall = {
    stemHeight: 4,
    crestWidth: 0.2,
    footWidth: 0.2,
    backRun: 0,
    toe: 0,
    heel: 0,
    thickness: 0,
    unitWeight: 18,
  };
  const ground = ordinaryGround({
    wall,
    behind: { slope: 0, layers: [{ soil: clay }] },
    below: [{ soil: clay }],
    front: { level: 0, ignoreTop: 0, toeSoil: true, soil: clay },
    water: {},
    loads: { surcharge: 15, strips: [], lines: [] },
  });
  const found = laid(ground, [1, 0.7, 0.6]);
  if (found === undefined) throw new RangeError("no circle");
  const { x, z, radius, entryX, exitX } = found.circle;
  const [s1, s2] = [(exitX - x) / radius, (entryX - x) / radius];
  const arcMoment = 40 * radius * radius * (Math.asin(s2) - Math.asin(s1));
  // ground under the arc's chord at z = 0, odd about the centre, drives nothing; the step of 4 m and its load do
  const segment = (from: number, to: number, level: number): number =>
    18 *
    ((level - z) * ((to - x) ** 2 - (from - x) ** 2) * 0.5 +
      -((radius ** 2 - (to - x) ** 2) ** 1.5 - (radius ** 2 - (from - x) ** 2) ** 1.5) / 3);
  const loaded = 0.5 * 15 * ((entryX - x) ** 2 - (0.2 - x) ** 2);
  const driving = segment(exitX, 0, 0) + segment(0, entryX, 4) + loaded;
  expect(found.arc.driving).toBeCloseTo(driving, 8);
  expect(resistingMoment(found.arc, 3)).toBeCloseTo(arcMoment, 8);
  expect(circleFactor(found.arc, 1)).toBeCloseTo(arcMoment / driving, 10);
});

test("the earthquake adds kh times the weight of soil and wall at its height, and none of the load", () => {
  const still = ordinaryGround();
  const shaken = ordinaryGround({ earthquake: { kh: 0.1, kv: 0 } });
  const [a, b] = [laid(still, [1, 0.8, 0.5]), laid(shaken, [1, 0.8, 0.5])];
  if (a === undefined || b === undefined) throw new RangeError("no circle");
  const slices = thinSlices(shaken, b.circle, 10_000).driving - thinSlices(still, a.circle, 10_000).driving;
  expect(b.arc.driving - a.arc.driving).toBeCloseTo(slices, 0);
  const lifted = laid(ordinaryGround({ earthquake: { kh: 0, kv: 1 } }), [1, 0.8, 0.5]);
  const { x, entryX } = a.circle;
  const surcharge = 0.5 * 10 * ((entryX - x) ** 2 - (1.3 - x) ** 2);
  expect(lifted?.arc.driving).toBeCloseTo(surcharge, 8);
});

test("free water in front presses on the end face of the sliding mass", () => {
  const deep = ordinaryGround({ water: { behind: 3, front: 3 } });
  const found = laid(deep, [1, 0.8, 0.5]);
  if (found === undefined) throw new RangeError("no circle");
  const slices = thinSlices(deep, found.circle, 10_000);
  expect(found.arc.driving / slices.driving).toBeCloseTo(1, 4);
  expect(circleFactor(found.arc, 1) / slices.factor).toBeCloseTo(1, 4);
});

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
  for (let i = 0; i < 150; i++) {
    const ground = randomGround(roll);
    const found = laid(ground, [1.5 * roll(), 2 * roll(), 3 * roll()]);
    if (found === undefined) continue;
    const factor = circleFactor(found.arc, 1);
    if (factor === leftOut) {
      out++;
      const slices = thinSlices(ground, found.circle, 1000);
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
  const found = laid(ordinaryGround(), [1, 0.8, 0.5]);
  if (found === undefined) throw new RangeError("no circle");
  const factor = circleFactor(found.arc, 1);
  expect(liesAbove(found.arc, factor * 0.999)).toBe(true);
  expect(liesAbove(found.arc, factor * 1.001)).toBe(false);
});
