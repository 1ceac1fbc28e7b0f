/** Every numeric quantity of a study, by path. */
import { type Field, fieldOfPath, fields } from "./fields.ts";
import { isRecord } from "./paths.ts";
import type { Quantity, Study } from "./study.ts";

export interface QuantityEntry {
  /** As in the file: `soils.fill.friction_angle`. */
  readonly path: string;
  readonly quantity: Quantity;
  readonly field: Field;
  /** Words for people: `Friction angle of Medium sand`. */
  readonly label: string;
}

/** All quantities the study has, defaults included: in file order, soil by soil and entry by entry in lists. */
export function quantitiesOf(study: Study): readonly QuantityEntry[] {
  const found: { path: string; field: Field; value: unknown }[] = [];
  for (const [head, group] of fieldGroups) {
    const holder =
      head === "" ? undefined : head.split(".").reduce<unknown>((here, key) => step(here, key, false), study);
    const names = head === "" ? [""] : Object.keys((holder as object | undefined) ?? {});
    for (const name of names) {
      for (const field of group) {
        const path = field.pattern.replace("*", name);
        const value = quantityAt(study, path);
        if (value !== undefined) found.push({ path, field, value });
      }
    }
  }
  return found.map(({ path, value, field }) => ({
    path,
    quantity: value as Quantity,
    field,
    label: labelOf(study, field, path),
  }));
}

/** Runs of fields with the same part before the `*`; the part is empty where there is no `*`. */
const fieldGroups: readonly (readonly [head: string, group: readonly Field[]])[] = groupFields();

function groupFields(): [string, Field[]][] {
  const groups: [string, Field[]][] = [];
  for (const field of fields) {
    const head = field.pattern.includes(".*") ? field.pattern.slice(0, field.pattern.indexOf(".*")) : "";
    const last = groups.at(-1);
    if (last?.[0] === head) last[1].push(field);
    else groups.push([head, [field]]);
  }
  return groups;
}

/** The quantity at a path, or undefined where the study has none there. */
export function quantityAt(study: Study, path: string): Quantity | undefined {
  const field = fieldOfPath(path);
  if (field === undefined) return undefined;
  let here: unknown = study;
  for (const [i, key] of path.split(".").entries()) here = step(here, key, field.pattern.split(".")[i] === "*");
  return here as Quantity | undefined;
}

/** Words for the quantity at a path, whether or not the study has one there. */
export function labelAt(study: Study, path: string): string {
  const field = fieldOfPath(path);
  return field === undefined ? path : labelOf(study, field, path);
}

/** Names of soils and places in lists stay as they are; keys of the format are camelCase in the study. */
function step(here: unknown, key: string, asIs: boolean): unknown {
  if (Array.isArray(here)) return here[Number(key)];
  const name = asIs ? key : key.replace(/_(\w)/g, (_, letter: string) => letter.toUpperCase());
  return isRecord(here) && Object.hasOwn(here, name) ? here[name] : undefined;
}

function labelOf(study: Study, field: Field, path: string): string {
  const keys = path.split(".");
  const place = keys[field.pattern.split(".").indexOf("*")] ?? "";
  const layers = keys[1] === "below" ? study.ground.below.layers : study.ground.behind.layers;
  const soil = keys[0] === "soils" ? place : (layers[Number(place)]?.soil ?? "");
  const name = Object.hasOwn(study.soils, soil) ? study.soils[soil]!.name : soil;
  return field.label.replace("{soil}", name).replace("{n}", String(Number(place) + 1));
}
