import type { Command } from "commander";
import { deliver } from "../deliver.ts";
import { exitCode, type Io, writeOutput } from "../io.ts";
import { addSamplingOptions, loadStudy, type SamplingOptions, withText } from "../study-input.ts";
import { runAssess } from "./assess.ts";

export function addReport(program: Command, io: Io, end: (code: number) => void): void {
  addSamplingOptions(program.command("report"))
    .argument("<study>", "study file, or - for standard input")
    .description("All of it on one page that works offline and prints.")
    .addHelpText("after", "\nExample:\n  toehold report wall.yaml -o wall.html")
    .action(async (file: string, options: SamplingOptions) => {
      const input = await loadStudy(file, options, io);
      const { check } = await import("../../check.ts");
      const { htmlReport } = await import("../../report/html-report.ts");
      const checked = withText(input.text, () => check(input.study), input.study.file);
      const assessed = await runAssess(input, options, io);
      const page = await htmlReport({ study: input.study, check: checked, assess: assessed });
      const target = options.output ?? "report.html";
      await writeOutput(target, page, [file]);
      const { resultJson } = await import("../../report/result-json.ts");
      if (options.json) io.out(resultJson(assessed));
      else if (!options.quiet) {
        const { terminalAssess } = await import("../../report/terminal-assess.ts");
        await deliver(terminalAssess(assessed, input.study, { width: io.width, colour: io.colour }), {}, file, io);
        io.out(`\nThe report is in ${target}: open it in a browser.\n`);
      }
      if (!assessed.run.complete) end(exitCode.stopped);
    });
}
