import { existsSync, readFileSync } from "node:fs";
import { importsOf, resolveImport } from "./import-rules.ts";

/** Whether one file reaches another through relative imports, its own included; paths below `root`, with forward slashes. */
export function reaches(root: string, from: string, to: string): boolean {
  if (!existsSync(`${root}${from}`)) return false;
  const seen = new Set([from]);
  for (const file of seen) {
    if (file === to) return true;
    const targets = importsOf(readFileSync(`${root}${file}`, "utf8")).filter((target) => /^\..*\.ts$/.test(target));
    for (const target of targets) seen.add(resolveImport(file, target));
  }
  return false;
}
