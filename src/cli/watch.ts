import { watch } from "node:fs";
import { basename, dirname, resolve } from "node:path";
import { type Io, UsageError } from "./io.ts";

/**
 * Runs once, and again whenever the file is saved, until the user stops it. What goes wrong in a run is shown and waited out: the next
 * save may mend it.
 *
 * Editors save by writing anew or by renaming over; so the folder is watched, and a burst of events is one save.
 */
export async function watchFile(
  file: string,
  io: Io,
  run: () => Promise<void>,
  showError: (error: unknown) => void,
): Promise<void> {
  if (file === "-") throw new UsageError("--watch needs a file, not standard input");
  const attempt = async (): Promise<void> => {
    try {
      await run();
    } catch (error) {
      showError(error);
    }
    io.err(`\nWatching ${file}; Ctrl-C ends it.\n`);
  };
  await attempt();
  const path = resolve(file);
  await new Promise<void>((done) => {
    let timer: NodeJS.Timeout | undefined;
    let running = false;
    let again = false;
    const start = async (): Promise<void> => {
      if (running) {
        again = true;
        return;
      }
      running = true;
      do {
        again = false;
        await attempt();
      } while (again);
      running = false;
    };
    const watcher = watch(dirname(path), (_, name) => {
      if (name !== null && name !== basename(path)) return;
      clearTimeout(timer);
      timer = setTimeout(() => void start(), 100);
    });
    const end = (): void => {
      clearTimeout(timer);
      watcher.close();
      done();
    };
    if (io.signal.aborted) end();
    else io.signal.addEventListener("abort", end, { once: true });
  });
}
