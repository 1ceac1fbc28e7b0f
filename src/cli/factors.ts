import type { Command } from "commander";
import type { PartialFactors } from "../mechanics/partial-factors.ts";
import type { CheckResult } from "../results.ts";
import type { Study } from "../study/study.ts";
import { readInput } from "./files.ts";
import type { Io } from "./io.ts";
import { withText } from "./study-input.ts";

export interface FactorOptions {
  readonly factors?: string;
}

export function addFactorsOption(command: Command): Command {
  return command.option(
    "--factors <file>",
    "partial factors of your own, in YAML: a check with them beside the plain one",
  );
}

/** Reads the file once; each check it is then given gets its design beside it. */
export async function factorsFrom(
  file: string | undefined,
  io: Io,
): Promise<(study: Study, plain: CheckResult) => CheckResult> {
  if (file === undefined) return (_, plain) => plain;
  const text = await readInput(file, io);
  const { readPartialFactors } = await import("../mechanics/partial-factors.ts");
  const { design } = await import("../design.ts");
  const factors: PartialFactors = withText(text, () => readPartialFactors(text, file));
  return (study, plain) => ({ ...plain, design: design(study, plain, factors, file) });
}
