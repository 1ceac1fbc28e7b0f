import { exitCode, type Io, StoppedError } from "./io.ts";

/** What `Io` takes from a process. */
export type ProcessStreams = Pick<NodeJS.Process, "stdin" | "stdout" | "stderr" | "env" | "exit">;

/** The streams of a process, as a command sees them. Colour: on a terminal alone, and not where NO_COLOR is set. */
export function processIo({ stdin, stdout, stderr, env, exit }: ProcessStreams, signal: AbortSignal): Io {
  const noColour = (env.NO_COLOR ?? "") !== "" || env.TERM === "dumb";
  // A reader that closes early (`| head`) ends the output, not the program's good name.
  stdout.on("error", (error: NodeJS.ErrnoException) =>
    exit(error.code === "EPIPE" ? exitCode.done : exitCode.internal),
  );
  return {
    out: (text) => void stdout.write(text),
    err: (text) => void stderr.write(text),
    errIsTerminal: stderr.isTTY === true,
    errStream: stderr,
    width: stdout.columns || 100,
    colour: stdout.isTTY === true && !noColour,
    signal,
    clock: () => performance.now() / 1000,
    async readStandardInput() {
      stdin.setEncoding("utf8");
      let text = "";
      for await (const part of stdin) text += part;
      return text;
    },
    ...(stdin.isTTY && stderr.isTTY ? { ask: (question) => ask(question, stdin, stderr, signal) } : {}),
  };
}

async function ask(
  question: string,
  input: NodeJS.ReadableStream,
  output: NodeJS.WritableStream,
  signal: AbortSignal,
): Promise<string> {
  const { createInterface } = await import("node:readline");
  const lines = createInterface({ input, output });
  try {
    return await new Promise((resolve, reject) => {
      const stopped = (): void => reject(new StoppedError("ended by the user"));
      lines.once("close", stopped);
      lines.once("SIGINT", stopped);
      signal.addEventListener("abort", stopped, { once: true });
      lines.question(question, resolve);
    });
  } finally {
    lines.close();
  }
}
