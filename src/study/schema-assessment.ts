/** Schema of the model, the correlations and the assessment. */

import { defaults, limitStateNames } from "./defaults.ts";
import { about, group, quantity, text, words } from "./schema-words.ts";
import { targetNames } from "./targets.ts";
import * as z from "./zod.ts";

export const model: z.ZodObject = group("How the engine computes", {
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

export const pathText: z.ZodType<string> = z
  .string()
  .meta({ description: "Path of a variable", examples: ["soils.fill.friction_angle"], wanted: "a path" });

export const correlation: z.ZodObject = group("Correlation of two uncertain values", {
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

export const assessment: z.ZodObject = group("What is assessed, and how finely", {
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
