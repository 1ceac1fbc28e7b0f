import { setTimeout as sleep } from "node:timers/promises";
import { StudyError } from "../errors.ts";
import type { Outcome } from "../report/terminal-compare.ts";
import type { AssessResult, CheckResult } from "../results.ts";
import { showFailure } from "./failure.ts";
import { readInput } from "./files.ts";
import { type Io, UsageError, withoutControls } from "./io.ts";
import { type Setting, StudyTextError } from "./study-input.ts";
import type { Job } from "./study-job.ts";

/** Time between two looks at the files, ms. Looking finds a save whichever way an editor or a network drive makes it. */
const pause = 200;

export interface Watched<R extends CheckResult | AssessResult> {
  readonly job: Job<R>;
  readonly file: string;
  readonly set: readonly Setting[];
  /** All files that the result rests on. */
  readonly inputs: readonly string[];
}

/** Shows the result, then what changed at every save, until the signal is aborted. A wrong study is shown and waited out. */
export async function watchStudy<R extends CheckResult | AssessResult>(watched: Watched<R>, io: Io): Promise<void> {
  const { job, file, set, inputs } = watched;
  let last: Outcome<R> | undefined;
  let seen: string | undefined;
  while (!io.signal.aborted) {
    const now = await textsOf(inputs, io, seen === undefined);
    if (now === undefined || now === seen) {
      await sleep(pause, undefined, { signal: io.signal }).catch(() => undefined);
      continue;
    }
    const first = seen === undefined;
    seen = now;
    try {
      const outcome = await job.compute(file, set);
      io.out(withoutControls(await shown(job, last, outcome, io), io.colour));
      last = outcome;
    } catch (error) {
      if (!canBeMended(error, first)) throw error;
      await showFailure(error, io);
    }
    if (!io.signal.aborted) io.out(`\nWatching ${inputs.join(", ")}; Ctrl-C ends it.\n`);
  }
}

/** Everything that the result rests on; nothing while an editor has a file away or empty. */
async function textsOf(inputs: readonly string[], io: Io, first: boolean): Promise<string | undefined> {
  try {
    const texts = await Promise.all(inputs.map((input) => readInput(input, io)));
    return !first && texts.includes("") ? undefined : texts.join("\u0000");
  } catch (error) {
    if (first) throw error;
    return undefined;
  }
}

async function shown<R extends CheckResult | AssessResult>(
  job: Job<R>,
  last: Outcome<R> | undefined,
  outcome: Outcome<R>,
  io: Io,
): Promise<string> {
  if (last === undefined) return job.text(outcome, io.colour);
  const { terminalCompare } = await import("../report/terminal-compare.ts");
  return `\n${terminalCompare(last, outcome, { names: ["before", "now"], width: io.width, colour: io.colour })}`;
}

/** Whether the next save may mend it: a wrong study always, wrong usage not at the start. */
function canBeMended(error: unknown, first: boolean): boolean {
  const cause = error instanceof StudyTextError ? error.cause : error;
  return cause instanceof StudyError || (cause instanceof UsageError && !first);
}
