import { describe, expect, test } from "vitest";
import { publishedCovs, publishedMeans } from "../../src/study/plausibility.ts";
import { fixture, notesOf, plainWith } from "./fixtures/read.ts";

const friction = (value: string): [string, string] => ["{ lognormal: { mean: 33, cov: 0.08 } }", value];
const fill = (line: string): [string, string] => ["unit_weight: 19", `unit_weight: 19\n    ${line}`];

test("the shipped studies and the plain fixture raise no note", () => {
  expect(notesOf(fixture("plain"))).toEqual([]);
  for (const name of ["two-soils-high-water", "sloping-fill-us"])
    expect(notesOf(fixture(`../../../studies/${name}/study`))).toEqual([]);
});

describe("a coefficient of variation", () => {
  test("outside published ranges is noted with its source", () => {
    expect(notesOf(plainWith(friction("{ lognormal: { mean: 33, cov: 0.2 } }")))).toEqual([
      "soils.sand.friction_angle: the coefficient of variation 20 % lies outside the published 2 to 15 % (2 to 13 % in Duncan (2000), Table 1, from memory; 5 to 15 % for sand, and up to 50 % for clay, in Cherubini and others, discussion of Phoon and Kulhawy (1999))",
    ]);
    expect(notesOf(plainWith(friction("{ lognormal: { mean: 33, cov: 0.01 } }"))).join()).toContain(
      "the coefficient of variation 1 % lies outside",
    );
  });

  test("at the ends of a published range is not", () => {
    for (const cov of ["0.02", "0.15"])
      expect(notesOf(plainWith(friction(`{ normal: { mean: 33, cov: ${cov} } }`)))).toEqual([]);
  });

  test("is that of the variable itself, a cut included", () => {
    expect(notesOf(plainWith(friction("{ truncated_normal: { mean: 33, sd: 12, from: 30, to: 36 } }")))).toEqual([]);
  });

  test("of a cohesion and of an undrained strength is judged too", () => {
    expect(notesOf(plainWith(fill("cohesion: { lognormal: { mean: 5, cov: 0.6 } }"))).join()).toContain(
      "60 % lies outside the published 10 to 50 %",
    );
    expect(notesOf(fixture("gravity").replace("cov: 0.25", "cov: 0.6")).join()).toContain(
      "60 % lies outside the published 10 to 40 %",
    );
  });
});

describe("a mean", () => {
  test.each<[string, [string, string], string]>([
    [
      "unit weight of a soil",
      ["unit_weight: 19", "unit_weight: 27"],
      "soils.fill.unit_weight: 27 kN/m3 lies outside the published 13 kN/m3 to 24 kN/m3",
    ],
    [
      "friction angle",
      friction("{ normal: { mean: 45, sd: 2 } }"),
      "soils.sand.friction_angle: the mean 45 degrees lies outside the published 13.5 degrees to 42 degrees",
    ],
    ["cohesion", fill("cohesion: 60"), "soils.fill.cohesion: 60 kPa lies outside the published 0 kPa to 30 kPa"],
    [
      "unit weight of the wall",
      ["unit_weight: 24", "unit_weight: 18"],
      "wall.unit_weight: 18 kN/m3 lies outside the published 20 kN/m3 to 26 kN/m3",
    ],
  ])("%s outside published ranges is noted", (_, change, note) => {
    expect(notesOf(plainWith(change)).join()).toContain(note);
  });

  test("of a friction angle that looks like radians is asked about", () => {
    expect(notesOf(plainWith(friction("0.58"))).join()).toContain("is it in radians?");
  });

  test("is shown in the study's units", () => {
    expect(notesOf(fixture("gravity").replace("unit_weight: 120", "unit_weight: 170"))).toContainEqual(
      expect.stringContaining(
        "soils.fill.unit_weight: 170 lb/ft3 lies outside the published 82.76 lb/ft3 to 152.8 lb/ft3",
      ),
    );
  });

  test("published ranges agree with their source: tan φ′ from 0.24 to 0.90", () => {
    // JCSS Probabilistic Model Code, part 3.7 (2006), tables of prior indications
    const range = publishedMeans.find(({ key }) => key === "friction_angle")!;
    expect(range.lowest).toBeCloseTo((Math.atan(0.24) * 180) / Math.PI, 1);
    expect(range.highest).toBeCloseTo((Math.atan(0.9) * 180) / Math.PI, 1);
    for (const { source, lowest, highest } of [...publishedMeans, ...publishedCovs]) {
      expect(source.length).toBeGreaterThan(10);
      expect(lowest).toBeLessThan(highest);
    }
  });
});

describe("a saturated unit weight", () => {
  test("that can fall below the moist one is noted", () => {
    const note = (moist: string, saturated: string): string =>
      notesOf(
        plainWith(
          ["{ normal: { mean: 18, cov: 0.05 } }", moist],
          ["saturated_unit_weight: 22", `saturated_unit_weight: ${saturated}`],
        ),
      ).join();
    expect(note("18", "17")).toContain(
      "soils.sand.saturated_unit_weight: lies below the moist unit weight; leave it out, and it follows unit_weight plus 2 kN/m3",
    );
    expect(note("{ normal: { mean: 18, cov: 0.05 } }", "20")).toContain("can fall below the moist unit weight");
    expect(note("{ normal: { mean: 18, cov: 0.05 } }", "20.8")).toBe("");
    expect(note("18", "18")).not.toContain("saturated");
  });
});

describe("ranges, slopes and correlations", () => {
  test("uneven bounds of a range are noted", () => {
    expect(notesOf(plainWith(friction("{ range: { lowest: 28, likely: 34, highest: 39 } }")))).toEqual([
      "soils.sand.friction_angle: the bounds of the range are uneven, 6 degrees below and 5 degrees above the likely value; the mean is taken at the likely value all the same",
    ]);
    expect(notesOf(plainWith(friction("{ range: { lowest: 28, likely: 34, highest: 40 } }")))).toEqual([]);
  });

  test("a slope below 1 degree is noted, none at all is not", () => {
    expect(notesOf(plainWith(["slope: 0", "slope: 0.5"]))).toEqual([
      'ground.behind.slope: 0.5 degrees is all but level; a slope is given in degrees, or as "1v:2h"',
    ]);
    expect(notesOf(plainWith(["slope: 0", "slope: 1"]))).toEqual([]);
  });

  test("a correlation of cohesion and friction angle outside published ranges is noted", () => {
    const correlated = (coefficient: string): string[] =>
      notesOf(
        plainWith(fill("cohesion: { lognormal: { mean: 5, cov: 0.3 } }"), [
          "[soils.sand.friction_angle, soils.sand.unit_weight], coefficient: 0.4",
          `[soils.fill.cohesion, soils.fill.friction_angle], coefficient: ${coefficient}`,
        ]),
      );
    expect(correlated("0.4").join()).toContain(
      "correlations.0.coefficient: 0.4 between cohesion and friction angle lies outside the published -0.7 to -0.24",
    );
    expect(correlated("-0.5")).toEqual([]);
  });
});

describe("what has no effect", () => {
  test("a soil that no layer names", () => {
    expect(notesOf(plainWith(["soils:\n", "soils:\n  clay: { unit_weight: 18, friction_angle: 24 }\n"]))).toEqual([
      "soils.clay: is named by no layer, so it has no effect",
    ]);
  });

  test("an uncertain model factor of a limit state that is not listed", () => {
    const text = plainWith(
      ["bearing: vesic", "bearing: vesic\n  factors: { bearing_capacity: { lognormal: { mean: 1, cov: 0.2 } } }"],
      ["[sliding, overturning, bearing]", "[sliding]"],
    );
    expect(notesOf(text)).toEqual([
      "model.factors.bearing_capacity: is uncertain, but has no effect: bearing is not listed",
    ]);
  });

  test("passive resistance of ground that is all ignored", () => {
    const text = plainWith(
      ["  shear_key:\n    depth: 0.4\n    width: 0.4\n    from_toe: 1.8\n", ""],
      ["    level: 1.0\n", "    level: 1.0\n    mobilised: 0.3\n    ignore_top: 1.0\n"],
    );
    expect(notesOf(text)).toEqual([
      "ground.front.mobilised: has no effect: ignore_top takes away all of the 1 m of ground in front",
    ]);
  });
});
