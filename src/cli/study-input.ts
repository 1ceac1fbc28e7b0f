import { type Command, InvalidArgumentError, Option } from "commander";
import type { SamplingMethod } from "../reliability/sampling-estimate.ts";
import type { Study } from "../study/study.ts";
import { readInput } from "./files.ts";
import type { Io } from "./io.ts";

/** Path and value, as on the command line. */
export type Setting = readonly [path: string, value: string];

/** Options that every command on a study takes. */
export interface CommonOptions {
  readonly json?: boolean;
  readonly output?: string;
  readonly quiet?: boolean;
  readonly set?: readonly Setting[];
}

export interface SamplingOptions extends CommonOptions {
  readonly seed?: string;
  readonly samples?: number;
  readonly precision?: number;
  readonly workers?: number;
  readonly method?: SamplingMethod;
}

export function addCommonOptions(command: Command): Command {
  return addSettings(
    command
      .option("--json", "print the result as JSON, and nothing else, on standard output")
      .option("-o, --output <file>", "write the result to a file instead")
      .option("--quiet", "print no more than is asked for"),
  );
}

export function addSettings(command: Command): Command {
  return command.option(
    "--set <path=value>",
    "set a value of the study before it is read; may be repeated",
    collectSetting,
  );
}

export function addSamplingOptions(command: Command): Command {
  return addCommonOptions(command)
    .option("--seed <text>", "seed in place of the study's; the same seed gives the same numbers")
    .option("--samples <n>", "most evaluations of one sampling run", wholeNumber(1, 1e12))
    .option(
      "--precision <cov>",
      "coefficient of variation at which sampling may stop; 0 uses all samples",
      numberBetween(0, 1),
    )
    .option("--workers <n>", "threads to sample on; the numbers do not depend on it", wholeNumber(1, 256))
    .addOption(
      new Option("--method <name>", "sampling method; chosen by the program where left out").choices([
        "plain",
        "latin_hypercube",
        "sobol",
        "importance",
        "subset",
        "directional",
      ]),
    );
}

function collectSetting(text: string, before: readonly Setting[] = []): readonly Setting[] {
  const equals = text.indexOf("=");
  if (equals < 1) throw new InvalidArgumentError("write it as path=value, for example water.behind.level=1.2");
  return [...before, [text.slice(0, equals).trim(), text.slice(equals + 1).trim()]];
}

export function wholeNumber(lowest: number, highest: number): (text: string) => number {
  return (text) => {
    const value = Number(text);
    if (text.trim() === "" || !Number.isInteger(value) || value < lowest || value > highest)
      throw new InvalidArgumentError(`it must be a whole number from ${lowest} to ${highest}`);
    return value;
  };
}

export function numberBetween(lowest: number, highest: number): (text: string) => number {
  return (text) => {
    const value = Number(text);
    if (text.trim() === "" || !(value >= lowest && value <= highest))
      throw new InvalidArgumentError(`it must be a number from ${lowest} to ${highest}`);
    return value;
  };
}

/** A study and the text it came from, for messages. */
export interface StudyInput {
  readonly study: Study;
  readonly text: string;
}

/** Keeps the text beside a failure, so that the message can show the line. */
export class StudyTextError extends Error {
  readonly text: string;
  /** Name of the file, where the problems were found after reading and have no place yet; empty otherwise. */
  readonly file: string;
  override readonly cause: unknown;
  constructor(cause: unknown, text: string, file = "") {
    super("the study is wrong");
    this.cause = cause;
    this.text = text;
    this.file = file;
  }
}

export async function loadStudy(file: string, set: readonly Setting[], io: Io): Promise<StudyInput> {
  const text = await readInput(file, io);
  const { readStudy } = await import("../study/read-study.ts");
  return withText(text, () => ({
    study: readStudy(text, { file: file === "-" ? "standard input" : file, set }),
    text,
  }));
}

/** Runs something that may find the study wrong; the error then carries the text. */
export function withText<T>(text: string, run: () => T, file = ""): T {
  try {
    return run();
  } catch (error) {
    throw new StudyTextError(error, text, file);
  }
}
