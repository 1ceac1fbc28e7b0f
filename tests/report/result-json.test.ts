import { expect, test } from "vitest";
import { fileKey, resultJson } from "../../src/report/result-json.ts";

test("keys turn into snake_case, paths keep their letters, and what is not finite becomes null", () => {
  const text = resultJson({
    reliabilityIndex: null,
    contributions: { "soils.Fill_A.friction_angle": 0.5 },
    list: [{ factorAtMean: Number.POSITIVE_INFINITY }],
    deep_seated: 1,
  });
  expect(JSON.parse(text)).toEqual({
    reliability_index: null,
    contributions: { "soils.Fill_A.friction_angle": 0.5 },
    list: [{ factor_at_mean: null }],
    deep_seated: 1,
  });
  expect(fileKey("probabilityAmongStable")).toBe("probability_among_stable");
  expect(fileKey("soils.myFill.unit_weight")).toBe("soils.myFill.unit_weight");
});
