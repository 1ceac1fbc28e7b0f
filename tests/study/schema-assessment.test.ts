import { expect, test } from "vitest";
import { assessment, correlation, model } from "../../src/study/schema-assessment.ts";

test.each([
  { samples: 1 },
  { samples: 1e12 },
  { precision: 0 },
  { eccentricity_limit: 0.5 },
  { target: { probability: 0.999 } },
  { seed: 7 },
  { period: 0.5 },
])("%j is an assessment", (value) => {
  expect(assessment.safeParse(value).success).toBe(true);
});

test.each([
  { samples: 0 },
  { samples: 2e12 },
  { precision: 1 },
  { eccentricity_limit: 0 },
  { eccentricity_limit: 0.51 },
  { target: { probability: 0 } },
  { target: { reliability_index: 9 } },
  { period: 0 },
  { limit_states: ["all"] },
])("%j is none", (value) => {
  expect(assessment.safeParse(value).success).toBe(false);
});

test("a correlation has two paths and a coefficient short of 1; a model has words from the list", () => {
  expect(correlation.safeParse({ between: ["a", "b"], coefficient: -0.99 }).success).toBe(true);
  expect(correlation.safeParse({ between: ["a"], coefficient: 0 }).success).toBe(false);
  expect(correlation.safeParse({ between: ["a", "b"], coefficient: -1 }).success).toBe(false);
  expect(
    model.safeParse({ earth_pressure: "at_rest", bearing: "en1997", tension_crack: "water", plane: "wall_back" })
      .success,
  ).toBe(true);
  expect(model.safeParse({ bearing: "Vesic" }).success).toBe(false);
});
