import { expect, test } from "vitest";
import { normalUpper } from "../../src/numeric/normal.ts";
import type { LimitStates } from "../../src/reliability/limit-states.ts";
import type { SamplingEstimate, SamplingOrder } from "../../src/reliability/sampling-estimate.ts";
import { fourBranches } from "./four-branches.ts";
import { statesOfMargins, straightLine } from "./straight-line.ts";

/** What every method that needs no design point must hold, whatever way it samples. */
export function samplingLaws(
  name: SamplingEstimate["method"],
  sample: (states: LimitStates, order: SamplingOrder) => SamplingEstimate,
): void {
  test.each([
    ["a line", straightLine(2.5), normalUpper(2.5)],
    // Waarts (2000): four design points; the exact value is in tests/outside/series-systems
    ["four branches", fourBranches(6), 4.457331e-3],
  ])("%s: intervals cover in nearly all of 20 seeds", (_, states, expected) => {
    const runs = Array.from({ length: 20 }, (_, seed) =>
      sample(states, { seed: `${name} ${seed}`, precision: 0.1, samples: 60_000 }),
    );
    const covered = runs.filter(({ interval: [low, high] }) => low <= expected && expected <= high).length;
    expect(covered).toBeGreaterThanOrEqual(15); // at 95 % coverage fewer come once in 3000
    for (const { method, probability, standardError } of runs) {
      expect(method).toBe(name);
      expect(standardError / probability).toBeLessThan(0.13);
    }
  });

  test("counts its evaluations where the limit states do", () => {
    const states = straightLine(2);
    const { evaluations } = sample(states, { seed: "count", precision: 0.2, samples: 40_000 });
    expect(evaluations).toBe(states.evaluations.exact + states.evaluations.batched);
  });

  test("a smaller error is bought with more evaluations", () => {
    const run = (precision: number): { evaluations: number; standardError: number } =>
      sample(straightLine(2), { seed: "more", precision, samples: 400_000 });
    expect(run(0.03).evaluations).toBeGreaterThan(run(0.2).evaluations);
    expect(run(0.03).standardError).toBeLessThan(run(0.2).standardError);
  });

  test("no failure leaves a doubt, and no NaN", () => {
    const found = sample(statesOfMargins(2, { never: (u) => 30 - u[0] }), {
      seed: "never",
      precision: 0.1,
      samples: 20_000,
    });
    expect(found.probability).toBe(0);
    expect(found.interval[0]).toBe(0);
    expect(found.doubts).toHaveLength(1);
  });

  test("the same seed gives the same bits, another seed other ones", () => {
    const run = (seed: string): number =>
      sample(straightLine(2), { seed, precision: 0.2, samples: 20_000 }).probability;
    expect(run("a")).toBe(run("a"));
    expect(run("b")).not.toBe(run("a"));
  });
}
