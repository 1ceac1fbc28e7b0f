import { describe, expect, test } from "vitest";
import { everything, notesOf, plainWith, problemsOf, read } from "./fixtures/read.ts";

const pair = (paths: string): [string, string] => ["[soils.sand.friction_angle, soils.sand.unit_weight]", paths];

describe("a correlation", () => {
  test("between uncertain values is kept", () => {
    expect(read(everything).correlations).toHaveLength(2);
  });

  test("with a certain number has no effect, and a note says so", () => {
    const text = plainWith(pair("[soils.sand.friction_angle, soils.fill.unit_weight]"));
    expect(read(text).correlations).toEqual([]);
    expect(notesOf(text)).toContain(
      "correlations.0.between: soils.fill.unit_weight is a certain number, so this correlation has no effect",
    );
  });

  test("with a value that is left at its default has none either", () => {
    expect(notesOf(plainWith(pair("[soils.sand.friction_angle, model.factors.earth_thrust]")))).toContain(
      "correlations.0.between: model.factors.earth_thrust is a certain number, so this correlation has no effect",
    );
  });

  test("with a value the study does not give is refused", () => {
    expect(
      problemsOf(() => read(plainWith(pair("[soils.sand.friction_angle, soils.fill.saturated_unit_weight]")))),
    ).toContain('"soils.fill.saturated_unit_weight" is not a value of this study');
    expect(problemsOf(() => read(plainWith(pair("[soils.sand.friction_angle, rain]"))))).toBe(
      '54:44 correlations.0.between.1: "rain" is not a value of this study\n  hint: a variable is named by its path, such as soils.sand.friction_angle',
    );
  });

  test("may be 0, and may come close to 1", () => {
    for (const coefficient of ["0", "-0.999", "0.999"])
      expect(read(plainWith(["coefficient: 0.4", `coefficient: ${coefficient}`])).correlations[0].coefficient).toBe(
        Number(coefficient),
      );
  });
});

describe("what tests can teach about a variable", () => {
  const level = (beside: string): string => everything.replace("      yearly: true\n      knowledge: 0.2\n", beside);

  test("a yearly one must say how much of it is knowledge, wherever a test bears on it", () => {
    const said = problemsOf(() => read(level("      yearly: true\n")));
    expect(said).toContain(
      "evidence.1.of: water.behind.level is yearly, and only what its knowledge says can be learned; it states none",
    );
    expect(said).toContain("decision.investigations.1.informs: water.behind.level is yearly");
    expect(problemsOf(() => read(level("      yearly: true\n      knowledge: 0\n")))).toBe("");
  });

  test("only scatter spares the error of a test", () => {
    expect(problemsOf(() => read(everything.replace("tests: 3 }", "tests: 3, error: 3 }")))).toBe("");
    expect(problemsOf(() => read(everything.replace("tests: 1, error: 0.2,", "tests: 1,")))).toContain(
      "decision.investigations.2.informs.1.error: is missing",
    );
  });
});
