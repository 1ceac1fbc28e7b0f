import type { Io } from "./io.ts";

export interface Progress {
  update(done: number, of: number): void;
  stop(): void;
}

const silent: Progress = { update: () => undefined, stop: () => undefined };

/** A run shorter than this, s, shows no bar. */
const patience = 0.5;

/** A bar on standard error, on a terminal alone, and only once a run turns out to be long. */
export async function startProgress(io: Io, quiet: boolean): Promise<Progress> {
  if (quiet || !io.errIsTerminal) return silent;
  const { default: cliProgress } = await import("cli-progress");
  const bar = new cliProgress.SingleBar(
    {
      format: "Sampling {bar} {percentage} % of at most {total} samples",
      barsize: Math.max(10, Math.min(40, io.width - 50)),
      stream: io.errStream,
      clearOnComplete: true,
      hideCursor: true,
    },
    cliProgress.Presets.rect,
  );
  const start = io.clock();
  let shown = false;
  return {
    update(done, of) {
      if (!shown && io.clock() - start < patience) return;
      if (shown) bar.update(done);
      else bar.start(of, done);
      shown = true;
    },
    stop() {
      if (shown) bar.stop();
    },
  };
}
