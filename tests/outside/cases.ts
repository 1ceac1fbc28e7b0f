import { readFileSync } from "node:fs";

/** One row of a table: the text of each cell, by the heading of its column. */
export type Case = Readonly<Record<string, string>>;

/** Rows of a comma-separated table without quotes, in a file beside the test: `readCases(new URL("cases.csv", import.meta.url))`. */
export function readCases(file: URL): readonly Case[] {
  const [head, ...lines] = readFileSync(file, "utf8").trim().split(/\r?\n/);
  const names = head.split(",");
  return lines.map((line) => {
    const cells = line.split(",");
    if (cells.length !== names.length) throw new RangeError(`${file.pathname}: ${cells.length} cells in "${line}"`);
    return Object.fromEntries(names.map((name, i) => [name, cells[i]]));
  });
}

/** Half a unit in the last printed digit: 5e-4 for "0.474". A hair more, so that a value rounded from a tie passes. */
export function halfUnit(printed: string): number {
  const decimals = printed.split(".")[1]?.length ?? 0;
  return 0.5 * 10 ** -decimals + 1e-9;
}

/** What is wrong with a computed value beside a printed one; empty when it agrees to the printed digits. */
export function disagreement(
  what: string,
  found: number,
  printed: string,
  tolerance: number = halfUnit(printed),
): string {
  return Math.abs(found - Number(printed)) <= tolerance ? "" : `${what}: found ${found}, printed ${printed}`;
}

export const radians = (degrees: string | number): number => (Number(degrees) * Math.PI) / 180;
