import { type Io, writeOutput } from "./io.ts";
import type { CommonOptions } from "./study-input.ts";

/** Sends a result where it was asked for: a file with -o, standard output otherwise. */
export async function deliver(text: string, options: CommonOptions, study: string, io: Io): Promise<void> {
  if (options.output === undefined) {
    io.out(text.endsWith("\n") ? text : `${text}\n`);
    return;
  }
  await writeOutput(options.output, text, [study]);
  if (!options.quiet && !options.json) io.out(`Written to ${options.output}.\n`);
}
