import { expect, test } from "vitest";
import { buildModel, type Model } from "../../../src/model.ts";
import { findDesignPoints } from "../../../src/reliability/design-points.ts";
import { firstOrderResult, refined } from "../../../src/reliability/first-order.ts";
import { dot } from "../../../src/reliability/point-evaluator.ts";
import { readStudy } from "../../../src/study/read-study.ts";
import { type Case, disagreement, readCases } from "../cases.ts";

function wall(kind: string, correlation: number): Model {
  const text = `
title: Reference wall, dry
wall:
  stem: { height: 5.0, crest_width: 0.4, foot_width: 0.4 }
  base: { toe: 0.8, heel: 2.0, thickness: 0.5 }
  unit_weight: 25
  sliding_friction: { angle: { ${kind}: { mean: 25, cov: 0.10 } } }
soils:
  fill:
    unit_weight: { ${kind}: { mean: 18, cov: 0.05 } }
    friction_angle: { ${kind}: { mean: 34, cov: 0.10 } }
  below: { unit_weight: 18, friction_angle: 30 }
ground:
  behind: { layers: [ { soil: fill } ] }
  below: { soil: below }
${correlation === 0 ? "" : `correlations: [ { between: [soils.fill.unit_weight, soils.fill.friction_angle], coefficient: ${correlation} } ]`}
assessment: { limit_states: [sliding] }
`;
  return buildModel(readStudy(text));
}

const paths = {
  gamma: "soils.fill.unit_weight",
  phi: "soils.fill.friction_angle",
  delta: "wall.sliding_friction.angle",
};

/** Half a unit in the last printed digit of a number in scientific notation. */
const printedTolerance = (text: string): number => {
  const [digits, power] = text.split("e");
  return 0.501 * 10 ** (Number(power) - (digits.split(".")[1]?.length ?? 0));
};

function faultsOf(row: Case): readonly string[] {
  const { states, space } = wall(row.kind, Number(row.correlation));
  const search = findDesignPoints(states, space, "reference wall").states[0];
  const found = firstOrderResult(states, space, search);
  const [{ point }] = refined(states, search.points);
  const faults = [
    disagreement("index", found.reliabilityIndex!, row.index),
    disagreement("probability", found.probability!, row.first_order, printedTolerance(row.first_order)),
  ];
  const own = (path: string): number => dot(space.rows[space.unknowns.findIndex((one) => one.path === path)], point);
  // independent normals in the order γ, φ, δ, as printed
  const [gamma, phi, delta] = Object.values(paths).map(own);
  const rho = Number(row.correlation);
  faults.push(
    disagreement("u of gamma", gamma, row.u_gamma),
    disagreement("u of phi", (phi - rho * gamma) / Math.sqrt(1 - rho * rho), row.u_phi),
    disagreement("u of delta", delta, row.u_delta),
  );
  for (const [name, path] of Object.entries(paths))
    faults.push(disagreement(`x of ${name}`, found.designPoint[path], row[`x_${name}`]));
  return faults.filter((fault) => fault !== "");
}

test("index, probability and design point agree to the printed digits", () => {
  const rows = readCases(new URL("cases.csv", import.meta.url));
  expect(rows.length).toBe(3);
  for (const row of rows) expect(faultsOf(row), `${row.kind} ${row.correlation}`).toEqual([]);
});
