import { CommanderError } from "commander";
import { StudyError } from "../errors.ts";
import { placeProblems } from "../study/place-problems.ts";
import { version } from "../version.ts";
import { exitCode, type Io, UsageError } from "./io.ts";
import { problemText } from "./problems.ts";
import { StudyTextError } from "./study-input.ts";

/** Says on standard error what went wrong, and gives the exit code that it means. */
export function showFailure(error: unknown, io: Io): number {
  if (error instanceof CommanderError) return error.exitCode === 0 ? exitCode.done : exitCode.usage;
  if (error instanceof UsageError) {
    io.err(`toehold: ${error.message}\n`);
    return exitCode.usage;
  }
  const cause = error instanceof StudyTextError ? error.cause : error;
  if (cause instanceof StudyError) {
    const placed = error instanceof StudyTextError ? placeProblems(cause, error.text, error.file) : cause;
    io.err(problemText(placed, error instanceof StudyTextError ? error.text : ""));
    return exitCode.studyWrong;
  }
  if (cause instanceof UsageError) return showFailure(cause, io);
  const detail = cause instanceof Error ? (cause.stack ?? cause.message) : String(cause);
  io.err(
    `toehold ${version}: an internal error; nothing was written. Please report it with the study and these lines:\n${detail}\n`,
  );
  return exitCode.internal;
}
