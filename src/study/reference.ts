/** A page that lists every key of a study file, in Markdown, made from the JSON Schema. */
import { besideKeys } from "./distribution-keys.ts";
import { studyJsonSchema } from "./json-schema.ts";
import { isRecord } from "./paths.ts";
import { flow } from "./structure.ts";

type Json = Record<string, unknown>;

/** Headings are the groups of the file; `*` stands for the name of a soil or a place in a list. */
export function studyReference(): string {
  const schema = studyJsonSchema();
  const groups = Object.entries(schema.properties as Record<string, Json>);
  const single = groups.filter(([, json]) => rowsOf(json, "").length === 0);
  const parts = groups.filter(([, json]) => rowsOf(json, "").length > 0);
  const definitions = schema.definitions as Record<string, Json>;
  const forms = (definitions.uncertain as { anyOf: { $ref: string }[] }).anyOf.map(
    ({ $ref }) => $ref.split("/").at(-1)!,
  );
  return [
    "# The study file",
    "Every number may be a plain number, a number with a unit, or a distribution; `*` stands for the name of a soil or a place in a list, counted from 0.",
    table(single.map(([key, json]) => row(key, json))),
    ...parts.flatMap(([key, json]) => [`## ${key}`, `${json.description}.`, table(rowsOf(json, key))]),
    "## Distributions",
    table(forms.flatMap((form) => rowsOf(definitions[form]!, "", form))),
  ].join("\n\n");
}

function table(rows: readonly string[]): string {
  return ["| key | what it is | unit | default | example |", "|---|---|---|---|---|", ...rows].join("\n");
}

/** What may stand beside any distribution is shown once, with the first. */
function isShown(key: string, form?: string): boolean {
  return form === undefined || form === "normal" || !Object.hasOwn(besideKeys, key);
}

/** A row per key below; groups of keys are followed. */
function rowsOf(json: Json, path: string, form?: string): string[] {
  const join = (key: string): string => (path === "" ? key : `${path}.${key}`);
  const properties = Object.entries((json.properties as Record<string, Json> | undefined) ?? {}).filter(([key]) =>
    isShown(key, form),
  );
  const own = properties.flatMap(([key, below]) => {
    const inside = rowsOf(below, join(key));
    return inside.length > 0 && !Array.isArray(below.examples) ? inside : [row(join(key), below), ...inside];
  });
  const starred = ["items", "additionalProperties"].flatMap((key) =>
    isRecord(json[key]) ? rowsOf(json[key], join("*")) : [],
  );
  const branches = Array.isArray(json.anyOf) ? json.anyOf.flatMap((branch: Json) => rowsOf(branch, path)) : [];
  return [...own, ...starred, ...branches];
}

function row(path: string, json: Json): string {
  const fallback = json.default ?? json["x-default"];
  const example = (json.examples as unknown[] | undefined)?.[0];
  const allowed = Array.isArray(json.enum) && json.enum.length <= 12 ? `: ${json.enum.join(", ")}` : "";
  const cells = [
    `\`${path}\``,
    `${String(json.description ?? "").replace(/\.$/, "")}${allowed}`,
    String(json["x-unit"] ?? ""),
    fallback === undefined || fallback === "" ? "" : `\`${flow(fallback)}\``,
    example === undefined ? "" : `\`${flow(example)}\``,
  ];
  return `| ${cells.map((cell) => cell.replaceAll("|", "\\|")).join(" | ")} |`;
}
