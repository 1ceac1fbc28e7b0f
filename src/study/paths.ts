/** Paths into the tree of a study file: `loads.strips.0.pressure`. */

/** Names that a key may not have: they would reach into JavaScript's own objects. */
export function isReservedKey(key: string): boolean {
  return key === "prototype" || key in Object.prototype;
}

export function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}

/** The value at a path, undefined where there is none. */
export function valueAt(tree: unknown, path: string): unknown {
  return valueAtKeys(tree, path === "" ? [] : path.split("."));
}

/** As `valueAt`, for keys that may hold dots themselves (paths under `change`). */
export function valueAtKeys(tree: unknown, keys: readonly string[]): unknown {
  return keys.reduce<unknown>(child, tree);
}

function child(parent: unknown, key: string): unknown {
  if (Array.isArray(parent)) return /^\d+$/.test(key) ? parent[Number(key)] : undefined;
  return isRecord(parent) && Object.hasOwn(parent, key) ? parent[key] : undefined;
}

/**
 * A copy of the tree with one value set; parents that are missing become mappings, and the entry after the last of a list
 * may be added. What is wrong with the names is left to reading.
 *
 * @returns the new tree, or in words why the path leads nowhere
 */
export function withValueAt(tree: unknown, path: string, value: unknown): { tree: unknown } | { message: string } {
  const copy = structuredClone(tree) ?? {};
  const keys = path.split(".");
  if (keys.some((key) => key === "")) return { message: "is not a path: names are joined by single dots" };
  if (keys.some(isReservedKey)) return { message: "is not a path of a study" };
  let here: unknown = copy;
  for (const [i, key] of keys.entries()) {
    const last = i === keys.length - 1;
    if (Array.isArray(here)) {
      const place = /^\d+$/.test(key) ? Number(key) : Number.NaN;
      if (!(place <= here.length)) {
        return { message: `has no entry "${key}": ${keys.slice(0, i).join(".")} has ${here.length}, counted from 0` };
      }
      if (last) here[place] = value;
      else here = here[place] ??= emptyParent(keys[i + 1]!);
    } else if (isRecord(here)) {
      if (last) here[key] = value;
      else here = here[key] ??= emptyParent(keys[i + 1]!);
    } else {
      return { message: `leads nowhere: ${keys.slice(0, i).join(".")} is a single value` };
    }
  }
  return { tree: copy };
}

/** A list where the next key is a place in one, else a mapping; soil names never begin with a digit. */
function emptyParent(next: string): unknown {
  return /^\d+$/.test(next) ? [] : {};
}
