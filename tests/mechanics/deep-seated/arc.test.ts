import { expect, test } from "vitest";
import { resistingMoment } from "../../../src/mechanics/deep-seated/bishop.ts";
import { circleFactor } from "../../../src/mechanics/deep-seated/circle-factor.ts";
import { layCircle } from "./laid-circle.ts";
import { ordinaryGround, undrained } from "./random-ground.ts";
import { thinSlices } from "./thin-slices.ts";

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
  const found = layCircle(ground, [1, 0.7, 0.6]);
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
  const [a, b] = [layCircle(still, [1, 0.8, 0.5]), layCircle(shaken, [1, 0.8, 0.5])];
  const slices = thinSlices(shaken, b.circle, 10_000).driving - thinSlices(still, a.circle, 10_000).driving;
  expect(b.arc.driving - a.arc.driving).toBeCloseTo(slices, 0);
  const lifted = layCircle(ordinaryGround({ earthquake: { kh: 0, kv: 1 } }), [1, 0.8, 0.5]);
  const { x, entryX } = a.circle;
  const surcharge = 0.5 * 10 * ((entryX - x) ** 2 - (1.3 - x) ** 2);
  expect(lifted.arc.driving).toBeCloseTo(surcharge, 8);
});

test("free water in front presses on the end face of the sliding mass", () => {
  const deep = ordinaryGround({ water: { behind: 3, front: 3 } });
  const found = layCircle(deep, [1, 0.8, 0.5]);
  const slices = thinSlices(deep, found.circle, 10_000);
  expect(found.arc.driving / slices.driving).toBeCloseTo(1, 4);
  expect(circleFactor(found.arc, 1) / slices.factor).toBeCloseTo(1, 4);
});
