import type { Command } from "commander";
import { deliver } from "../deliver.ts";
import { refuseBadTarget } from "../files.ts";
import { exitCode, type Io } from "../io.ts";
import { addSamplingOptions, loadStudy, type SamplingOptions } from "../study-input.ts";
import { addVaryOptions, runSize, type VaryOptions } from "../vary.ts";

const examples = `
Examples:
  toehold size wall.yaml --vary wall.base.heel --from 2 --to 4
  toehold size wall.yaml --vary wall.base.heel --from 2 --to 4 --vary wall.base.toe --from 0.5 --to 1.5
  toehold report wall.yaml --vary wall.base.heel --from 2 --to 4     (the same as charts on the page)`;

export function addSize(program: Command, io: Io, end: (code: number) => void): void {
  addVaryOptions(addSamplingOptions(program.command("size")))
    .argument("<study>", "study file, or - for standard input")
    .description("Which value of a dimension meets the target? A second --vary gives a contour.")
    .addHelpText("after", examples)
    .action(async (file: string, options: SamplingOptions & VaryOptions) => {
      await refuseBadTarget(options.output, [file]);
      const input = await loadStudy(file, options.set ?? [], io);
      const result = await runSize(input, options, io);
      if (options.json) {
        const { resultJson } = await import("../../report/result-json.ts");
        await deliver(resultJson(result), options, [file], io);
      } else {
        const { terminalSize } = await import("../../report/terminal-size.ts");
        const colour = io.colour && options.output === undefined;
        await deliver(terminalSize(result, input.study, { width: io.width, colour }), options, [file], io);
      }
      if (!result.run.complete) end(exitCode.stopped);
    });
}
