import { PassThrough } from "node:stream";
import { expect, test } from "vitest";
import { StoppedError } from "../../src/cli/io.ts";
import { type ProcessStreams, processIo } from "../../src/cli/process-io.ts";

interface Fake {
  readonly streams: ProcessStreams;
  readonly ends: number[];
}

function fakeProcess(options: { tty?: boolean; env?: NodeJS.ProcessEnv; columns?: number } = {}): Fake {
  const stream = (): PassThrough =>
    Object.assign(new PassThrough(), { isTTY: options.tty ?? false, columns: options.columns });
  const ends: number[] = [];
  const streams = {
    stdin: stream(),
    stdout: stream(),
    stderr: stream(),
    env: options.env ?? {},
    exit: (code: number) => ends.push(code),
  };
  return { streams: streams as unknown as ProcessStreams, ends };
}

const never = new AbortController().signal;

test.each([
  [{ tty: true }, true],
  [{ tty: false }, false],
  [{ tty: true, env: { NO_COLOR: "1" } }, false],
  [{ tty: true, env: { NO_COLOR: "" } }, true],
  [{ tty: true, env: { TERM: "dumb" } }, false],
])("colour with %j is %s", (options, colour) => {
  expect(processIo(fakeProcess(options).streams, never).colour).toBe(colour);
});

test.each([
  [undefined, 100],
  [0, 100],
  [72, 72],
])("a terminal that says %s columns is taken as %d wide", (columns, width) => {
  expect(processIo(fakeProcess(columns === undefined ? {} : { columns }).streams, never).width).toBe(width);
});

test("standard input is read to its end, also where a letter comes in two parts", async () => {
  const { streams } = fakeProcess();
  const text = processIo(streams, never).readStandardInput();
  const bytes = Buffer.from("title: Bänke");
  const cut = bytes.indexOf(0xc3) + 1; // between the two bytes of ä
  const stdin = streams.stdin as unknown as PassThrough;
  stdin.write(bytes.subarray(0, cut));
  await new Promise(setImmediate);
  stdin.end(bytes.subarray(cut));
  expect(await text).toBe("title: Bänke");
});

test("a reader that closes early ends the program without a complaint; another failure of the output is an internal error", () => {
  const { streams, ends } = fakeProcess();
  processIo(streams, never);
  streams.stdout.emit("error", Object.assign(new Error("closed"), { code: "EPIPE" }));
  streams.stdout.emit("error", Object.assign(new Error("broken"), { code: "EIO" }));
  expect(ends).toEqual([0, 3]);
});

test("questions are asked on a terminal alone, on standard error, and answered by a line", async () => {
  expect(processIo(fakeProcess().streams, never).ask).toBeUndefined();
  const { streams } = fakeProcess({ tty: true });
  const answer = processIo(streams, never).ask?.("Height? ");
  (streams.stdin as unknown as PassThrough).write("4.5\n");
  expect(await answer).toBe("4.5");
  expect(String((streams.stderr as unknown as PassThrough).read())).toContain("Height? ");
  expect((streams.stdout as unknown as PassThrough).read()).toBeNull();
});

test("a question ends with the end of the input, and with Ctrl-C", async () => {
  const closed = fakeProcess({ tty: true });
  const ended = processIo(closed.streams, never).ask?.("Height? ");
  setImmediate(() => (closed.streams.stdin as unknown as PassThrough).end());
  await expect(ended).rejects.toThrow(StoppedError);
  const stop = new AbortController();
  const stopped = processIo(fakeProcess({ tty: true }).streams, stop.signal).ask?.("Height? ");
  setImmediate(() => stop.abort());
  await expect(stopped).rejects.toThrow(StoppedError);
});
