/** Everything a command touches outside itself: handed in, so that tests can stand in for a terminal. */
export interface Io {
  out(text: string): void;
  err(text: string): void;
  readonly errIsTerminal: boolean;
  /** Where a progress bar is drawn; used on a terminal alone. */
  readonly errStream: NodeJS.WritableStream;
  /** Columns of the terminal; 100 where there is none. */
  readonly width: number;
  readonly colour: boolean;
  readStandardInput(): Promise<string>;
  /** Asks a person; absent where there is none to ask. Rejects with `StoppedError` when she ends the input. */
  readonly ask?: (question: string) => Promise<string>;
  /** Aborted by Ctrl-C. */
  readonly signal: AbortSignal;
  /** Seconds of a clock that only goes forward. */
  clock(): number;
}

/** Exit codes of the format page. */
export const exitCode = { done: 0, studyWrong: 1, usage: 2, internal: 3, stopped: 130 } as const;

/** Something wrong with how the command was called: shown without a stack, exit 2. */
export class UsageError extends Error {}

/** The user ended it before there was anything to show: exit 130. */
export class StoppedError extends Error {}

/**
 * Text for a terminal or a pipe, without the control characters that a study may bring: they would move the cursor, repaint
 * or hide. Line ends and tabs stay; where colour is on, bold and colours do too.
 */
export function withoutControls(text: string, colour = false): string {
  return text.replace(/\p{Cc}/gu, (found, place: number) => {
    const own = colour && /^\[(?:0|1|2|22|39|3[1-6])m/.test(text.slice(place + 1, place + 5));
    return found === "\n" || found === "\t" || (found === "\u001b" && own) ? found : "\ufffd";
  });
}
