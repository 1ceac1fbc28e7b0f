import { writeOutput } from "./files.ts";
import { type Io, withoutControls } from "./io.ts";
import type { CommonOptions } from "./study-input.ts";

/** Sends a result where it was asked for: to a file with -o FILE, to standard output otherwise or with -o -. */
export async function deliver(
  text: string,
  options: Pick<CommonOptions, "output" | "quiet" | "json">,
  inputs: readonly string[],
  io: Io,
): Promise<void> {
  const ended = text.endsWith("\n") ? text : `${text}\n`;
  const whole = options.json ? ended : withoutControls(ended, io.colour && options.output === undefined);
  if (options.output === undefined || options.output === "-") {
    io.out(whole);
    return;
  }
  await writeOutput(options.output, whole, inputs);
  if (!options.quiet && !options.json) io.out(`Written to ${options.output}.\n`);
}
