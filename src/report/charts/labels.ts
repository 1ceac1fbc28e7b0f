import type { AssessResult } from "../../results.ts";

/** Rows of a chart of variables: more do not fit a page; the table below it has them all. */
export const mostRows = 14;

/** Words for a path, cut where they are too long for an axis. */
export function labelsOf(result: AssessResult): (path: string) => string {
  const labels = new Map(result.variables.map((variable) => [variable.path, variable.label]));
  return (path) => shortened(labels.get(path) ?? path, 44);
}

export function shortened(text: string, most: number): string {
  const letters = [...text];
  return letters.length <= most
    ? text
    : `${letters
        .slice(0, most - 1)
        .join("")
        .trimEnd()}…`;
}
