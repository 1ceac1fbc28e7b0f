import { describe, expect, test } from "vitest";
import { assess } from "../src/assess.ts";
import { decisionModel } from "../src/decision-model.ts";
import { evidence } from "../src/evidence.ts";
import { prepareWall } from "../src/mechanics/prepare-wall.ts";
import { spaceOf } from "../src/model.ts";
import { resultTree } from "../src/report/result-json.ts";
import { scope } from "../src/scope.ts";
import { readStudy } from "../src/study/read-study.ts";

const wall = `
title: Options (invented)
wall:
  stem: { height: 5.0, crest_width: 0.30, foot_width: 0.55 }
  base: { toe: 0.9, heel: 2.8, thickness: 0.55 }
  unit_weight: 24.5
  sliding_friction: { ratio: 0.82 }
soils:
  fill: { unit_weight: { normal: { mean: 19.5, cov: 0.05 } }, friction_angle: { normal: { mean: 37, sd: 2 } } }
  sand:
    unit_weight: 18.2
    friction_angle:
      normal: { mean: 34.5 }
      scatter: { inherent: 0.08, scale_of_fluctuation: 1.5, averaged_over: 6.0, measurement: 0.03, transformation: 0.05, tests: 3 }
ground:
  behind: { layers: [ { soil: fill, bottom: 2.6 }, { soil: sand } ] }
  below: { soil: sand }
water: { behind: { level: { triangular: { from: 0.4, peak: 1.4, to: 3.9 } } } }
assessment: { limit_states: [sliding, overturning, bearing], seed: options, target: { reliability_index: 3.1 } }
`;
const decision = `
decision:
  currency: EUR
  failure_cost: 2400000
  options:
    - { name: As drawn, cost: 0 }
    - { name: Longer heel, cost: 14000, change: { wall.base.heel: 3.4 } }
    - { name: Drains, cost: 9000, change: { water.behind.level: { triangular: { from: 0.2, peak: 0.6, to: 2.2 } } } }
`;
const investigations = `
  investigations:
    - { name: Shear boxes, cost: 2500, informs: soils.sand.friction_angle, tests: 6, error: 2.0 }
    - { name: Standpipe, cost: 3000, informs: water.behind.level, tests: 2, error: 0.25 }
    - { name: Density, cost: 900, informs: soils.fill.unit_weight, tests: 4, error: 0.6 }
`;
const read = (text: string) => readStudy(text, { notAvailable: [] });

test("options, investigations and their bounds are consistent, in the words of the study", async () => {
  const result = await scope(read(wall + decision + investigations), { samples: 65_536 });
  expect(result.options.map((option) => option.name)).toEqual(["As drawn", "Longer heel", "Drains"]);
  const best = result.options.find((option) => option.name === result.bestOption)!;
  for (const option of result.options) {
    expect(option.expectedCost).toBeGreaterThanOrEqual(best.expectedCost);
    expect(option.expectedCost - option.cost).toBeCloseTo(2_400_000 * option.probability, 4);
    expect(option.meetsTarget).toBe(option.probability <= result.target!.probability);
  }
  const [boxes, standpipe] = result.investigations;
  expect(boxes.netValue).toBeCloseTo(boxes.value - 2500, 9);
  const slack = (error: number): number => 4 * error + 1;
  expect(boxes.value).toBeLessThan(result.perfectByVariable["soils.sand.friction_angle"] + slack(boxes.standardError));
  expect(standpipe.value).toBeLessThan(result.perfectByVariable["water.behind.level"] + slack(standpipe.standardError));
  for (const one of result.investigations)
    expect(one.value).toBeLessThan(result.perfectInformation + slack(one.standardError));
  expect(result.pairs).toHaveLength(3);
  expect(new Set(result.ranking)).toEqual(new Set(["Shear boxes", "Standpipe", "Density"]));
  expect(result.proposals).toEqual([]);
  expect(result.cautions[0]).toMatch(/target reliability governs/);
  const keys = Object.keys(resultTree(result) as object);
  for (const key of ["options", "best_option", "perfect_information", "perfect_by_variable", "investigations"])
    expect(keys).toContain(key);
});

test("a study without investigations is given proposals for each variable that tests can inform", async () => {
  const result = await scope(read(wall + decision), { samples: 32_768 });
  expect(result.investigations).toEqual([]);
  expect(result.proposals.map((proposal) => proposal.path)).toEqual([
    "soils.fill.unit_weight",
    "soils.fill.friction_angle",
    "soils.sand.friction_angle",
    "water.behind.level",
  ]);
  for (const { points } of result.proposals) expect(points[0]).toEqual({ tests: 0, value: 0, standardError: 0 });
});

test("a study without a decision is told so", async () => {
  await expect(scope(read(wall))).rejects.toThrow(/decision: is missing/);
});

test("evidence: results by the conjugate formula, survival lowers the probability", () => {
  const seen = `
evidence:
  - { results: [36.1, 37.9, 36.4], of: soils.fill.friction_angle, error: 2.5 }
  - { survived: { water.behind.level: 3.2 } }
`;
  const found = evidence(read(wall + seen), { samples: 16_384 })!;
  const fill = found.variables.find(({ path }) => path === "soils.fill.friction_angle")!;
  expect(fill.prior).toEqual({ mean: 37, sd: 2 });
  expect(found.chanceOfEvidence).toBeGreaterThan(0.5);
  expect(found.chanceOfEvidence).toBeLessThan(1);
  expect(found.probability).toBeLessThan(found.priorProbability);
  expect(found.conflicts).toEqual([]);
  expect(evidence(read(wall))).toBeUndefined();
});

describe("knowledge and nature in unequal shares", () => {
  const shares = (level: string, period: string) =>
    read(`
title: Shares (invented)
wall:
  stem: { height: 5.0, crest_width: 0.30, foot_width: 0.55 }
  base: { toe: 0.9, heel: 2.4, thickness: 0.55 }
  unit_weight: 24.5
  sliding_friction: { ratio: 0.82 }
soils:
  fill:
    unit_weight: 19.5
    friction_angle:
      normal: { mean: 36 }
      scatter: { inherent: 0.06, scale_of_fluctuation: 2, averaged_over: 4, measurement: 0.03 }
  sand: { unit_weight: 18.2, friction_angle: { measured: [33.1, 35.4, 31.8, 36.0, 34.2] } }
ground: { behind: { layers: [ { soil: fill, bottom: 2.6 }, { soil: sand } ] }, below: { soil: sand } }
water: { behind: { level: { gumbel: { mean: 1.5, sd: 0.5 }${level} } } }
correlations:
  - { between: [soils.fill.friction_angle, soils.sand.friction_angle], coefficient: 0.5 }
  - { between: [water.behind.level, soils.sand.friction_angle], coefficient: -0.1 }
assessment: { limit_states: [sliding, overturning, bearing], seed: shares${period} }
decision: { currency: EUR, failure_cost: 1000000, options: [ { name: As drawn, cost: 0 } ] }
`);

  test.each([
    ["the ground as it is", "", ""],
    ["a period of one year", ", yearly: true, knowledge: 0.3", ", period: 1"],
  ])("assess and the base option of scope agree, and correlation is kept: %s", async (_, level, period) => {
    const study = shares(level, period);
    const assessed = await assess(study, { samples: 65_536, precision: 0, method: "plain" });
    const { options } = await scope(study, { samples: 16_384 });
    const { probability, standardError } = assessed.bestEstimate;
    // each fails 1 in 15 000
    const allowed = 4 * Math.hypot(standardError, options[0].probabilityStandardError);
    expect(Math.abs(options[0].probability - probability)).toBeLessThan(allowed);
    expect(allowed).toBeLessThan(0.2 * probability);
    const { monteCarlo } = assessed.system;
    expect(Math.abs(monteCarlo.probability - probability)).toBeLessThan(
      4 * Math.hypot(standardError, monteCarlo.standardError),
    );
    const kappas = assessed.variables.map(({ knowledge }) => knowledge);
    expect(new Set(kappas).size).toBe(3);
    // the split moves nothing: the same study with the shares left out of account
    const whole = decisionModel(study).problem.variables;
    const [fill, sand] = ["soils.fill.friction_angle", "soils.sand.friction_angle"].map(
      (path) => whole.find((one) => one.path === path)!.image.row,
    );
    const together = spaceOf(study, prepareWall(study), false);
    const row = (path: string) => together.rows[together.unknowns.findIndex((one) => one.path === path)];
    const dot = (a: Float64Array, b: Float64Array) => a.reduce((sum, x, j) => sum + x * b[j], 0);
    expect(dot(fill, sand)).toBeCloseTo(dot(row("soils.fill.friction_angle"), row("soils.sand.friction_angle")), 10);
  });
});

test("where the target must be met, the cheapest option is closed and the choice falls on one that meets it", async () => {
  const strict = `
decision:
  currency: EUR
  failure_cost: 1000
  must_meet_target: true
  options:
    - { name: As drawn, cost: 0 }
    - { name: Longer heel, cost: 14000, change: { wall.base.heel: 3.6 }, always_open: true }
    - { name: Dearer still, cost: 20000, change: { wall.base.heel: 3.8 } }
`;
  const result = await scope(read(wall + strict), { samples: 8192 });
  const [drawn, longer, dearer] = result.options;
  expect(drawn.meetsTarget).toBe(false);
  expect(drawn.open).toBe(false);
  expect(drawn.expectedCost).toBeLessThan(longer.expectedCost);
  expect(longer.open).toBe(true);
  expect(dearer.open).toBe(dearer.meetsTarget);
  expect(result.bestOption).toBe("Longer heel");
  expect(result.target?.mustMeet).toBe(true);
});
