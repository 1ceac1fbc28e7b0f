import { describe, expect, test } from "vitest";
import type { Io } from "../../src/cli/io.ts";
import { startProgress } from "../../src/cli/progress.ts";
import { type FakeIo, fakeIo } from "./fake-io.ts";

/** A terminal whose clock is set by hand. */
function terminal(options: Partial<Io> = {}): { io: FakeIo; at: (seconds: number) => void } {
  let now = 0;
  const io = fakeIo({ errIsTerminal: true, clock: () => now, ...options });
  Object.assign(io.errStream, { isTTY: true, columns: 100, cursorTo: () => true, moveCursor: () => true });
  return {
    io,
    at: (seconds) => {
      now = seconds;
    },
  };
}

describe("the progress bar", () => {
  test("shows on standard error once a run is long, and is cleared at the end", async () => {
    const { io, at } = terminal();
    const progress = await startProgress(io, false);
    progress.update(100, 1000);
    expect(io.written.bar).toBe("");
    at(0.6);
    progress.update(500, 1000);
    progress.update(700, 1000);
    progress.stop();
    expect(io.written.bar).toContain("50 % of at most 1000 samples");
    expect(io.written).toMatchObject({ out: "", err: "" });
  });

  test("is silent where standard error is no terminal, and with --quiet", async () => {
    for (const [options, quiet] of [
      [{ errIsTerminal: false }, false],
      [{}, true],
    ] as const) {
      const { io, at } = terminal(options);
      const progress = await startProgress(io, quiet);
      at(10);
      progress.update(500, 1000);
      progress.stop();
      expect(io.written.bar).toBe("");
    }
  });
});
