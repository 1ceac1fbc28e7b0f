import { expect, test } from "vitest";
import { circleAt, type SlipCircle } from "../../../src/mechanics/deep-seated/circle.ts";
import { circleLimits } from "../../../src/mechanics/deep-seated/circle-limits.ts";
import { loweredFront, virtualTop } from "../../../src/mechanics/deep-seated/ground.ts";
import { blankCircle as blank } from "./laid-circle.ts";
import { dice, ordinaryGround, randomGround } from "./random-ground.ts";

const levelOf = (c: SlipCircle, x: number): number => c.z - Math.sqrt(c.radius ** 2 - (x - c.x) ** 2);

test("every circle keeps to the rules, over 150 random walls and any place asked for", () => {
  const roll = dice(11);
  let circles = 0;
  for (let i = 0; i < 150; i++) {
    const ground = randomGround(roll);
    const limits = circleLimits(ground);
    const [top, exitLevel] = [virtualTop(ground), loweredFront(ground)];
    const firm = ground.firmLevel ?? -limits.height;
    for (let k = 0; k < 12; k++) {
      const c = blank();
      // a third of the exits near the foot of the face under the toe, where there is one
      const exit = k % 3 === 0 ? Math.max(-exitLevel, 0) / limits.height + 0.2 * roll() - 0.1 : 5 * roll() - 1;
      if (!circleAt(limits, [6 * roll() - 1, exit, 6 * roll() - 1], c)) continue;
      circles++;
      const slack = 1e-6 * limits.height;
      expect(Math.hypot(c.entryX - c.x, c.entryZ - c.z)).toBeCloseTo(c.radius, 6);
      expect(Math.hypot(c.exitX - c.x, c.exitZ - c.z)).toBeCloseTo(c.radius, 6);
      expect(c.z).toBeGreaterThan(Math.max(c.entryZ, c.exitZ) - slack);
      expect(c.entryX).toBeGreaterThanOrEqual(limits.heelX);
      expect(c.entryX).toBeLessThanOrEqual(limits.heelX + 4 * limits.height + slack);
      expect(c.entryZ).toBeCloseTo(top + (c.entryX - limits.heelX) * Math.tan(ground.behind.slope), 9);
      expect(c.exitX).toBeLessThanOrEqual(0);
      expect(c.exitX).toBeGreaterThanOrEqual(-3 * limits.height - slack);
      if (c.exitX < 0) expect(c.exitZ).toBeCloseTo(exitLevel, 9);
      else expect(c.exitZ).toBeGreaterThanOrEqual(Math.min(exitLevel, 0));
      for (let p = 0; p < limits.cornersX.length; p++)
        expect(levelOf(c, limits.cornersX[p])).toBeLessThanOrEqual(limits.cornersZ[p] + slack);
      if (c.exitX < 0) expect(levelOf(c, 0)).toBeLessThanOrEqual(Math.min(exitLevel, 0) + slack);
      const lowest = c.x > c.exitX ? c.z - c.radius : c.exitZ;
      expect(lowest).toBeGreaterThan(firm - slack);
    }
  }
  expect(circles).toBeGreaterThan(900);
});

test("depth 0 touches the heel or the key, depth 1 is tangent to the first level", () => {
  const ground = ordinaryGround({ firmLevel: -3 });
  const limits = circleLimits(ground);
  const c = blank();
  expect(circleAt(limits, [1, 0.8, 0], c)).toBe(true);
  expect(Math.max(levelOf(c, 0), levelOf(c, 3.7))).toBeCloseTo(0, 9);
  circleAt(limits, [2, 1.5, limits.levels.length], c);
  expect(c.z - c.radius).toBeCloseTo(-3, 9);
  const wall = { ...ground.wall, key: { fromToe: 1.8, width: 0.4, depth: 0.7 } };
  circleAt(circleLimits({ ...ground, wall }), [1, 0.8, 0], c);
  expect(Math.max(levelOf(c, 1.8), levelOf(c, 2.2))).toBeCloseTo(-0.7, 9);
});

test("circles are tangent to each boundary of layers on the way down", () => {
  const sand = ordinaryGround().below[0].soil;
  const below = [{ soil: sand, bottom: -1 }, { soil: sand, bottom: -2 }, { soil: sand }];
  const limits = circleLimits(ordinaryGround({ below }));
  const c = blank();
  const lowest = Array.from(limits.levels.keys(), (i) => {
    circleAt(limits, [1.2, 1, i + 1], c);
    return c.z - c.radius;
  });
  expect(Array.from(limits.levels)).toEqual([0, -1, -2, -5.5]);
  expect(lowest[1]).toBeCloseTo(-1, 9);
  expect(lowest[2]).toBeCloseTo(-2, 9);
  expect(lowest[3]).toBeGreaterThanOrEqual(-5.5 - 1e-9);
});

test("where the firm level leaves no room under the base there is no circle", () => {
  const limits = circleLimits(ordinaryGround({ firmLevel: -0.01 }));
  for (const entry of [0.2, 1, 2, 4]) expect(circleAt(limits, [entry, 1, 0], blank())).toBe(false);
});

test("circles leave through the face under the toe where the ground in front is dug away below the underside", () => {
  const front = { ...ordinaryGround().front, level: 0, ignoreTop: 1 };
  const limits = circleLimits(ordinaryGround({ front }));
  const c = blank();
  circleAt(limits, [1, 0.5 / 5.5, 0], c);
  expect([c.exitX, c.exitZ]).toEqual([0, -0.5]);
  circleAt(limits, [1, 3 / 5.5, 0], c);
  expect([c.exitX, c.exitZ]).toEqual([-2, -1]);
});
