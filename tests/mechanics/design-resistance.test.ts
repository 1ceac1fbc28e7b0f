import { expect, test } from "vitest";
import { type BaseGround, baseResistance, bearingCapacity } from "../../src/mechanics/design-resistance.ts";

const ground: BaseGround = {
  width: 3,
  undrained: false,
  tanBaseFriction: 0.5,
  adhesion: 4,
  frictionAngle: Math.PI / 6,
  cohesion: 0,
  unitWeight: 18,
  saturatedUnitWeight: 20,
  waterDepth: Number.POSITIVE_INFINITY,
  surcharge: 10,
  bearing: "en1997",
  baseFactor: 1,
  bearingFactor: 1,
};

test("drained: friction on the normal force, adhesion on the compressed length", () => {
  expect(baseResistance(ground, { normal: 200, horizontal: 50, effectiveWidth: 2.5 })).toBeCloseTo(100 + 4 * 3, 12);
  expect(baseResistance(ground, { normal: 200, horizontal: 50, effectiveWidth: 1 })).toBeCloseTo(100 + 4 * 1.5, 12);
  expect(baseResistance(ground, { normal: -1, horizontal: 50, effectiveWidth: 1 })).toBe(0);
});

test("undrained: strength on the effective width", () => {
  const clay = { ...ground, undrained: true, cohesion: 60 };
  expect(baseResistance(clay, { normal: 200, horizontal: 50, effectiveWidth: 2 })).toBeCloseTo(120, 12);
  expect(bearingCapacity(clay, { normal: 200, horizontal: 0, effectiveWidth: 2 })).toBeCloseTo(
    (Math.PI + 2) * 60 + 10,
    10,
  );
});

test("a vertical load on a strip: q0 Nq + ½ γ B′ Nγ, with the textbook factors of 30°", () => {
  // Nq = 18.401, Nγ = 2 (Nq − 1) tan φ = 20.093
  const capacity = bearingCapacity(ground, { normal: 200, horizontal: 0, effectiveWidth: 2 });
  expect(capacity).toBeCloseTo(10 * 18.4011 + 0.5 * 18 * 2 * 20.0931, 2);
});

test("water at the underside makes the soil below buoyant", () => {
  const wet = bearingCapacity({ ...ground, waterDepth: 0 }, { normal: 200, horizontal: 0, effectiveWidth: 2 });
  expect(wet).toBeCloseTo(10 * 18.4011 + 0.5 * (20 - 9.81) * 2 * 20.0931, 2);
});
