import type { Command } from "commander";
import type { Side } from "../../report/terminal-compare.ts";
import type { AssessResult } from "../../results.ts";
import { deliver } from "../deliver.ts";
import { showFailure } from "../failure.ts";
import { exitCode, type Io, UsageError } from "../io.ts";
import { startProgress } from "../progress.ts";
import {
  addSamplingOptions,
  loadStudy,
  type SamplingOptions,
  type StudyInput,
  StudyTextError,
} from "../study-input.ts";
import { watchFile } from "../watch.ts";

interface Options extends SamplingOptions {
  readonly all?: boolean;
  readonly compare?: string;
  readonly watch?: boolean;
}

export function addAssess(program: Command, io: Io, end: (code: number) => void): void {
  addSamplingOptions(program.command("assess"))
    .argument("<study>", "study file, or - for standard input")
    .description("How likely is each failure, how sure are we, which unknown drives it?")
    .option("--all", "show every method and measure")
    .option("--compare <study>", "assess another study too and show the two side by side")
    .option("--watch", "assess again whenever the file is saved, and show what changed")
    .addHelpText(
      "after",
      "\nExamples:\n  toehold assess wall.yaml\n  toehold assess wall.yaml --samples 10000000 --precision 0.02\n  toehold assess wall.yaml --json > result.json",
    )
    .action(async (file: string, options: Options) => {
      const one = async (name: string): Promise<Side<AssessResult>> => {
        const input = await loadStudy(name, options, io);
        return { name, study: input.study, result: await runAssess(input, options, io) };
      };
      const show = async (side: Side<AssessResult>, before: Side<AssessResult> | undefined): Promise<void> => {
        const other = options.compare === undefined ? undefined : await one(options.compare);
        const pairs =
          before === undefined
            ? []
            : [
                [
                  { ...before, name: "before" },
                  { ...side, name: "now" },
                ] as const,
              ];
        await deliver(
          await assessText(side, other === undefined ? pairs : [...pairs, [side, other]], options, io),
          options,
          file,
          io,
        );
        if (![side, other].every((shown) => shown?.result.run.complete ?? true)) end(exitCode.stopped);
      };
      if (!options.watch) return show(await one(file), undefined);
      let before: Side<AssessResult> | undefined;
      return watchFile(
        file,
        io,
        async () => {
          const now = await one(file);
          await show(now, before);
          before = now;
        },
        (error) => showFailure(error, io),
      );
    });
}

type Pair = readonly [Side<AssessResult>, Side<AssessResult>];

/** The result as JSON (an array where two were asked for), or as text with what is set beside it. */
async function assessText(side: Side<AssessResult>, pairs: readonly Pair[], options: Options, io: Io): Promise<string> {
  const { resultJson } = await import("../../report/result-json.ts");
  if (options.json)
    return resultJson(options.compare === undefined ? side.result : [side.result, pairs[pairs.length - 1][1].result]);
  const { terminalAssess } = await import("../../report/terminal-assess.ts");
  const terminal = { width: io.width, colour: io.colour && options.output === undefined, all: options.all === true };
  const text = terminalAssess(side.result, side.study, terminal);
  if (pairs.length === 0) return text;
  const { compareAssessments } = await import("../../report/terminal-compare.ts");
  return [text, ...pairs.map(([a, b]) => compareAssessments(a, b, terminal))].join("\n");
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
