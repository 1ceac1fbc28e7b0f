import { expect, test } from "vitest";
import { drawBeliefs } from "../../../src/decision/belief-sample.ts";
import { bestRule, type CellSums, valueOfCells } from "../../../src/decision/cell-rule.ts";
import { decisionBasis } from "../../../src/decision/decision-basis.ts";
import { drawFailures } from "../../../src/decision/failure-sample.ts";
import { beliefMixture, failureMixture } from "../../../src/decision/mixture.ts";
import { bestStagePlan } from "../../../src/decision/two-stage-rule.ts";
import { normalUpper } from "../../../src/numeric/normal.ts";
import { planeCentre, planeMargin, problemOf, unit } from "../../decision/problems.ts";
import { disagreement } from "../cases.ts";

const weak = 0.3;
// build (0) loses 100 where the layer is weak; treat (1) costs 20; treating is best today
const terms = { prices: [0, 20], today: 1 };
const table = (belief: number[], weakHere: number[]): CellSums => ({
  belief: Float64Array.from(belief),
  loss: [Float64Array.from(weakHere, (p) => 100 * p), new Float64Array(belief.length)],
});

test("one test: its value, and that of perfect information", () => {
  const [positive, negative] = [0.9 * weak + 0.2 * (1 - weak), 0.1 * weak + 0.8 * (1 - weak)];
  expect(disagreement("P(+)", positive, "0.41")).toBe("");
  expect(disagreement("P(weak | +)", (0.9 * weak) / positive, "0.6585366")).toBe("");
  expect(disagreement("P(weak | −)", (0.1 * weak) / negative, "0.0508475")).toBe("");
  const seen = table([positive, negative], [0.9 * weak, 0.1 * weak]);
  const fold = { cells: 2, belief: [seen.belief], loss: [seen.loss] };
  expect(valueOfCells(fold, terms).value).toBeCloseTo(8.8, 12);
  expect([...valueOfCells(fold, terms).rule]).toEqual([1, 0]);
  const known = table([weak, 1 - weak], [weak, 0]);
  expect(valueOfCells({ cells: 2, belief: [known.belief], loss: [known.loss] }, terms).value).toBeCloseTo(14, 12);
});

test("a second test after the first: the plan found is the best of all nine", () => {
  const joint = [
    [0.9 * 0.8, 0.9 * 0.2, 0.1 * 0.8, 0.1 * 0.2], // ++, +−, −+, −− where weak
    [0.2 * 0.1, 0.2 * 0.9, 0.8 * 0.1, 0.8 * 0.9], // and where not
  ];
  const belief = joint[0].map((p, c) => weak * p + (1 - weak) * joint[1][c]);
  const weakHere = joint[0].map((p) => weak * p);
  const price = 1;
  const costOf = (after: readonly string[]): number =>
    after.reduce((sum, what, first) => {
      const cells = [2 * first, 2 * first + 1];
      const build = (c: number): number => 100 * weakHere[c];
      const treat = (c: number): number => 20 * belief[c];
      if (what === "build") return sum + cells.reduce((s, c) => s + build(c), 0);
      if (what === "treat") return sum + cells.reduce((s, c) => s + treat(c), 0);
      return sum + cells.reduce((s, c) => s + Math.min(build(c), treat(c)) + price * belief[c], 0);
    }, 0);
  const whats = ["build", "treat", "test"];
  const least = Math.min(...whats.flatMap((a) => whats.map((b) => costOf([a, b]))));
  const first = table(
    [belief[0] + belief[1], belief[2] + belief[3]],
    [weakHere[0] + weakHere[1], weakHere[2] + weakHere[3]],
  );
  const plan = bestStagePlan(first, [{ cost: price, cells: 2, sums: table(belief, weakHere) }], terms, bestRule);
  expect(20 - plan.gain).toBeCloseTo(least, 12);
  // after a bad first result one treats at once; after a good one a second test is worth its price
  expect(plan.actions.map((action) => action.kind)).toEqual(["build", "investigate"]);
  expect(plan.actions[0]).toEqual({ kind: "build", option: 1 });
});

test("drainage of a slope: probabilities, expected costs, and the decision", () => {
  const roles = ["nature", "nature"] as const;
  // fails where 10 h − 20 d > 0, in standard normals: −4 z_d + 7.5 z_h > margin
  const direction = unit([-4, 7.5]);
  const index = (h: number): number => (50 - 10 * h) / 8.5;
  const option = (name: string, cost: number, h: number) => ({
    name,
    cost,
    margins: { sliding: planeMargin(direction, index(h)) },
  });
  const problem = problemOf({
    roles,
    variables: [],
    failureCosts: { sliding: 5_000_000 },
    options: [option("as it is", 0, 4), option("drainage", 150_000, 3.52)],
  });
  expect(disagreement("index", index(4), "1.176471")).toBe("");
  const centres = [planeCentre(direction, index(4), 0), planeCentre(direction, index(3.52), 1)];
  const plan = { seed: "slope", purpose: "test", samples: 16_384, folds: 2 };
  const basis = decisionBasis(
    problem,
    drawFailures(problem, failureMixture(centres, 2, 2), plan),
    drawBeliefs(problem, beliefMixture([], 2), plan),
  );
  const [now, drained] = basis.outcomes;
  // samples spread evenly along the direction of failure leave an error of about 1e-5
  expect(now.probability.value / 0.119703).toBeCloseTo(1, 3);
  expect(drained.probability.value / 0.040826).toBeCloseTo(1, 3);
  expect(now.probability.value / normalUpper(index(4))).toBeCloseTo(1, 3);
  expect(Math.abs(now.expectedCost.value - 598_517)).toBeLessThan(600);
  expect(Math.abs(drained.expectedCost.value - 354_132)).toBeLessThan(350);
  expect(problem.options[basis.today].name).toBe("drainage");
});
