import { expect, test } from "vitest";
import { runDecision } from "../../../src/decision/decision-run.ts";
import { findFailureCentres } from "../../../src/decision/failure-centres.ts";
import { valueOfInvestigation } from "../../../src/decision/investigation.ts";
import { valueOfPerfectInformation } from "../../../src/decision/perfect-information.ts";
import { valueOfKnowing } from "../../../src/decision/single-signal.ts";
import type { Estimate } from "../../../src/decision/stratified-sample.ts";
import { lognormal } from "../../../src/probability/lognormal.ts";
import { normal } from "../../../src/probability/normal.ts";
import { uniform } from "../../../src/probability/uniform.ts";
import { problemOf, variable } from "../../decision/problems.ts";
import { readCases } from "../cases.ts";

const cases = readCases(new URL("cases.csv", import.meta.url));
const expected = (problem: string, quantity: string): number =>
  Number(cases.find((row) => row.problem === problem && row.quantity === quantity)?.quadrature);

/** Within 4 standard errors (1 in 16 000), and a share of the value for what the rule may lose. */
function expectNear(found: Estimate, value: number, share: number): void {
  expect(Math.abs(found.value - value)).toBeLessThan(4 * found.standardError + share * value + 2e-3);
}

const settings = { seed: "nested", most: 65_536, precision: 0.005 };

test("a wall with two limit states, nature, and drains with a level of their own", () => {
  const roles = ["knowledge", "nature", "knowledge", "knowledge", "nature"] as const;
  const [strength, level, model] = [
    lognormal({ mean: 34, sd: 5 }),
    uniform({ from: 0, to: 2 }),
    lognormal({ mean: 1, sd: 0.1 }),
  ];
  const [known, natural] = [Math.sqrt(0.6), Math.sqrt(0.4)];
  const angle = (z: Float64Array): number => strength.quantileOfNormal(known * z[0] + natural * z[1]);
  const own = (z: Float64Array): number => level.quantileOfNormal(z[2]);
  const drained = (z: Float64Array): number => 0.25 * (1 + Math.tanh(z[4]));
  const margins = (heel: number, wide: number, water: (z: Float64Array) => number) => ({
    sliding: (z: Float64Array) =>
      (model.quantileOfNormal(z[3]) * heel * Math.tan((angle(z) * Math.PI) / 180)) / (0.32 + 0.09 * water(z) ** 2),
    bearing: (z: Float64Array) => (wide * Math.exp(0.11 * (angle(z) - 22))) / (1 + 0.8 * water(z)),
  });
  const problem = problemOf({
    roles,
    options: [
      { name: "base", cost: 0, margins: margins(1, 1, own) },
      { name: "longer", cost: 40, margins: margins(1.2, 1.25, own) },
      { name: "drains", cost: 25, margins: margins(1, 1, drained) },
    ],
    variables: [
      variable("strength", [known, natural, 0, 0, 0], roles, strength),
      variable("level", [0, 0, 1, 0, 0], roles, level),
      variable("model", [0, 0, 0, 1, 0], roles, model),
    ],
    failureCosts: { sliding: 1000, bearing: 600 },
  });
  const run = runDecision(problem, findFailureCentres(problem, "nested"), settings);
  run.basis.outcomes.forEach((outcome, o) => {
    expectNear(outcome.expectedCost, expected("wall", `cost of option ${o}`), 0);
  });
  const tests = { variable: 0, tests: 4, error: 4, sharedError: 0 };
  const reading = { variable: 1, tests: 1, error: 0.3, sharedError: 0 };
  const value = (...informs: (typeof tests)[]): Estimate =>
    valueOfInvestigation(run, { name: String(informs.length), informs }).value;
  expectNear(value(tests), expected("wall", "strength tests"), 0.005);
  expectNear(value(reading), expected("wall", "level reading"), 0.005);
  expectNear(value(tests, reading), expected("wall", "both"), 0.01);
  expectNear(valueOfKnowing(run.basis, run.ledger(0)).value, expected("wall", "know strength"), 0.005);
  expectNear(valueOfKnowing(run.basis, run.ledger(1)).value, expected("wall", "know level"), 0.005);
  expectNear(valueOfPerfectInformation(run.basis, run.modes).value, expected("wall", "perfect"), 0.01);
});

test("ten years with a yearly load, and knowledge of ground and load that is correlated", () => {
  const roles = ["knowledge", "knowledge", "nature", "yearly"] as const;
  const ground = [Math.sqrt(0.5), 0, Math.sqrt(0.5), 0];
  const load = [Math.sqrt(0.3) * 0.5, Math.sqrt(0.3) * Math.sqrt(0.75), 0, Math.sqrt(0.7)];
  const dot = (row: readonly number[], z: Float64Array): number => row.reduce((sum, a, j) => sum + a * z[j], 0);
  const margin = (extra: number) => (z: Float64Array) =>
    1 + (1 + extra + 0.5 * dot(ground, z) - 0.4 * dot(load, z)) / 5;
  const problem = problemOf({
    roles,
    years: 10,
    options: [
      { name: "as it is", cost: 0, margins: { sliding: margin(0) } },
      { name: "stronger", cost: 30, margins: { sliding: margin(0.4) } },
    ],
    variables: [
      variable("ground", ground, roles, normal({ mean: 2, sd: 0.5 })),
      variable("load", load, roles, normal({ mean: 1, sd: 0.4 })),
    ],
    failureCosts: { sliding: 1000 },
  });
  const run = runDecision(problem, findFailureCentres(problem, "nested"), settings);
  run.basis.outcomes.forEach((outcome, o) => {
    expectNear(outcome.expectedCost, expected("years", `cost of option ${o}`), 0);
  });
  const value = (informs: { variable: number; tests: number; error: number; sharedError: number }): Estimate =>
    valueOfInvestigation(run, { name: "tests", informs: [informs] }).value;
  expectNear(value({ variable: 0, tests: 3, error: 0.4, sharedError: 0 }), expected("years", "ground tests"), 0.01);
  expectNear(value({ variable: 1, tests: 2, error: 0.1, sharedError: 0 }), 0, 0);
  expectNear(valueOfKnowing(run.basis, run.ledger(0)).value, expected("years", "know ground"), 0.01);
  expectNear(valueOfPerfectInformation(run.basis, run.modes).value, expected("years", "perfect"), 0.01);
});
