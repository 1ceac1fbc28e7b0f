import type { Notice } from "../study/study.ts";
import { wrap } from "./table.ts";

export interface TerminalOptions {
  /** Columns of the terminal. */
  readonly width: number;
  readonly colour: boolean;
  /** Every method and measure. */
  readonly all?: boolean;
}

/** Marks for headings; plain text where colour is off. */
export function heading(text: string, options: TerminalOptions): string {
  return options.colour ? `\u001b[1m${text}\u001b[22m` : text;
}

/** Notes and cautions, wrapped and hung under their marks. */
export function closing(warnings: readonly Notice[], cautions: readonly string[], options: TerminalOptions): string {
  const width = Math.max(40, options.width);
  const notes = warnings.flatMap(({ path, message }) =>
    wrap(`• ${path === "" ? "" : `${path}: `}${message}`, width, "  "),
  );
  const care = cautions.flatMap((caution) => wrap(`• ${caution}`, width, "  "));
  return [
    ...(notes.length === 0 ? [] : [heading("Notes", options), ...notes, ""]),
    heading("Cautions", options),
    ...care,
  ].join("\n");
}
