import { CommanderError } from "commander";
import { StudyError } from "../errors.ts";
import { version } from "../version.ts";
import { exitCode, type Io, StoppedError, UsageError } from "./io.ts";
import { problemText } from "./problems.ts";
import { StudyTextError } from "./study-input.ts";

/** Says on standard error what went wrong, and gives the exit code that it means. */
export async function showFailure(error: unknown, io: Io): Promise<number> {
  if (error instanceof CommanderError) return error.exitCode === 0 ? exitCode.done : exitCode.usage;
  if (error instanceof StoppedError) return exitCode.stopped;
  if (error instanceof UsageError) {
    io.err(`toehold: ${error.message}\n`);
    return exitCode.usage;
  }
  if (error instanceof StudyTextError) {
    if (!(error.cause instanceof StudyError)) return showFailure(error.cause, io);
    io.err(problemText(await placed(error.cause, error), error.text));
    return exitCode.studyWrong;
  }
  if (error instanceof StudyError) {
    io.err(problemText(error, ""));
    return exitCode.studyWrong;
  }
  io.err(internalErrorText(error));
  return exitCode.internal;
}

/** What was found after reading gets the place in the file that reading would have given it. */
async function placed(cause: StudyError, { text, file }: StudyTextError): Promise<StudyError> {
  if (file === "") return cause;
  const { placeProblems } = await import("../study/place-problems.ts");
  return placeProblems(cause, text, file);
}

export function internalErrorText(cause: unknown): string {
  const detail = cause instanceof Error ? (cause.stack ?? cause.message) : String(cause);
  return `toehold ${version}: an internal error; nothing was written. This is a mistake of the program, not of the study. Please report it where toehold comes from, with the study and these lines:\n${detail}\n`;
}
