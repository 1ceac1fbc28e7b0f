import { expect, test } from "vitest";
import { type DriverMeasures, rankDrivers } from "../../src/drivers/driver-ranking.ts";

const row = (path: string, over: Partial<DriverMeasures> = {}): DriverMeasures => ({
  path,
  adverse: "low",
  knowledge: 1,
  ...over,
});

test("a straight line of independent normals: all measures agree, and nothing is remarked", () => {
  const ranked = rankDrivers(
    [0.2, 0.7, 0.1].map((part, i) =>
      row(`x${i}`, {
        share: part,
        importance: part,
        totalIndex: part,
        firstIndex: part,
        rankCorrelation: Math.sqrt(part),
        shiftGivenFailure: -2 * Math.sqrt(part),
      }),
    ),
  );
  expect(ranked.map(({ path, rank }) => [path, rank])).toEqual([
    ["x1", 1],
    ["x0", 2],
    ["x2", 3],
  ]);
  expect(ranked.map(({ weight }) => weight)).toEqual([0.7, 0.2, 0.1].map((part) => expect.closeTo(part, 12)));
  expect(ranked.flatMap(({ disagreements }) => disagreements)).toEqual([]);
});

test("an unknown that matters only at failure is remarked, and so is one that matters only around the means", () => {
  const ranked = rankDrivers([
    row("water", { share: 0.05, importance: 0.7, shiftGivenFailure: 2 }),
    row("friction", { share: 0.95, importance: 0.3, shiftGivenFailure: -0.5 }),
  ]);
  const of = (path: string): readonly string[] => ranked.find((one) => one.path === path)!.disagreements;
  expect(of("water")).toEqual([expect.stringContaining("matters where the wall fails much more")]);
  expect(of("friction")).toEqual([expect.stringContaining("the wall fails without it")]);
});

test("interaction and a turn of the harmful end are remarked", () => {
  const [interacting] = rankDrivers([
    row("a", { firstIndex: 0.05, totalIndex: 0.6 }),
    row("b", { firstIndex: 0.35, totalIndex: 0.4 }),
  ]);
  expect(interacting.disagreements).toEqual([expect.stringContaining("together with others")]);
  const [turned] = rankDrivers([row("a", { rankCorrelation: 0.4, shiftGivenFailure: 1.2 })]);
  expect(turned.disagreements).toEqual([expect.stringContaining("both ends")]);
});

test("a measure that is missing for one unknown is left out for all", () => {
  const ranked = rankDrivers([row("a", { share: 0.9, importance: null }), row("b", { share: 0.1, importance: 1 })]);
  expect(ranked[0]).toMatchObject({ path: "a", weight: 0.9 });
});

test("a negative share counts as none, and without measures nothing is weighed", () => {
  expect(rankDrivers([row("a", { share: 1.1 }), row("b", { share: -0.1 })])[1].weight).toBe(0);
  expect(rankDrivers([row("a"), row("b")]).map(({ weight }) => weight)).toEqual([0, 0]);
  expect(rankDrivers([])).toEqual([]);
});
