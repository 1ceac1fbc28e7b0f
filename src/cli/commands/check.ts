import type { Command } from "commander";
import type { CheckOptions } from "../../check.ts";
import type { Study } from "../../study/study.ts";
import { deliver } from "../deliver.ts";
import { type Io, readInput, UsageError } from "../io.ts";
import { addCommonOptions, type CommonOptions, loadStudy, withText } from "../study-input.ts";

interface Options extends CommonOptions {
  readonly at: string;
}

export function addCheck(program: Command, io: Io): void {
  addCommonOptions(program.command("check"))
    .argument("<study>", "study file, or - for standard input")
    .description("Does the wall stand at one set of values? Forces, factors of safety, the whole calculation.")
    .option(
      "--at <point>",
      "mean, cautious (each variable at its adverse 5 % fractile), or a file of path: value",
      "mean",
    )
    .addHelpText(
      "after",
      "\nExamples:\n  toehold check wall.yaml\n  toehold check wall.yaml --at cautious\n  toehold check wall.yaml --set water.behind.level=2.5 --json",
    )
    .action(async (file: string, options: Options) => {
      const { study, text } = await loadStudy(file, options, io);
      const { check } = await import("../../check.ts");
      const at = await pointOf(study, options.at, text, io);
      const result = withText(text, () => check(study, { at }), study.file);
      const { resultJson } = await import("../../report/result-json.ts");
      if (options.json) return deliver(resultJson(result), options, file, io);
      const { terminalCheck } = await import("../../report/terminal-check.ts");
      const colour = io.colour && options.output === undefined;
      return deliver(terminalCheck(result, study, { width: io.width, colour }), options, file, io);
    });
}

async function pointOf(study: Study, at: string, text: string, io: Io): Promise<CheckOptions["at"]> {
  if (at === "mean") return "mean";
  if (at === "cautious") {
    const { cautiousPoint } = await import("../../assess.ts");
    return withText(text, () => cautiousPoint(study), study.file);
  }
  if (at.startsWith("design_point")) throw new UsageError("--at design_point is not available in this version");
  const values = await readInput(at, io);
  const { readValues } = await import("../../study/read-values.ts");
  return { name: at, values: withText(values, () => readValues(values, study, at)) };
}
