import { type Command, Option } from "commander";
import type { AssessResult, ReportInput } from "../../results.ts";
import type { Study } from "../../study/study.ts";
import { deliver } from "../deliver.ts";
import { addFactorsOption, type FactorOptions, factorsFrom } from "../factors.ts";
import { writeOutput } from "../files.ts";
import { exitCode, type Io, UsageError } from "../io.ts";
import {
  isFolder,
  pictureFiles,
  type ReportFile,
  type ReportFormat,
  refuseBadPlace,
  reportFormats,
  resultFile,
  tableFiles,
  usualTarget,
  writeFolder,
} from "../report-files.ts";
import { addSamplingOptions, loadStudy, type SamplingOptions, wholeNumber, withText } from "../study-input.ts";
import { addVaryOptions, runSize, type VaryOptions, variedOf } from "../vary.ts";
import { runAssess } from "./assess.ts";
import { runScope } from "./scope.ts";

const examples = `
Examples:
  toehold report wall.yaml -o wall.html
  toehold report wall.yaml --vary wall.base.heel --from 2 --to 4
  toehold report wall.yaml --format png -o wall-pictures
  toehold report wall.yaml --format csv --sample-rows 1000 -o wall-tables
  toehold report wall.yaml -o - > wall.html`;

interface Options extends SamplingOptions, FactorOptions, VaryOptions {
  readonly format: ReportFormat;
  readonly sampleRows?: number;
}

export function addReport(program: Command, io: Io, end: (code: number) => void): void {
  addVaryOptions(addFactorsOption(addSamplingOptions(program.command("report"))))
    .argument("<study>", "study file, or - for standard input")
    .description("All of it on one page that works offline and prints (report.html where -o names no other file).")
    .addOption(
      new Option("--format <form>", "one file (html, json) or a folder of files (csv, svg, png), named by -o")
        .choices(reportFormats)
        .default("html"),
    )
    .option("--sample-rows <n>", "with --format csv: the first n samples too, one a row", wholeNumber(1, 1_000_000))
    .addHelpText("after", examples)
    .action(async (file: string, options: Options) => {
      const { format } = options;
      const target = options.output ?? usualTarget(format);
      const inputs = [file, ...(options.factors === undefined ? [] : [options.factors])];
      if (options.sampleRows !== undefined && format !== "csv")
        throw new UsageError("--sample-rows belongs to --format csv");
      if (target === "-" && options.json) throw new UsageError("-o - and --json both want standard output");
      await refuseBadPlace(format, target, inputs);
      const input = await reportInput(file, options, io);
      if (isFolder(format)) await writeFolder(target, await filesOf(input, options), inputs);
      else {
        const text = format === "json" ? await resultFile(input) : await pageOf(input);
        if (target === "-") io.out(text);
        else await writeOutput(target, text, inputs);
      }
      if (target !== "-") await summary(input.assess, input.study, target, options, io);
      if (!input.assess.run.complete) end(exitCode.stopped);
    });
}

/** Computes all that the report shows. */
async function reportInput(file: string, options: Options, io: Io): Promise<ReportInput> {
  const input = await loadStudy(file, options.set ?? [], io);
  const { study, text } = input;
  const varies = [options.vary, options.from, options.to, options.points].some((given) => given !== undefined);
  if (varies) variedOf(study, options);
  const { check } = await import("../../check.ts");
  const withFactors = await factorsFrom(options.factors, io);
  const checked = withText(text, () => withFactors(study, check(study)), study.file);
  const assess = await runAssess(input, { ...options, all: true }, io);
  const size = varies ? await runSize(input, options, io) : undefined;
  const { failurePoint } = await import("../../report/failure-point.ts");
  const point = failurePoint(assess);
  const scope = study.decision === undefined || !assess.run.complete ? undefined : await runScope(input, options, io);
  return {
    study,
    check: checked,
    assess,
    ...(size === undefined ? {} : { size }),
    ...(scope === undefined ? {} : { scope }),
    ...(point === undefined ? {} : { atFailure: check(study, { at: point }) }),
  };
}

async function pageOf(input: ReportInput): Promise<string> {
  const { htmlReport } = await import("../../report/html-report.ts");
  return htmlReport(input);
}

async function filesOf(input: ReportInput, { format, sampleRows = 0 }: Options): Promise<readonly ReportFile[]> {
  if (format === "csv") return tableFiles(input, sampleRows);
  return pictureFiles(await pageOf(input), format === "png" ? "png" : "svg");
}

async function summary(result: AssessResult, study: Study, target: string, options: Options, io: Io): Promise<void> {
  if (options.json) {
    const { resultJson } = await import("../../report/result-json.ts");
    return deliver(resultJson(result), { json: true }, [], io);
  }
  if (options.quiet) return;
  const { terminalAssess } = await import("../../report/terminal-assess.ts");
  await deliver(terminalAssess(result, study, { width: io.width, colour: io.colour }), {}, [], io);
  io.out(`\nThe report is in ${target}${options.format === "html" ? ": open it in a browser" : ""}.\n`);
}
