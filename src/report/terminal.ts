import type { Notice } from "../study/study.ts";
import { wrap } from "./table.ts";

export interface TerminalOptions {
  /** Columns of the terminal. */
  readonly width: number;
  readonly colour: boolean;
  /** Every method and measure. */
  readonly all?: boolean;
}

/** Narrower than this a line says nothing; longer lines may run over then. */
export const leastWidth = 32;

const bold = ["\u001b[1m", "\u001b[22m"] as const;
const faint = ["\u001b[2m", "\u001b[22m"] as const;

/** Marks for headings; plain text where colour is off. */
export const heading = (text: string, { colour }: TerminalOptions): string =>
  colour ? `${bold[0]}${text}${bold[1]}` : text;

/** The study's title, broken where it is long. */
export const title = (text: string, options: TerminalOptions): readonly string[] =>
  paragraphLines([text], options).map((line) => heading(line, options));

/** What is read last. */
export const quiet = (text: string, { colour }: TerminalOptions): string =>
  colour ? `${faint[0]}${text}${faint[1]}` : text;

/** Lines of a paragraph, hung by two. */
export const paragraphLines = (sentences: readonly string[], { width }: TerminalOptions): readonly string[] =>
  sentences.flatMap((sentence) => wrap(sentence, Math.max(width, leastWidth), "  "));

/** Notes and cautions, wrapped and hung under their marks. */
export function closing(warnings: readonly Notice[], cautions: readonly string[], options: TerminalOptions): string {
  const notes = distinct(warnings).map(({ path, message }) => `• ${path === "" ? "" : `${path}: `}${message}`);
  const care = paragraphLines(
    cautions.map((caution) => `• ${caution}`),
    options,
  );
  return [
    ...(notes.length === 0 ? [] : [heading("Notes", options), ...paragraphLines(notes, options), ""]),
    heading("Cautions", options),
    ...care.map((line) => quiet(line, options)),
  ].join("\n");
}

const distinct = (notes: readonly Notice[]): readonly Notice[] => [
  ...new Map(notes.map((note) => [`${note.path} ${note.message}`, note])).values(),
];

/**
 * Text that is safe to send to a terminal: words of a study could hold codes that move the cursor or rename the window. Only our own
 * marks for bold and faint pass.
 */
export function terminalSafe(text: string): string {
  const ours = new RegExp([...bold, ...faint].map((code) => code.replace("[", "\\[")).join("|"), "g");
  const marks = text.match(ours) ?? [];
  return text
    .split(ours)
    .map((part) => part.replace(/(?!\n)\p{Cc}/gu, ""))
    .reduce((whole, part, place) => whole + (place === 0 ? "" : marks[place - 1]) + part, "");
}
