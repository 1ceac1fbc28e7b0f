import { expect, test } from "vitest";
import { check } from "../../src/check.ts";
import { actionFactor, type DesignCheck, designCheck } from "../../src/mechanics/design-check.ts";
import { baseGroundOf } from "../../src/mechanics/design-resistance.ts";
import { designStudy } from "../../src/mechanics/design-values.ts";
import { type PartialFactors, unfactored } from "../../src/mechanics/partial-factors.ts";
import type { Force, LimitStateCheck } from "../../src/results.ts";
import { readDocument } from "../../src/study/read-study.ts";
import type { LimitStateName } from "../../src/study/study.ts";
import { randomStudy, type StudyTree } from "./random-study.ts";

function designOf(tree: StudyTree, factors: PartialFactors): DesignCheck {
  const study = designStudy(readDocument(tree), {}, factors);
  const plain = check(study);
  return designCheck(
    plain,
    {
      ground: baseGroundOf(study, plain),
      passiveInOverturning: study.ground.front.inOverturning,
      eccentricityLimit: study.assessment.eccentricityLimit,
    },
    factors,
  );
}

const withActions = (actions: Partial<PartialFactors["actions"]>): PartialFactors => ({
  ...unfactored,
  actions: { ...unfactored.actions, ...actions },
});

test("with all factors 1 the ratios are the factors of safety wherever no load would help, over 150 random walls", () => {
  let compared = 0;
  for (let seed = 1; seed <= 150; seed++) {
    const tree = randomStudy(seed);
    const plain = check(readDocument(tree));
    const { limitStates } = designOf(tree, unfactored);
    for (const [name, state] of Object.entries(plain.limitStates) as [LimitStateName, LimitStateCheck][]) {
      const found = limitStates[name];
      if (found === undefined) throw new RangeError(`seed ${seed}: no ${name}`);
      // a favourable variable action is left out even where all factors are 1
      if (found.forceFactors.includes(0)) continue;
      compared++;
      expect(found.ratio / Math.max(state.factorOfSafety, 1e-9), `seed ${seed}, ${name}`).toBeCloseTo(
        state.factorOfSafety > 0 ? 1 : 0,
        6,
      );
    }
  }
  expect(compared).toBeGreaterThan(350);
});

const force = (group: Force["group"], horizontal: number, vertical: number, name = "x"): Force => ({
  name,
  group,
  horizontal,
  vertical,
  x: 1,
  z: 1,
});

test("each force takes the factor of its group", () => {
  const factors: PartialFactors = {
    ...unfactored,
    actions: { permanentUnfavourable: 1.35, permanentFavourable: 0.9, variable: 1.5 },
    resistance: { sliding: 1, bearing: 1, passive: 1.4 },
  };
  expect(actionFactor(force("earth", 10, 0), true, factors)).toBe(1.35);
  expect(actionFactor(force("weight", 0, 10), false, factors)).toBe(0.9);
  expect(actionFactor(force("water", 10, 0), true, factors)).toBe(1.35);
  expect(actionFactor(force("surcharge", 10, 0), true, factors)).toBe(1.5);
  expect(actionFactor(force("surcharge", 0, 10), false, factors)).toBe(0);
  expect(actionFactor(force("inertia", 10, 0), true, factors)).toBe(1);
  expect(actionFactor(force("earth", 10, 0, "Earthquake increment"), true, factors)).toBe(1);
  expect(actionFactor(force("front", -10, 0), false, factors)).toBeCloseTo(1 / 1.4, 12);
});

/** A wall whose forces can be summed by hand: 4 m of dry sand, level, smooth, a load behind. */
const simple = (): StudyTree => ({
  ...randomStudy(1),
  wall: {
    stem: { height: 4, crest_width: 0.4, foot_width: 0.4, back_run: 0 },
    base: { toe: 0.6, heel: 2, thickness: 0.4 },
    unit_weight: 25,
    sliding_friction: { ratio: 1, adhesion: 0 },
  },
  soils: { sand: { unit_weight: 20, saturated_unit_weight: 21, friction_angle: 30, cohesion: 0 } },
  ground: {
    behind: { slope: 0, layers: [{ soil: "sand" }] },
    below: { soil: "sand" },
    front: { level: 0.5, soil: "sand", mobilised: 0.5, ignore_top: 0, toe_soil: false, in_overturning: false },
  },
  water: { flow: "hydrostatic" },
  loads: { surcharge: { pressure: 12, on_heel: false }, strips: [], lines: [] },
  model: {
    earth_pressure: "rankine",
    bearing: "en1997",
    tension_crack: "dry",
    factors: { earth_thrust: 1, base_resistance: 1, bearing_capacity: 1 },
  },
});

test("sliding of a simple wall, by hand", () => {
  const factors: PartialFactors = {
    ...unfactored,
    actions: { permanentUnfavourable: 1.35, permanentFavourable: 0.95, variable: 1.5 },
    resistance: { sliding: 1.1, bearing: 1.4, passive: 1.4 },
  };
  const weight = 25 * (0.4 * 4 + 3 * 0.4) + 20 * 2 * 4;
  const earth = (20 * 4.4 ** 2) / 2 / 3;
  const load = (12 * 4.4) / 3;
  const passive = (0.5 * 3 * 20 * 0.5 ** 2) / 2;
  const driving = 1.35 * earth + 1.5 * load;
  const resisting = (0.95 * weight * Math.tan(Math.PI / 6)) / 1.1 + passive / 1.4;
  const { sliding, overturning } = designOf(simple(), factors).limitStates;
  expect(sliding?.driving).toBeCloseTo(driving, 8);
  expect(sliding?.resisting).toBeCloseTo(resisting, 8);
  expect(sliding?.ratio).toBeCloseTo(resisting / driving, 8);
  const [stem, slab, soil] = [25 * 1.6 * 0.8, 25 * 1.2 * 1.5, 20 * 8 * 2];
  expect(overturning?.resisting).toBeCloseTo(0.95 * (stem + slab + soil), 8);
  expect(overturning?.driving).toBeCloseTo((1.35 * earth * 4.4) / 3 + (1.5 * load * 4.4) / 2, 8);
});

test("strength factors act through the whole calculation: earth pressure at tan φ/γ", () => {
  const strength = { ...unfactored.strength, tanFrictionAngle: 1.25 };
  const { forces } = designOf(simple(), { ...unfactored, strength });
  const phi = Math.atan(Math.tan(Math.PI / 6) / 1.25);
  const ka = Math.tan(Math.PI / 4 - phi / 2) ** 2;
  expect(forces.find(({ group }) => group === "earth")?.horizontal).toBeCloseTo((ka * 20 * 4.4 ** 2) / 2, 8);
});

test("bearing counts the worse of weights favourable and unfavourable", () => {
  const heavy = designOf(simple(), withActions({ permanentUnfavourable: 1.35 })).limitStates.bearing;
  const one = designOf(simple(), withActions({ permanentUnfavourable: 1.0 })).limitStates.bearing;
  expect(heavy?.ratio).toBeLessThan(one?.ratio ?? 0);
  expect(["favourable", "unfavourable"]).toContain(heavy?.weights);
  const light = designOf(simple(), withActions({ permanentFavourable: 0.5 })).limitStates.bearing;
  expect(light?.weights).toBe("favourable");
});

test("a load on the heel is left out where it would help, and counts where it presses", () => {
  const tree = simple();
  tree.loads.surcharge = { pressure: 12, on_heel: true };
  const { sliding, bearing } = designOf(tree, withActions({ variable: 1.5 })).limitStates;
  const { forces } = designOf(tree, withActions({ variable: 1.5 }));
  const onHeel = forces.findIndex(({ group, vertical }) => group === "surcharge" && vertical > 0);
  expect(onHeel).toBeGreaterThanOrEqual(0);
  expect(sliding?.forceFactors[onHeel]).toBe(0);
  expect(bearing?.forceFactors[onHeel]).toBe(bearing?.weights === "unfavourable" ? 1.5 : 0);
});

test("greater factors never raise a ratio, over 60 random walls", () => {
  const harder: PartialFactors = {
    actions: { permanentUnfavourable: 1.35, permanentFavourable: 1, variable: 1.5 },
    strength: { tanFrictionAngle: 1, cohesion: 1, undrainedStrength: 1, unitWeight: 1 },
    resistance: { sliding: 1.1, bearing: 1.4, passive: 1.4 },
  };
  for (let seed = 1; seed <= 60; seed++) {
    const tree = randomStudy(seed);
    const [easy, hard] = [designOf(tree, unfactored).limitStates, designOf(tree, harder).limitStates];
    for (const name of ["sliding", "bearing"] as const)
      expect(hard[name]?.ratio ?? 0).toBeLessThanOrEqual((easy[name]?.ratio ?? 0) * (1 + 1e-9));
  }
});

test("deep-seated failure is taken from a check of its own, and left out without one", () => {
  const deepSeated: LimitStateCheck = { factorOfSafety: 1.2, resisting: 120, driving: 100, unit: "kNm/m" };
  const study = designStudy(readDocument(simple()), {}, unfactored);
  const plain = check(study);
  const withDeep = { ...plain, limitStates: { ...plain.limitStates, deep_seated: deepSeated } };
  const setting = { ground: baseGroundOf(study, plain), passiveInOverturning: false };
  expect(designCheck(withDeep, { ...setting, deepSeated }, unfactored).limitStates.deep_seated?.ratio).toBe(1.2);
  expect(designCheck(withDeep, setting, unfactored).limitStates.deep_seated).toBeUndefined();
});
