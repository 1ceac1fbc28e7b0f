/** Aligned columns for a terminal. */
export interface Column {
  readonly heading: string;
  readonly align?: "left" | "right";
  /** Dropped first where the terminal is too narrow: the higher, the sooner. 0 is never dropped. */
  readonly spare?: number;
}

/**
 * Columns two spaces apart, cut to the width of the terminal by dropping the columns that can be spared and then by
 * breaking the first column's words.
 */
export function textTable(columns: readonly Column[], rows: readonly (readonly string[])[], width: number): string {
  const kept = keptColumns(columns, rows, width);
  const cells = [columns.map((column) => column.heading), ...rows].map((row) => kept.map((place) => row[place]));
  const widths = kept.map((_, k) => Math.max(...cells.map((row) => lengthOf(row[k]))));
  const total = widths.reduce((sum, size) => sum + size + 2, -2);
  if (total > width) widths[0] = Math.max(12, widths[0] - (total - width));
  const lines = cells.flatMap((row) =>
    brokenRow(
      row,
      widths,
      kept.map((place) => columns[place].align ?? "left"),
    ),
  );
  const rule = widths.map((size) => "─".repeat(size)).join("  ");
  const headingLines = brokenRow(
    cells[0],
    widths,
    kept.map((place) => columns[place].align ?? "left"),
  ).length;
  return [...lines.slice(0, headingLines), rule, ...lines.slice(headingLines)].join("\n");
}

/** The first column is broken down to so many letters before another is dropped. */
const firstLeast = 24;

function keptColumns(columns: readonly Column[], rows: readonly (readonly string[])[], width: number): number[] {
  const kept = columns.map((_, place) => place);
  const sizeOf = (place: number): number => {
    const size = Math.max(lengthOf(columns[place].heading), ...rows.map((row) => lengthOf(row[place])));
    return place === 0 ? Math.min(size, firstLeast) : size;
  };
  const total = (): number => kept.reduce((sum, place) => sum + sizeOf(place) + 2, -2);
  while (total() > width) {
    const spare = kept.filter((place) => (columns[place].spare ?? 0) > 0);
    if (spare.length === 0) break;
    const out = spare.reduce((most, place) =>
      (columns[place].spare ?? 0) > (columns[most].spare ?? 0) ? place : most,
    );
    kept.splice(kept.indexOf(out), 1);
  }
  return kept;
}

function brokenRow(row: readonly string[], widths: readonly number[], aligns: readonly ("left" | "right")[]): string[] {
  const first = wrap(row[0], widths[0]);
  return first.map((text, line) =>
    row
      .map((cell, k) => pad(k === 0 ? text : line === 0 ? cell : "", widths[k], aligns[k]))
      .join("  ")
      .trimEnd(),
  );
}

function pad(text: string, size: number, align: "left" | "right"): string {
  const gap = " ".repeat(Math.max(0, size - lengthOf(text)));
  return align === "right" ? gap + text : text + gap;
}

/** Characters as a terminal counts them; combining marks and thin spaces are one cell or none. */
export function lengthOf(text: string): number {
  return [...text.normalize("NFC")].length;
}

/** Breaks text at spaces, keeping what it is indented by; a word longer than the width stands on a line of its own. */
export function wrap(text: string, width: number, indent = ""): string[] {
  const lead = /^ */.exec(text)?.[0] ?? "";
  const lines: string[] = [];
  let line = lead;
  let empty = true;
  for (const word of text.trimStart().split(" ")) {
    const next = empty ? line + word : `${line} ${word}`;
    if (!empty && lengthOf(next) > width) {
      lines.push(line);
      line = indent + word;
    } else line = next;
    empty = false;
  }
  return [...lines, line];
}
