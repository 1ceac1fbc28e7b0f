/** What reading a study turns up, collected on the way so that everything wrong is reported at once. */
import type { Problem } from "../errors.ts";
import type { Notice } from "./study.ts";

export interface Place {
  readonly line: number;
  readonly column: number;
}

/** Where in the text the key or the value at a path stands; undefined: not in the text; null: it was set from outside. */
export type Places = (path: string, part: "key" | "value") => Place | undefined | null;

export interface Findings {
  readonly problems: Problem[];
  readonly notices: Notice[];
  /** Placed at the value, or at the nearest parent's key where the path is not in the file. */
  problem(path: string, message: string, hint?: string): void;
  /** Placed where the caller says. */
  placedProblem(at: Place, path: string, message: string, hint?: string): void;
  /** Placed at the key itself. */
  keyProblem(path: string, message: string, hint?: string): void;
  notice(path: string, message: string): void;
}

/** Beyond this many problems only their number is kept. */
const mostProblems = 200;

export function collectFindings(places: Places): Findings {
  const problems: Problem[] = [];
  const notices: Notice[] = [];
  const seen = new Set<string>();
  let count = 0;
  const isNew = (list: string, path: string, message: string): boolean => {
    const size = seen.size;
    return seen.add(`${list}\n${path}\n${message}`).size > size;
  };
  const add = (place: () => Place | null, path: string, message: string, hint?: string): void => {
    if (!isNew("problems", path, message)) return;
    if (count < mostProblems) {
      const at = place();
      problems.push({ path, ...(at && { at }), message, ...(hint !== undefined && { hint }) });
    }
    count++;
    if (count > mostProblems) {
      problems[mostProblems] = { path: "", message: `has ${count - mostProblems} more problems than are listed here` };
    }
  };
  return {
    problems,
    notices,
    problem: (path, message, hint) => add(() => placeOf(path, "value", places), path, message, hint),
    keyProblem: (path, message, hint) => add(() => placeOf(path, "key", places), path, message, hint),
    placedProblem: (at, path, message, hint) => add(() => at, path, message, hint),
    notice: (path, message) => {
      if (isNew("notices", path, message)) notices.push({ path, message });
    },
  };
}

function placeOf(path: string, part: "key" | "value", places: Places): Place | null {
  const own = places(path, part);
  if (own !== undefined || path === "") return own ?? null;
  const keys = path.split(".");
  while (keys.length > 1) {
    keys.pop();
    const parent = keys.join(".");
    const at = places(parent, "key") ?? places(parent, "value"); // an entry of a list has no key of its own
    if (at !== undefined || places(parent, "key") === null) return at ?? null;
  }
  return places("", "value") ?? null;
}

/** A misspelt key is also a missing one; the second message would only distract from the first. */
export function withoutEchoes(problems: readonly Problem[]): readonly Problem[] {
  const misspelt = new Set<string>();
  for (const { path, hint } of problems) {
    const meant = /^did you mean "([^"]+)"\?$/.exec(hint ?? "")?.[1];
    if (meant !== undefined) misspelt.add([...path.split(".").slice(0, -1), meant].join("."));
  }
  return problems.filter(({ path, message }) => !(message.startsWith("is missing") && misspelt.has(path)));
}
