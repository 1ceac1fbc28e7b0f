import { expect, test } from "vitest";
import { probeOf } from "../../../src/mechanics/deep-seated/probe.ts";
import { resultOf } from "../../../src/mechanics/deep-seated/result.ts";
import { ordinaryGround } from "./random-ground.ts";

test("the deepest valley is the result, with its circle, its place and its moments", () => {
  const ground = ordinaryGround();
  const probe = probeOf(ground);
  const result = resultOf(ground, probe, [{ place: [1, 0.8, 0.5], factor: 2 }]);
  expect(result.factor).toBe(2);
  expect(result.place).toEqual({ entry: 1, exit: 0.8, depth: 0.5 });
  expect(result.circle?.entryX).toBeCloseTo(3.7 + 5.5, 12);
  expect(result.driving).toBeGreaterThan(0);
});

test("without a valley the result is the cap without a circle", () => {
  const ground = ordinaryGround();
  const { factor, circle, place } = resultOf(ground, probeOf(ground), []);
  expect([factor, circle, place]).toEqual([1000, undefined, undefined]);
});
