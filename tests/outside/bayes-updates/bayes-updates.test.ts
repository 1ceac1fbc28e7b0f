import { expect, test } from "vitest";
import { normalMoments } from "../../../src/decision/belief-moments.ts";
import { conditionOnResults } from "../../../src/decision/condition-on-results.ts";
import { predictiveScale, updatedMean, updatedMeanAndVariance } from "../../../src/decision/conjugate-normal.ts";
import { evidence } from "../../../src/evidence.ts";
import { betaQuantile } from "../../../src/numeric/incomplete-beta.ts";
import { studentUpperQuantile } from "../../../src/numeric/student-t.ts";
import { normal } from "../../../src/probability/normal.ts";
import { readStudy } from "../../../src/study/read-study.ts";
import { problemOf, variable } from "../../decision/problems.ts";
import { disagreement, readCases } from "../cases.ts";

const rows = readCases(new URL("known-scatter.csv", import.meta.url));

test("the conjugate formula gives the posterior of a normal mean with known scatter", () => {
  for (const row of rows) {
    const prior = { mean: Number(row.prior_mean), sd: Number(row.prior_sd) };
    const scatter = Number(row.scatter);
    const { mean, sd } = updatedMean(prior, Number(row.result_mean), scatter / Math.sqrt(Number(row.n)));
    expect(disagreement("mean", mean, row.mean)).toBe("");
    expect(disagreement("sd", sd, row.sd)).toBe("");
    expect(disagreement("predictive sd", Math.hypot(sd, scatter), row.predictive_sd, 1e-7)).toBe("");
  }
});

test("evidence in a study gives the same posterior", () => {
  for (const row of rows) {
    const results = Array.from({ length: Number(row.n) }, () => row.result_mean).join(", ");
    const study = readStudy(`
title: Known scatter (invented)
wall:
  stem: { height: 4.5, crest_width: 0.3, foot_width: 0.5 }
  base: { toe: 0.8, heel: 2.4, thickness: 0.5 }
  unit_weight: 24
  sliding_friction: { ratio: 0.8 }
soils: { sand: { unit_weight: 18, friction_angle: { normal: { mean: ${row.prior_mean}, sd: ${row.prior_sd} } } } }
ground: { behind: { layers: [ { soil: sand } ] }, below: { soil: sand } }
evidence: [ { results: [${results}], of: soils.sand.friction_angle, error: ${row.scatter} } ]
`);
    const [{ posterior }] = evidence(study, { samples: 1024 })!.variables;
    expect(disagreement("mean", posterior.mean, row.mean)).toBe("");
    expect(disagreement("sd", posterior.sd, row.sd)).toBe("");
  }
});

test("evidence on a normal variable gives the same posterior", () => {
  for (const row of rows) {
    const roles = ["knowledge"] as const;
    const marginal = normal({ mean: Number(row.prior_mean), sd: Number(row.prior_sd) });
    const prior = problemOf({ roles, options: [], variables: [variable("x", [1], roles, marginal)] });
    const results = {
      variable: 0,
      tests: Number(row.n),
      error: Number(row.scatter),
      sharedError: 0,
      mean: Number(row.result_mean),
    };
    const { mean, sd } = normalMoments(conditionOnResults(prior, [results]).variables[0]);
    expect(disagreement("mean", mean, row.mean)).toBe("");
    expect(disagreement("sd", sd, row.sd)).toBe("");
  }
});

test("mean and variance both unknown", () => {
  const prior = { mean: 33, weight: 4, variance: 6.25, degrees: 6 };
  const found = updatedMeanAndVariance(prior, [31.5, 34.0, 36.5, 33.0, 35.0]);
  expect([found.weight, found.degrees]).toEqual([9, 11]);
  expect(disagreement("mean", found.mean, "33.5555556")).toBe("");
  expect(disagreement("variance", found.variance, "4.9292929")).toBe("");
  expect(disagreement("scale", predictiveScale(found), "2.3402974")).toBe("");
  const fractile = found.mean - predictiveScale(found) * studentUpperQuantile(0.05, found.degrees);
  expect(disagreement("5 % fractile", fractile, "29.3526509")).toBe("");
});

test("readings at two places teach about a third between them, through their correlation", () => {
  const roles = ["knowledge", "knowledge", "knowledge"] as const;
  const rho = (d: number): number => Math.exp((-2 * d) / 10);
  // places 0, 8 and 4 m as rows of a Cholesky factor
  const [r08, r04, r84] = [rho(8), rho(4), rho(4)];
  const l22 = Math.sqrt(1 - r08 * r08);
  const l32 = (r84 - r04 * r08) / l22;
  const rows3 = [
    [1, 0, 0],
    [r08, l22, 0],
    [r04, l32, Math.sqrt(1 - r04 * r04 - l32 * l32)],
  ];
  const marginal = normal({ mean: 34, sd: 3 });
  const variables = rows3.map((row, v) => variable(`at ${v}`, row, roles, marginal));
  const reading = (place: number, mean: number) => ({ variable: place, tests: 1, error: 1.5, sharedError: 0, mean });
  const prior = problemOf({ roles, options: [], variables });
  const { mean, sd } = normalMoments(conditionOnResults(prior, [reading(0, 36), reading(1, 33)]).variables[2]);
  expect(disagreement("mean", mean, "34.3094773")).toBe("");
  expect(disagreement("sd", sd, "2.5489159")).toBe("");
});

test("no failure in twenty trials leaves an upper limit", () => {
  expect(disagreement("mean", 1 / 22, "0.0454545")).toBe("");
  expect(disagreement("upper limit", betaQuantile(0.95, 1, 21).x, "0.1329459")).toBe("");
});
