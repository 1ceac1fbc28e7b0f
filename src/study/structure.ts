/** Schema issues in this project's words, with the nearest known key; and what a zod schema knows about its keys. */

import type { Findings } from "./findings.ts";
import { isRecord, valueAtKeys } from "./paths.ts";
import { didYouMean } from "./suggest.ts";
import * as z from "./zod.ts";

/** The schema without `optional`, `nullable` and the like. */
export function inner(schema: z.ZodType | undefined): z.ZodType | undefined {
  let here = schema;
  while (here instanceof z.ZodOptional) here = here.unwrap() as z.ZodType;
  return here;
}

/** The schema of one key of a mapping or entry of a list; undefined where it has none. */
export function schemaOf(schema: z.ZodType | undefined, key: string): z.ZodType | undefined {
  const here = inner(schema);
  if (here instanceof z.ZodObject) return Object.hasOwn(here.shape, key) ? (here.shape[key] as z.ZodType) : undefined;
  if (here instanceof z.ZodRecord) return here.valueType as z.ZodType;
  if (here instanceof z.ZodArray) return here.element as z.ZodType;
  return undefined;
}

/** What a reader of the schema says about a key: its description and an example. */
export function metaOf(schema: z.ZodType | undefined): { description?: string; examples?: unknown[]; wanted?: string } {
  return (schema?.meta() ?? inner(schema)?.meta() ?? {}) as {
    description?: string;
    examples?: unknown[];
    wanted?: string;
  };
}

/** Lists and mappings that are there but empty (`loads:` with nothing below) count as left out. */
export function withoutEmpty(value: unknown, schema: z.ZodType): unknown {
  const here = inner(schema);
  if (Array.isArray(value))
    return here instanceof z.ZodArray ? value.map((item) => withoutEmpty(item, here.element as z.ZodType)) : value;
  if (!isRecord(value)) return value;
  const kept: Record<string, unknown> = {};
  for (const [key, item] of Object.entries(value)) {
    const below = inner(schemaOf(here, key));
    const holder = below instanceof z.ZodObject || below instanceof z.ZodArray || below instanceof z.ZodRecord;
    if (item === null && holder) continue;
    kept[key] = holder ? withoutEmpty(item, below) : item;
  }
  return kept;
}

/**
 * Checks keys and types; every issue becomes a problem below `prefix`.
 *
 * @returns whether there was none
 */
export function checkStructure(schema: z.ZodType, value: unknown, prefix: string, findings: Findings): boolean {
  const result = schema.safeParse(value);
  if (result.success) return true;
  for (const issue of result.error.issues) report(issue, schema, value, prefix, findings);
  return false;
}

function report(issue: z.core.$ZodIssue, schema: z.ZodType, value: unknown, prefix: string, findings: Findings): void {
  const keys = issue.path.map(String);
  const path = joined(prefix, keys.join("."));
  const here = keys.reduce<z.ZodType | undefined>(schemaOf, schema);
  const found = valueAtKeys(value, keys);
  if (issue.code === "unrecognized_keys") {
    for (const key of issue.keys) unknownKey(joined(path, key), key, here, findings);
  } else if (found === undefined) {
    missing(path, here, findings);
  } else if (found === null && path === "") {
    findings.problem(path, "the study is empty", "toehold new makes one to start from");
  } else if (found === null) {
    findings.problem(path, "is empty", "give a value, or leave the key out");
  } else if (issue.code === "invalid_value") {
    notAllowed(path, found, issue.values.map(String), findings);
  } else if (issue.code === "invalid_key") {
    findings.keyProblem(path, issue.issues[0]?.message ?? "is not a name that can be used here");
  } else {
    const wanted = metaOf(here).wanted ?? wantedType(issue, here);
    findings.problem(path, `found ${shown(found)}; ${wanted} is needed`, typeHint(found, here));
  }
}

/** Longest list of allowed words that is written out. */
const mostWords = 12;

function notAllowed(path: string, found: unknown, words: readonly string[], findings: Findings): void {
  const long = words.length > mostWords;
  const allowed = long ? `${words.length} names are allowed` : `allowed: ${words.join(", ")}`;
  const otherwise = long ? `for example ${words.slice(0, 3).join(", ")}; toehold schema lists them all` : undefined;
  findings.problem(
    path,
    `found ${shown(found)}; ${allowed}`,
    typeof found === "string" ? didYouMean(found, words, otherwise) : otherwise,
  );
}

function unknownKey(path: string, key: string, here: z.ZodType | undefined, findings: Findings): void {
  const known = here instanceof z.ZodType ? knownKeys(here) : [];
  const list = known.length > 0 ? `known here: ${known.join(", ")}` : undefined;
  findings.keyProblem(path, `unknown key "${key}"`, didYouMean(key, known, list));
}

export function knownKeys(schema: z.ZodType): readonly string[] {
  const here = inner(schema);
  return here instanceof z.ZodObject ? Object.keys(here.shape) : [];
}

function missing(path: string, schema: z.ZodType | undefined, findings: Findings): void {
  const { description, examples } = metaOf(schema);
  const last = path.split(".").at(-1)!;
  const example = examples?.[0];
  const hint = example === undefined ? undefined : `for example ${last}: ${flow(example)}`;
  findings.problem(path, `is missing${description === undefined ? "" : ` (${decapitalised(description)})`}`, hint);
}

function wantedType(issue: z.core.$ZodIssue, schema: z.ZodType | undefined): string {
  const here = inner(schema);
  if (here instanceof z.ZodObject || here instanceof z.ZodRecord) return "a group of keys";
  if (here instanceof z.ZodArray) return issue.code === "too_small" ? `a list of at least ${issue.minimum}` : "a list";
  if (here instanceof z.ZodBoolean) return "true or false";
  if (here instanceof z.ZodString) return "a text";
  if (here instanceof z.ZodNumber) return numberWanted(issue);
  return "another kind of value";
}

function numberWanted(issue: z.core.$ZodIssue): string {
  if (issue.code === "too_small") return `a number ${issue.inclusive ? "of at least" : "above"} ${issue.minimum}`;
  if (issue.code === "too_big") return `a number ${issue.inclusive ? "of at most" : "below"} ${issue.maximum}`;
  return issue.code === "invalid_type" && issue.expected === "int" ? "a whole number" : "a plain number";
}

function typeHint(found: unknown, schema: z.ZodType | undefined): string | undefined {
  const here = inner(schema);
  if (here instanceof z.ZodBoolean && typeof found === "string") return "write true or false, without quotes";
  if (here instanceof z.ZodNumber && typeof found === "string" && /^[\d_, ]+$/.test(found))
    return `write ${found.replace(/[_, ]/g, "")}`;
  if (here instanceof z.ZodString && typeof found === "number") return `put it in quotes: "${found}"`;
  if (here instanceof z.ZodArray && !Array.isArray(found))
    return "put the entries in [ ] or on lines of their own that begin with -";
  return undefined;
}

export function joined(prefix: string, path: string): string {
  return prefix === "" ? path : path === "" ? prefix : `${prefix}.${path}`;
}

/** A found value, short enough for a message. */
export function shown(value: unknown): string {
  if (Array.isArray(value)) return `a list of ${value.length}`;
  if (isRecord(value)) return "a group of keys";
  if (typeof value !== "string") return String(value);
  return value.length > 40 ? `"${value.slice(0, 37)}…"` : `"${value}"`;
}

/** A value as one would write it on one line of YAML. */
export function flow(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map(flow).join(", ")}]`;
  if (!isRecord(value)) return String(value);
  return `{ ${Object.entries(value)
    .map(([key, item]) => `${key}: ${flow(item)}`)
    .join(", ")} }`;
}

function decapitalised(text: string): string {
  return /^[A-Z][a-z]/.test(text) ? text[0]!.toLowerCase() + text.slice(1) : text;
}
