import type { Io } from "../../src/cli/io.ts";
import { run } from "../../src/cli/main.ts";

export interface Ran {
  readonly code: number;
  readonly out: string;
  readonly err: string;
}

/** Runs a command line in this process, with streams that keep what is written. */
export async function runWith(
  args: readonly string[],
  options: Partial<Io> & { readonly input?: string } = {},
): Promise<Ran> {
  let [out, err] = ["", ""];
  const io: Io = {
    out: (text) => {
      out += text;
    },
    err: (text) => {
      err += text;
    },
    outIsTerminal: false,
    errIsTerminal: false,
    width: 100,
    colour: false,
    signal: new AbortController().signal,
    clock: () => performance.now() / 1000,
    readStandardInput: async () => options.input ?? "",
    ...options,
  };
  const code = await run(args, io);
  return { code, out, err };
}
