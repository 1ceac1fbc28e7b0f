/**
 * Every numeric field of a study, in one table: what it measures, its physical range, its default, its words.
 *
 * The schema, the JSON Schema, the reading of values, the list of quantities and the limits at which samples are taken
 * all come from here. Ranges are in house units (degrees for angles). The lower limits follow from mechanics (a length is
 * above 0, a strength is not negative); a length's least value is 1 cm, so that a sample taken at the limit still has a
 * wall to work with. The upper limits bound what a gravity or cantilever wall can meet, generously: they catch slips of
 * the decimal point and of the unit, not unusual sites.
 */
import type { Dimension } from "./units.ts";

export interface Field {
  /** Path with `*` for the name of a soil or the place in a list: `soils.*.friction_angle`. */
  readonly pattern: string;
  readonly dimension: Dimension;
  /** Physical range, house units, both ends included. */
  readonly lowest: number;
  readonly highest: number;
  /** Words for people; `{soil}` is the soil's name, `{n}` the place counted from 1. */
  readonly label: string;
  readonly description: string;
  /** House units; absent where there is none. */
  readonly default?: number;
  /** A default that is not a number. */
  readonly defaultText?: string;
  readonly example: number;
  /** Must be given wherever its parent is. */
  readonly required: boolean;
}

type Options = Partial<Pick<Field, "default" | "defaultText" | "required">>;

function field(
  pattern: string,
  dimension: Dimension,
  range: readonly [number, number],
  label: string,
  description: string,
  example: number,
  options: Options = {},
): Field {
  const required = options.required ?? (options.default === undefined && options.defaultText === undefined);
  return { pattern, dimension, lowest: range[0], highest: range[1], label, description, example, ...options, required };
}

const extent = [0.01, 100] as const; // m, a dimension that cannot be nothing
const offset = [0, 100] as const; // m, a dimension that can
const levels = [-1000, 10000] as const; // m, from below the sea to above the highest road
const angle = [0, 60] as const; // degrees
const weight = [1, 40] as const; // kN/m³, foamed fill to iron ore
const strength = [0, 10000] as const; // kPa
const factor = [0, 10] as const;

/** In the order of the study file. */
export const fields: readonly Field[] = [
  field(
    "wall.stem.height",
    "length",
    extent,
    "Stem height",
    "Height of the stem above the base slab (above the underside without one)",
    5,
  ),
  field("wall.stem.crest_width", "length", extent, "Stem width at the crest", "Width of the stem at its top", 0.3),
  field("wall.stem.foot_width", "length", extent, "Stem width at the foot", "Width of the stem at its foot", 0.5),
  field(
    "wall.stem.back_run",
    "length",
    offset,
    "Back run of the stem",
    "Horizontal distance by which the back face runs in from foot to crest; the front face runs in by what is left of the foot width",
    0,
    { default: 0 },
  ),
  field("wall.base.toe", "length", offset, "Toe length", "Length of the base slab in front of the stem", 0.8),
  field("wall.base.heel", "length", offset, "Heel length", "Length of the base slab behind the stem", 2.4),
  field("wall.base.thickness", "length", extent, "Base thickness", "Thickness of the base slab", 0.5),
  field("wall.shear_key.depth", "length", extent, "Shear key depth", "Depth of the shear key below the underside", 0.4),
  field("wall.shear_key.width", "length", extent, "Shear key width", "Width of the shear key", 0.4),
  field(
    "wall.shear_key.from_toe",
    "length",
    offset,
    "Shear key distance from the toe",
    "Distance from the tip of the toe to the front of the shear key",
    1.8,
  ),
  field("wall.unit_weight", "unit_weight", weight, "Unit weight of the wall", "Unit weight of stem, base and key", 24),
  field(
    "wall.underside_level",
    "level",
    levels,
    "Level of the underside",
    "Site level of the underside of the base; all levels are site levels then",
    0,
    { default: 0 },
  ),
  field(
    "wall.sliding_friction.ratio",
    "ratio",
    [0, 1.5],
    "Base friction ratio",
    "Friction angle on the base divided by the friction angle of the soil below",
    0.8,
    { required: false },
  ),
  field(
    "wall.sliding_friction.angle",
    "angle",
    angle,
    "Base friction angle",
    "Friction angle on the base, in place of the ratio",
    27,
    { required: false },
  ),
  field(
    "wall.sliding_friction.adhesion",
    "pressure",
    strength,
    "Adhesion on the base",
    "Adhesion on the compressed length of the base",
    0,
    { default: 0 },
  ),
  field(
    "soils.*.unit_weight",
    "unit_weight",
    weight,
    "Unit weight of {soil}",
    "Moist unit weight, above the water",
    19,
  ),
  field(
    "soils.*.saturated_unit_weight",
    "unit_weight",
    weight,
    "Saturated unit weight of {soil}",
    "Unit weight below the water, water included",
    21,
    { defaultText: "unit_weight + 2 kN/m3" },
  ),
  field(
    "soils.*.friction_angle",
    "angle",
    angle,
    "Friction angle of {soil}",
    "Effective friction angle φ′; needed for a drained soil",
    34,
    { required: false },
  ),
  field("soils.*.cohesion", "pressure", strength, "Cohesion of {soil}", "Effective cohesion c′", 0, { default: 0 }),
  field(
    "soils.*.undrained_strength",
    "pressure",
    strength,
    "Undrained strength of {soil}",
    "Undrained shear strength c_u, with drainage: undrained",
    60,
    { required: false },
  ),
  field(
    "soils.*.overconsolidation_ratio",
    "ratio",
    [1, 100],
    "Overconsolidation ratio of {soil}",
    "Overconsolidation ratio, for earth pressure at rest",
    2,
    { required: false },
  ),
  field(
    "ground.behind.slope",
    "slope",
    angle,
    "Slope of the retained ground",
    "Slope of the ground surface behind the wall, rising from the crest",
    0,
    { default: 0 },
  ),
  field(
    "ground.behind.layers.*.bottom",
    "level",
    levels,
    "Bottom of {soil} behind the wall",
    "Level of the bottom of the layer; the last layer has none",
    2,
    { required: false },
  ),
  field(
    "ground.below.layers.*.bottom",
    "level",
    levels,
    "Bottom of {soil} below the wall",
    "Level of the bottom of the layer; the last layer has none",
    -2,
    { required: false },
  ),
  field(
    "ground.below.firm_level",
    "level",
    levels,
    "Level of firm ground",
    "Level below which no slip circle goes, for deep_seated",
    -6,
    { required: false, defaultText: "the height of the wall below the underside" },
  ),
  field("ground.front.level", "level", levels, "Ground level in front", "Level of the ground in front of the wall", 1, {
    defaultText: "the underside of the base",
  }),
  field(
    "ground.front.mobilised",
    "ratio",
    [0, 1],
    "Mobilised share of passive resistance",
    "Share of the passive resistance in front that is counted",
    0.3,
    { default: 0 },
  ),
  field(
    "ground.front.ignore_top",
    "length",
    offset,
    "Ignored depth in front",
    "Depth below the ground in front that gives no passive resistance (it may be dug away)",
    0.3,
    { default: 0 },
  ),
  field(
    "water.behind.level",
    "level",
    levels,
    "Water level behind the wall",
    "Level of the water in the retained ground",
    1,
  ),
  field("water.front.level", "level", levels, "Water level in front", "Level of the water in front of the wall", 0.5),
  field(
    "loads.surcharge.pressure",
    "pressure",
    strength,
    "Surcharge behind the wall",
    "Uniform load on the ground behind the wall, per horizontal area",
    10,
  ),
  field(
    "loads.strips.*.pressure",
    "pressure",
    strength,
    "Pressure of strip load {n}",
    "Vertical pressure of the strip load",
    40,
  ),
  field(
    "loads.strips.*.from",
    "length",
    offset,
    "Distance of strip load {n}",
    "Distance from the crest of the back face to the near edge of the strip",
    1,
  ),
  field("loads.strips.*.width", "length", extent, "Width of strip load {n}", "Width of the strip", 2),
  field(
    "loads.lines.*.force",
    "line_force",
    [0, 100000],
    "Force of line load {n}",
    "Vertical force of the line load per length of wall",
    30,
  ),
  field(
    "loads.lines.*.at",
    "length",
    offset,
    "Distance of line load {n}",
    "Distance from the crest of the back face to the line load",
    2.5,
  ),
  field(
    "loads.earthquake.kh",
    "ratio",
    [0, 1],
    "Horizontal earthquake coefficient",
    "Horizontal pseudo-static coefficient, not the peak ground acceleration",
    0.1,
  ),
  field(
    "loads.earthquake.kv",
    "ratio",
    [-0.5, 0.5],
    "Vertical earthquake coefficient",
    "Vertical pseudo-static coefficient, positive upwards (it lightens the wall); try both signs",
    0,
    { default: 0 },
  ),
  field(
    "model.wall_friction",
    "angle",
    angle,
    "Wall friction angle",
    "Friction angle between the soil and the plane the pressure acts on, for Coulomb",
    20,
    { default: 0 },
  ),
  field(
    "model.factors.earth_thrust",
    "ratio",
    factor,
    "Model factor on earth thrust",
    "Multiplies the whole earth thrust; its spread is the model's uncertainty",
    1,
    { default: 1 },
  ),
  field(
    "model.factors.base_resistance",
    "ratio",
    factor,
    "Model factor on base resistance",
    "Multiplies friction, adhesion and undrained shear on the base",
    1,
    { default: 1 },
  ),
  field(
    "model.factors.bearing_capacity",
    "ratio",
    factor,
    "Model factor on bearing capacity",
    "Multiplies the bearing capacity",
    1,
    { default: 1 },
  ),
  field(
    "model.factors.deep_seated",
    "ratio",
    factor,
    "Model factor on deep-seated failure",
    "Multiplies the factor of safety against deep-seated failure",
    1,
    { default: 1 },
  ),
];

const byPattern: ReadonlyMap<string, Field> = new Map(fields.map((entry) => [entry.pattern, entry]));

/** The field with exactly this pattern. @throws RangeError where there is none */
export function fieldOfPattern(pattern: string): Field {
  const found = byPattern.get(pattern);
  if (found === undefined) throw new RangeError(`no field has the pattern ${pattern}`);
  return found;
}

/** The field a path names (`soils.fill.friction_angle`), or undefined where the path is not one of a number. */
export function fieldOfPath(path: string): Field | undefined {
  if (path.includes("*")) return undefined;
  const exact = byPattern.get(path);
  if (exact !== undefined) return exact;
  const keys = path.split(".");
  for (let i = 1; i < keys.length - 1; i++) {
    const isName = keys[i - 1] === "soils" ? keys[i] !== "" : /^(0|[1-9]\d*)$/.test(keys[i]!);
    const found = isName ? byPattern.get([...keys.slice(0, i), "*", ...keys.slice(i + 1)].join(".")) : undefined;
    if (found !== undefined) return found;
  }
  return undefined;
}
