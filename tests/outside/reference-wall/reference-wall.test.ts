import { expect, test } from "vitest";
import { type Evaluated, evaluateWall } from "../../mechanics/evaluate-wall.ts";
import { disagreement, readCases } from "../cases.ts";

const wall = (rest: string, below = "fill", front = "{ toe_soil: false }"): Evaluated =>
  evaluateWall(`
wall:
  stem: { height: 5.0, crest_width: 0.4, foot_width: 0.4 }
  base: { toe: 0.8, heel: 2.0, thickness: 0.5 }
  unit_weight: 25
  sliding_friction: { angle: 25 }
soils:
  fill: { unit_weight: 18, saturated_unit_weight: 20, friction_angle: 34 }
  a: { unit_weight: 19, friction_angle: 32 }
  b: { unit_weight: 19, friction_angle: 28, cohesion: 5 }
  c: { unit_weight: 19, drainage: undrained, undrained_strength: 80 }
ground:
  behind: { layers: [ { soil: fill } ] }
  below: { soil: ${below} }
  front: ${front}
model: { bearing: en1997 }
${rest}
`);

const or = (value: number | null | undefined): number => value ?? Number.NaN;

function named(result: Evaluated, part: string): Evaluated["forces"][number] {
  const force = result.forces.find((row) => row.name.includes(part));
  if (force === undefined) throw new RangeError(`no force is named ${part}`);
  return force;
}

function dry(): Record<string, number> {
  const result = wall("");
  const { overturning, sliding } = result.limitStates;
  return {
    Ph: named(result, "Earth").horizontal,
    "height of Ph": named(result, "Earth").z,
    "overturning moment": or(overturning?.driving),
    vertical: result.base.vertical,
    "stabilising moment": or(overturning?.resisting),
    sliding: or(sliding?.factorOfSafety),
    overturning: or(overturning?.factorOfSafety),
  };
}

function wet(): Record<string, number> {
  const result = wall("water: { behind: { level: 3.0 } }");
  const { overturning, sliding } = result.limitStates;
  const uplift = named(result, "Uplift");
  const weights = result.forces.filter((force) => force.group === "weight");
  return {
    "above water": named(result, "above water").horizontal,
    "height of above water": named(result, "above water").z,
    "below water": named(result, "below water").horizontal,
    water: named(result, "Water behind").horizontal,
    "height of water": named(result, "Water behind").z,
    horizontal: result.base.horizontal,
    weights: weights.reduce((sum, force) => sum + force.vertical, 0),
    "stabilising moment": or(overturning?.resisting),
    uplift: -uplift.vertical,
    "x of uplift": uplift.x,
    "moment of uplift": -uplift.vertical * uplift.x,
    "overturning moment without uplift": or(overturning?.driving) + uplift.vertical * uplift.x,
    sliding: or(sliding?.factorOfSafety),
    overturning: or(overturning?.factorOfSafety),
  };
}

function bearing(soil: string): Record<string, number> {
  const result = wall("", soil, "{ level: 0.8, toe_soil: false }");
  const state = result.limitStates.bearing;
  return {
    q_ult: or(state?.resisting),
    R: or(state?.resisting) * result.base.effectiveWidth,
    "R over V": or(state?.factorOfSafety),
  };
}

test("forces, moments and factors of the reference wall agree to their printed digits", () => {
  const found: Record<string, Record<string, number>> = {
    dry: dry(),
    wet: wet(),
    "bearing a": bearing("a"),
    "bearing b": bearing("b"),
    "bearing c": bearing("c"),
  };
  const rows = readCases(new URL("cases.csv", import.meta.url));
  expect(rows).toHaveLength(30);
  const wrong = rows
    .map((row) => disagreement(`${row.case}, ${row.quantity}`, found[row.case][row.quantity], row.value))
    .filter((text) => text !== "");
  expect(wrong).toEqual([]);
});
