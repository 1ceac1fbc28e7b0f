import { mkdtempSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { Writable } from "node:stream";
import type { Io } from "../../src/cli/io.ts";
import { run } from "../../src/cli/main.ts";

export const root = new URL("../../", import.meta.url).pathname;
export const yard = join(root, "studies/two-soils-high-water/study.yaml");
export const usStudy = join(root, "studies/sloping-fill-us/study.yaml");
/** A short run of a fixed size. */
export const few = ["--samples", "20000", "--precision", "0"];

export const newFolder = (): string => mkdtempSync(join(tmpdir(), "toehold-"));

export interface FakeIo extends Io {
  readonly written: { out: string; err: string; bar: string };
}

/** Streams that keep what is written; no terminal unless said. */
export function fakeIo(options: Partial<Io> & { readonly input?: string } = {}): FakeIo {
  const written = { out: "", err: "", bar: "" };
  const { input = "", ...rest } = options;
  return {
    written,
    out: (text) => {
      written.out += text;
    },
    err: (text) => {
      written.err += text;
    },
    errIsTerminal: false,
    errStream: new Writable({
      write(chunk, _, done) {
        written.bar += chunk;
        done();
      },
    }),
    width: 100,
    colour: false,
    signal: new AbortController().signal,
    clock: () => performance.now() / 1000,
    readStandardInput: async () => input,
    ...rest,
  };
}

export interface Ran {
  readonly code: number;
  readonly out: string;
  readonly err: string;
}

/** Runs a command line in this process. */
export async function runWith(
  args: readonly string[],
  options: Partial<Io> & { readonly input?: string } = {},
): Promise<Ran> {
  const io = fakeIo(options);
  const code = await run(args, io);
  return { code, out: io.written.out, err: io.written.err };
}

/** The value at a path of keys in parsed JSON. Keys that hold dots are given in brackets of their own. */
export function valueIn(tree: unknown, ...keys: readonly string[]): unknown {
  return keys.reduce<unknown>((here, key) => (here as Record<string, unknown>)[key], tree);
}

export async function jsonOf(args: readonly string[], options: Parameters<typeof runWith>[1] = {}): Promise<unknown> {
  return JSON.parse((await runWith(args, options)).out);
}
