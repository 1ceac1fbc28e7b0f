import fc from "fast-check";
import { expect, test } from "vitest";
import { parse } from "yaml";
import { StudyError } from "../../src/errors.ts";
import { distributionMoments } from "../../src/study/moments.ts";
import { quantitiesOf } from "../../src/study/quantities.ts";
import { readDocument, readStudy, studyWith } from "../../src/study/read-study.ts";
import { everything, plain, read } from "./fixtures/read.ts";

const seed = 20240611;

/** Runs it; whatever goes wrong must be a StudyError whose problems all say something, at a line where the text has one. */
function soundOrRefused(run: () => ReturnType<typeof readStudy>, lines: number): void {
  try {
    const study = run();
    const outside = quantitiesOf(study).filter(({ quantity, field }) => {
      const mean = typeof quantity === "number" ? quantity : distributionMoments(quantity.distribution).mean;
      return !(mean >= field.lowest && mean <= field.highest);
    });
    expect(outside).toEqual([]);
  } catch (error) {
    if (!(error instanceof StudyError)) throw error;
    expect(error.problems.length).toBeGreaterThan(0);
    for (const { message, at } of error.problems) {
      expect(message).not.toMatch(/undefined|NaN(?! is not)|\[object/);
      if (at) expect(at.line).toBeLessThanOrEqual(lines + 1);
    }
  }
}

test("a text with lines lost, doubled, moved or overwritten is read or refused, never stumbled over", () => {
  const oddities = [
    "x",
    "- 1",
    "  : 3",
    "height: [",
    "a: { b: c }",
    "    cov: 0.1",
    "\t",
    "*a",
    "&a 1",
    "null",
    "1e5: 2",
    "'",
    "{",
    "level: { normal: {} }",
    "measured: [1, 2]",
    "source: 3",
  ];
  for (const text of [plain, everything]) {
    const lines = text.split("\n");
    const place = fc.nat({ max: lines.length - 1 });
    const edit = fc.oneof(
      place.map((i) => (all: string[]) => all.splice(i, 1)),
      fc.tuple(place, place).map(
        ([i, k]) =>
          (all: string[]) =>
            all.splice(i, 0, all[k] ?? ""),
      ),
      fc.tuple(place, fc.constantFrom(...oddities)).map(
        ([i, odd]) =>
          (all: string[]) =>
            all.splice(i, 1, odd),
      ),
      fc.tuple(place, fc.nat({ max: 60 }), fc.string({ maxLength: 4 })).map(([i, k, odd]) => (all: string[]) => {
        const line = all[i] ?? "";
        all[i] = line.slice(0, k) + odd + line.slice(k + odd.length);
      }),
    );
    fc.assert(
      fc.property(fc.array(edit, { minLength: 1, maxLength: 3 }), (edits) => {
        const all = [...lines];
        for (const apply of edits) apply(all);
        soundOrRefused(() => readStudy(all.join("\n"), { notAvailable: [] }), all.length);
      }),
      { seed, numRuns: 100 },
    );
  }
});

test("a tree with any value in any place is read or refused, never stumbled over", () => {
  const document = parse(everything, { version: "1.2" });
  const paths = leafPaths(document, []);
  const value = fc.oneof(
    fc.double(),
    fc.integer(),
    fc.string({ maxLength: 6 }),
    fc.boolean(),
    fc.constantFrom(null, [], {}, [1], { value: 3 }, { normal: { mean: 1 } }, "5 m", "1v:2h", {
      uniform: { from: 0, to: 1 },
    }),
  );
  fc.assert(
    fc.property(fc.constantFrom(...paths), value, (path, found) => {
      const copy = structuredClone(document);
      const parent = path.slice(0, -1).reduce((here, key) => here[key], copy);
      parent[path.at(-1)!] = found;
      soundOrRefused(() => readDocument(copy, { notAvailable: [] }), 0);
    }),
    { seed, numRuns: 150 },
  );

  function leafPaths(here: unknown, path: string[]): string[][] {
    if (typeof here !== "object" || here === null) return [path];
    return [
      ...(path.length > 0 ? [path] : []),
      ...Object.entries(here).flatMap(([key, below]) => leafPaths(below, [...path, key])),
    ];
  }
});

test("setting a quantity to a certain value of its range, and reading it back, gives the value", () => {
  const study = read(plain);
  const entries = quantitiesOf(study).filter(
    ({ path }) =>
      !/back_run|foot_width|crest_width|from_toe|level|bottom|width|thickness|height|toe|heel|wall_friction|deep_seated/.test(
        path,
      ),
  );
  fc.assert(
    fc.property(fc.constantFrom(...entries), fc.double({ min: 0, max: 1, noNaN: true }), ({ path, field }, share) => {
      const value = field.lowest + share * (field.highest - field.lowest);
      const changed = studyWith(study, { [path]: value });
      expect(quantitiesOf(changed).find((one) => one.path === path)?.quantity).toBe(value);
      expect(quantitiesOf(changed).filter((one) => one.path !== path)).toEqual(
        quantitiesOf(study).filter((one) => one.path !== path),
      );
    }),
    { seed, numRuns: 60 },
  );
});
