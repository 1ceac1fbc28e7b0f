import { describe, expect, test } from "vitest";
import { fixture, notesOf, plainWith, problemsOf, read } from "./fixtures/read.ts";

const gravity = fixture("gravity");

describe("the wall at its means", () => {
  test("may have a front face that is just vertical, and not one that overhangs", () => {
    expect(problemsOf(() => read(plainWith(["back_run: 0.1", "back_run: 0.2"])))).toBe("");
    expect(problemsOf(() => read(plainWith(["back_run: 0.1", "back_run: 0.2001"])))).toContain(
      "the front face would overhang",
    );
  });

  test("is judged at the means of what is uncertain", () => {
    const around = (mean: number): string =>
      plainWith(["back_run: 0.1", `back_run: { normal: { mean: ${mean}, sd: 0.3 } }`]);
    expect(problemsOf(() => read(around(0.15)))).toBe("");
    expect(problemsOf(() => read(around(0.25)))).toContain("the front face would overhang");
  });

  test("may have a key that ends with the base, and not beyond it", () => {
    expect(problemsOf(() => read(plainWith(["from_toe: 1.8", "from_toe: 3.3"])))).toBe("");
    expect(problemsOf(() => read(plainWith(["from_toe: 1.8", "from_toe: 3.31"])))).toContain(
      "beyond the base (3.7 m wide)",
    );
  });
});

describe("base friction", () => {
  test("is not needed on undrained ground, and of no effect there", () => {
    expect(notesOf(gravity)).toContain("wall.sliding_friction: has no effect: clay below the base is undrained");
    const without = gravity.replace(/ {2}sliding_friction.*\n/, "");
    expect(read(without).wall.slidingFriction).toBeUndefined();
    expect(notesOf(without).join()).not.toContain("sliding_friction");
  });

  test("may be an angle", () => {
    expect(read(plainWith(["ratio: 0.80", "angle: 27"])).wall.slidingFriction).toEqual({ angle: 27, adhesion: 0 });
  });
});

describe("the wall's own back as plane of pressure", () => {
  const coulomb = (heel: string, plane: string): string =>
    plainWith(
      ["heel: 2.4", `heel: ${heel}`],
      ["from_toe: 1.8", "from_toe: 0.1"],
      ["earth_pressure: rankine", `earth_pressure: coulomb\n  wall_friction: 20\n  plane: ${plane}`],
    );

  test("is allowed up to a heel of a tenth of the wall's height", () => {
    expect(problemsOf(() => read(coulomb("0.55", "wall_back")))).toBe("");
    expect(problemsOf(() => read(coulomb("0.56", "wall_back")))).toContain(
      "at most 0.55 m (a tenth of the wall's height) is allowed",
    );
    expect(problemsOf(() => read(coulomb("0.56", "virtual_back")))).toBe("");
  });
});
