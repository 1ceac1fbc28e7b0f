import { expect, test } from "vitest";
import { assess } from "../src/assess.ts";
import { readDocument } from "../src/study/read-study.ts";
import { gallery } from "./report/gallery.ts";

type Tree = Record<string, unknown>;

test("every kind of uncertain value is echoed with its word, moments, fractiles, share of knowledge and picture", async () => {
  const soils = {
    fill: {
      name: "Gravel fill",
      unit_weight: { truncated_normal: { mean: 19, sd: 1, from: 17, to: 20 } },
      friction_angle: { measured: [33.1, 35.4, 31.8, 36], as: "normal" },
    },
    sand: {
      unit_weight: { range: { lowest: 17, likely: 18, highest: 19 }, source: "judgement" },
      friction_angle: {
        scatter: { inherent: 0.09, scale_of_fluctuation: 1.5, averaged_over: 6, measurement: 0.03, tests: 4 },
        normal: { mean: 33 },
      },
    },
  };
  const study = readDocument({ ...(gallery.plain as Tree), soils, assessment: { seed: "echo", samples: 1000 } });
  const byPath = new Map((await assess(study)).variables.map((variable) => [variable.path, variable]));
  const at = (path: string) => byPath.get(path) ?? expect.fail(path);

  const cut = at("soils.fill.unit_weight");
  expect(cut).toMatchObject({
    distribution: "truncated_normal",
    unit: "kN/m³",
    label: "Unit weight of Gravel fill",
    parent: { mean: 19, sd: 1 },
    knowledge: 1,
  });
  expect(cut.mean).toBeLessThan(19);
  expect(at("soils.fill.friction_angle")).toMatchObject({
    distribution: "measured",
    ticks: [33.1, 35.4, 31.8, 36],
    unit: "°",
  });
  expect(at("soils.fill.friction_angle").knowledge).toBeCloseTo(0.2, 12); // (1/4)/(1 + 1/4)
  const judged = at("soils.sand.unit_weight");
  expect(judged).toMatchObject({ distribution: "range", mean: 18, sd: 0.5, source: "judgement" });
  expect(judged.fractile5).toBeCloseTo(18 - 0.5 * 1.6448536269514722, 12);
  expect(judged.fractile95).toBeCloseTo(18 + 0.5 * 1.6448536269514722, 12);
  const cov2 = 0.25 * 0.09 ** 2 + (0.09 ** 2 + 0.03 ** 2) / 4;
  expect(at("soils.sand.friction_angle").sd).toBeCloseTo(33 * Math.sqrt(cov2), 10);
  expect(at("soils.sand.friction_angle").knowledge).toBeCloseTo(1 - (0.25 * 0.09 ** 2) / cov2, 10);
  for (const { density } of byPath.values()) {
    expect(density.x).toHaveLength(density.y.length);
    expect(Math.min(...density.y)).toBeGreaterThanOrEqual(0);
  }
});
