import { Command } from "commander";
import { version } from "../version.ts";
import { addAssess } from "./commands/assess.ts";
import { addCheck } from "./commands/check.ts";
import { addCompletion } from "./commands/completion.ts";
import { addNew } from "./commands/new.ts";
import { addReport } from "./commands/report.ts";
import { addSchema } from "./commands/schema.ts";
import { showFailure } from "./failure.ts";
import { exitCode, type Io } from "./io.ts";

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
    .configureOutput({
      writeOut: (text) => io.out(text),
      writeErr: (text) => io.err(text),
      getOutHelpWidth: () => io.width,
      getErrHelpWidth: () => io.width,
    })
    .showHelpAfterError("(add --help for the options)");
  addCheck(program, io);
  addAssess(program, io, end);
  addReport(program, io, end);
  addSchema(program, io);
  addCompletion(program, io);
  addNew(program, io);
  for (const command of program.commands) command.exitOverride().copyInheritedSettings(program);
  try {
    await program.parseAsync([...args], { from: "user" });
    return code;
  } catch (error) {
    return showFailure(error, io);
  }
}

/** The process as a command line: its streams, Ctrl-C, exit code. */
export async function main(): Promise<void> {
  const { stdout, stderr, stdin, env } = process;
  const stop = new AbortController();
  process.once("SIGINT", () => stop.abort());
  const noColour = env.NO_COLOR !== undefined && env.NO_COLOR !== "";
  const io: Io = {
    out: (text) => void stdout.write(text),
    err: (text) => void stderr.write(text),
    outIsTerminal: stdout.isTTY === true,
    errIsTerminal: stderr.isTTY === true,
    width: stdout.columns ?? 100,
    colour: stdout.isTTY === true && !noColour && env.TERM !== "dumb",
    signal: stop.signal,
    clock: () => performance.now() / 1000,
    async readStandardInput() {
      stdin.setEncoding("utf8");
      let text = "";
      for await (const part of stdin) text += part;
      return text;
    },
  };
  // A reader that closes early (`| head`) ends the output, not the program's good name.
  stdout.on("error", (error: NodeJS.ErrnoException) =>
    process.exit(error.code === "EPIPE" ? exitCode.done : exitCode.internal),
  );
  process.exitCode = await run(process.argv.slice(2), io);
}
