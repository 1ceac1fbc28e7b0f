import { describe, expect, test } from "vitest";
import { evidenceOutcome } from "../../src/decision/evidence-outcome.ts";
import { normalCdf, normalPdf, normalUpper } from "../../src/numeric/normal.ts";
import { lognormal } from "../../src/probability/lognormal.ts";
import type { Marginal } from "../../src/probability/marginal.ts";
import { normal } from "../../src/probability/normal.ts";
import { uniform } from "../../src/probability/uniform.ts";
import { planeMargin, problemOf, statesOf, unit, variable } from "./problems.ts";

const roles = ["knowledge", "knowledge", "nature"] as const;
const settings = { seed: "evidence", samples: 32_768 };
const direction = unit([0.6, 0.7, 0.4]).map((x) => -x);

function problemWith(marginal: Marginal, index: number) {
  return problemOf({
    roles,
    options: [{ name: "wall", cost: 0, margins: { sliding: planeMargin(direction, index) } }],
    variables: [variable("x", [1, 0, 0], roles, marginal), variable("y", [0, 1, 0], roles)],
  });
}

describe("five results with a mean of 35, against sums over a fine grid", () => {
  test.each([
    ["normal", normal({ mean: 33, sd: 3 })],
    ["lognormal", lognormal({ mean: 33, sd: 6 })],
    ["uniform", uniform({ from: 28, to: 38 })],
  ])("%s", (_, marginal) => {
    const results = [{ variable: 0, tests: 5, error: 2, sharedError: 0, mean: 35 }];
    const outcome = evidenceOutcome(problemWith(marginal, 3.2), results, settings);
    const rest = Math.sqrt(1 - direction[0] ** 2);
    let [below, failing, first, second] = [0, 0, 0, 0];
    for (let k = -8; k <= 8; k += 0.001) {
      const x = marginal.quantileOfNormal(k);
      const weight = normalPdf(k) * Math.exp(-0.5 * ((35 - x) / (2 / Math.sqrt(5))) ** 2);
      below += weight;
      failing += weight * normalUpper((3.2 - direction[0] * k) / rest);
      first += weight * x;
      second += weight * x * x;
    }
    const { probability, priorProbability, variables, chanceOfSurvival } = outcome;
    // about 1e-5; fails 1 in 16 000
    expect(Math.abs(probability.value - failing / below)).toBeLessThan(
      4 * probability.standardError + (2e-4 * failing) / below,
    );
    expect(probability.standardError).toBeLessThan((0.01 * failing) / below);
    expect(priorProbability.value / normalUpper(3.2)).toBeCloseTo(1, 3);
    expect(chanceOfSurvival).toBeUndefined();
    const mean = first / below;
    const sd = Math.sqrt(second / below - mean * mean);
    expect(Math.abs(variables[0].posterior.mean - mean)).toBeLessThan(0.02 * sd);
    expect(variables[0].posterior.sd / sd).toBeCloseTo(1, 1);
  });
});

describe("a wall that has stood", () => {
  test.each([
    [1.5, 3.2],
    [0.3, 1.6],
  ])("survival index %f, failure index %f, with results on another variable", (level, index) => {
    const e = unit([0.8, 0, 0.6]).map((x) => -x);
    const survivals = [statesOf(["z0", "z1", "z2"], { sliding: planeMargin(e, level) })];
    const problem = { ...problemWith(normal({ mean: 33, sd: 3 }), index), survivals };
    const results = [{ variable: 1, tests: 2, error: 1, sharedError: 0.2, mean: 0.5 }];
    const outcome = evidenceOutcome(problem, results, settings);
    // the results turn z1 into N(m, v); then the failure given e·z = q is a normal tail
    const variance = 1 / (1 + 1 / 0.54);
    const mean = (variance * 0.5) / 0.54;
    const shared = direction.reduce((sum, a, j) => sum + a * e[j], 0);
    const spread = Math.sqrt(direction[0] ** 2 + direction[2] ** 2 + direction[1] ** 2 * variance - shared * shared);
    let failing = 0;
    for (let q = -9; q < level; q += 0.001)
      failing += 0.001 * normalPdf(q) * normalUpper((index - direction[1] * mean - shared * q) / spread);
    const expected = failing / normalCdf(level);
    const { probability, chanceOfSurvival } = outcome;
    expect(Math.abs(probability.value - expected)).toBeLessThan(4.5 * probability.standardError); // fails 1 in 150 000
    expect(probability.standardError).toBeLessThan(0.05 * expected);
    expect(Math.abs(chanceOfSurvival!.value - normalCdf(level))).toBeLessThan(4 * chanceOfSurvival!.standardError);
  });
});

test("results that the beliefs make nearly impossible are found out, alone and together", () => {
  const problem = problemWith(normal({ mean: 33, sd: 3 }), 3);
  const far = { variable: 0, tests: 9, error: 3, sharedError: 0, mean: 50 };
  const { surprises } = evidenceOutcome(problem, [far], settings);
  // 17/√(9 + 1) = 5.376 standard deviations, both sides
  expect(surprises[0].chance / (2 * normalUpper(17 / Math.sqrt(10)))).toBeCloseTo(1, 3);
  expect(surprises[0].chance).toBeLessThan(1e-6);
});
