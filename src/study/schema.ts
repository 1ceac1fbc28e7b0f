/**
 * The study file as a zod schema: which keys there are, which must be there, and in what words they are explained.
 *
 * Numeric fields are leaves that only carry their row of `fields.ts`: `read-quantity.ts` reads them, because their units
 * and ranges hang on the file. The JSON Schema is made from the same tree (`json-schema.ts`).
 */
import { z } from "zod";
import { leaf } from "./distribution-keys.ts";
import { fieldOfPattern } from "./fields.ts";
import { isReservedKey } from "./paths.ts";
import { targetNames } from "./targets.ts";

export const limitStateNames = ["sliding", "overturning", "bearing", "eccentricity", "deep_seated"] as const;

/** Defaults of the keys that are no quantities. */
export const defaults = {
  title: "Untitled study",
  units: "metric",
  drainage: "drained",
  flow: "hydrostatic",
  onHeel: false,
  toeSoil: true,
  inOverturning: false,
  earthPressure: "rankine",
  bearing: "vesic",
  tensionCrack: "dry",
  limitStates: ["sliding", "overturning", "bearing"],
  seed: "toehold",
  samples: 1_000_000,
  precision: 0.05,
  mustMeetTarget: false,
  alwaysOpen: false,
} as const;

function quantity(pattern: string): z.ZodType<unknown> {
  const field = fieldOfPattern(pattern);
  const schema = leaf({ field: pattern, description: field.description, examples: [field.example] });
  return field.required ? schema : schema.optional();
}

type Meta = { description: string; default?: unknown; examples: unknown[]; [key: string]: unknown };

const about = (description: string, example: unknown, fallback?: unknown): Meta => ({
  description,
  examples: [example],
  ...(fallback !== undefined && { default: fallback }),
});

const group = (description: string, shape: Record<string, z.ZodType>): z.ZodObject =>
  z.strictObject(shape).meta({ description });
const flag = (description: string, fallback: boolean): z.ZodType =>
  z
    .boolean()
    .optional()
    .meta(about(description, !fallback, fallback));
const words = (description: string, allowed: readonly [string, ...string[]], fallback?: string): z.ZodType =>
  z
    .enum(allowed)
    .optional()
    .meta(about(description, allowed.at(-1), fallback));
const text = (description: string, example: string, fallback?: string): z.ZodType =>
  z
    .string()
    .optional()
    .meta(about(description, example, fallback));

const wall = group("The wall: a stem, with or without a base slab", {
  stem: group("Stem, a trapezoid", {
    height: quantity("wall.stem.height"),
    crest_width: quantity("wall.stem.crest_width"),
    foot_width: quantity("wall.stem.foot_width"),
    back_run: quantity("wall.stem.back_run"),
  }),
  base: group("Base slab; left out for a gravity wall", {
    toe: quantity("wall.base.toe"),
    heel: quantity("wall.base.heel"),
    thickness: quantity("wall.base.thickness"),
  }).optional(),
  shear_key: group("Shear key below the base", {
    depth: quantity("wall.shear_key.depth"),
    width: quantity("wall.shear_key.width"),
    from_toe: quantity("wall.shear_key.from_toe"),
  }).optional(),
  unit_weight: quantity("wall.unit_weight"),
  underside_level: quantity("wall.underside_level"),
  sliding_friction: group(
    "Friction between base and ground: ratio or angle. No default; not needed on undrained soil",
    {
      ratio: quantity("wall.sliding_friction.ratio"),
      angle: quantity("wall.sliding_friction.angle"),
      adhesion: quantity("wall.sliding_friction.adhesion"),
    },
  ).optional(),
});

const soil = group("One soil. The same soil under several headings is one set of variables", {
  name: text("Name for people", "Medium sand"),
  unit_weight: quantity("soils.*.unit_weight"),
  saturated_unit_weight: quantity("soils.*.saturated_unit_weight"),
  friction_angle: quantity("soils.*.friction_angle"),
  cohesion: quantity("soils.*.cohesion"),
  drainage: words("Whether the soil drains while it is loaded", ["drained", "undrained"], defaults.drainage),
  undrained_strength: quantity("soils.*.undrained_strength"),
  overconsolidation_ratio: quantity("soils.*.overconsolidation_ratio"),
});

/** A letter, then letters, digits, _ or -: a soil's name is part of paths. */
const soilName = z
  .string()
  .regex(/^\p{L}[\p{L}\p{N}_-]*$/u, {
    error:
      "a soil's name in paths begins with a letter and holds letters, digits, _ and - only; give its full name as name: …",
  })
  .refine((name) => !isReservedKey(name), { error: "cannot be the name of a soil; choose another" });

const soilReference = z
  .string()
  .meta({ description: "Name of a soil under soils", examples: ["sand"], wanted: "the name of a soil" });

const layers = (pattern: string, description: string): z.ZodType =>
  z
    .array(group("A layer", { soil: soilReference, bottom: quantity(pattern) }))
    .min(1)
    .meta({ description, examples: [[{ soil: "fill", bottom: 2 }, { soil: "sand" }]] });

const ground = group("The ground behind, below and in front of the wall", {
  behind: group("Retained ground", {
    slope: quantity("ground.behind.slope"),
    layers: layers("ground.behind.layers.*.bottom", "Layers from the top down; the last has no bottom"),
  }),
  below: group("Ground below the base: one soil, or layers", {
    soil: soilReference.optional(),
    layers: layers(
      "ground.below.layers.*.bottom",
      "Layers below the base from the top down, in place of soil",
    ).optional(),
    firm_level: quantity("ground.below.firm_level"),
  }),
  front: group("Ground in front of the wall", {
    level: quantity("ground.front.level"),
    soil: soilReference.optional().meta(about("Name of the soil in front", "sand", "the soil below")),
    mobilised: quantity("ground.front.mobilised"),
    ignore_top: quantity("ground.front.ignore_top"),
    toe_soil: flag("Count the soil over the toe as weight", defaults.toeSoil),
    in_overturning: flag("Let passive resistance count against overturning", defaults.inOverturning),
  }).optional(),
});

const water = group("Ground water; left out for dry ground", {
  behind: group("Water in the retained ground", { level: quantity("water.behind.level") }).optional(),
  front: group("Water in front", { level: quantity("water.front.level") }).optional(),
  flow: words("How the water stands or flows around the base", ["hydrostatic", "seepage"], defaults.flow),
});

const onHeel = flag("Count what stands over the heel as weight", defaults.onHeel);

const loads = group("Loads on the retained ground", {
  surcharge: group("Uniform surcharge", { pressure: quantity("loads.surcharge.pressure"), on_heel: onHeel }).optional(),
  strips: z
    .array(
      group("A strip load", {
        pressure: quantity("loads.strips.*.pressure"),
        from: quantity("loads.strips.*.from"),
        width: quantity("loads.strips.*.width"),
        on_heel: onHeel,
      }),
    )
    .optional()
    .meta(about("Strip loads, parallel to the wall", [{ pressure: 40, from: 1, width: 2 }])),
  lines: z
    .array(
      group("A line load", {
        force: quantity("loads.lines.*.force"),
        at: quantity("loads.lines.*.at"),
        on_heel: onHeel,
      }),
    )
    .optional()
    .meta(about("Line loads, parallel to the wall", [{ force: 30, at: 2.5 }])),
  earthquake: group("Pseudo-static earthquake", {
    kh: quantity("loads.earthquake.kh"),
    kv: quantity("loads.earthquake.kv"),
  }).optional(),
});

const model = group("How the engine computes", {
  earth_pressure: words("Earth pressure behind the wall", ["rankine", "coulomb", "at_rest"], defaults.earthPressure),
  plane: words("Plane on which the pressure acts; the default follows the geometry", ["virtual_back", "wall_back"]),
  wall_friction: quantity("model.wall_friction").optional(),
  bearing: words("Bearing capacity factors", ["vesic", "en1997", "meyerhof"], defaults.bearing),
  tension_crack: words("What fills a tension crack", ["dry", "water"], defaults.tensionCrack),
  factors: group("Model uncertainty: factors that multiply a result of the model", {
    earth_thrust: quantity("model.factors.earth_thrust"),
    base_resistance: quantity("model.factors.base_resistance"),
    bearing_capacity: quantity("model.factors.bearing_capacity"),
    deep_seated: quantity("model.factors.deep_seated"),
  }).optional(),
});

const pathText = z
  .string()
  .meta({ description: "Path of a variable", examples: ["soils.fill.friction_angle"], wanted: "a path" });

const correlation = group("Correlation of two uncertain values", {
  between: z
    .array(pathText)
    .length(2)
    .meta({
      description: "The two paths",
      examples: [["soils.fill.friction_angle", "soils.fill.unit_weight"]],
      wanted: "a list of two paths",
    }),
  coefficient: z
    .number()
    .gt(-1)
    .lt(1)
    .meta({
      ...about("Pearson coefficient of the two variables themselves", 0.4),
      wanted: "a number between -1 and 1 (ends excluded)",
    }),
});

const years = z
  .number()
  .positive()
  .meta({ ...about("Years", 50), unit: "years", wanted: "a number of years above 0" });

const target = group("What the probability of failure is held against: one of probability, reliability_index, named", {
  probability: z
    .number()
    .gt(0)
    .lt(1)
    .optional()
    .meta({ ...about("Target probability of failure", 1e-4), wanted: "a probability between 0 and 1" }),
  reliability_index: z
    .number()
    .gte(-1)
    .lte(8)
    .optional()
    .meta({ ...about("Target reliability index", 3.8), wanted: "a reliability index between -1 and 8" }),
  named: z.enum(targetNames).optional().meta(about("A published target, by name", "en1990_rc2_50_years")),
  period: years.optional().meta(about("Reference period of the target, years", 50)),
  reason: text("Where the target comes from", "EN 1990 Table B2, RC2"),
});

const assessment = group("What is assessed, and how finely", {
  limit_states: z
    .array(z.enum(limitStateNames))
    .min(1)
    .optional()
    .meta(
      about(
        "Limit states; the system fails when any of them fails",
        [...defaults.limitStates],
        [...defaults.limitStates],
      ),
    ),
  eccentricity_limit: z
    .number()
    .gt(0)
    .lte(0.5)
    .optional()
    .meta({
      ...about("Largest eccentricity as a share of the base width, for the limit state eccentricity", 0.333),
      wanted: "a share of the base width above 0 and at most 0.5",
    }),
  seed: z
    .union([z.string(), z.number()])
    .optional()
    .meta({ ...about("Any text; the same seed gives the same numbers", "bay-3", defaults.seed), wanted: "a text" }),
  samples: z
    .number()
    .int()
    .min(1)
    .max(1e12)
    .optional()
    .meta({
      ...about("Most evaluations of one sampling run", 1_000_000, defaults.samples),
      wanted: "a whole number from 1 to 1e12",
    }),
  precision: z
    .number()
    .min(0)
    .lt(1)
    .optional()
    .meta({
      ...about(
        "Coefficient of variation of the estimate at which sampling may stop; 0: use all samples",
        0.05,
        defaults.precision,
      ),
      wanted: "a number from 0 to below 1",
    }),
  period: years.optional().meta({
    ...about("Years that are looked ahead; needed when anything is yearly, not allowed otherwise", 50),
    unit: "years",
    wanted: "a number of years above 0",
  }),
  target: target.optional(),
});

const plainNumber = (description: string, example: number): z.ZodType =>
  leaf({ number: "of_path", description, examples: [example] });

const evidence = group("One piece of evidence: results of tests, or survival under loads", {
  results: z
    .array(plainNumber("One result", 34.1))
    .min(1)
    .optional()
    .meta(about("Results of tests on one variable, in its unit", [34.1, 36.0, 33.2])),
  of: pathText.optional(),
  error: plainNumber("Standard deviation of one result about the true mean, soil scatter included", 1.5).optional(),
  transformation: z
    .number()
    .min(0)
    .optional()
    .meta({
      ...about("Error that all the results share, as a share of the mean", 0.05),
      wanted: "a number of at least 0",
    }),
  survived: z
    .record(z.string(), leaf({ number: "of_path", description: "Value it stood under", examples: [2.6] }))
    .optional()
    .meta(about("Values under which the wall stood, by path", { "water.behind.level": 2.6 })),
});

const money = z.number().min(0);
const perLimitState = Object.fromEntries(
  limitStateNames.map((name) => [name, money.optional().meta(about(`Cost of a failure by ${name}`, 900000))]),
);

const tests = z.number().int().min(1);
const testCount = tests.meta({ ...about("Number of tests", 6), wanted: "a whole number of tests from 1" });
const testError = plainNumber(
  "Standard deviation of one result about the true mean, soil scatter included",
  1.5,
).optional();
const testShared = z
  .number()
  .min(0)
  .optional()
  .meta({
    ...about("Error that all the results share, as a share of the mean", 0.05),
    wanted: "a number of at least 0",
  });
const informed = group("One variable an investigation tells about", {
  path: pathText,
  tests: testCount,
  error: testError,
  transformation: testShared,
});

const decision = group("What can be done, what it costs, and what could be investigated first", {
  currency: z
    .string()
    .optional()
    .meta(about("Currency of all costs", "EUR", "")),
  failure_cost: z.union([money, group("Cost of failure by limit state", perLimitState)]).meta({
    ...about("Cost of failure: a number, or one per limit state", 900000),
    wanted: "a cost of at least 0, or one per limit state,",
  }),
  must_meet_target: flag(
    "Options that miss the target are out, but for those marked always_open",
    defaults.mustMeetTarget,
  ),
  options: z
    .array(
      group("One option; the first is the base case", {
        name: z.string().meta(about("Name of the option", "Heel 0.5 m longer")),
        cost: money.meta({ ...about("Price of the option", 21000), wanted: "a cost of at least 0" }),
        change: z
          .record(z.string(), z.unknown())
          .optional()
          .meta(about("What the option changes in the study, by path", { "wall.base.heel": 2.9 })),
        always_open: flag("Stays open even where it misses the target", defaults.alwaysOpen),
      }),
    )
    .min(1)
    .meta(about("What can be done; the first is the base case", [{ name: "Build as drawn", cost: 0 }])),
  investigations: z
    .array(
      group("One investigation: informs a path with tests, or a list of them", {
        name: z.string().meta(about("Name of the investigation", "Six shear-box tests on the sand")),
        cost: money.optional().meta({ ...about("Price of the investigation", 6500), wanted: "a cost of at least 0" }),
        informs: z.union([pathText, z.array(informed).min(1)]).meta({
          ...about("What it tells about: a path, or a list of path and tests", "soils.sand.friction_angle"),
          wanted: "a path, or a list of { path, tests, error },",
        }),
        tests: testCount.optional(),
        error: testError,
        transformation: testShared,
      }),
    )
    .optional()
    .meta(
      about("Investigations that could be bought", [
        { name: "Six shear-box tests", cost: 6500, informs: "soils.sand.friction_angle", tests: 6, error: 1.5 },
      ]),
    ),
});

export const studySchema: z.ZodObject = group("One retaining wall with everything that is known and unknown about it", {
  title: text("Title", "Bay 3 (invented)", defaults.title),
  notes: text("Free text, shown in the report", "First look before tender", ""),
  units: words(
    "Units of plain numbers: metric (m, kN/m3, kPa) or us (ft, lb/ft3, lb/ft2, lb/ft)",
    ["metric", "us"],
    defaults.units,
  ),
  wall,
  soils: z
    .record(soilName, soil)
    .meta(about("Soils by the name that paths use", { sand: { unit_weight: 18, friction_angle: 33 } })),
  ground,
  water: water.optional(),
  loads: loads.optional(),
  model: model.optional(),
  correlations: z
    .array(correlation)
    .optional()
    .meta(
      about("Correlations between uncertain values", [
        { between: ["soils.fill.friction_angle", "soils.fill.unit_weight"], coefficient: 0.4 },
      ]),
    ),
  assessment: assessment.optional(),
  evidence: z
    .array(evidence)
    .optional()
    .meta(
      about("What has been seen on site since the beliefs were written down", [
        { results: [34.1, 36.0], of: "soils.fill.friction_angle", error: 1.5 },
      ]),
    ),
  decision: decision.optional(),
});
