import { describe, expect, test } from "vitest";
import { treeReader } from "../../src/study/build-study.ts";
import { everything, fixture, noPlaces, plain, read } from "./fixtures/read.ts";

describe("a study", () => {
  test("has every key of the file in house units and camelCase", () => {
    const study = read(everything);
    expect(study.wall).toMatchObject({
      stem: { footWidth: 0.5, backRun: 0.1 },
      base: { heel: 2.4 },
      shearKey: { fromToe: 1.8 },
      undersideLevel: 100,
      slidingFriction: { ratio: 0.8, adhesion: 2 },
    });
    expect(study.soils.fill).toMatchObject({
      name: "Crushed-rock fill",
      saturatedUnitWeight: 21,
      overconsolidationRatio: 2,
      drainage: "drained",
    });
    expect(study.soils.clay).toMatchObject({ name: "clay", drainage: "undrained", frictionAngle: 0 });
    expect(study.ground).toMatchObject({
      below: { soil: "sand", firmLevel: 94, layers: [{ soil: "sand", bottom: 98 }, { soil: "clay" }] },
      front: { soil: "fill", level: 101, ignoreTop: 0.3, toeSoil: false, inOverturning: true },
    });
    expect(study.water).toMatchObject({ front: { level: 100.5 }, flow: "seepage" });
    expect(study.loads).toMatchObject({
      surcharge: { onHeel: true },
      strips: [{ from: 1, width: 2, onHeel: true }],
      lines: [
        { force: 30, onHeel: true },
        { force: 10, at: 4, onHeel: false },
      ],
      earthquake: { kv: -0.03 },
    });
    expect(study.model).toMatchObject({
      earthPressure: "at_rest",
      plane: "virtual_back",
      bearing: "meyerhof",
      tensionCrack: "dry",
      factors: { baseResistance: 1, deepSeated: 1 },
    });
    expect(study.sources).toEqual({
      "wall.base.heel": "drawing 12",
      "soils.fill.friction_angle": "five shear boxes",
      "soils.sand.friction_angle": "penetration tests",
    });
    expect([study.title, study.notes, study.units]).toEqual(["Every key (invented)", "free text", "metric"]);
  });

  test("has the defaults of the format where the file is silent", () => {
    const study = read(plain);
    expect(study.notes).toBe("");
    expect(study.wall.undersideLevel).toBe(0);
    expect(study.wall.slidingFriction).toEqual({ ratio: 0.8, adhesion: 0 });
    expect(study.soils.fill).not.toHaveProperty("saturatedUnitWeight");
    expect(study.soils.fill.cohesion).toBe(0);
    expect(study.ground.below).toEqual({ soil: "sand", layers: [] });
    expect(study.ground.front).toEqual({
      level: 1,
      soil: "sand",
      mobilised: 0,
      ignoreTop: 0,
      toeSoil: true,
      inOverturning: false,
    });
    expect(study.water.flow).toBe("hydrostatic");
    expect(study.loads.surcharge).toEqual({ pressure: 10, onHeel: false });
    expect(study.loads.lines).toEqual([]);
    expect(study.model).toEqual({
      earthPressure: "rankine",
      wallFriction: 0,
      bearing: "vesic",
      tensionCrack: "dry",
      factors: { earthThrust: 1, baseResistance: 1, bearingCapacity: 1, deepSeated: 1 },
    });
    expect(study).not.toHaveProperty("decision");
    expect([study.evidence, study.sources, study.notices]).toEqual([[], {}, []]);
  });

  test("may do without base, key, water, loads and front", () => {
    const study = read(fixture("gravity"));
    expect(study.wall.base).toBeUndefined();
    expect(study.wall.shearKey).toBeUndefined();
    expect(study.wall.stem).toMatchObject({ height: expect.closeTo(3.048, 12), backRun: expect.closeTo(0.3048, 12) });
    expect(study.water).toEqual({ flow: "hydrostatic" });
    expect(study.loads).toEqual({ strips: [], lines: [] });
    expect(study.ground.front).toEqual({
      soil: "clay",
      mobilised: 0,
      ignoreTop: 0,
      toeSoil: true,
      inOverturning: false,
    });
  });
});

test("a reader of a tree gives values, defaults and NaN, and never throws over what the file holds", () => {
  const findings = noPlaces();
  const reader = treeReader(
    { wall: { unit_weight: "heavy", stem: 3 }, title: 5, model: { bearing: "mine" } },
    findings,
  );
  expect(reader.quantity("wall.unit_weight")).toBeNaN();
  expect(reader.quantity("wall.stem.height")).toBeNaN();
  expect(reader.quantity("model.factors.earth_thrust")).toBe(1);
  expect(reader.maybe("wall.stem.height")).toBeUndefined();
  expect(reader.text("title", "none")).toBe("none");
  expect(reader.choice("model.bearing", ["vesic", "meyerhof"], "vesic")).toBe("vesic");
  expect(reader.list("correlations")).toEqual([]);
  expect(findings.problems).toHaveLength(1);
  expect(() => reader.maybe("title")).toThrow(RangeError);
});
