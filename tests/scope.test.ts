import { expect, test } from "vitest";
import { evidence } from "../src/evidence.ts";
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
