import type { Command } from "commander";
import type { AssessResult } from "../../results.ts";
import { deliver } from "../deliver.ts";
import { exitCode, type Io, UsageError } from "../io.ts";
import { startProgress } from "../progress.ts";
import {
  addSamplingOptions,
  loadStudy,
  type SamplingOptions,
  type StudyInput,
  StudyTextError,
} from "../study-input.ts";

interface Options extends SamplingOptions {
  readonly all?: boolean;
}

export function addAssess(program: Command, io: Io, end: (code: number) => void): void {
  addSamplingOptions(program.command("assess"))
    .argument("<study>", "study file, or - for standard input")
    .description("How likely is each failure, how sure are we, which unknown drives it?")
    .option("--all", "show every method and measure")
    .addHelpText(
      "after",
      "\nExamples:\n  toehold assess wall.yaml\n  toehold assess wall.yaml --samples 10000000 --precision 0.02\n  toehold assess wall.yaml --json > result.json",
    )
    .action(async (file: string, options: Options) => {
      const input = await loadStudy(file, options, io);
      const result = await runAssess(input, options, io);
      const { resultJson } = await import("../../report/result-json.ts");
      if (options.json) await deliver(resultJson(result), options, file, io);
      else {
        const { terminalAssess } = await import("../../report/terminal-assess.ts");
        const colour = io.colour && options.output === undefined;
        await deliver(
          terminalAssess(result, input.study, { width: io.width, colour, all: options.all === true }),
          options,
          file,
          io,
        );
      }
      if (!result.run.complete) end(exitCode.stopped);
    });
}

/** Assesses with progress on a terminal and a stop by Ctrl-C that keeps what was computed. */
export async function runAssess({ study, text }: StudyInput, options: SamplingOptions, io: Io): Promise<AssessResult> {
  if (options.method !== undefined && options.method !== "plain")
    throw new UsageError(`--method ${options.method} is not available in this version`);
  const { assess } = await import("../../assess.ts");
  const progress = await startProgress(io, options.quiet === true || options.json === true);
  try {
    return await assess(study, {
      ...(options.seed === undefined ? {} : { seed: options.seed }),
      ...(options.samples === undefined ? {} : { samples: options.samples }),
      ...(options.precision === undefined ? {} : { precision: options.precision }),
      signal: io.signal,
      clock: io.clock,
      onProgress: (done, of) => progress.update(done, of),
    });
  } catch (error) {
    throw new StudyTextError(error, text, study.file);
  } finally {
    progress.stop();
  }
}
