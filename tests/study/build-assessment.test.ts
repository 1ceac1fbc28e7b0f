import { expect, test } from "vitest";
import { plain, plainWith, read } from "./fixtures/read.ts";

const withTarget = (target: string) =>
  read(plainWith(["{ reliability_index: 3.8, reason: brief }", target])).assessment.target;

test("an assessment has its defaults", () => {
  const text = plain.slice(0, plain.indexOf("assessment:"));
  expect(read(text).assessment).toEqual({
    limitStates: ["sliding", "overturning", "bearing"],
    seed: "toehold",
    samples: 1_000_000,
    precision: 0.05,
  });
});

test("a seed may be any text, a number as it is written", () => {
  expect(read(plainWith(["seed: plain", "seed: 42"])).assessment.seed).toBe("42");
  expect(read(plainWith(["seed: plain", 'seed: "0042"'])).assessment.seed).toBe("0042");
});

test("limit states stand in the order of the program, whatever the file's", () => {
  const text = plainWith(["[sliding, overturning, bearing]", "[bearing, sliding]"]);
  expect(read(text).assessment.limitStates).toEqual(["sliding", "bearing"]);
});

test("a target has both an index and a probability, p = Φ(−β), whichever was given", () => {
  // EN 1990:2002, Table B2: index 3.8, probability 7.2e-5
  expect(withTarget("{ reliability_index: 3.8 }")).toEqual({
    reliabilityIndex: 3.8,
    probability: expect.closeTo(7.2348e-5, 9),
  });
  const target = withTarget("{ probability: 1e-4, period: 50, reason: brief }");
  expect(target).toEqual({
    reliabilityIndex: expect.closeTo(3.719016, 6),
    probability: 1e-4,
    period: 50,
    reason: "brief",
  });
});

test("a named target brings its period and its source, and says what is from memory", () => {
  expect(withTarget("{ named: en1990_rc2_50_years }")).toEqual({
    named: "en1990_rc2_50_years",
    reliabilityIndex: 3.8,
    probability: expect.closeTo(7.2348e-5, 9),
    period: 50,
    reason: "EN 1990:2002, Table B2",
  });
  expect(withTarget("{ named: usace_good }")?.reason).toContain("(from memory)");
  expect(withTarget("{ named: usace_good }")).not.toHaveProperty("period");
  expect(withTarget("{ named: usace_good, reason: the owner asks for it }")?.reason).toBe("the owner asks for it");
});
