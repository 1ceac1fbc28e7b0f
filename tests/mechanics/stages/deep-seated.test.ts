import { describe, expect, test } from "vitest";
import { assess } from "../../../src/assess.ts";
import { check } from "../../../src/check.ts";
import { deepSeated } from "../../../src/mechanics/deep-seated/deep-seated.ts";
import { buildModel } from "../../../src/model.ts";
import { readDocument } from "../../../src/study/read-study.ts";

const tree = {
  title: "Wall on clay (invented)",
  wall: {
    stem: { height: 5, crest_width: 0.3, foot_width: 0.5 },
    base: { toe: 0.8, heel: 2.4, thickness: 0.5 },
    unit_weight: 24,
  },
  soils: {
    fill: { unit_weight: 19, saturated_unit_weight: 21, friction_angle: { normal: { mean: 33, sd: 2 } } },
    clay: { unit_weight: 17.5, drainage: "undrained", undrained_strength: { lognormal: { mean: 40, cov: 0.2 } } },
  },
  ground: { behind: { layers: [{ soil: "fill" }] }, below: { soil: "clay", firm_level: -6 }, front: { level: 0.8 } },
  loads: { surcharge: { pressure: 10 } },
  model: { factors: { deep_seated: 0.95 } },
  assessment: { limit_states: ["sliding", "deep_seated"], seed: "deep", samples: 300, precision: 0 },
};
const degree = Math.PI / 180;

describe("deep-seated failure as a limit state", () => {
  test("is the search over circles on the ground of the study, times its model factor", () => {
    const result = check(readDocument(tree));
    const soil = (unitWeight: number, saturatedUnitWeight: number, frictionAngle: number, cohesion: number) => ({
      unitWeight,
      saturatedUnitWeight,
      frictionAngle,
      cohesion,
    });
    const clay = soil(17.5, 19.5, 0, 40);
    const alone = deepSeated({
      wall: {
        stemHeight: 5,
        crestWidth: 0.3,
        footWidth: 0.5,
        backRun: 0,
        toe: 0.8,
        heel: 2.4,
        thickness: 0.5,
        unitWeight: 24,
      },
      behind: { slope: 0, layers: [{ soil: soil(19, 21, 33 * degree, 0) }] },
      below: [{ soil: clay }],
      firmLevel: -6,
      front: { level: 0.8, ignoreTop: 0, toeSoil: true, soil: clay },
      water: {},
      loads: { surcharge: 10, strips: [], lines: [] },
      earthquake: { kh: 0, kv: 0 },
    });
    expect(result.limitStates.deep_seated?.factorOfSafety).toBeCloseTo(0.95 * alone.factor, 9);
    expect(result.limitStates.deep_seated).toMatchObject({ unit: "kNm/m" });
    expect(
      (result.limitStates.deep_seated?.resisting ?? 0) / (result.limitStates.deep_seated?.driving ?? 1),
    ).toBeCloseTo(0.95 * alone.factor, 6);
    expect(result.section.circle?.radius).toBeCloseTo(alone.circle?.radius ?? 0, 9);
    expect(
      result.sheet.some((line) => line.heading === "Deep-seated failure" && line.source?.startsWith("Bishop")),
    ).toBe(true);
  });

  test("in a block of samples is the full search to 1 %, and the same from any block", () => {
    const study = readDocument(tree);
    const { states, space } = buildModel(study);
    const place = states.names.indexOf("deep_seated");
    const points = [-1.5, 0, 1.5].flatMap((a) => [-1.5, 1.5].map((b) => [a, b]));
    const x = space.unknowns.map((unknown, v) =>
      Float64Array.from(points, (point) => unknown.marginal.quantileOfNormal(point[v])),
    );
    const factors = states.names.map(() => new Float64Array(points.length));
    states.evaluateAt(x, points.length, factors, new Uint8Array(points.length));
    points.forEach((_, i) => {
      const values = Object.fromEntries(space.unknowns.map((unknown, v) => [unknown.path, x[v][i]]));
      const full = check(study, { at: { name: "point", values } }).limitStates.deep_seated?.factorOfSafety ?? 0;
      expect(factors[place][i] / full).toBeGreaterThan(1 - 1e-9 - 0.002);
      expect(factors[place][i] / full).toBeLessThan(1.01);
    });
  });

  test("is sampled with the others", async () => {
    const result = await assess(readDocument(tree));
    expect(result.limitStates.deep_seated?.monteCarlo.samples).toBe(300);
    expect(result.limitStates.deep_seated?.factorAtMean).toBeGreaterThan(1);
  });
});
