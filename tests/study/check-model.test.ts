import { describe, expect, test } from "vitest";
import { fixture, notesOf, plainWith, problemsOf, read } from "./fixtures/read.ts";

test("Coulomb without wall friction is noted as smooth, and no crack forms at rest", () => {
  expect(notesOf(fixture("gravity").replace("wall_friction: 20, ", ""))).toContain(
    "model.wall_friction: is not given: the wall is taken as smooth (0 degrees)",
  );
  expect(notesOf(plainWith(["earth_pressure: rankine", "earth_pressure: at_rest\n  tension_crack: water"]))).toContain(
    "model.tension_crack: has no effect: no crack forms at rest",
  );
});

test("an eccentricity limit without its limit state has no effect", () => {
  expect(notesOf(plainWith(["seed: plain", "seed: plain\n  eccentricity_limit: 0.333"]))).toContain(
    "assessment.eccentricity_limit: has no effect: the limit state eccentricity is not listed",
  );
});

describe("periods", () => {
  const yearly: [string, string] = ["peak: 0.8, to: 3.0 } }", "peak: 0.8, to: 3.0 }, yearly: true }"];
  const target = (text: string): [string, string] => ["target: { reliability_index: 3.8, reason: brief }", text];

  test("of a study and of its target may be equal", () => {
    const study = read(plainWith(yearly, target("target: { named: en1990_rc2_50_years }\n  period: 50")));
    expect([study.assessment.period, study.assessment.target?.period]).toEqual([50, 50]);
  });

  test("may stand in the study alone", () => {
    expect(problemsOf(() => read(plainWith(yearly, target("period: 50"))))).toBe("");
  });

  test("of a named target must be the study's", () => {
    expect(
      problemsOf(() => read(plainWith(yearly, target("target: { named: en1990_rc2_1_year }\n  period: 50")))),
    ).toContain("assessment.target: the target is for 1 year and the study for 50 years; they must be equal");
  });

  test("of a target beside a study without yearly values give a note", () => {
    expect(notesOf(plainWith(target("target: { named: en1990_rc2_50_years }")))).toEqual([
      "assessment.target: is for 50 years, but nothing in this study is yearly: the probability holds for the ground as it is, not per year",
    ]);
  });
});
