import { expect, test } from "vitest";
import {
  baseWidth,
  crestOfBack,
  loweredFront,
  virtualTop,
  wallHeight,
} from "../../../src/mechanics/deep-seated/ground.ts";
import { ordinaryGround } from "./random-ground.ts";

test("the outline follows from the wall's dimensions", () => {
  const ground = ordinaryGround({ behind: { slope: Math.atan(0.5), layers: ordinaryGround().behind.layers } });
  const wall = { ...ground.wall, backRun: 0.1 };
  expect(baseWidth(wall)).toBeCloseTo(3.7, 12);
  expect(wallHeight(wall)).toBe(5.5);
  expect(crestOfBack(wall)).toBeCloseTo(1.2, 12);
  expect(virtualTop({ ...ground, wall })).toBeCloseTo(5.5 + 2.5 * 0.5, 12);
  expect(loweredFront(ground)).toBeCloseTo(0.7, 12);
});
