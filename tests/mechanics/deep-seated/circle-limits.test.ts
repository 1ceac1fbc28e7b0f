import { expect, test } from "vitest";
import { circleLimits } from "../../../src/mechanics/deep-seated/circle-limits.ts";
import { drained, ordinaryGround } from "./random-ground.ts";

test("entries reach 4 wall heights behind the heel, exits 3 in front of the toe", () => {
  const limits = circleLimits(ordinaryGround());
  expect(limits.height).toBe(5.5);
  expect(limits.heelX).toBeCloseTo(3.7, 12);
  expect(limits.farthestEntry).toBeCloseTo(3.7 + 22, 12);
  expect(limits.exitWay).toBeCloseTo(16.5, 12);
  expect(limits.exitLevel).toBeCloseTo(0.7, 12);
});

test("firm ground lies a wall height below the underside unless it is given", () => {
  expect(circleLimits(ordinaryGround()).levels.at(-1)).toBe(-5.5);
  expect(circleLimits(ordinaryGround({ firmLevel: -2 })).levels.at(-1)).toBe(-2);
});

test("boundaries of layers are levels, from the top down, between underside and firm ground", () => {
  const soil = drained(30);
  const below = [{ soil, bottom: -1 }, { soil, bottom: -4 }, { soil }];
  const behind = { slope: 0, layers: [{ soil, bottom: -0.5 }, { soil }] };
  const limits = circleLimits(ordinaryGround({ below, behind, firmLevel: -3 }));
  expect(Array.from(limits.levels)).toEqual([-0.5, -1, -3, -3]);
});

test("the corners of a key are corners that circles keep below", () => {
  const wall = { ...ordinaryGround().wall, key: { fromToe: 1.5, width: 0.4, depth: 0.6 } };
  const limits = circleLimits(ordinaryGround({ wall }));
  expect(Array.from(limits.cornersX)).toEqual([0, 3.7, 1.5, 1.9]);
  expect(Array.from(limits.cornersZ)).toEqual([0, 0, -0.6, -0.6]);
});
