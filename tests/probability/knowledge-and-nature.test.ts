import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { StudyError } from "../../src/errors.ts";
import { jointSpace, type SpaceWithNotices, type StatedUnknown } from "../../src/probability/joint-space.ts";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import type { Correlation } from "../../src/study/study.ts";

function unknown(path: string, more: Partial<StatedUnknown> = {}): StatedUnknown {
  return { path, marginal: marginalOf({ kind: "normal", mean: 30, sd: 3 }), yearly: false, ...more };
}

function between(first: string, second: string, coefficient: number): Correlation {
  return { between: [first, second], coefficient };
}

/** Covariance of two unknowns through the columns of one part alone, or of all. */
function shared(space: SpaceWithNotices, i: number, j: number, part?: "knowledge" | "nature"): number {
  return space.coordinates.reduce(
    (sum, coordinate, c) =>
      sum + (part === undefined || coordinate.part === part ? space.rows[i][c] * space.rows[j][c] : 0),
    0,
  );
}

function refusal(make: () => unknown): string {
  try {
    make();
  } catch (error) {
    if (error instanceof StudyError) return error.problems.map(({ path, message }) => `${path}: ${message}`).join("\n");
    throw error;
  }
  return "";
}

describe("coordinates", () => {
  test("plain variables have knowledge alone, stated ones both, a yearly one without knowledge its nature alone", () => {
    const space = jointSpace(
      [
        unknown("plain"),
        unknown("tested", { knowledge: 0.4 }),
        unknown("flood", { yearly: true }),
        unknown("load", { yearly: true, knowledge: 0.3 }),
      ],
      [],
      true,
    );
    expect(space.coordinates).toEqual([
      { key: "plain", part: "knowledge", yearly: false },
      { key: "tested", part: "knowledge", yearly: false },
      { key: "tested/nature", part: "nature", yearly: false },
      { key: "flood", part: "nature", yearly: true },
      { key: "load", part: "knowledge", yearly: false },
      { key: "load/nature", part: "nature", yearly: true },
    ]);
    expect([...space.rows[1]]).toEqual([0, Math.sqrt(0.4), Math.sqrt(0.6), 0, 0, 0]);
    expect(space.unknowns.map(({ knowledge }) => knowledge)).toEqual([1, 0.4, 0, 0.3]);
  });
});

describe("what two variables share", () => {
  test("two stated ones share it in knowledge and nature by one coefficient", () => {
    const space = jointSpace(
      [unknown("a", { knowledge: 0.3 }), unknown("b", { knowledge: 0.8 })],
      [between("a", "b", 0.5)],
      true,
    );
    const coefficient = 0.5 / (Math.sqrt(0.3 * 0.8) + Math.sqrt(0.7 * 0.2));
    expect(shared(space, 0, 1, "knowledge")).toBeCloseTo(coefficient * Math.sqrt(0.3 * 0.8), 14);
    expect(shared(space, 0, 1, "nature")).toBeCloseTo(coefficient * Math.sqrt(0.7 * 0.2), 14);
    expect(shared(space, 0, 1)).toBeCloseTo(0.5, 14);
  });

  test("a yearly one and one that is not share knowledge alone", () => {
    const flood = unknown("flood", { yearly: true, knowledge: 0.5 });
    for (const other of [unknown("soil", { knowledge: 0.6 }), unknown("plain")]) {
      const space = jointSpace([flood, other], [between("flood", other.path, 0.4)], true);
      expect(shared(space, 0, 1, "nature")).toBe(0);
      expect(shared(space, 0, 1)).toBeCloseTo(0.4, 14);
      expect(space.unknowns[1].knowledge).toBeCloseTo(other.knowledge ?? 1, 14);
    }
  });

  test("a plain one leans on the stated one as a whole, and loses what it shares with its nature", () => {
    const space = jointSpace(
      [unknown("plain"), unknown("tested", { knowledge: 0.4 })],
      [between("plain", "tested", 0.5)],
      true,
    );
    expect(shared(space, 0, 1, "nature")).toBeCloseTo(0.5 * 0.6, 14);
    expect(space.unknowns[0].knowledge).toBeCloseTo(1 - 0.25 * 0.6, 14);
    expect(space.notices).toEqual([
      {
        path: "plain",
        message: "only 85 % of its spread can be learned: the rest it shares with the nature of others",
      },
    ]);
  });

  test("correlation among plain variables alone changes nothing", () => {
    const unknowns = [unknown("a"), unknown("b"), unknown("c", { knowledge: 0.5 })];
    const correlations = [between("a", "b", 0.7)];
    const space = jointSpace(unknowns, correlations, true);
    expect(shared(space, 0, 1, "knowledge")).toBeCloseTo(0.7, 14);
    expect(space.unknowns.slice(0, 2).map(({ knowledge }) => knowledge)).toEqual([1, 1]);
    expect(space.notices).toEqual([]);
    const unsplit = jointSpace(unknowns, correlations, false);
    for (let i = 0; i < 2; i++) expect([...space.rows[i].slice(0, 2)]).toEqual([...unsplit.rows[i].slice(0, 2)]);
  });

  test("the covariance of the normals is the study's, for any shares and any mix of kinds that is allowed", () => {
    const share = fc.double({ min: 0, max: 1, noNaN: true });
    const one = fc.record({ kind: fc.constantFrom("plain", "stated", "yearly"), share });
    let allowed = 0;
    fc.assert(
      fc.property(
        fc.array(one, { minLength: 2, maxLength: 6 }),
        fc.array(fc.double({ min: -0.6, max: 0.6, noNaN: true }), { minLength: 15, maxLength: 15 }),
        (kinds, coefficients) => {
          const unknowns = kinds.map(({ kind, share: knowledge }, i) =>
            unknown(`v${i}`, kind === "plain" ? {} : { knowledge, yearly: kind === "yearly" }),
          );
          const correlations: Correlation[] = [];
          for (let i = 0; i < kinds.length; i++) {
            for (let j = 0; j < i; j++) {
              const coefficient = coefficients[(i * (i - 1)) / 2 + j];
              if (Math.abs(coefficient) > 0.15) correlations.push(between(`v${i}`, `v${j}`, coefficient));
            }
          }
          let space: SpaceWithNotices;
          try {
            space = jointSpace(unknowns, correlations, true);
          } catch (error) {
            if (error instanceof StudyError) return;
            throw error;
          }
          allowed++;
          for (let i = 0; i < kinds.length; i++) {
            for (let j = 0; j <= i; j++) expect(shared(space, i, j)).toBeCloseTo(space.correlation[i][j], 7);
            const nature = shared(space, i, i, "nature");
            expect(space.unknowns[i].knowledge).toBeCloseTo(1 - nature, 7);
            for (let j = 0; j < kinds.length; j++) {
              if (unknowns[i].yearly !== unknowns[j].yearly) expect(shared(space, i, j, "nature")).toBeCloseTo(0, 10);
            }
          }
        },
      ),
      { numRuns: 400, seed: 11 },
    );
    expect(allowed).toBeGreaterThan(80);
  });
});

describe("refusals", () => {
  test("shares too unlike for the correlation", () => {
    const make = () =>
      jointSpace([unknown("a", { knowledge: 0.9 }), unknown("b", { knowledge: 0.1 })], [between("a", "b", 0.7)], true);
    expect(refusal(make)).toBe(
      "correlations.0: a and b cannot have a correlation of 0.7: with shares of knowledge of 0.900 and 0.100, their knowledge and their nature would need a correlation of 1.17",
    );
    expect(() =>
      jointSpace([unknown("a", { knowledge: 0.9 }), unknown("b", { knowledge: 0.1 })], [between("a", "b", 0.7)], false),
    ).not.toThrow();
  });

  test("a yearly value without knowledge shares nothing with what stays", () => {
    const make = () =>
      jointSpace([unknown("flood", { yearly: true }), unknown("plain")], [between("flood", "plain", 0.2)], true);
    expect(refusal(make)).toBe(
      "correlations.0: flood and plain cannot have a correlation of 0.2: flood shares only what is known of it, and its knowledge is 0",
    );
  });

  test("a plain one that would need more of a yearly one than its knowledge", () => {
    const make = () =>
      jointSpace(
        [unknown("flood", { yearly: true, knowledge: 0.25 }), unknown("plain")],
        [between("flood", "plain", 0.6)],
        true,
      );
    expect(refusal(make)).toBe(
      "correlations.0: flood and plain cannot have a correlation of 0.6: of a yearly variable only its knowledge can be shared, and that does not suffice",
    );
  });

  test("knowledge that has no joint distribution, though the variables have one", () => {
    const unknowns = [
      unknown("a", { knowledge: 0.9 }),
      unknown("b", { knowledge: 0.15 }),
      unknown("c", { knowledge: 0.9 }),
    ];
    const make = () =>
      jointSpace(unknowns, [between("a", "b", 0.55), between("b", "c", 0.55), between("a", "c", -0.1)], true);
    expect(refusal(make)).toMatch(
      /^correlations\.\d: . and . cannot have a correlation of \S+: the knowledge of the variables then has no joint/,
    );
  });
});
