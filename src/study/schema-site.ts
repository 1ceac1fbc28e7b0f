/** Schema of the site: wall, soils, ground, water and loads. */

import { defaults } from "./defaults.ts";
import { isReservedKey } from "./paths.ts";
import { about, flag, group, quantity, text, words } from "./schema-words.ts";
import * as z from "./zod.ts";

export const wall: z.ZodObject = group("The wall: a stem, with or without a base slab", {
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

export const soil: z.ZodObject = group("One soil. The same soil under several headings is one set of variables", {
  name: text("Name for people", "Medium sand").meta({
    ...about("Name for people", "Medium sand"),
    "x-default": "its name in paths",
  }),
  unit_weight: quantity("soils.*.unit_weight"),
  saturated_unit_weight: quantity("soils.*.saturated_unit_weight"),
  friction_angle: quantity("soils.*.friction_angle"),
  cohesion: quantity("soils.*.cohesion"),
  drainage: words("Whether the soil drains while it is loaded", ["drained", "undrained"], defaults.drainage),
  undrained_strength: quantity("soils.*.undrained_strength"),
  overconsolidation_ratio: quantity("soils.*.overconsolidation_ratio"),
});

/** A letter, then letters, digits, _ or -: a soil's name is part of paths. */
export const soilName: z.ZodType<string, string> = z
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

export const ground: z.ZodObject = group("The ground behind, below and in front of the wall", {
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
    soil: soilReference
      .optional()
      .meta({ ...about("Name of the soil in front", "sand"), "x-default": "the soil below" }),
    mobilised: quantity("ground.front.mobilised"),
    ignore_top: quantity("ground.front.ignore_top"),
    toe_soil: flag("Count the soil over the toe as weight", defaults.toeSoil),
    in_overturning: flag("Let passive resistance count against overturning", defaults.inOverturning),
  }).optional(),
});

export const water: z.ZodObject = group("Ground water; left out for dry ground", {
  behind: group("Water in the retained ground", { level: quantity("water.behind.level") }).optional(),
  front: group("Water in front", { level: quantity("water.front.level") }).optional(),
  flow: words("How the water stands or flows around the base", ["hydrostatic", "seepage"], defaults.flow),
});

const onHeel = flag("Count what stands over the heel as weight", defaults.onHeel);

export const loads: z.ZodObject = group("Loads on the retained ground", {
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
