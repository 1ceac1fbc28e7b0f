import type { Command } from "commander";
import type { CheckOptions } from "../../check.ts";
import type { Side } from "../../report/terminal-compare.ts";
import type { CheckResult } from "../../results.ts";
import type { Study } from "../../study/study.ts";
import { deliver } from "../deliver.ts";
import { showFailure } from "../failure.ts";
import { type Io, readInput, UsageError } from "../io.ts";
import { addCommonOptions, type CommonOptions, loadStudy, withText } from "../study-input.ts";
import { watchFile } from "../watch.ts";

interface Options extends CommonOptions {
  readonly at: string;
  readonly compare?: string;
  readonly watch?: boolean;
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
    .option("--compare <study>", "check another study too and show the two side by side")
    .option("--watch", "check again whenever the file is saved, and show what changed")
    .addHelpText(
      "after",
      "\nExamples:\n  toehold check wall.yaml\n  toehold check wall.yaml --at cautious\n  toehold check wall.yaml --set water.behind.level=2.5 --json",
    )
    .action(async (file: string, options: Options) => {
      const one = async (name: string): Promise<Side<CheckResult>> => {
        const { study, text } = await loadStudy(name, options, io);
        const { check } = await import("../../check.ts");
        const at = await pointOf(study, options.at, text, io);
        return { name, study, result: withText(text, () => check(study, { at }), study.file) };
      };
      const show = async (side: Side<CheckResult>, before: Side<CheckResult> | undefined): Promise<void> => {
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
          await checkText(side, other === undefined ? pairs : [...pairs, [side, other]], options, io),
          options,
          file,
          io,
        );
      };
      if (!options.watch) return show(await one(file), undefined);
      let before: Side<CheckResult> | undefined;
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

type Pair = readonly [Side<CheckResult>, Side<CheckResult>];

/** The result as JSON (an array where two were asked for), or as text with what is set beside it. */
async function checkText(side: Side<CheckResult>, pairs: readonly Pair[], options: Options, io: Io): Promise<string> {
  const { resultJson } = await import("../../report/result-json.ts");
  if (options.json)
    return resultJson(options.compare === undefined ? side.result : [side.result, pairs[pairs.length - 1][1].result]);
  const { terminalCheck } = await import("../../report/terminal-check.ts");
  const terminal = { width: io.width, colour: io.colour && options.output === undefined };
  const text = terminalCheck(side.result, side.study, terminal);
  if (pairs.length === 0) return text;
  const { compareChecks } = await import("../../report/terminal-compare.ts");
  return [text, ...pairs.map(([a, b]) => compareChecks(a, b, terminal))].join("\n");
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
