/** A value of unknown make -> a deep copy of plain objects, lists, texts, numbers and booleans; all else is refused. */
import type { Findings } from "./findings.ts";
import { isReservedKey } from "./paths.ts";
import { joined } from "./structure.ts";
import { deepestNesting } from "./yaml-tree.ts";

export function plainTree(value: unknown, findings: Findings, path = "", depth = 0): unknown {
  if (depth > deepestNesting) {
    findings.problem(path, `is nested too deeply; at most ${deepestNesting} levels are read`);
    return null;
  }
  if (value === null || value === undefined) return null;
  if (typeof value === "string" || typeof value === "boolean") return value;
  if (typeof value === "number") {
    if (Number.isFinite(value)) return value;
    findings.problem(path, `${value} is not a finite number`);
    return null;
  }
  if (Array.isArray(value))
    return value.map((item, i) => plainTree(item, findings, joined(path, String(i)), depth + 1));
  const prototype = typeof value === "object" ? Object.getPrototypeOf(value) : undefined;
  if (prototype === Object.prototype || prototype === null)
    return plainRecord(value as Record<string, unknown>, findings, path, depth);
  findings.problem(path, `found a ${typeof value}; plain data is needed`);
  return null;
}

function plainRecord(
  value: Record<string, unknown>,
  findings: Findings,
  path: string,
  depth: number,
): Record<string, unknown> {
  const copy: Record<string, unknown> = {};
  for (const key of Object.keys(value)) {
    if (isReservedKey(key)) findings.problem(joined(path, key), `"${key}" cannot be a key`, "choose another name");
    else if (value[key] !== undefined) copy[key] = plainTree(value[key], findings, joined(path, key), depth + 1);
  }
  return copy;
}
