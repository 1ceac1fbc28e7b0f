import type { Command } from "commander";
import type { AssessResult } from "../../results.ts";
import { addFactorsOption, type FactorOptions, factorsFrom } from "../factors.ts";
import type { Io } from "../io.ts";
import { startProgress } from "../progress.ts";
import {
  addSamplingOptions,
  loadStudy,
  type SamplingOptions,
  type StudyInput,
  StudyTextError,
  withText,
} from "../study-input.ts";
import { addJobOptions, type Job, type JobOptions, runJob } from "../study-job.ts";

interface Options extends SamplingOptions, JobOptions, FactorOptions {
  readonly all?: boolean;
}

const examples = `
Examples:
  toehold assess wall.yaml
  toehold assess wall.yaml --samples 10000000 --precision 0.02
  toehold assess wall.yaml --json > result.json
  toehold assess wall.yaml --compare wider-base.yaml
  toehold assess wall.yaml --factors factors.yaml
  toehold assess wall.yaml --watch`;

export function addAssess(program: Command, io: Io, end: (code: number) => void): void {
  addFactorsOption(addJobOptions(addSamplingOptions(program.command("assess"))))
    .argument("<study>", "study file, or - for standard input")
    .description("How likely is each failure, how sure are we, which unknown drives it?")
    .option("--all", "show every method and measure")
    .addHelpText("after", examples)
    .action((file: string, options: Options) => runJob(assessJob(options, io), file, options, io, end));
}

function assessJob(options: Options, io: Io): Job<AssessResult> {
  return {
    beside: options.factors === undefined ? [] : [options.factors],
    async compute(file, set) {
      const input = await loadStudy(file, set, io);
      const { study, text } = input;
      const withFactors = await factorsFrom(options.factors, io);
      const result = await runAssess(input, options, io);
      if (options.factors === undefined) return { study, result };
      const { check } = await import("../../check.ts");
      const { design } = withText(text, () => withFactors(study, check(study)), study.file);
      return { study, result: { ...result, ...(design === undefined ? {} : { design }) } };
    },
    async text({ study, result }, colour) {
      const { terminalAssess } = await import("../../report/terminal-assess.ts");
      return terminalAssess(result, study, { width: io.width, colour, all: options.all === true });
    },
  };
}

/** Assesses with progress on a terminal and a stop by Ctrl-C that keeps what was computed. */
export async function runAssess(
  { study, text }: StudyInput,
  options: SamplingOptions & { readonly all?: boolean },
  io: Io,
): Promise<AssessResult> {
  const { assess } = await import("../../assess.ts");
  const { workersFor } = await import("../../parallel/worker-count.ts");
  const workers = options.workers ?? workersFor(study, options.samples ?? study.assessment.samples);
  const runner = workers > 1 ? await import("../../parallel/worker-runner.ts") : undefined;
  const progress = await startProgress(io, options.quiet === true);
  try {
    return await assess(study, {
      ...(options.seed === undefined ? {} : { seed: options.seed }),
      ...(options.samples === undefined ? {} : { samples: options.samples }),
      ...(options.precision === undefined ? {} : { precision: options.precision }),
      ...(options.method === undefined ? {} : { method: options.method }),
      ...(runner === undefined ? {} : { startRunner: (of, plan) => runner.workerRunner(of, plan, workers) }),
      workers,
      ...(options.all === true ? { all: true } : {}),
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
