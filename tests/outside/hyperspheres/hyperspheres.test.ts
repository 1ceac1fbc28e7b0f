import { expect, test } from "vitest";
import { findDesignPoints } from "../../../src/reliability/design-points.ts";
import { directionalSampling } from "../../../src/reliability/directional.ts";
import { importanceSampling } from "../../../src/reliability/importance-sampling.ts";
import { subsetSimulation } from "../../../src/reliability/subset-simulation.ts";
import { fourBranches } from "../../reliability/four-branches.ts";
import { standardSpace, statesOfMargins } from "../../reliability/straight-line.ts";
import { readCases } from "../cases.ts";

const rows = readCases(new URL("cases.csv", import.meta.url));
const order = { seed: "spheres", precision: 0.05, samples: 100_000 };
const sphere = (dimension: number, radius: number) =>
  statesOfMargins(dimension, { sphere: (u) => radius - Math.hypot(...u) });

test("directional sampling gives every row of the table to 1e-4 of its value", () => {
  expect(rows.length).toBe(15);
  // bisection leaves the radius uncertain by up to 2e-5, and the tail then by radius · 2e-5 of its value
  for (const { n, radius, Pf_outside } of rows) {
    const found = directionalSampling(sphere(Number(n), Number(radius)), { ...order, samples: 20_000 });
    expect(Math.abs(found.probability / Number(Pf_outside) - 1), `${n} ${radius}`).toBeLessThan(1e-4);
  }
});

test("subset simulation gives the rare rows within its error", () => {
  for (const { n, radius, Pf_outside } of rows.filter((row) => Number(row.Pf_outside) < 1e-3)) {
    const found = subsetSimulation(sphere(Number(n), Number(radius)), { ...order, precision: 0 });
    // at least eight runs: five of its own standard errors, Student's t, fail once in a thousand at worst; four rows, one seed
    expect(Math.abs(found.probability - Number(Pf_outside)), `${n} ${radius}`).toBeLessThan(5 * found.standardError);
    expect(found.standardError).toBeLessThan(0.3 * Number(Pf_outside));
  }
});

test("four branches: importance sampling around the four points, and subset simulation, within their errors", () => {
  const space = standardSpace(2);
  const states = fourBranches(6);
  const { points } = findDesignPoints(states, space, "branches").states[0];
  const exact = 4.457331e-3;
  for (const found of [
    importanceSampling(states, space, points, { ...order, precision: 0.02 }),
    subsetSimulation(states, { ...order, precision: 0.05 }),
    directionalSampling(states, { ...order, precision: 0.02 }),
  ]) {
    expect(Math.abs(found.probability - exact), found.method).toBeLessThan(5 * found.standardError);
    expect(found.standardError, found.method).toBeLessThan(0.15 * exact);
  }
});
