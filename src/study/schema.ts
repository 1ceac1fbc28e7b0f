/**
 * The study file as a zod schema: which keys there are, which must be there, and in what words they are explained.
 *
 * Numeric fields are leaves that only carry their row of `fields.ts`: `read-quantity.ts` reads them, because their units
 * and ranges hang on the file. The JSON Schema is made from the same tree (`json-schema.ts`).
 */

import { defaults } from "./defaults.ts";
import { assessment, correlation, model } from "./schema-assessment.ts";
import { decision, evidence } from "./schema-decision.ts";
import { ground, loads, soil, soilName, wall, water } from "./schema-site.ts";
import { about, group, text, words } from "./schema-words.ts";
import * as z from "./zod.ts";

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
