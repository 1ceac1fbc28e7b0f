import { expect, test } from "vitest";
import { evaluateWall } from "../../mechanics/evaluate-wall.ts";
import { disagreement, readCases } from "../cases.ts";

const result = evaluateWall(`
units: us
wall:
  stem: { height: 18, crest_width: 1.5, foot_width: 2.5 }
  base: { toe: 4, heel: 6, thickness: 2.75 }
  unit_weight: 150
  sliding_friction: { ratio: 0.6666666666666666, adhesion: 600 }
soils:
  fill: { unit_weight: 117, friction_angle: 34 }
  clay: { unit_weight: 107, friction_angle: 18, cohesion: 900 }
ground:
  behind: { slope: 10, layers: [ { soil: fill } ] }
  below: { soil: clay }
  front: { level: 4, toe_soil: false }
`);

const foot = 0.3048; // m, exact
const kip = 4.4482216152605; // kN, exact
const perFoot = kip / foot; // kN/m in a kip/ft

function found(): Record<string, number> {
  const { forces, base, limitStates } = result;
  const named = (start: string): { vertical: number; horizontal: number; x: number } => {
    const force = forces.find((row) => row.name.startsWith(start));
    if (force === undefined) throw new RangeError(`no force is named ${start}`);
    return force;
  };
  const moment = (start: string): number => (named(start).vertical * named(start).x) / perFoot / foot;
  const or = (value: number | null | undefined): number => value ?? Number.NaN;
  return {
    "height of the plane": result.pressure[0].z / foot,
    stem: named("Stem").vertical / perFoot,
    slab: named("Base").vertical / perFoot,
    "soil over the heel": named("Soil over the heel").vertical / perFoot,
    Pv: named("Earth").vertical / perFoot,
    Ph: named("Earth").horizontal / perFoot,
    vertical: base.vertical / perFoot,
    "moment of the stem": moment("Stem"),
    "moment of the slab": moment("Base"),
    "moment of the soil over the heel": moment("Soil over the heel"),
    "moment of Pv": moment("Earth"),
    "stabilising moment": or(limitStates.overturning?.resisting) / perFoot / foot,
    "overturning moment": or(limitStates.overturning?.driving) / perFoot / foot,
    overturning: or(limitStates.overturning?.factorOfSafety),
    sliding: or(limitStates.sliding?.factorOfSafety),
    e: or(base.eccentricity) / foot,
    "pressure at the toe": (or(base.pressureToe) / perFoot) * foot,
    "pressure at the heel": (or(base.pressureHeel) / perFoot) * foot,
  };
}

/** Half a per cent of a figure, one of a factor of safety; of a small difference, half a per cent of what it is taken from. */
function tolerance(quantity: string, printed: number): number {
  if (quantity === "overturning" || quantity === "sliding") return 0.01 * printed;
  if (quantity === "e") return 0.005 * 5.8;
  if (quantity === "pressure at the heel") return 0.005 * 2.4427;
  return 0.005 * printed;
}

test("weights, thrust, moments, factors and pressures of the published wall agree within the book's rounding", () => {
  const values = found();
  const rows = readCases(new URL("cases.csv", import.meta.url));
  expect(rows).toHaveLength(19);
  const wrong = rows
    .map((row) => {
      return disagreement(row.quantity, values[row.quantity], row.value, tolerance(row.quantity, Number(row.value)));
    })
    .filter((text) => text !== "");
  expect(wrong).toEqual([]);
});
