import { randomBytes } from "node:crypto";
import { readFile, realpath, rename, stat, unlink, writeFile } from "node:fs/promises";
import { basename, dirname, join } from "node:path";
import { type Io, UsageError } from "./io.ts";

/** Text of a file, or of standard input for "-". @throws UsageError where it cannot be read */
export async function readInput(file: string, io: Io): Promise<string> {
  if (file === "-") return io.readStandardInput();
  try {
    return await readFile(file, "utf8");
  } catch (error) {
    throw new UsageError(`cannot read ${file}: ${reason(error)}`);
  }
}

/**
 * Looks before a long run whether its result can be written.
 *
 * @throws UsageError where the target is one of the inputs (under whatever name or link), a folder, or in no folder
 */
export async function refuseBadTarget(target: string | undefined, inputs: readonly string[]): Promise<void> {
  if (target === undefined || target === "-") return;
  const found = await identity(target);
  if (found === undefined) {
    const folder = await stat(dirname(target)).catch((error: unknown) => cannotWrite(target, error));
    if (!folder.isDirectory()) throw new UsageError(`cannot write ${target}: part of its path is not a folder`);
    return;
  }
  if (found.folder) throw new UsageError(`cannot write ${target}: it is a folder`);
  for (const input of inputs) {
    if (input !== "-" && (await identity(input))?.key === found.key)
      throw new UsageError(`${target} is an input of this command; choose another file for -o`);
  }
}

/**
 * Writes beside the target and renames, so that a failure leaves the old file whole. A link stays a link, and what is no
 * ordinary file (a pipe, /dev/null) is written to as it is.
 *
 * @throws UsageError where the target is one of the inputs, or cannot be written
 */
export async function writeOutput(target: string, text: string | Uint8Array, inputs: readonly string[]): Promise<void> {
  await refuseBadTarget(target, inputs);
  const found = await identity(target);
  try {
    if (found !== undefined && !found.ordinary) await writeFile(target, text);
    else await replaceFile(found === undefined ? target : await realpath(target), text);
  } catch (error) {
    cannotWrite(target, error);
  }
}

async function replaceFile(file: string, text: string | Uint8Array): Promise<void> {
  const beside = join(dirname(file), `.${basename(file)}.${randomBytes(6).toString("hex")}`);
  try {
    await writeFile(beside, text, { flag: "wx" });
    await rename(beside, file);
  } catch (error) {
    await unlink(beside).catch(() => undefined);
    throw error;
  }
}

interface Identity {
  /** The same for two names of one file. */
  readonly key: string;
  readonly ordinary: boolean;
  readonly folder: boolean;
}

async function identity(file: string): Promise<Identity | undefined> {
  const found = await stat(file).catch(() => undefined);
  return found && { key: `${found.dev}:${found.ino}`, ordinary: found.isFile(), folder: found.isDirectory() };
}

function cannotWrite(file: string, error: unknown): never {
  throw new UsageError(`cannot write ${file}: ${reason(error)}`);
}

const words: Readonly<Record<string, string>> = {
  ENOENT: "no such file or folder",
  EACCES: "permission denied",
  EPERM: "permission denied",
  EISDIR: "it is a folder",
  ENOTDIR: "part of its path is not a folder",
  ENOSPC: "the disk is full",
  EROFS: "the disk is read-only",
};

/** Why a file could not be read or written, for people. */
export function reason(error: unknown): string {
  const code = (error as { code?: string }).code ?? "";
  return words[code] ?? (error as Error).message;
}
