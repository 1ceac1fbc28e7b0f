import { describe, expect, test } from "vitest";
import { treeReader } from "../../src/study/build-study.ts";
import { soilReferences } from "../../src/study/check-ground.ts";
import { everything, noPlaces, notesOf, plainWith, problemsOf, read } from "./fixtures/read.ts";

describe("layers", () => {
  test("may be as thin as nothing at the means, and not less", () => {
    const second = (bottom: number): string =>
      plainWith(["- { soil: sand }", `- { soil: sand, bottom: ${bottom} }\n      - { soil: fill }`]);
    expect(problemsOf(() => read(second(2.0)))).toBe("");
    expect(problemsOf(() => read(second(2.01)))).toContain("lies above the bottom of the layer over it (2 m)");
  });

  test("may reach above the crest on a slope, up to the ground over the heel", () => {
    const slope = (bottom: number): string =>
      plainWith(["slope: 0", "slope: 20"], ["bottom: 2.0", `bottom: ${bottom}`]);
    expect(problemsOf(() => read(slope(6.3)))).toBe(""); // 5.5 + (2.4 + 0.1) tan 20° = 6.41
    expect(problemsOf(() => read(slope(6.5)))).toContain("lies above the ground surface (6.41 m)");
  });

  test("of site levels count from the site's datum", () => {
    const text = everything.replace("bottom: 98 }", "bottom: 100.5 }");
    expect(problemsOf(() => read(text))).toContain(
      "ground.below.layers.0.bottom: 100.5 m lies above the underside of the base (100 m)",
    );
  });
});

describe("soils", () => {
  test("of an undrained layer need no friction angle, and a note says that one has no effect", () => {
    const text = plainWith(["unit_weight: 19", "unit_weight: 19\n    drainage: undrained\n    undrained_strength: 50"]);
    expect(notesOf(text)).toContain("soils.fill.friction_angle: has no effect: the soil is undrained");
  });

  test("that are named are found with the path of the name", () => {
    const study = read(everything);
    const reader = treeReader(study.document, noPlaces());
    expect(soilReferences({ study, read: reader })).toEqual([
      { path: "ground.behind.layers.0.soil", soil: "fill" },
      { path: "ground.behind.layers.1.soil", soil: "sand" },
      { path: "ground.below.layers.0.soil", soil: "sand" },
      { path: "ground.below.layers.1.soil", soil: "clay" },
      { path: "ground.front.soil", soil: "fill" },
    ]);
  });

  test("there must be at least one", () => {
    const text =
      "wall: { stem: { height: 3, crest_width: 1, foot_width: 1 }, unit_weight: 24 }\nsoils: {}\nground: { behind: { layers: [{ soil: sand }] }, below: { soil: sand } }";
    expect(problemsOf(() => read(text))).toContain("soils: names no soil");
  });
});

describe("firm ground", () => {
  test("lies below base and key", () => {
    const text = everything.replace("firm_level: 94", "firm_level: 99.7");
    expect(problemsOf(() => read(text))).toContain(
      "ground.below.firm_level: 99.7 m must be below the base and its key (99.6 m)",
    );
  });

  test("belongs to deep-seated failure", () => {
    const text = everything.replace("[deep_seated, sliding", "[sliding").replace(", deep_seated: 1000000", "");
    expect(problemsOf(() => read(text))).toBe(
      "58:5 ground.below.firm_level: belongs to the limit state deep_seated, which this study does not list\n  hint: leave it out",
    );
  });
});

describe("water", () => {
  test("above the ground behind is noted, since it is taken at the ground", () => {
    const text = plainWith(["{ triangular: { from: 0, peak: 0.8, to: 3.0 } }", "5.8"]);
    expect(notesOf(text)).toContain(
      "water.behind.level: mean 5.8 m lies above the ground (5.5 m) and is taken at the ground",
    );
  });

  test("in front may reach the crest, and the ground in front may too", () => {
    expect(problemsOf(() => read(plainWith(["    level: 0.5", "    level: 5.5"])))).toBe("");
    expect(problemsOf(() => read(plainWith(["    level: 1.0\n", "    level: 5.5\n"])))).toBe("");
    expect(problemsOf(() => read(plainWith(["    level: 1.0\n", "    level: 0\n"])))).toBe("");
  });
});
