import { fieldOfPath } from "../study/fields.ts";
import { isRecord } from "../study/paths.ts";
import { flow } from "../study/structure.ts";

/** One place where two studies are not alike, each side as one would write it on one line; "–" where it is not there. */
export interface Difference {
  readonly path: string;
  readonly first: string;
  readonly second: string;
}

/** Free text that no result rests on. */
const words = new Set(["title", "notes"]);

/** What differs between two study trees, in the order of the files. A number with its distribution is one value. */
export function studyDifferences(first: unknown, second: unknown): readonly Difference[] {
  return differencesAt("", first, second).filter(({ path }) => !words.has(path));
}

function differencesAt(path: string, first: unknown, second: unknown): readonly Difference[] {
  const whole = path !== "" && fieldOfPath(path) !== undefined;
  const inside = whole ? undefined : childrenOf(first, second);
  if (inside !== undefined)
    return inside.flatMap((key) =>
      differencesAt(path === "" ? key : `${path}.${key}`, at(first, key), at(second, key)),
    );
  const [a, b] = [written(first), written(second)];
  return a === b ? [] : [{ path, first: a, second: b }];
}

/** Keys of two mappings or places of two lists, where at least one is there and the other, if any, is of its kind. */
function childrenOf(first: unknown, second: unknown): readonly string[] | undefined {
  const sides = [first, second].filter((side) => side !== undefined && side !== null);
  if (sides.length > 0 && sides.every(Array.isArray))
    return Array.from({ length: Math.max(...sides.map((side) => side.length)) }, (_, place) => String(place));
  if (sides.length > 0 && sides.every(isRecord)) return [...new Set(sides.flatMap(Object.keys))];
  return undefined;
}

const at = (parent: unknown, key: string): unknown =>
  isRecord(parent) || Array.isArray(parent) ? (parent as Readonly<Record<string, unknown>>)[key] : undefined;

/** Without the words of where a number came from, and `{ value: 34 }` as 34. */
function written(value: unknown): string {
  if (value === undefined) return "–";
  if (!isRecord(value) || !Object.hasOwn(value, "source")) return flow(value);
  const { source: _, ...rest } = value;
  return Object.keys(rest).join() === "value" ? flow(rest.value) : flow(rest);
}
