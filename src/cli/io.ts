import { randomBytes } from "node:crypto";
import { readFile, rename, unlink, writeFile } from "node:fs/promises";
import { basename, dirname, join, resolve } from "node:path";

/** Everything a command touches outside itself: handed in, so that tests can stand in for a terminal. */
export interface Io {
  out(text: string): void;
  err(text: string): void;
  readonly outIsTerminal: boolean;
  readonly errIsTerminal: boolean;
  /** Columns of the terminal; 100 where there is none. */
  readonly width: number;
  readonly colour: boolean;
  readStandardInput(): Promise<string>;
  /** Aborted by Ctrl-C. */
  readonly signal: AbortSignal;
  /** Seconds of a clock that only goes forward. */
  clock(): number;
}

/** Exit codes of the format page. */
export const exitCode = { done: 0, studyWrong: 1, usage: 2, internal: 3, stopped: 130 } as const;

/** Something wrong with how the command was called: shown without a stack, exit 2. */
export class UsageError extends Error {}

/** Text of a file, or of standard input for "-". */
export async function readInput(file: string, io: Io): Promise<string> {
  if (file === "-") return io.readStandardInput();
  try {
    return await readFile(file, "utf8");
  } catch (error) {
    throw new UsageError(`cannot read ${file}: ${reason(error)}`);
  }
}

/**
 * Writes beside the target and renames, so that a failure leaves the old file whole.
 *
 * @throws UsageError where the target is one of the inputs, or cannot be written
 */
export async function writeOutput(file: string, text: string | Uint8Array, inputs: readonly string[]): Promise<void> {
  const target = resolve(file);
  if (inputs.some((input) => input !== "-" && resolve(input) === target))
    throw new UsageError(`${file} is the study itself; choose another file for -o`);
  const beside = join(dirname(target), `.${basename(target)}.${randomBytes(6).toString("hex")}`);
  try {
    await writeFile(beside, text);
    await rename(beside, target);
  } catch (error) {
    await unlink(beside).catch(() => undefined);
    throw new UsageError(`cannot write ${file}: ${reason(error)}`);
  }
}

const words: Readonly<Record<string, string>> = {
  ENOENT: "no such file or folder",
  EACCES: "permission denied",
  EISDIR: "it is a folder",
  ENOTDIR: "part of its path is not a folder",
  ENOSPC: "the disk is full",
  EROFS: "the disk is read-only",
};

function reason(error: unknown): string {
  const code = (error as { code?: string }).code ?? "";
  return words[code] ?? (error as Error).message;
}
