import { type Command, InvalidArgumentError } from "commander";
import type { Vary } from "../../size.ts";
import { fieldOfPath } from "../../study/fields.ts";
import type { Study } from "../../study/study.ts";
import { displayUnit } from "../../study/units.ts";
import { deliver } from "../deliver.ts";
import { refuseBadTarget } from "../files.ts";
import { exitCode, type Io, UsageError } from "../io.ts";
import { startProgress } from "../progress.ts";
import { addSamplingOptions, loadStudy, type SamplingOptions, StudyTextError, wholeNumber } from "../study-input.ts";

interface Options extends SamplingOptions {
  readonly vary?: readonly string[];
  readonly from?: readonly number[];
  readonly to?: readonly number[];
  readonly points?: readonly number[];
}

export function addSize(program: Command, io: Io, end: (code: number) => void): void {
  addSamplingOptions(program.command("size"))
    .argument("<study>", "study file, or - for standard input")
    .description("Which value of a dimension meets the target? A second --vary gives a contour.")
    .option("--vary <path>", "path of what varies; may be given twice", more)
    .option("--from <value>", "lowest value, in the study's units; once for each --vary", moreNumbers)
    .option("--to <value>", "highest value; once for each --vary", moreNumbers)
    .option(
      "--points <n>",
      "number of values; once for each --vary",
      (text: string, before: readonly number[] = []) => [...before, wholeNumber(2, 401)(text)],
    )
    .addHelpText(
      "after",
      "\nExamples:\n  toehold size wall.yaml --vary wall.base.heel --from 2 --to 4\n  toehold size wall.yaml --vary wall.base.heel --from 2 --to 4 --vary wall.base.toe --from 0.5 --to 1.5",
    )
    .action(async (file: string, options: Options) => {
      await refuseBadTarget(options.output, [file]);
      const { study, text } = await loadStudy(file, options.set ?? [], io);
      const vary = varied(study, options);
      const { size } = await import("../../size.ts");
      const progress = await startProgress(io, options.quiet === true || options.json === true);
      const result = await size(study, {
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
      if (options.json) {
        const { resultJson } = await import("../../report/result-json.ts");
        await deliver(resultJson(result), options, [file], io);
      } else {
        const { terminalSize } = await import("../../report/terminal-size.ts");
        await deliver(
          terminalSize(result, study, { width: io.width, colour: io.colour && options.output === undefined }),
          options,
          [file],
          io,
        );
      }
      if (!result.run.complete) end(exitCode.stopped);
    });
}

const more = (text: string, before: readonly string[] = []): readonly string[] => [...before, text];

function moreNumbers(text: string, before: readonly number[] = []): readonly number[] {
  const value = Number(text);
  if (text.trim() === "" || !Number.isFinite(value))
    throw new InvalidArgumentError("it must be a number, in the study's units");
  return [...before, value];
}

/** What varies, in house units. */
function varied(
  study: Study,
  { vary = [], from = [], to = [], points = [] }: Options,
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
