import { formatProblem, type StudyError } from "../errors.ts";
import { withoutControls } from "./io.ts";

/** All problems of a study, each with the line of the file and a caret under the place. */
export function problemText(error: StudyError, text: string): string {
  const lines = text.split(/\r\n|\r|\n/);
  const blocks = error.problems.map((problem) => {
    const [first, ...rest] = formatProblem(problem, error.file).split("\n");
    const source = problem.at === undefined ? undefined : lines[problem.at.line - 1];
    if (problem.at === undefined || source === undefined) return [first, ...rest].join("\n");
    return [first, ...sourceLines(source, problem.at.line, problem.at.column), ...rest].join("\n");
  });
  const count = error.problems.length;
  return withoutControls(
    `${blocks.join("\n\n")}\n\n${count} problem${count === 1 ? "" : "s"} in the study; nothing was computed and nothing was written.\n`,
  );
}

/** The line and a caret below it; of a very long line what is around the place. */
function sourceLines(source: string, line: number, column: number): string[] {
  const number = String(line);
  const start = column > 80 ? column - 60 : 0;
  const shown = source.slice(start, start + 100).replace(/\t/g, " ");
  return [`  ${number} | ${shown}`, `  ${" ".repeat(number.length)} | ${" ".repeat(Math.max(0, column - 1 - start))}^`];
}
