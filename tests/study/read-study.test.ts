import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { StudyError } from "../../src/errors.ts";
import { quantityAt } from "../../src/study/quantities.ts";
import { readDocument, readStudy, studyWith } from "../../src/study/read-study.ts";
import { wrongStudies } from "./fixtures/wrong-studies.ts";

const fixture = (name: string): string => readFileSync(new URL(`fixtures/${name}.yaml`, import.meta.url), "utf8");
const plain = fixture("plain");
const everything = fixture("everything");

function problemsOf(read: () => unknown): string {
  try {
    read();
  } catch (error) {
    if (error instanceof StudyError) return error.message;
    throw error;
  }
  return "";
}

describe("a wrong study", () => {
  test("the table holds at least fifty", () => {
    expect(wrongStudies.length).toBeGreaterThanOrEqual(50);
  });

  test.each(wrongStudies)("with $what is refused with place, path, message and hint", ({ replace, by, also, says }) => {
    let text = replace === undefined ? by : plain.replace(replace, () => by);
    if (replace !== undefined) expect(plain.split(replace)).toHaveLength(2);
    if (also) text = text.replace(also[0], () => also[1]);
    expect(problemsOf(() => readStudy(text, { notAvailable: [] }))).toBe(says);
  });

  test("reports everything that is wrong at once, in the order of its lines, with the file's name", () => {
    const text = plain
      .replace("height: 5.0", "height: 500")
      .replace("unit_weight: 24", "unitweight: 24")
      .replace("below:\n    soil: sand", "below:\n    soil: clay")
      .replace("coefficient: 0.4", "coefficient: 2");
    expect(problemsOf(() => readStudy(text, { file: "weir.yaml" }))).toBe(
      [
        "weir.yaml:6:13 wall.stem.height: 500 is outside 0.01 to 100 m\n  hint: did you mean 50.0?",
        'weir.yaml:15:3 wall.unitweight: unknown key "unitweight"\n  hint: did you mean "unit_weight"?',
        'weir.yaml:35:11 ground.below.soil: "clay" is not one of the soils\n  hint: soils of this study: fill, sand',
        "weir.yaml:54:82 correlations.0.coefficient: found 2; a number between -1 and 1 (ends excluded) is needed",
      ].join("\n"),
    );
  });

  test("in US units is told the range in US units", () => {
    const text = plain.replace("units: metric", "units: us").replace("unit_weight: 19", "unit_weight: 1200");
    expect(problemsOf(() => readStudy(text))).toContain(
      "1200 is outside 6.366 to 254.6 lb/ft3\n  hint: did you mean 120.0?",
    );
  });
});

describe("a hostile text", () => {
  test.each([
    ["a text above 1 MB", `title: ${"x".repeat(1_000_001)}`, "at most 1000000 are read"],
    ["a hundred thousand open brackets", "[".repeat(100_000), "nested too deeply"],
    ["a hundred thousand dashes", "- ".repeat(100_000), "nested too deeply"],
    [
      "a thousand indented lines",
      Array.from({ length: 1000 }, (_, i) => `${" ".repeat(i)}a:`).join("\n"),
      "nested too deeply",
    ],
    ["aliases that multiply", multiplying(), "holds more than 100000 values"],
    ["an alias of itself", "a: &a [*a]", "*a holds itself"],
    ["a constructor", "constructor: { prototype: { polluted: 1 } }", '"constructor" cannot be a key'],
    ["a number beyond all numbers", "title: -.inf", "-.inf is not a finite number"],
    ["a key that is a list", "[a, b]: 1", "found a key that is not a single word"],
  ])("such as %s is refused, quickly", (_, text, words) => {
    const start = performance.now();
    expect(problemsOf(() => readStudy(text))).toContain(words);
    expect(performance.now() - start).toBeLessThan(5000);
    expect(({} as Record<string, unknown>).polluted).toBeUndefined();
  });

  test("with thirty thousand keys is read through, not compared key by key", () => {
    const text = Array.from({ length: 30_000 }, (_, i) => `k${i}: 1`).join("\n");
    const start = performance.now();
    const said = problemsOf(() => readStudy(text));
    expect(said).toContain('1:1 k0: unknown key "k0"');
    expect(said).toContain("has 29803 more problems than are listed here"); // 30 000 keys, three that are missing
    expect(performance.now() - start).toBeLessThan(20_000);
  });

  function multiplying(): string {
    const lines = ["a0: &a0 [1, 1, 1, 1, 1, 1, 1, 1, 1, 1]"];
    for (let i = 1; i < 8; i++)
      lines.push(
        `a${i}: &a${i} [${Array(10)
          .fill(`*a${i - 1}`)
          .join(", ")}]`,
      );
    return lines.join("\n");
  }
});

describe("a sound study", () => {
  test("is the same from YAML and from JSON, with spaces or tabs", () => {
    const study = readStudy(plain);
    expect(readStudy(JSON.stringify(study.document))).toEqual(study);
    expect(readStudy(JSON.stringify(study.document, null, "\t"))).toEqual(study);
    expect(readStudy(plain.replaceAll("\n", "\r\n"))).toEqual(study);
    expect(readDocument(study.document)).toEqual(study);
  });

  test("may use anchors and aliases", () => {
    const text = plain
      .replace("unit_weight: 19", "unit_weight: &w 19")
      .replace("saturated_unit_weight: 22", "saturated_unit_weight: *w");
    expect(readStudy(text).soils.sand.saturatedUnitWeight).toBe(19);
  });

  test("may leave a group empty, as one does while writing", () => {
    const text = plain.replace(/loads:\n(.|\n)*?model:/, "loads:\nmodel:");
    expect(readStudy(text).loads).toEqual({ strips: [], lines: [] });
  });

  test("survives structured cloning to a worker", () => {
    const study = readStudy(everything, { notAvailable: [] });
    expect(structuredClone(study)).toEqual(study);
  });

  test("keeps its own tree untouched by defaults", () => {
    expect(Object.keys(readStudy(plain).document as object)).not.toContain("notes");
  });
});

describe("setting paths from outside", () => {
  test("takes texts as YAML: numbers, units, distributions", () => {
    const study = readStudy(plain, {
      set: [
        ["wall.base.heel", "2.9"],
        ["wall.base.toe", "3 ft"],
        ["water.behind.level", "{ uniform: { from: 0, to: 1 } }"],
        ["loads.strips.0.width", 3],
      ],
    });
    expect(study.wall.base?.heel).toBe(2.9);
    expect(study.wall.base?.toe).toBeCloseTo(0.9144, 12);
    expect(study.water.behind?.level).toMatchObject({ distribution: { kind: "uniform", from: 0, to: 1 } });
    expect(study.loads.strips[0].width).toBe(3);
  });

  test("says what is wrong without a line, since it stands in none, and keeps the lines of the rest", () => {
    const text = plain.replace("unit_weight: 24", "unit_weight: 240");
    const set = [
      ["wall.base.heel", "200"],
      ["walls.base.heel", "2"],
      ["title.part", "1"],
      ["loads.strips.7.width", "1"],
      ["wall.base.toe", "{ a: "],
    ] as const;
    expect(problemsOf(() => readStudy(text, { file: "a.yaml", set }))).toBe(
      [
        'a.yaml wall.base.toe: "{ a: " is not valid YAML: Flow map must end with a }\n  hint: a quote or a bracket is not closed',
        "a.yaml title.part: leads nowhere: title is a single value",
        'a.yaml loads.strips.7.width: has no entry "7": loads.strips has 1, counted from 0',
        'a.yaml walls: unknown key "walls"\n  hint: did you mean "wall"?',
        "a.yaml wall.base.heel: 200 is outside 0 to 100 m\n  hint: did you mean 20.0?",
        'a.yaml:15:16 wall.unit_weight: 240 is outside 1 to 40 kN/m3\n  hint: if it is in pounds per cubic foot, write "240 lb/ft3"',
      ].join("\n"),
    );
  });

  test("keeps a period that has lost its yearly value, with a note", () => {
    const text = plain
      .replace("to: 3.0 } }", "to: 3.0 }, yearly: true }")
      .replace("seed: plain", "seed: plain\n  period: 50");
    const study = readStudy(text, { set: [["water.behind.level", "1"]] });
    expect(study.assessment.period).toBe(50);
    expect(study.notices).toContainEqual({
      path: "assessment.period",
      message: expect.stringContaining("nothing in this study is yearly"),
    });
  });
});

describe("a changed study", () => {
  const study = readStudy(plain);

  test("has the change and everything else as before", () => {
    const changed = studyWith(study, { "wall.base.heel": 2.9 });
    expect(changed.wall.base?.heel).toBe(2.9);
    expect({ ...changed, wall: study.wall, document: study.document }).toEqual(study);
    expect(study.wall.base?.heel).toBe(2.4);
  });

  test("may name what the study did not have", () => {
    const dry = readStudy(plain.replace(/water:\n(.|\n)*?loads:/, "loads:"));
    expect(quantityAt(dry, "water.behind.level")).toBeUndefined();
    expect(quantityAt(studyWith(dry, { "water.behind.level": "3 ft" }), "water.behind.level")).toBeCloseTo(0.9144, 12);
    expect(studyWith(study, { "loads.lines.0.force": 30, "loads.lines.0.at": 1 }).loads.lines).toEqual([
      { force: 30, at: 1, onHeel: false },
    ]);
  });

  test("takes numbers in the study's own units", () => {
    const us = readStudy(readFileSync(new URL("../../studies/sloping-fill-us/study.yaml", import.meta.url), "utf8"));
    expect(studyWith(us, { "wall.stem.height": 10 }).wall.stem.height).toBeCloseTo(3.048, 12);
  });

  test("that is wrong is refused", () => {
    expect(problemsOf(() => studyWith(study, { "wall.base.heel": -1 }))).toBe(
      "wall.base.heel: -1 is outside 0 to 100 m\n  hint: did you mean 1?",
    );
    expect(problemsOf(() => studyWith(study, { "wall.base.heel": Number.NaN }))).toBe(
      "wall.base.heel: NaN is not a finite number",
    );
    expect(problemsOf(() => studyWith(study, { evidence: "none" }))).toContain("evidence");
  });

  test("leaves evidence and correlations aside that its change has made pointless", () => {
    const full = readStudy(everything, { notAvailable: [] });
    const changed = studyWith(
      full,
      { "soils.sand.friction_angle": 33, "water.behind.level": 101 },
      { notAvailable: [] },
    );
    expect(changed.correlations).toEqual([]);
    expect(changed.assessment.period).toBe(50);
  });
});

describe("what a version does not serve", () => {
  test("is answered by name, not as a typing error", () => {
    const said = problemsOf(() => readStudy(everything, { file: "e.yaml", notAvailable: [{ path: "evidence" }] }));
    expect(said).toContain("evidence is not available in this version");
    expect(said).not.toContain("unknown key");
  });

  test("is nothing of the format in this one", () => {
    expect(readStudy(everything, { file: "e.yaml" }).evidence.length).toBeGreaterThan(0);
  });
});
