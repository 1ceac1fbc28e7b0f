import { describe, expect, test } from "vitest";
import { normalCdf, normalPdf } from "../../src/numeric/normal.ts";
import type { JointSpace } from "../../src/probability/marginal.ts";
import { periodProbability, yearlyGivenSurvival } from "../../src/reliability/period.ts";
import { type Problem, problemOf } from "./known-problems.ts";

const normal = { kind: "normal", mean: 0, sd: 1 } as const;

/** Strength that stays and a yearly load: fails in a year where load − strength > 2.5·√2. The index of one year is 2.5. */
function strengthAndLoad(): Problem {
  const problem = problemOf(
    { "strength.r": normal, "load.s": normal },
    { sliding: ([r, s]) => 1 + (r - s + 2.5 * Math.SQRT2) / 100 },
  );
  const space: JointSpace = {
    ...problem.space,
    coordinates: problem.space.coordinates.map((coordinate) => ({
      ...coordinate,
      yearly: coordinate.key === "load.s",
      part: "nature",
    })),
  };
  return { states: problem.states, space };
}

/** E[1 − (1 − p(r))^T] with p(r) = Φ(−(r + 2.5√2)), by Simpson over r: the second method. */
function exact(years: number): number {
  const [low, high, steps] = [-9, 9, 20_000];
  const h = (high - low) / steps;
  let sum = 0;
  for (let k = 0; k <= steps; k++) {
    const r = low + k * h;
    const p = normalCdf(-(r + 2.5 * Math.SQRT2));
    sum += (k === 0 || k === steps ? 1 : k % 2 === 1 ? 4 : 2) * normalPdf(r) * -Math.expm1(years * Math.log1p(-p));
  }
  return (sum * h) / 3;
}

const plan = { seed: "period", evaluations: 1_500_000, precision: 0 };

describe("a period of years", () => {
  test("fails with the probability that quadrature gives, shared strength and fresh loads together", async () => {
    const { states, space } = strengthAndLoad();
    const found = await periodProbability(states, space, { ...plan, years: 50 });
    const expected = exact(50);
    expect(found.periods).toBe(30_000);
    // one seed in a million falls outside
    expect(Math.abs(found.probability - expected)).toBeLessThan(
      4.89 * Math.sqrt((expected * (1 - expected)) / found.periods),
    );
    // years as independent, and one year alone, are far off
    expect(1 - (1 - normalCdf(-2.5)) ** 50).toBeGreaterThan(1.5 * expected);
    expect(found.interval[0]).toBeGreaterThan(3 * normalCdf(-2.5));
  });

  test("of one year is one year", async () => {
    const { states, space } = strengthAndLoad();
    const found = await periodProbability(states, space, { ...plan, years: 1, evaluations: 300_000 });
    const p = normalCdf(-2.5);
    expect(Math.abs(found.probability - p)).toBeLessThan(4.89 * Math.sqrt((p * (1 - p)) / 300_000));
  });

  test("year by year given survival, the chance falls: a wall that has stood has shown its strength", async () => {
    const { states, space } = strengthAndLoad();
    const found = await periodProbability(states, space, { ...plan, years: 50 });
    const chances = yearlyGivenSurvival(found).map((chance) => chance ?? 0);
    const mean = (from: number, to: number): number =>
      chances.slice(from, to).reduce((sum, chance) => sum + chance, 0) / (to - from);
    expect(mean(0, 3)).toBeGreaterThan(2 * mean(40, 50));
    expect(found.firstFailures.reduce((sum, count) => sum + count, 0)).toBe(found.failures);
    // second year given survival of the first: 1 − Φ₂-form, E[p(1 − p)]/E[1 − p] by the same quadrature
    const second = (exact(2) - exact(1)) / (1 - exact(1));
    expect(Math.abs(chances[1] - second)).toBeLessThan(4.89 * Math.sqrt(second / found.periods));
  });

  test("gives the same bits for the same seed, stops at the precision asked for, and keeps what it has when stopped", async () => {
    const { states, space } = strengthAndLoad();
    const one = await periodProbability(states, space, { ...plan, years: 20, precision: 0.1 });
    expect(await periodProbability(states, space, { ...plan, years: 20, precision: 0.1 })).toEqual(one);
    expect(one.periods).toBeLessThan(75_000);
    expect(one.standardError / one.probability).toBeLessThanOrEqual(0.1);
    const stop = new AbortController();
    const stopped = await periodProbability(states, space, {
      ...plan,
      years: 20,
      signal: stop.signal,
      onProgress: () => stop.abort(),
    });
    expect(stopped).toMatchObject({ complete: false, periods: 1024 });
  });
});
