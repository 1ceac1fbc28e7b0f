import { expect, test } from "vitest";
import { normalCdf } from "../../src/numeric/normal.ts";
import type { JointSpace, Marginal } from "../../src/probability/marginal.ts";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import { findDesignPoints } from "../../src/reliability/design-points.ts";
import { firstOrderResult, type RemadeAt } from "../../src/reliability/first-order.ts";
import type { FirstOrderResult } from "../../src/results.ts";
import { spaceOf, standardSpace, statesOf, statesOfMargins } from "./straight-line.ts";

const normal = (mean: number, sd: number): Marginal => marginalOf({ kind: "normal", mean, sd });
const lognormal = (mean: number, sd: number): Marginal => marginalOf({ kind: "lognormal", mean, sd, shift: 0 });

function resultOf(space: JointSpace, factor: (x: readonly number[]) => number, remadeAt?: RemadeAt): FirstOrderResult {
  const states = statesOf(space, { sliding: factor });
  return firstOrderResult(states, space, findDesignPoints(states, space, "first order").states[0], remadeAt);
}

const ratio = ([r, s]: readonly number[]): number => (s > 0 ? r / s : 1000);

test("resistance and load: index, design point, importance as in the closed form", () => {
  const found = resultOf(spaceOf([normal(15, 2), normal(10, 1.5)]), ratio);
  expect(found).toMatchObject({ converged: true, status: "smooth" });
  expect(found.reliabilityIndex).toBeCloseTo(2, 8);
  expect(found.probability).toBeCloseTo(normalCdf(-2), 10);
  expect(found.designPoint.x1).toBeCloseTo(15 - (2 * 4) / 2.5, 6);
  expect(found.designPoint.x2).toBeCloseTo(10 + (2 * 2.25) / 2.5, 6);
  expect(found.importance.x1).toBeCloseTo(0.64, 6);
  expect(found.importance.x2).toBeCloseTo(0.36, 6);
});

test("derivatives of the index to means and standard deviations as in the closed form", () => {
  // β = (μR − μS)/√(σR² + σS²)
  const { derivatives } = resultOf(spaceOf([normal(15, 2), normal(10, 1.5)]), ratio);
  expect(derivatives!.x1.perMean).toBeCloseTo(1 / 2.5, 6);
  expect(derivatives!.x2.perMean).toBeCloseTo(-1 / 2.5, 6);
  expect(derivatives!.x1.perSd).toBeCloseTo((-2 * 2) / 6.25, 6);
  expect(derivatives!.x2.perSd).toBeCloseTo((-2 * 1.5) / 6.25, 6);
});

test("with a marginal that is made anew they are those of its kind: lognormal resistance and load", () => {
  const index = (mean: number, sd: number): number => {
    const v = [(sd / mean) ** 2, 0.2 ** 2];
    return Math.log((mean / 10) * Math.sqrt((1 + v[1]) / (1 + v[0]))) / Math.sqrt(Math.log((1 + v[0]) * (1 + v[1])));
  };
  const remadeAt: RemadeAt = () => (mean, sd) => lognormal(mean, sd);
  const { derivatives, reliabilityIndex } = resultOf(spaceOf([lognormal(20, 3), lognormal(10, 2)]), ratio, remadeAt);
  expect(reliabilityIndex).toBeCloseTo(index(20, 3), 7);
  const h = 1e-4;
  expect(derivatives!.x1.perMean).toBeCloseTo((index(20 + h, 3) - index(20 - h, 3)) / (2 * h), 5);
  expect(derivatives!.x1.perSd).toBeCloseTo((index(20, 3 + h) - index(20, 3 - h)) / (2 * h), 5);
});

test("with correlation the importance is that of the unknowns, whatever the order of the coordinates", () => {
  const rho = 0.6;
  const rest = Math.sqrt(1 - rho * rho);
  const first = resultOf(
    spaceOf(
      [normal(15, 2), normal(10, 1.5)],
      [
        [1, 0],
        [rho, rest],
      ],
    ),
    ratio,
  );
  const second = resultOf(
    spaceOf(
      [normal(15, 2), normal(10, 1.5)],
      [
        [rest, rho],
        [0, 1],
      ],
    ),
    ratio,
  );
  expect(first.reliabilityIndex).toBeCloseTo(5 / Math.sqrt(4 + 2.25 - 2 * rho * 3), 7);
  expect(second.reliabilityIndex).toBeCloseTo(first.reliabilityIndex!, 8);
  // the margin moves by 2 per unit of the first normal and by 1.5 of the second
  expect(first.importance.x1).toBeCloseTo(4 / 6.25, 5);
  expect(second.importance.x1).toBeCloseTo(4 / 6.25, 5);
});

test("an unknown spread over two coordinates counts as one", () => {
  const found = resultOf(
    spaceOf(
      [normal(15, 2), normal(10, 1.5)],
      [
        [Math.sqrt(0.3), Math.sqrt(0.7), 0],
        [0, 0, 1],
      ],
    ),
    ratio,
  );
  expect(found.reliabilityIndex).toBeCloseTo(2, 7);
  expect(found.importance.x1).toBeCloseTo(0.64, 5);
});

test("further design points stand beside the nearest", () => {
  const states = statesOfMargins(2, { either: (u) => Math.min(3 - u[0], 3.5 + u[0]) });
  const found = firstOrderResult(states, standardSpace(2), findDesignPoints(states, standardSpace(2), "two").states[0]);
  expect(found.reliabilityIndex).toBeCloseTo(3, 7);
  expect(found.others!.map((other) => other.reliabilityIndex)).toEqual([expect.closeTo(3.5, 5)]);
});

test("nothing found is a result: not converged, without a number", () => {
  const found = resultOf(standardSpace(2), () => 5);
  expect(found).toMatchObject({
    converged: false,
    status: "none",
    reliabilityIndex: null,
    probability: null,
    designPoint: {},
  });
  expect(found.evaluations).toBeGreaterThan(0);
});

test("an origin on the surface has index 0 and an importance by its gradient", () => {
  const states = statesOfMargins(2, { line: (u) => 3 * u[0] + 4 * u[1] });
  const found = firstOrderResult(
    states,
    standardSpace(2),
    findDesignPoints(states, standardSpace(2), "zero").states[0],
  );
  expect(found.reliabilityIndex).toBeCloseTo(0, 8);
  expect(found.importance.x1).toBeCloseTo(0.36, 5);
});
