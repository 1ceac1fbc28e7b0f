import { expect, test } from "vitest";
import { designFrictionAngle, designStudy, designValue } from "../../src/mechanics/design-values.ts";
import { type PartialFactors, unfactored } from "../../src/mechanics/partial-factors.ts";
import { quantityAt } from "../../src/study/quantities.ts";
import { readStudy } from "../../src/study/read-study.ts";
import { plain } from "../study/fixtures/read.ts";

const factors: PartialFactors = {
  actions: { permanentUnfavourable: 1.35, permanentFavourable: 0.9, variable: 1.5 },
  strength: { tanFrictionAngle: 1.25, cohesion: 1.4, undrainedStrength: 1.6, unitWeight: 1.1 },
  resistance: { sliding: 1, bearing: 1, passive: 1 },
};

test("the factor of friction divides its tangent", () => {
  expect(designFrictionAngle(30, 1.25)).toBeCloseTo(24.791, 3); // atan(tan 30°/1.25)
  expect(designFrictionAngle(0, 1.25)).toBe(0);
  expect(designFrictionAngle(33, 1)).toBeCloseTo(33, 12);
});

test.each([
  ["soils.sand.friction_angle", 30, designFrictionAngle(30, 1.25)],
  ["soils.sand.cohesion", 14, 10],
  ["soils.sand.undrained_strength", 80, 50],
  ["soils.sand.unit_weight", 19.8, 18],
  ["soils.sand.saturated_unit_weight", 22, 20],
  ["wall.sliding_friction.angle", 30, designFrictionAngle(30, 1.25)],
  ["wall.sliding_friction.ratio", 0.8, 0.8],
  ["wall.sliding_friction.adhesion", 7, 5],
  ["model.wall_friction", 20, designFrictionAngle(20, 1.25)],
  ["wall.unit_weight", 24, 24],
  ["wall.stem.height", 5, 5],
  ["loads.surcharge.pressure", 10, 10],
])("%s of %f becomes %f", (path, value, expected) => {
  expect(designValue(path, value, factors)).toBeCloseTo(expected, 12);
});

const study = readStudy(plain);
const means = {
  "soils.fill.friction_angle": 35,
  "soils.sand.unit_weight": 18,
  "soils.sand.friction_angle": 32,
  "water.behind.level": 1,
};

test("a design study holds numbers alone, strengths over their factors, and leaves the study as it was", () => {
  const before = structuredClone(study);
  const design = designStudy(study, means, factors);
  expect(quantityAt(design, "soils.sand.friction_angle")).toBeCloseTo(designFrictionAngle(32, 1.25), 12);
  expect(quantityAt(design, "water.behind.level")).toBe(1);
  expect(quantityAt(design, "soils.sand.unit_weight")).toBeCloseTo(18 / 1.1, 12);
  expect(design.correlations).toEqual([]);
  expect(study).toEqual(before);
});

test("a saturated unit weight that is left out follows the moist one before the factor", () => {
  const design = designStudy(study, means, factors);
  for (const name of Object.keys(study.soils))
    if (study.soils[name].saturatedUnitWeight === undefined) {
      const moist = Number(quantityAt(design, `soils.${name}.unit_weight`)) * 1.1;
      expect(quantityAt(design, `soils.${name}.saturated_unit_weight`)).toBeCloseTo((moist + 2) / 1.1, 10);
    }
});

test("loads take the variable factor only where asked", () => {
  const text = `${plain}\n`;
  const loaded = readStudy(text.includes("surcharge") ? text : `${text}loads: { surcharge: { pressure: 10 } }\n`);
  const plainLoad = Number(quantityAt(loaded, "loads.surcharge.pressure"));
  expect(quantityAt(designStudy(loaded, means, factors), "loads.surcharge.pressure")).toBe(plainLoad);
  expect(quantityAt(designStudy(loaded, means, factors, "factored"), "loads.surcharge.pressure")).toBeCloseTo(
    1.5 * plainLoad,
    12,
  );
});

test("a missing value of an uncertain quantity is a broken promise", () => {
  expect(() => designStudy(study, {}, unfactored)).toThrow(RangeError);
});
