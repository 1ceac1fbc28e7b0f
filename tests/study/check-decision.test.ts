import { describe, expect, test } from "vitest";
import { everything, notesOf, plainWith, problemsOf, read } from "./fixtures/read.ts";

const evidence = (entry: string): [string, string] => ["assessment:", `evidence:\n  - ${entry}\nassessment:`];
const decision = (rest: string): [string, string] => [
  "assessment:",
  `decision:\n  failure_cost: 1\n  options: ${rest}\nassessment:`,
];

describe("evidence", () => {
  test("that is also among the measured values gives a note", () => {
    const text = plainWith(
      ["{ lognormal: { mean: 33, cov: 0.08 } }", "{ measured: [31.8, 33.1, 35.4, 36] }"],
      evidence("{ results: [33.1, 34, 36], of: soils.sand.friction_angle, error: 3 }"),
    );
    expect(notesOf(text)).toEqual([
      "evidence.0.results: 33.1, 36 also stand among the measured values of this variable: the same tests would count twice",
    ]);
  });

  test("of as many results as scatter already rests on gives a note", () => {
    const text = plainWith(
      [
        "{ lognormal: { mean: 33, cov: 0.08 } }",
        "{ lognormal: { mean: 33 }, scatter: { inherent: 0.05, measurement: 0.05, tests: 3 } }",
      ],
      evidence("{ results: [33.1, 34, 36], of: soils.sand.friction_angle, error: 3 }"),
    );
    expect(notesOf(text).join()).toContain(
      "3 results, and scatter already rests on 3 tests: if they are the same, they count twice",
    );
  });

  test("with an error below the soil's own scatter gives a note", () => {
    expect(notesOf(everything.replace("error: 3.0", "error: 1.5"))).toEqual([
      "evidence.0.error: 1.5 is less than the inherent scatter 2.97 of this soil; the error of a result includes it",
    ]);
    expect(notesOf(everything.replace("error: 3.5", "error: 1.5"))).toEqual([
      "decision.investigations.0.error: 1.5 is less than the inherent scatter 2.97 of this soil; the error of a result includes it",
    ]);
  });

  test("of survival may name a load the study does not have, and must leave the study sound", () => {
    const dry = (entry: string): string => plainWith(evidence(entry)).replace(/water:\n(.|\n)*?loads:/, "loads:");
    expect(problemsOf(() => read(dry("{ survived: { water.behind.level: 2 } }")))).toBe("");
    expect(problemsOf(() => read(dry("{ survived: { water.front.level: 7 } }")))).toBe(
      "51:38 evidence.0.survived.water.front.level: 7 m is above the crest of the wall (5.5 m)",
    );
    expect(problemsOf(() => read(dry("{ survived: { loads.lines.0.force: 30 } }")))).toContain(
      "loads.lines.0.at: is missing",
    );
  });

  test("of survival bears no error", () => {
    expect(problemsOf(() => read(plainWith(evidence("{ survived: { water.behind.level: 2 }, error: 1 }"))))).toContain(
      "evidence.0.error: error goes with results, not with survived",
    );
  });
});

describe("options", () => {
  test("may take the last yearly value out of the study", () => {
    expect(problemsOf(() => read(everything.replace("yearly: true, knowledge: 0 }", "yearly: false }")))).toBe("");
  });

  test("whose change is wrong are told where", () => {
    expect(
      problemsOf(() =>
        read(
          plainWith(
            decision(
              "[{ name: a, cost: 0 }, { name: b, cost: 1, change: { soils.sand.friction_angle: { nromal: { mean: 3 } } } }]",
            ),
          ),
        ),
      ),
    ).toContain(
      'decision.options.1.change.soils.sand.friction_angle.nromal: "nromal" is not a distribution\n  hint: did you mean "normal"?',
    );
    expect(
      problemsOf(() =>
        read(plainWith(decision("[{ name: a, cost: 0 }, { name: b, cost: 1, change: { loads.strips.3.width: 3 } }]"))),
      ),
    ).toContain('decision.options.1.change.loads.strips.3.width: has no entry "3"');
  });

  test("are not blamed for what is wrong without them", () => {
    const text = plainWith(decision("[{ name: a, cost: 0 }, { name: b, cost: 1, change: { wall.base.heel: 2.9 } }]"), [
      "below:\n    soil: sand",
      "below:\n    soil: snad",
    ]);
    expect(problemsOf(() => read(text))).toBe(
      '35:11 ground.below.soil: "snad" is not one of the soils\n  hint: did you mean "sand"?',
    );
  });

  test("begin with the base case, and a note says so where it changes something", () => {
    expect(notesOf(plainWith(decision("[{ name: a, cost: 0, change: { wall.base.heel: 2.9 } }]")))).toContain(
      "decision.options.0: the first option is the base case, yet it changes the study",
    );
  });

  test("marked always_open without a target to meet give a note", () => {
    expect(notesOf(plainWith(decision("[{ name: a, cost: 0, always_open: true }]")))).toContain(
      "decision.options: always_open has no effect without must_meet_target: true",
    );
  });
});

test("a failure cost of a limit state that is not listed gives a note", () => {
  const text = plainWith([
    "assessment:",
    "decision:\n  failure_cost: { sliding: 1, overturning: 1, bearing: 1, eccentricity: 1 }\n  options: [{ name: a, cost: 0 }]\nassessment:",
  ]);
  expect(notesOf(text)).toContain("decision.failure_cost.eccentricity: has no effect: the limit state is not listed");
});

test("tests, error and transformation belong to the entries where informs is a list", () => {
  const text = plainWith(
    decision(
      "[{ name: a, cost: 0 }]\n  investigations: [{ name: t, tests: 3, informs: [{ path: soils.sand.friction_angle, tests: 3, error: 1 }] }]",
    ),
  );
  expect(problemsOf(() => read(text))).toContain(
    "decision.investigations.0.tests: tests belongs to each entry of informs, where informs is a list",
  );
});
