import type { Command } from "commander";
import type { ScopeResult } from "../../results-decision.ts";
import { deliver } from "../deliver.ts";
import { refuseBadTarget } from "../files.ts";
import { exitCode, type Io } from "../io.ts";
import { startProgress } from "../progress.ts";
import {
  addSamplingOptions,
  loadStudy,
  type SamplingOptions,
  type StudyInput,
  StudyTextError,
} from "../study-input.ts";

const examples = `
Examples:
  toehold scope wall.yaml
  toehold scope wall.yaml --json > scope.json`;

export function addScope(program: Command, io: Io, end: (code: number) => void): void {
  addSamplingOptions(program.command("scope"))
    .argument("<study>", "study file, or - for standard input")
    .description("Which investigation is worth its price, and which option is best today?")
    .addHelpText("after", examples)
    .action(async (file: string, options: SamplingOptions) => {
      await refuseBadTarget(options.output, [file]);
      const input = await loadStudy(file, options.set ?? [], io);
      const { study } = input;
      const result = await runScope(input, options, io);
      if (options.json) {
        const { resultJson } = await import("../../report/result-json.ts");
        await deliver(resultJson(result), options, [file], io);
      } else {
        const { terminalScope } = await import("../../report/terminal-scope.ts");
        const colour = io.colour && options.output === undefined;
        await deliver(terminalScope(result, study, { width: io.width, colour }), options, [file], io);
      }
      if (!result.run.complete) end(exitCode.stopped);
    });
}

/** Weighs a study that is in hand, with progress. */
export async function runScope({ study, text }: StudyInput, options: SamplingOptions, io: Io): Promise<ScopeResult> {
  const { scope } = await import("../../scope.ts");
  const progress = await startProgress(io, options.quiet === true || options.json === true);
  return scope(study, {
    ...(options.seed === undefined ? {} : { seed: options.seed }),
    ...(options.samples === undefined ? {} : { samples: options.samples }),
    ...(options.precision === undefined ? {} : { precision: options.precision }),
    clock: io.clock,
    onProgress: (done, of) => progress.update(done, of),
  })
    .catch((error: unknown) => {
      throw new StudyTextError(error, text, study.file);
    })
    .finally(() => progress.stop());
}
