/**
 * What the format has and this version does not serve. It is known and answered, not taken for a typing error and never
 * ignored. Take an entry out when the feature lands.
 */
import type { Findings } from "./findings.ts";
import { isRecord, valueAt } from "./paths.ts";

export interface NotAvailable {
  /** Path of a key, `*` for any name or place. */
  readonly path: string;
  /** Only this value of it; absent: the key as such. */
  readonly value?: string;
}

export const notAvailable: readonly NotAvailable[] = [];

/** A problem for each key or value of the tree that is on the list. */
export function refuseNotAvailable(tree: unknown, list: readonly NotAvailable[], findings: Findings): void {
  for (const entry of list) {
    for (const path of pathsLike(tree, entry.path.split("."), "")) {
      const found = valueAt(tree, path);
      if (entry.value !== undefined && found !== entry.value) continue;
      findings.keyProblem(
        path,
        `${entry.value ?? path.split(".").at(-1)} is not available in this version`,
        "leave it out for now",
      );
    }
  }
}

function pathsLike(here: unknown, pattern: readonly string[], path: string): string[] {
  const [part, ...rest] = pattern;
  if (part === undefined) return here === undefined ? [] : [path];
  const holder = isRecord(here) || Array.isArray(here) ? (here as Record<string, unknown>) : {};
  const keys = part === "*" ? Object.keys(holder) : Object.hasOwn(holder, part) ? [part] : [];
  return keys.flatMap((key) => pathsLike(holder[key], rest, path === "" ? key : `${path}.${key}`));
}
