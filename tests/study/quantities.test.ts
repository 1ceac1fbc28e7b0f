import { describe, expect, test } from "vitest";
import { fieldOfPath, fields } from "../../src/study/fields.ts";
import { labelAt, quantitiesOf, quantityAt } from "../../src/study/quantities.ts";
import { everything, fixture, plain, read } from "./fixtures/read.ts";

describe("the quantities of a study", () => {
  const study = read(everything);
  const found = quantitiesOf(study);

  test("are each at a path of their own, with the field of that path, and where quantityAt finds them", () => {
    expect(new Set(found.map(({ path }) => path)).size).toBe(found.length);
    for (const { path, quantity, field } of found) {
      expect(fieldOfPath(path)).toBe(field);
      expect(quantityAt(study, path)).toBe(quantity);
      expect(typeof quantity === "number" ? Number.isFinite(quantity) : typeof quantity.distribution.kind).toBeTruthy();
    }
  });

  test("reach every field of the table, over the fixtures", () => {
    const reached = new Set(
      ["everything", "plain", "gravity"].flatMap((name) =>
        quantitiesOf(read(fixture(name))).map(({ field }) => field.pattern),
      ),
    );
    expect(fields.map(({ pattern }) => pattern).filter((pattern) => !reached.has(pattern))).toEqual([]);
  });

  test("come in the order of the file, soil by soil and entry by entry", () => {
    const paths = found.map(({ path }) => path);
    const order = [
      "wall.stem.height",
      "soils.fill.unit_weight",
      "soils.fill.cohesion",
      "soils.sand.unit_weight",
      "soils.clay.unit_weight",
      "ground.behind.layers.0.bottom",
      "water.front.level",
      "loads.lines.0.force",
      "loads.lines.0.at",
      "loads.lines.1.force",
      "model.factors.deep_seated",
    ];
    expect(order.map((path) => paths.indexOf(path))).toEqual(
      order.map((path) => paths.indexOf(path)).sort((a, b) => a - b),
    );
    expect(order.every((path) => paths.includes(path))).toBe(true);
  });

  test("include defaults, and not what the study does not have", () => {
    const paths = quantitiesOf(read(plain)).map(({ path }) => path);
    expect(paths).toContain("model.factors.earth_thrust");
    expect(paths).toContain("soils.sand.cohesion");
    expect(paths).not.toContain("soils.fill.saturated_unit_weight");
    expect(paths).not.toContain("wall.sliding_friction.angle");
    expect(paths).not.toContain("ground.behind.layers.1.bottom");
  });

  test("bear words for people", () => {
    const labels = Object.fromEntries(found.map(({ path, label }) => [path, label]));
    expect(labels["soils.sand.friction_angle"]).toBe("Friction angle of Medium sand");
    expect(labels["soils.clay.undrained_strength"]).toBe("Undrained strength of clay");
    expect(labels["water.behind.level"]).toBe("Water level behind the wall");
    expect(labels["ground.behind.layers.0.bottom"]).toBe("Bottom of Crushed-rock fill behind the wall");
    expect(labels["ground.below.layers.0.bottom"]).toBe("Bottom of Medium sand below the wall");
    expect(labels["loads.lines.1.at"]).toBe("Distance of line load 2");
    expect(new Set(Object.values(labels)).size).toBe(found.length);
  });
});

test("a path that the study does not have is undefined, whatever it is made of", () => {
  const study = read(plain);
  for (const path of [
    "wall.base.heal",
    "wall",
    "soils.clay.cohesion",
    "loads.strips.9.width",
    "soils.toString.cohesion",
    "model.earth_pressure",
    "",
  ]) {
    expect(quantityAt(study, path), path).toBeUndefined();
  }
});

test("a label is there for a path without a value, too", () => {
  const study = read(plain);
  expect(labelAt(study, "soils.fill.saturated_unit_weight")).toBe("Saturated unit weight of Crushed-rock fill");
  expect(labelAt(study, "nothing.of.the.kind")).toBe("nothing.of.the.kind");
});
