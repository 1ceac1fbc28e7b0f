import { describe, expect, test } from "vitest";
import { drawBeliefs } from "../../src/decision/belief-sample.ts";
import { type DecisionBasis, decisionBasis } from "../../src/decision/decision-basis.ts";
import { drawFailures } from "../../src/decision/failure-sample.ts";
import { knowledgeLedger } from "../../src/decision/knowledge-ledger.ts";
import { beliefMixture, failureMixture } from "../../src/decision/mixture.ts";
import { valueOfKnowing, valueOfTests } from "../../src/decision/single-signal.ts";
import { integrate } from "../../src/numeric/gauss-legendre.ts";
import { normalPdf, normalUpper } from "../../src/numeric/normal.ts";
import { findRoot } from "../../src/numeric/root.ts";
import { lognormal } from "../../src/probability/lognormal.ts";
import { planeCentre, planeMargin, problemOf, unit, variable } from "./problems.ts";

/** Two options over planes in the same direction; failure costs a million. */
function basisOf(
  direction: readonly number[],
  [base, longer]: readonly [number, number],
  price: number,
  samples = 65_536,
): DecisionBasis {
  const roles = direction.map((): "knowledge" => "knowledge");
  const axis = (j: number): number[] => direction.map((_, i) => (i === j ? 1 : 0));
  const problem = problemOf({
    roles,
    options: [
      { name: "base", cost: 0, margins: { sliding: planeMargin(direction, base) } },
      { name: "longer", cost: price, margins: { sliding: planeMargin(direction, longer) } },
    ],
    variables: [
      ...direction.map((_, j) => variable(`x${j}`, axis(j), roles)),
      variable("lognormal", axis(0), roles, lognormal({ mean: 30, sd: 6 })),
    ],
  });
  const centres = [planeCentre(direction, base, 0), planeCentre(direction, longer, 1)];
  const plan = { seed: "planes", purpose: "decision", samples, folds: 10 };
  const failures = drawFailures(problem, failureMixture(centres, 2, direction.length), plan);
  return decisionBasis(problem, failures, drawBeliefs(problem, beliefMixture([], direction.length), plan));
}

/** The same by one-dimensional quadrature: the signal S explains r of the direction. */
function exactValue([base, longer]: readonly [number, number], price: number, r: number): number {
  const rest = Math.sqrt(1 - r * r);
  const first = (s: number): number => 1e6 * normalUpper((base - r * s) / rest);
  const second = (s: number): number => price + 1e6 * normalUpper((longer - r * s) / rest);
  const tips = findRoot((s) => first(s) - second(s), -8, base).x;
  const seen =
    integrate((s) => normalPdf(s) * first(s), -9, tips, 200) + integrate((s) => normalPdf(s) * second(s), tips, 9, 200);
  return Math.min(1e6 * normalUpper(base), price + 1e6 * normalUpper(longer)) - seen;
}

describe("two options, one normal variable, linear margin", () => {
  const indices = [3, 3.8] as const;
  const basis = basisOf([1], indices, 3000, 262_144);
  const ledger = knowledgeLedger(basis, basis.problem.variables[0]);
  test.each([1, 4, 16])("%i tests of one standard deviation: quadrature to four digits", (tests) => {
    const { value } = valueOfTests(basis, ledger, { variable: 0, tests, error: 1, sharedError: 0 });
    const expected = exactValue(indices, 3000, Math.sqrt(1 / (1 + 1 / tests)));
    expect(Math.abs(value.value / expected - 1)).toBeLessThan(1e-4);
  });
  test("an error that the tests share counts beside their own", () => {
    const { value } = valueOfTests(basis, ledger, { variable: 0, tests: 4, error: 1, sharedError: 0.3 });
    const expected = exactValue(indices, 3000, Math.sqrt(1 / (1 + 0.25 + 0.09)));
    expect(Math.abs(value.value / expected - 1)).toBeLessThan(1e-4);
  });
});

describe("two variables, the second unknown to the tests", () => {
  const indices = [3, 3.8] as const;
  const basis = basisOf(unit([0.8, 0.6, 0]), indices, 3000);
  const { variables } = basis.problem;
  const value = (v: number, tests: number, error = 1) =>
    valueOfTests(basis, knowledgeLedger(basis, variables[v]), { variable: v, tests, error, sharedError: 0 });
  const perfect = valueOfKnowing(basis, knowledgeLedger(basis, variables[0]));

  test("values lie within four standard errors of the quadrature (a correct one fails 1 in 16 000)", () => {
    for (const tests of [1, 2, 5, 20]) {
      const found = value(0, tests);
      const expected = exactValue(indices, 3000, 0.8 * Math.sqrt(1 / (1 + 1 / tests)));
      expect(Math.abs(found.value.value - expected)).toBeLessThan(4 * found.value.standardError);
      expect(found.value.standardError).toBeLessThan(0.01 * expected);
    }
  });

  test("no tests are worth nothing; endless tests what perfect knowledge is worth; in between it rises", () => {
    expect(value(0, 0).value).toEqual({ value: 0, standardError: 0 });
    const values = [1, 2, 4, 8, 16, 1e7].map((n) => value(0, n).value.value);
    const slack = 2 * perfect.value.standardError;
    for (let k = 1; k < values.length; k++) expect(values[k]).toBeGreaterThan(values[k - 1] - slack);
    expect(Math.abs(values[5] - perfect.value.value)).toBeLessThan(slack);
    expect(Math.max(...values)).toBeLessThan(perfect.value.value + slack);
  });

  test("a variable that changes nothing is worth nothing within its error", () => {
    const found = value(2, 10);
    expect(Math.abs(found.value.value)).toBeLessThan(4 * found.value.standardError + 1e-3 * perfect.value.value);
  });

  test("the rule says in the variable's own unit where the decision tips", () => {
    const { steps, chanceItChangesTheDecision } = value(0, 4);
    expect(steps.map((step) => step.option)).toEqual([0, 1]);
    // where 1e6 (Φ(−(3 − r s)/c) − Φ(−(3.8 − r s)/c)) = 3000 with r = 0.8·√0.8: s = 1.5160, in results times √1.25
    const r = 0.8 * Math.sqrt(0.8);
    const rest = Math.sqrt(1 - r * r);
    const tips = findRoot(
      (s) => 1e6 * (normalUpper((3 - r * s) / rest) - normalUpper((3.8 - r * s) / rest)) - 3000,
      -8,
      3,
    ).x;
    expect(steps[0].to).toBeCloseTo(tips * Math.sqrt(1.25), 1);
    const { value: chance, standardError } = chanceItChangesTheDecision;
    expect(Math.abs(chance - normalUpper(tips))).toBeLessThan(5 * standardError + 1e-3);
  });

  test("a lognormal variable, with the exact likelihood of its mean result", () => {
    const marginal = variables[3].marginal;
    const sd = 5 / Math.sqrt(3);
    const found = valueOfTests(basis, knowledgeLedger(basis, variables[3]), {
      variable: 3,
      tests: 3,
      error: 5,
      sharedError: 0,
    });
    // by quadrature over k and the mean result
    const cost = (k: number, o: number): number => o * 3000 + 1e6 * normalUpper((indices[o] - 0.8 * k) / 0.6);
    let seen = 0;
    for (let x = 5; x <= 110; x += 0.25) {
      const sums = [0, 1].map((o) => {
        let sum = 0;
        for (let k = -6; k <= 6; k += 0.05)
          sum += 0.05 * normalPdf(k) * (normalPdf((x - marginal.quantileOfNormal(k)) / sd) / sd) * cost(k, o);
        return sum;
      });
      seen += 0.25 * Math.min(...sums);
    }
    const expected = 1e6 * normalUpper(3) - seen;
    expect(Math.abs(found.value.value - expected)).toBeLessThan(4 * found.value.standardError + 1e-3 * expected);
  });
});
