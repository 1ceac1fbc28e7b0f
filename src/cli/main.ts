import { Command } from "commander";
import { version } from "../version.ts";
import type { AddCommand } from "./command.ts";
import { addAssess } from "./commands/assess.ts";
import { addCheck } from "./commands/check.ts";
import { addCompletion } from "./commands/completion.ts";
import { addNew } from "./commands/new.ts";
import { addReport } from "./commands/report.ts";
import { addSchema } from "./commands/schema.ts";
import { addScope } from "./commands/scope.ts";
import { addSize } from "./commands/size.ts";
import { internalErrorText, showFailure } from "./failure.ts";
import { exitCode, type Io } from "./io.ts";
import { processIo } from "./process-io.ts";

/** In the order of the help; a new command is one line here and one file beside the others. */
const commands: readonly AddCommand[] = [
  addCheck,
  addAssess,
  addScope,
  addSize,
  addReport,
  addSchema,
  addNew,
  addCompletion,
];

/** Runs one command line and returns its exit code. Nothing here ends the process. */
export async function run(args: readonly string[], io: Io): Promise<number> {
  let code: number = exitCode.done;
  const end = (ended: number): void => {
    code = ended;
  };
  const program = new Command("toehold");
  program
    .description(
      "How likely a cantilever or gravity retaining wall is to slide, overturn or overload its base, and what drives it.",
    )
    .version(version)
    .exitOverride()
    .configureHelp({ minWidthToWrap: 20 })
    .configureOutput({
      writeOut: (text) => io.out(text),
      writeErr: (text) => io.err(text),
      getOutHelpWidth: () => io.width,
      getErrHelpWidth: () => io.width,
    })
    .showHelpAfterError("(add --help for the options)")
    .addHelpText(
      "after",
      "\nStart here:\n  toehold new my-wall\n  toehold assess my-wall/study.yaml\n  toehold report my-wall/study.yaml -o my-wall.html",
    );
  for (const add of commands) add(program, io, end);
  for (const command of program.commands) command.copyInheritedSettings(program);
  try {
    await program.parseAsync([...args], { from: "user" });
    return code;
  } catch (error) {
    return showFailure(error, io);
  }
}

/** The process as a command line: its streams, Ctrl-C, exit code. */
export async function main(): Promise<void> {
  const stop = new AbortController();
  // The first Ctrl-C asks the run to stop and show what it has; a second one ends the process at once.
  process.once("SIGINT", () => stop.abort());
  const io = processIo(process, stop.signal);
  process.once("uncaughtException", (error) => {
    io.err(internalErrorText(error));
    process.exit(exitCode.internal);
  });
  process.exitCode = await run(process.argv.slice(2), io);
}
