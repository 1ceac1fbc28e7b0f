/** Dimensions that are varied: the options of `size` and `report`. */
import { type Command, InvalidArgumentError } from "commander";
import type { SizeResult } from "../results-size.ts";
import type { Vary } from "../size.ts";
import { fieldOfPath } from "../study/fields.ts";
import type { Study } from "../study/study.ts";
import { displayUnit } from "../study/units.ts";
import { type Io, UsageError } from "./io.ts";
import { startProgress } from "./progress.ts";
import { type SamplingOptions, type StudyInput, StudyTextError, wholeNumber } from "./study-input.ts";

export interface VaryOptions {
  readonly vary?: readonly string[];
  readonly from?: readonly number[];
  readonly to?: readonly number[];
  readonly points?: readonly number[];
}

export function addVaryOptions(command: Command): Command {
  return command
    .option("--vary <path>", "path of what varies; may be given twice", more)
    .option("--from <value>", "lowest value, in the study's units; once for each --vary", moreNumbers)
    .option("--to <value>", "highest value; once for each --vary", moreNumbers)
    .option(
      "--points <n>",
      "number of values; once for each --vary",
      (text: string, before: readonly number[] = []) => [...before, wholeNumber(2, 401)(text)],
    );
}

const more = (text: string, before: readonly string[] = []): readonly string[] => [...before, text];

function moreNumbers(text: string, before: readonly number[] = []): readonly number[] {
  const value = Number(text);
  if (text.trim() === "" || !Number.isFinite(value))
    throw new InvalidArgumentError("it must be a number, in the study's units");
  return [...before, value];
}

/**
 * What varies, in house units.
 *
 * @throws UsageError where a dimension lacks its ends, or there are none or too many
 */
export function variedOf(
  study: Study,
  { vary = [], from = [], to = [], points = [] }: VaryOptions,
): readonly [Vary] | readonly [Vary, Vary] {
  if (vary.length < 1 || vary.length > 2) throw new UsageError("size needs one --vary PATH, or two for a contour");
  if (from.length !== vary.length || to.length !== vary.length)
    throw new UsageError("each --vary needs its --from and its --to");
  const one = (k: number): Vary => {
    const factor = factorOf(vary[k], study);
    return {
      path: vary[k],
      from: from[k] / factor,
      to: to[k] / factor,
      ...(points[k] === undefined ? {} : { points: points[k] }),
    };
  };
  return vary.length === 1 ? [one(0)] : [one(0), one(1)];
}

function factorOf(path: string, study: Study): number {
  const field = fieldOfPath(path);
  return field === undefined ? 1 : displayUnit(field.dimension, study.units).factor;
}

/** Sizes with progress on a terminal and a stop by Ctrl-C that keeps what was computed. */
export async function runSize(
  { study, text }: StudyInput,
  options: SamplingOptions & VaryOptions,
  io: Io,
): Promise<SizeResult> {
  const vary = variedOf(study, options);
  const { size } = await import("../size.ts");
  const progress = await startProgress(io, options.quiet === true || options.json === true);
  return size(study, {
    vary,
    ...(options.seed === undefined ? {} : { seed: options.seed }),
    ...(options.samples === undefined ? {} : { samples: options.samples }),
    ...(options.precision === undefined ? {} : { precision: options.precision }),
    signal: io.signal,
    clock: io.clock,
    onProgress: (done, of) => progress.update(done, of),
  })
    .catch((error: unknown) => {
      throw new StudyTextError(error, text, study.file);
    })
    .finally(() => progress.stop());
}
