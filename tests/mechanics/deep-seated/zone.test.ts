import { expect, test } from "vitest";
import { layerAt, momentTo, weightTo, zoneOf, zonesOf } from "../../../src/mechanics/deep-seated/zone.ts";
import { ordinaryGround } from "./random-ground.ts";

const soil = (unitWeight: number) => ({
  unitWeight,
  saturatedUnitWeight: unitWeight + 3,
  frictionAngle: unitWeight / 100,
  cohesion: unitWeight / 10,
});
const dry = Number.NEGATIVE_INFINITY;
const three = zoneOf([{ soil: soil(15), bottom: 2 }, { soil: soil(16), bottom: -1 }, { soil: soil(17) }]);

test("weights are counted from the underside, layer by layer, up and down", () => {
  expect(weightTo(three, 0, dry)).toBe(0);
  expect(weightTo(three, 3, dry)).toBeCloseTo(2 * 16 + 15, 12);
  expect(weightTo(three, -2.5, dry)).toBeCloseTo(-16 - 1.5 * 17, 12);
  expect(momentTo(three, 0, dry)).toBe(0);
  expect(momentTo(three, 3, dry)).toBeCloseTo(2 * 16 * 1 + 15 * 2.5, 12);
  expect(momentTo(three, -2.5, dry)).toBeCloseTo(16 * 0.5 + 1.5 * 17 * 1.75, 12);
});

test("soil below the water level is saturated, and what lies above carries on from there", () => {
  expect(weightTo(three, 3, 1) - weightTo(three, -2, 1)).toBeCloseTo(15 + 16 + 2 * 19 + 20, 12);
  expect(weightTo(three, 3, 1) - weightTo(three, 1.5, 1)).toBeCloseTo(15 + 0.5 * 16, 12);
  expect(momentTo(three, 3, 1) - momentTo(three, -1, 1)).toBeCloseTo(15 * 2.5 + 16 * 1.5 + 2 * 19 * 0, 12);
});

test("a boundary belongs to the layer below it", () => {
  expect([2.1, 2, 0, -1, -5].map((z) => layerAt(three, z))).toEqual([0, 1, 1, 2, 2]);
});

test("a layer whose bottom lies above that of the layer over it has no thickness", () => {
  const crossed = zoneOf([{ soil: soil(15), bottom: 1 }, { soil: soil(99), bottom: 2 }, { soil: soil(17) }]);
  const plain = zoneOf([{ soil: soil(15), bottom: 1 }, { soil: soil(17) }]);
  for (const z of [3, 1.5, 0.5, -2]) expect(weightTo(crossed, z, dry)).toBeCloseTo(weightTo(plain, z, dry), 12);
});

test("the last layer behind gives way to the soil below at the underside", () => {
  const ground = ordinaryGround({ behind: { slope: 0, layers: [{ soil: soil(15) }] }, below: [{ soil: soil(20) }] });
  const { behind } = zonesOf(ground);
  expect(weightTo(behind, 1, dry) - weightTo(behind, -1, dry)).toBeCloseTo(15 + 20, 12);
});

test("the last layer behind goes on downwards where its top lies below the underside", () => {
  const layers = [{ soil: soil(15), bottom: -0.5 }, { soil: soil(16) }];
  const ground = ordinaryGround({ behind: { slope: 0, layers }, below: [{ soil: soil(20) }] });
  const { behind, under } = zonesOf(ground);
  expect(weightTo(behind, 1, dry) - weightTo(behind, -2, dry)).toBeCloseTo(1.5 * 15 + 1.5 * 16, 12);
  expect(weightTo(under, 0, dry) - weightTo(under, -2, dry)).toBeCloseTo(40, 12);
});

test("in front the front soil stands on the layers below the underside", () => {
  const front = { level: 2, ignoreTop: 0, toeSoil: true, soil: soil(12) };
  const below = [{ soil: soil(20), bottom: -1 }, { soil: soil(22) }];
  const zone = zonesOf(ordinaryGround({ front, below })).front;
  expect(weightTo(zone, 2, dry) - weightTo(zone, -3, dry)).toBeCloseTo(2 * 12 + 20 + 2 * 22, 12);
});
