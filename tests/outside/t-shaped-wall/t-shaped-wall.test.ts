import { expect, test } from "vitest";
import { type Evaluated, evaluateWall } from "../../mechanics/evaluate-wall.ts";
import { disagreement, readCases } from "../cases.ts";

const wall = (surcharge: string, friction: string): Evaluated =>
  evaluateWall(`
wall:
  stem: { height: 6.0, crest_width: 0.7, foot_width: 0.7 }
  base: { toe: 0.95, heel: 2.25, thickness: 0.8 }
  unit_weight: 25
  sliding_friction: ${friction}
soils:
  fill: { unit_weight: 19, friction_angle: 32.5 }
ground:
  behind: { slope: 20, layers: [ { soil: fill } ] }
  below: { soil: fill }
${surcharge}
`);

const sum = (
  result: Evaluated,
  what: "horizontal" | "vertical",
  named: (name: string, group: string) => boolean,
): number =>
  result.forces.filter((force) => named(force.name, force.group)).reduce((total, force) => total + force[what], 0);

function quantities(pressure: number): Record<string, number> {
  const loads = pressure > 0 ? `loads: { surcharge: { pressure: ${pressure} } }` : "";
  const result = wall(loads, "{ ratio: 1 }");
  const carried = wall("loads: { surcharge: { pressure: 5, on_heel: true } }", "{ ratio: 1 }");
  const { overturning, sliding } = result.limitStates;
  const thrust = (name: string, group: string): boolean => group === "earth" || (group === "surcharge" && name !== "");
  const top = result.pressure[0];
  const foot = result.pressure[result.pressure.length - 1];
  const weight = (name: string): number => sum(result, "vertical", (found) => found.startsWith(name));
  return {
    stem: weight("Stem"),
    slab: weight("Base"),
    fill: weight("Soil over the heel"),
    "vertical without thrust": sum(result, "vertical", (_, group) => group === "weight"),
    "surcharge on the heel":
      carried.base.vertical - wall("loads: { surcharge: { pressure: 5 } }", "{ ratio: 1 }").base.vertical,
    "height of the plane": top.z,
    "height of the fill at the heel": top.z - 0.8,
    Ka: foot.horizontal / foot.verticalEffective / Math.cos((20 * Math.PI) / 180),
    Ph: sum(result, "horizontal", thrust),
    Pv: sum(result, "vertical", thrust),
    "overturning moment": overturning?.driving ?? Number.NaN,
    vertical: result.base.vertical,
    "stabilising moment": overturning?.resisting ?? Number.NaN,
    overturning: overturning?.factorOfSafety ?? Number.NaN,
    e: result.base.eccentricity ?? Number.NaN,
    "pressure at the toe": result.base.pressureToe ?? Number.NaN,
    sliding: sliding?.factorOfSafety ?? Number.NaN,
    "sliding at two thirds":
      wall(loads, "{ ratio: 0.6666666666666666 }").limitStates.sliding?.factorOfSafety ?? Number.NaN,
  };
}

test("weights, thrust, moments, factors and pressures of the published wall agree to their printed digits", () => {
  const found: Record<string, Record<string, number>> = {
    published: quantities(0),
    q0: quantities(0),
    q5: quantities(5),
  };
  const rows = readCases(new URL("cases.csv", import.meta.url));
  expect(rows).toHaveLength(32);
  const wrong = rows
    .map((row) => disagreement(`${row.case}, ${row.quantity}`, found[row.case][row.quantity], row.value))
    .filter((text) => text !== "");
  expect(wrong).toEqual([]);
});
