import { describe, expect, test } from "vitest";
import { studyDifferences } from "../../src/report/study-differences.ts";

const study = {
  title: "A",
  notes: "n",
  wall: { stem: { height: 5 }, unit_weight: { uniform: { from: 24, to: 25 } } },
  ground: { behind: { layers: [{ soil: "fill", bottom: 2 }, { soil: "sand" }] } },
};
type Tree = Record<string, unknown>;
const changed = (change: (tree: typeof study & Tree) => void): unknown => {
  const copy = structuredClone(study) as typeof study & Tree;
  change(copy);
  return copy;
};

describe("what differs between two studies", () => {
  test("nothing, between a study and itself, or where only words differ", () => {
    expect(studyDifferences(study, structuredClone(study))).toEqual([]);
    expect(studyDifferences(study, { ...study, title: "B", notes: "m" })).toEqual([]);
  });

  test("a number with its distribution is one value, by its path", () => {
    const other = changed((tree) => Object.assign(tree.wall, { unit_weight: { normal: { mean: 24, sd: 1 } } }));
    expect(studyDifferences(study, other)).toEqual([
      {
        path: "wall.unit_weight",
        first: "{ uniform: { from: 24, to: 25 } }",
        second: "{ normal: { mean: 24, sd: 1 } }",
      },
    ]);
  });

  test("what one has and the other has not stands as –, entries of lists by their place", () => {
    const other = changed((tree) => {
      tree.ground.behind.layers.splice(1, 1, { soil: "sand", bottom: 1 }, { soil: "clay" });
      tree.water = { behind: { level: 1.5 } };
    });
    expect(studyDifferences(study, other)).toEqual([
      { path: "ground.behind.layers.1.bottom", first: "–", second: "1" },
      { path: "ground.behind.layers.2.soil", first: "–", second: "clay" },
      { path: "water.behind.level", first: "–", second: "1.5" },
    ]);
    expect(studyDifferences(other, study)[0]).toEqual({
      path: "ground.behind.layers.1.bottom",
      first: "1",
      second: "–",
    });
  });

  test("the words of where a number came from do not count", () => {
    const told = changed((tree) => Object.assign(tree.wall.stem, { height: { value: 5, source: "drawing 12" } }));
    expect(studyDifferences(study, told)).toEqual([]);
    const higher = changed((tree) => Object.assign(tree.wall.stem, { height: { value: 6, source: "drawing 13" } }));
    expect(studyDifferences(told, higher)).toEqual([{ path: "wall.stem.height", first: "5", second: "6" }]);
  });
});
