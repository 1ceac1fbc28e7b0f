/**
 * Which room may import which. A room imports from numeric/, the shared top-level files and rooms above it; top-level bridges are
 * for the public door, parallel/ and cli/ alone.
 */
const above: Readonly<Record<string, readonly string[]>> = {
  numeric: [],
  study: [],
  mechanics: ["study"],
  probability: ["study"],
  reliability: ["study", "probability"],
  drivers: ["study", "probability", "reliability"],
  decision: ["study", "probability", "reliability", "drivers"],
  report: ["study", "mechanics", "probability", "reliability", "drivers", "decision"],
  parallel: ["study", "mechanics", "probability", "reliability", "drivers", "decision"],
  cli: ["study", "mechanics", "probability", "reliability", "drivers", "decision", "report", "parallel"],
};

/** Top-level files that every room may use; results-*.ts, shapes of results, too. */
const shared = ["errors.ts", "cautions.ts", "version.ts"];

/** A file of shapes of results: types alone, for every room. */
export const isResultShapes = (file: string): boolean => /^results(-[a-z]+)*\.ts$/.test(file);
/** Rooms that may start the bridges (model, assess, check, …). */
const outermost = ["parallel", "cli"];
/** Rooms that may touch the machine. */
const onMachine = ["parallel", "cli"];

export interface Source {
  /** Path below src/, with forward slashes. */
  readonly file: string;
  readonly text: string;
}

/** What is wrong with the imports and the globals of one file; empty where all is well. */
export function importFaults({ file, text }: Source): readonly string[] {
  const room = roomOf(file);
  const faults = importsOf(text).flatMap((target) => faultOf(file, room, target) ?? []);
  if (!onMachine.includes(room)) {
    const code = withoutComments(text);
    for (const [name, pattern] of machineGlobals)
      if (pattern.test(code)) faults.push(`${file}: uses ${name}, which only ${onMachine.join(" and ")} may`);
  }
  return faults;
}

const machineGlobals: readonly (readonly [string, RegExp])[] = [
  ["process", /\bprocess\.\w/],
  ["Date", /\bDate\.now\b|\bnew Date\b/],
  ["performance", /\bperformance\.\w/],
  ["Math.random", /\bMath\.random\b/],
  ["code made from strings", /\beval\(|\bnew Function\(/],
];

const roomOf = (file: string): string => (file.includes("/") ? file.slice(0, file.indexOf("/")) : "");

/** What a file imports, as written: static and dynamic, types too. */
export function importsOf(text: string): readonly string[] {
  const code = withoutComments(text);
  return [...code.matchAll(/(?:\bfrom|\bimport)\s*\(?\s*"([^"]+)"/g)].map((match) => match[1]);
}

export function withoutComments(text: string): string {
  return text.replace(/\/\*[\s\S]*?\*\//g, "").replace(/(^|\s)\/\/.*$/gm, "$1");
}

function faultOf(file: string, room: string, target: string): string | undefined {
  if (!target.startsWith(".")) {
    return target.startsWith("node:") && !onMachine.includes(room)
      ? `${file}: imports ${target}; only ${onMachine.join(" and ")} may`
      : undefined;
  }
  if (!target.endsWith(".ts")) return `${file}: imports ${target} without its ending .ts`;
  const to = resolveImport(file, target);
  const toRoom = roomOf(to);
  if (room === "" || toRoom === room || toRoom === "numeric") return undefined;
  if (toRoom === "")
    return shared.includes(to) || isResultShapes(to) || outermost.includes(room)
      ? undefined
      : `${file}: imports ${to}, a bridge above its room`;
  if (above[room] === undefined) return `${file}: lies in ${room}/, a room that the rules do not know`;
  return above[room].includes(toRoom) ? undefined : `${file}: ${room}/ must not import ${toRoom}/`;
}

export function resolveImport(file: string, target: string): string {
  const parts = [...file.split("/").slice(0, -1)];
  for (const part of target.split("/")) {
    if (part === "..") parts.pop();
    else if (part !== ".") parts.push(part);
  }
  return parts.join("/");
}
