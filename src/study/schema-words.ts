/** The words the schema is written in: small makers of keys that carry their own explanation. */

import { leaf } from "./distribution-keys.ts";
import { fieldOfPattern } from "./fields.ts";
import * as z from "./zod.ts";

/** A numeric field, by its row of the table. */
export function quantity(pattern: string): z.ZodType<unknown> {
  const field = fieldOfPattern(pattern);
  const schema = leaf({ field: pattern, description: field.description, examples: [field.example] });
  return field.required ? schema : schema.optional();
}

export type Meta = { description: string; default?: unknown; examples: unknown[]; [key: string]: unknown };

/** What a key says about itself: words, an example, a default. */
export const about = (description: string, example: unknown, fallback?: unknown): Meta => ({
  description,
  examples: [example],
  ...(fallback !== undefined && { default: fallback }),
});

/** A mapping that allows these keys and no other. */
export const group = (description: string, shape: Record<string, z.ZodType>): z.ZodObject =>
  z.strictObject(shape).meta({ description });
/** true or false. */
export const flag = (description: string, fallback: boolean): z.ZodType =>
  z
    .boolean()
    .optional()
    .meta(about(description, !fallback, fallback));
/** One of a few words. */
export const words = (description: string, allowed: readonly [string, ...string[]], fallback?: string): z.ZodType =>
  z
    .enum(allowed)
    .optional()
    .meta(about(description, allowed.at(-1), fallback));
/** Free text. */
export const text = (description: string, example: string, fallback?: string): z.ZodType =>
  z
    .string()
    .optional()
    .meta(about(description, example, fallback));
