import type { Command } from "commander";
import type { AssessResult } from "../../results.ts";
import type { Study } from "../../study/study.ts";
import { deliver } from "../deliver.ts";
import { addFactorsOption, type FactorOptions, factorsFrom } from "../factors.ts";
import { refuseBadTarget, writeOutput } from "../files.ts";
import { exitCode, type Io, UsageError } from "../io.ts";
import { addSamplingOptions, loadStudy, type SamplingOptions, withText } from "../study-input.ts";
import { addVaryOptions, runSize, type VaryOptions, variedOf } from "../vary.ts";
import { runAssess } from "./assess.ts";
import { runScope } from "./scope.ts";

const examples = `
Examples:
  toehold report wall.yaml -o wall.html
  toehold report wall.yaml --vary wall.base.heel --from 2 --to 4
  toehold report wall.yaml -o - > wall.html`;

export function addReport(program: Command, io: Io, end: (code: number) => void): void {
  addVaryOptions(addFactorsOption(addSamplingOptions(program.command("report"))))
    .argument("<study>", "study file, or - for standard input")
    .description("All of it on one page that works offline and prints (report.html where -o names no other file).")
    .addHelpText("after", examples)
    .action(async (file: string, options: SamplingOptions & FactorOptions & VaryOptions) => {
      const target = options.output ?? "report.html";
      if (target === "-" && options.json) throw new UsageError("-o - and --json both want standard output");
      const inputs = [file, ...(options.factors === undefined ? [] : [options.factors])];
      await refuseBadTarget(target, inputs);
      const input = await loadStudy(file, options.set ?? [], io);
      const varies = [options.vary, options.from, options.to, options.points].some((given) => given !== undefined);
      if (varies) variedOf(input.study, options);
      const { check } = await import("../../check.ts");
      const { htmlReport } = await import("../../report/html-report.ts");
      const withFactors = await factorsFrom(options.factors, io);
      const checked = withText(input.text, () => withFactors(input.study, check(input.study)), input.study.file);
      const assessed = await runAssess(input, { ...options, all: true }, io);
      const sized = varies ? await runSize(input, options, io) : undefined;
      const { failurePoint } = await import("../../report/failure-point.ts");
      const point = failurePoint(assessed);
      const decided =
        input.study.decision === undefined || !assessed.run.complete ? undefined : await runScope(input, options, io);
      const page = await htmlReport({
        study: input.study,
        check: checked,
        assess: assessed,
        ...(sized === undefined ? {} : { size: sized }),
        ...(decided === undefined ? {} : { scope: decided }),
        ...(point === undefined ? {} : { atFailure: check(input.study, { at: point }) }),
      });
      if (target === "-") io.out(page);
      else {
        await writeOutput(target, page, inputs);
        await summary(assessed, input.study, target, options, io);
      }
      if (!assessed.run.complete) end(exitCode.stopped);
    });
}

async function summary(
  result: AssessResult,
  study: Study,
  target: string,
  options: SamplingOptions,
  io: Io,
): Promise<void> {
  if (options.json) {
    const { resultJson } = await import("../../report/result-json.ts");
    return deliver(resultJson(result), { json: true }, [], io);
  }
  if (options.quiet) return;
  const { terminalAssess } = await import("../../report/terminal-assess.ts");
  await deliver(terminalAssess(result, study, { width: io.width, colour: io.colour }), {}, [], io);
  io.out(`\nThe report is in ${target}: open it in a browser.\n`);
}
