import type { Command } from "commander";
import type { Outcome } from "../report/terminal-compare.ts";
import type { AssessResult, CheckResult } from "../results.ts";
import { deliver } from "./deliver.ts";
import { refuseBadTarget } from "./files.ts";
import { exitCode, type Io, UsageError } from "./io.ts";
import type { CommonOptions, Setting } from "./study-input.ts";

/** A command on a study: how it computes and how it shows. */
export interface Job<R extends CheckResult | AssessResult> {
  /** Files read beside the study. */
  readonly beside: readonly string[];
  compute(file: string, set: readonly Setting[]): Promise<Outcome<R>>;
  text(outcome: Outcome<R>, colour: boolean): Promise<string>;
}

export interface JobOptions extends CommonOptions {
  readonly watch?: boolean;
  readonly compare?: string;
}

export function addJobOptions(command: Command): Command {
  return command
    .option("--compare <study>", "show a second study beside this one; --set changes the first alone")
    .option("--watch", "compute anew whenever the study is saved, and show what changed; Ctrl-C ends it");
}

/** Computes one study and shows it: alone, beside another, or again and again as it is saved. */
export async function runJob<R extends CheckResult | AssessResult>(
  job: Job<R>,
  file: string,
  options: JobOptions,
  io: Io,
  end: (code: number) => void,
): Promise<void> {
  refuseMixtures(file, options);
  const inputs = [file, ...job.beside, ...(options.compare === undefined ? [] : [options.compare])];
  await refuseBadTarget(options.output, inputs);
  const set = options.set ?? [];
  if (options.watch) {
    const { watchStudy } = await import("./watch.ts");
    await watchStudy({ job, file, set, inputs }, io);
    end(exitCode.stopped);
    return;
  }
  const outcome = await job.compute(file, set);
  const other = options.compare === undefined ? undefined : await job.compute(options.compare, []);
  await deliver(await textOf(job, outcome, other, options, io), options, inputs, io);
  if (isUnfinished(outcome) || (other !== undefined && isUnfinished(other))) end(exitCode.stopped);
}

async function textOf<R extends CheckResult | AssessResult>(
  job: Job<R>,
  outcome: Outcome<R>,
  other: Outcome<R> | undefined,
  options: JobOptions,
  io: Io,
): Promise<string> {
  if (options.json) {
    const { resultJson } = await import("../report/result-json.ts");
    return resultJson(other === undefined ? outcome.result : { ...outcome.result, comparedWith: other.result });
  }
  const colour = io.colour && options.output === undefined;
  if (other === undefined) return job.text(outcome, colour);
  const { terminalCompare } = await import("../report/terminal-compare.ts");
  return terminalCompare(outcome, other, { names: ["first", "second"], width: io.width, colour });
}

function refuseMixtures(file: string, { watch, compare, json, output }: JobOptions): void {
  if (file === "-" && compare === "-") throw new UsageError("only one of the two studies can come from standard input");
  if (!watch) return;
  const beside = [
    ["--compare", compare !== undefined],
    ["--json", json === true],
    ["-o", output !== undefined],
    ["a study from standard input", file === "-"],
  ].find(([, given]) => given);
  if (beside !== undefined)
    throw new UsageError(`--watch shows text on the terminal and cannot stand with ${beside[0]}`);
}

function isUnfinished({ result }: Outcome<CheckResult | AssessResult>): boolean {
  return result.kind === "assess" && !result.run.complete;
}
