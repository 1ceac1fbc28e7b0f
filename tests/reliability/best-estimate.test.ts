import { describe, expect, test } from "vitest";
import { gammaUpper } from "../../src/numeric/incomplete-gamma.ts";
import { normalUpper } from "../../src/numeric/normal.ts";
import { type BestOfMethods, bestEstimate, plainSampling } from "../../src/reliability/best-estimate.ts";
import type { LimitStates } from "../../src/reliability/limit-states.ts";
import type { SamplingEstimate, SamplingMethod } from "../../src/reliability/sampling-estimate.ts";
import { fourBranches } from "./four-branches.ts";
import { standardSpace, statesOfMargins, straightLine } from "./straight-line.ts";

const order = { seed: "best", precision: 0.05, samples: 300_000 };

const best = (states: LimitStates, more: Partial<Parameters<typeof bestEstimate>[2]> = {}): BestOfMethods =>
  bestEstimate(states, standardSpace(states.dimension), { ...order, ...more });

/** Five standard errors: one seed in two million. */
function expectNear({ probability, standardError }: SamplingEstimate, expected: number): void {
  expect(Math.abs(probability - expected)).toBeLessThan(5 * standardError);
}

describe("the method is chosen", () => {
  test.each([
    ["plain sampling for common failures", straightLine(1), "plain", normalUpper(1)],
    ["plain sampling where the means fail", straightLine(-1), "plain", normalUpper(-1)],
    ["importance sampling for rare ones with a design point", straightLine(4.5, 6), "importance", normalUpper(4.5)],
    // Waarts (2000); the exact value is in tests/outside/series-systems
    ["importance sampling around four design points", fourBranches(6), "importance", 4.457331e-3],
  ] as const)("%s", (_, states, method, expected) => {
    const found = best(states);
    expect(found.method).toBe(method);
    expect(found.crossCheck?.agrees).toBe(true);
    expect(found.crossCheck?.estimate.method).not.toBe(method);
    expectNear(found, expected);
  });

  test("subset simulation where no point stands out: a sphere in twenty dimensions", () => {
    const found = best(statesOfMargins(20, { sphere: (u) => 7 - Math.hypot(...u) }));
    expect(found.method).toBe("subset");
    expect(found.reason).toContain("in doubt");
    expect(found.crossCheck).toMatchObject({ agrees: true, estimate: { method: "plain" } });
    expectNear(found, gammaUpper(10, 24.5));
  });

  test("where nothing fails within reach plain sampling gives at least an upper limit", () => {
    const found = best(statesOfMargins(2, { never: (u) => 30 - u[0] }), { samples: 20_000 });
    expect(found).toMatchObject({ method: "plain", probability: 0, doubts: ["no sample failed"] });
    expect(found.interval[1]).toBeLessThan(3e-4);
    expect(found.reason).toContain("found no failure");
  });
});

test.each(["plain", "latin_hypercube", "sobol", "importance", "subset", "directional"] as const)(
  "%s is taken where it is asked for",
  (method: SamplingMethod) => {
    const found = best(straightLine(2.2, 3), { method, precision: 0.1 });
    expect(found.method).toBe(method);
    expect(found.reason).toBe("asked for");
    expect(found.crossCheck?.agrees).toBe(true);
    expectNear(found, normalUpper(2.2));
  },
);

test("evaluations are those of search, pilot and run; the cross-check counts its own", () => {
  const states = straightLine(4, 4);
  const found = best(states);
  const all = states.evaluations.exact + states.evaluations.batched;
  expect(found.evaluations + (found.crossCheck?.estimate.evaluations ?? 0)).toBe(all);
});

test("plain sampling in hand is taken as the cross-check where it is sharp", () => {
  const plain = plainSampling(straightLine(2.5), { ...order, precision: 0.05 });
  expect(best(straightLine(2.5), { plain }).crossCheck?.estimate).toBe(plain);
});

test("two methods that part by more than chance are told apart", () => {
  const wrong: SamplingEstimate = {
    ...plainSampling(straightLine(2.5), { ...order, precision: 0.05 }),
    probability: 2 * normalUpper(2.5),
  };
  const { crossCheck } = best(straightLine(2.5), { plain: wrong });
  expect(crossCheck?.agrees).toBe(false);
  expect(crossCheck?.seesFactor).toBeLessThan(1.5);
});

test("the same seed gives the same bits", () => {
  expect(best(straightLine(3, 3))).toEqual(best(straightLine(3, 3)));
});
