import type { Command } from "commander";
import type { CheckOptions } from "../../check.ts";
import type { CheckResult } from "../../results.ts";
import { limitStateNames } from "../../study/defaults.ts";
import type { LimitStateName, Study } from "../../study/study.ts";
import { addFactorsOption, type FactorOptions, factorsFrom } from "../factors.ts";
import { readInput } from "../files.ts";
import { type Io, UsageError } from "../io.ts";
import { addCommonOptions, loadStudy, withText } from "../study-input.ts";
import { addJobOptions, type Job, type JobOptions, runJob } from "../study-job.ts";

interface Options extends JobOptions, FactorOptions {
  readonly at: string;
}

const examples = `
Examples:
  toehold check wall.yaml
  toehold check wall.yaml --at cautious
  toehold check wall.yaml --set water.behind.level=2.5 --json
  toehold check wall.yaml --set wall.base.heel=3.4 --compare wall.yaml
  toehold check wall.yaml --at cautious --factors factors.yaml
  toehold check wall.yaml --watch`;

export function addCheck(program: Command, io: Io, end: (code: number) => void): void {
  addFactorsOption(addJobOptions(addCommonOptions(program.command("check"))))
    .argument("<study>", "study file, or - for standard input")
    .description("Does the wall stand at one set of values? Forces, factors of safety, the whole calculation.")
    .option(
      "--at <point>",
      "mean, cautious (each variable at its adverse 5 % fractile), design_point:sliding, or a file of path: value",
      "mean",
    )
    .addHelpText("after", examples)
    .action((file: string, options: Options) => runJob(checkJob(options, io), file, options, io, end));
}

function checkJob({ at, factors }: Options, io: Io): Job<CheckResult> {
  return {
    beside: [...(isFile(at) ? [at] : []), ...(factors === undefined ? [] : [factors])],
    async compute(file, set) {
      const { study, text } = await loadStudy(file, set, io);
      const { check } = await import("../../check.ts");
      const point = await pointOf(study, at, text, io);
      const withFactors = await factorsFrom(factors, io);
      return { study, result: withText(text, () => withFactors(study, check(study, { at: point })), study.file) };
    },
    async text({ study, result }, colour) {
      const { terminalCheck } = await import("../../report/terminal-check.ts");
      return terminalCheck(result, study, { width: io.width, colour });
    },
  };
}

const isFile = (at: string): boolean => at !== "mean" && at !== "cautious" && !at.startsWith("design_point");

async function pointOf(study: Study, at: string, text: string, io: Io): Promise<CheckOptions["at"]> {
  if (at === "mean") return "mean";
  if (at === "cautious") {
    const { cautiousPoint } = await import("../../assess.ts");
    return withText(text, () => cautiousPoint(study), study.file);
  }
  if (at.startsWith("design_point")) {
    const name = limitStateIn(at);
    const { designPointOf } = await import("../../assess.ts");
    return withText(text, () => designPointOf(study, name), study.file);
  }
  const values = await readInput(at, io);
  const { readValues } = await import("../../study/read-values.ts");
  return { name: at, values: withText(values, () => readValues(values, study, at)) };
}

function limitStateIn(at: string): LimitStateName {
  const name = at.slice("design_point:".length);
  if (!limitStateNames.includes(name as LimitStateName))
    throw new UsageError(`--at ${at} names no limit state; write for example --at design_point:sliding`);
  return name as LimitStateName;
}
