/**
 * The JSON Schema of a study file, made from the schema that validates. Editors complete and check studies with it.
 *
 * Draft 7, which every editor reads. Every key carries a description, an example and, where it has them, its default and
 * its unit (`x-unit`, and in words in the description); a default that is not a number stands in `x-default`, so that no
 * editor writes it into a file.
 * Ranges of values with a unit are in words only, because the unit hangs on `units`.
 */

import { certainSchema, distributionKinds, type KeyType, uncertainSchema } from "./distribution-keys.ts";
import { type Field, fieldOfPattern } from "./fields.ts";
import { rangeText } from "./read-number.ts";
import { studySchema } from "./schema.ts";
import { plainUnit, usualUnits } from "./units.ts";
import * as z from "./zod.ts";

/** A JSON object. */
export type Json = Record<string, unknown>;

/** Annotations of zod leaves that are for the reader of this program, not for the reader of the schema. */
const inward = ["field", "number", "distribution", "wanted"];

export function studyJsonSchema(): Json {
  const definitions: Json = {
    text_with_unit: textWithUnit,
    number_or_text: { anyOf: [{ type: "number" }, reference("text_with_unit")] },
  };
  definitions.certain = convert(certainSchema);
  for (const kind of distributionKinds) {
    definitions[kind] = convert(uncertainSchema(kind));
    definitions[`${kind}_alone`] = convert(uncertainSchema(kind, true));
  }
  definitions.uncertain = { anyOf: distributionKinds.map((kind) => reference(kind)) };
  definitions.distribution_alone = { anyOf: distributionKinds.map((kind) => reference(`${kind}_alone`)) };
  const schema = convert(studySchema);
  return {
    $schema: "http://json-schema.org/draft-07/schema#",
    title: "Study of a retaining wall",
    ...schema,
    definitions,
  };
}

const textWithUnit: Json = {
  type: "string",
  pattern: "^\\s*[+-]?(\\d|\\.\\d)",
  description: "A number and its unit, such as 18 kN/m3, 120 lb/ft3, 2.5 m, 30 deg",
};

function reference(name: string): Json {
  return { $ref: `#/definitions/${name}` };
}

function convert(schema: z.ZodType): Json {
  const made = z.toJSONSchema(schema, {
    target: "draft-7",
    io: "input",
    unrepresentable: "any",
    override: ({ zodSchema, jsonSchema }) => annotate(z.globalRegistry.get(zodSchema) ?? {}, jsonSchema as Json),
  }) as Json;
  const { $schema, ...rest } = JSON.parse(JSON.stringify(made)) as Json;
  return rest;
}

function annotate(meta: Json, json: Json): void {
  if (typeof meta.field === "string") Object.assign(json, quantitySchema(fieldOfPattern(meta.field)));
  else if (typeof meta.number === "string") Object.assign(json, numberSchema(meta.number as KeyType | "of_path"));
  else if (meta.distribution === true) json.anyOf = [reference("distribution_alone")];
  if (typeof meta.unit === "string") json["x-unit"] = meta.unit;
  for (const key of [...inward, "unit"]) delete json[key];
  for (const key of Object.keys(json)) if (json[key] === undefined) delete json[key];
}

function quantitySchema(field: Field): Json {
  const [metric, us] = [plainUnit(field.dimension, "metric"), plainUnit(field.dimension, "us")];
  const unit = metric === "" ? "–" : metric === us ? metric : `${metric} (us: ${us})`;
  const fallback = field.default ?? field.defaultText;
  const words = [
    field.description,
    ...(metric === "" ? [] : [`Unit: ${unit}`]),
    `Range: ${rangeText(field, "metric")}`,
    ...(fallback === undefined ? [] : [`Default: ${fallback}`]),
  ];
  const sameInBoth = metric === us;
  return {
    description: `${words.join(". ")}.`,
    anyOf: [
      sameInBoth ? { type: "number", minimum: field.lowest, maximum: field.highest } : { type: "number" },
      reference("text_with_unit"),
      reference("certain"),
      reference("uncertain"),
    ],
    ...(field.default !== undefined && { default: field.default }),
    ...(field.defaultText !== undefined && { "x-default": field.defaultText }),
    examples: examplesOf(field, metric),
    "x-unit": unit,
  };
}

/** A plain number, one with a unit, and a distribution. */
function examplesOf(field: Field, unit: string): unknown[] {
  const written = unit === "degrees" ? "deg" : unit;
  const spread = { normal: { mean: field.example, sd: Number((Math.max(field.example, 1) * 0.1).toPrecision(2)) } };
  return [
    field.example,
    ...(usualUnits(field.dimension).length > 0 && written !== "" ? [`${field.example} ${written}`] : []),
    spread,
  ];
}

function numberSchema(type: KeyType | "of_path"): Json {
  const text = reference("text_with_unit");
  switch (type) {
    case "positive":
      return { anyOf: [{ type: "number", exclusiveMinimum: 0 }, text] };
    case "nonnegative":
      return { anyOf: [{ type: "number", minimum: 0 }, text] };
    case "share":
      return { anyOf: [{ type: "number", exclusiveMinimum: 0, maximum: 1 }, text] };
    case "portion":
      return { anyOf: [{ type: "number", minimum: 0, maximum: 1 }, text] };
    case "count":
      return { type: "integer", minimum: 1 };
    case "of_path":
      return { anyOf: [reference("number_or_text"), reference("certain"), reference("uncertain")] };
    default:
      return { anyOf: [{ type: "number" }, text] };
  }
}
