import { describe, expect, test } from "vitest";
import { jsonOf, runWith } from "../fake-io.ts";

const options = new URL("../../../studies/yard-wall-options/study.yaml", import.meta.url).pathname;
const yard = new URL("../../../studies/two-soils-high-water/study.yaml", import.meta.url).pathname;

describe("toehold scope", () => {
  test("says which option is best today, what each investigation is worth, and that the target governs where people can be hurt", async () => {
    const ran = await runWith(["scope", options, "--samples", "20000"]);
    expect(ran.code).toBe(0);
    const words = ran.out.replace(/\s+/g, " ");
    expect(words).toMatch(/“[^”]+” is the best option today: expected cost [\d ]+ EUR, probability of failure 1 in /);
    for (const found of [
      "Six shear-box tests on the sand",
      "One borehole to 8 m",
      "Knowing all of them would be worth",
      "the target reliability governs",
      "Where the decision tips",
      "licensed engineer",
    ])
      expect(words).toContain(found);
  });

  test("gives the keys of the result file, within the bounds that hold", async () => {
    // biome-ignore lint/suspicious/noExplicitAny: a reader in another program has no types of ours
    const result = (await jsonOf(["scope", options, "--json", "--samples", "20000"])) as any;
    expect(Object.keys(result)).toEqual(
      expect.arrayContaining([
        "options",
        "best_option",
        "perfect_information",
        "perfect_by_variable",
        "investigations",
      ]),
    );
    expect(Object.keys(result.options[0])).toEqual(
      expect.arrayContaining(["name", "cost", "probability", "expected_cost", "meets_target"]),
    );
    const least = Math.min(...result.options.map((option: { expected_cost: number }) => option.expected_cost));
    expect(result.options.find((option: { name: string }) => option.name === result.best_option).expected_cost).toBe(
      least,
    );
    for (const one of result.investigations) {
      expect(one.value).toBeGreaterThanOrEqual(0);
      expect(one.value).toBeLessThanOrEqual(
        result.perfect_information + 4 * one.standard_error + 4 * result.perfect_information_standard_error,
      );
      expect(one.net_value).toBeCloseTo(one.value - one.cost, 6);
    }
  });

  test("a study without a decision ends with 1 and says what is missing", async () => {
    const ran = await runWith(["scope", yard]);
    expect(ran.code).toBe(1);
    expect(ran.err).toContain("decision: is missing");
  });
});
