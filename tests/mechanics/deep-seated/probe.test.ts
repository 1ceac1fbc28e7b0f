import { expect, test } from "vitest";
import { leftOut } from "../../../src/mechanics/deep-seated/circle-factor.ts";
import { factorAt, factorBelow, momentsAt, probeOf } from "../../../src/mechanics/deep-seated/probe.ts";
import { ordinaryGround } from "./random-ground.ts";

const place = [1, 0.8, 0.5];

test("a probe counts the circles it tries, and not the places without one", () => {
  const probe = probeOf(ordinaryGround());
  factorAt(probe, place);
  factorAt(probe, [1.2, 0.8, 0.5]);
  expect(factorAt(probe, [-1, 0.8, 0.5])).toBe(leftOut);
  expect(probe.evaluations).toBe(2);
});

test("a factor above the bound is not worked out, one below it is the same as without a bound", () => {
  const probe = probeOf(ordinaryGround());
  const factor = factorAt(probe, place);
  expect(factorBelow(probe, place, factor * 0.99)).toBe(leftOut);
  expect(factorBelow(probe, place, factor * 1.01) / factor).toBeCloseTo(1, 8);
});

test("the moments of a circle are in the ratio of its factor", () => {
  const probe = probeOf(ordinaryGround());
  const factor = factorAt(probe, place);
  const { resisting, driving } = momentsAt(probe, place, factor);
  expect(resisting / driving / factor).toBeCloseTo(1, 7);
});
