import { formatProblem, type StudyError } from "../errors.ts";

/** All problems of a study, each with the line of the file and a caret under the place. */
export function problemText(error: StudyError, text: string): string {
  const lines = text.split(/\r?\n/);
  const blocks = error.problems.map((problem) => {
    const [first, ...rest] = formatProblem(problem, error.file).split("\n");
    const source = problem.at === undefined ? undefined : lines[problem.at.line - 1];
    if (problem.at === undefined || source === undefined) return [first, ...rest].join("\n");
    const { line, column } = problem.at;
    const number = String(line);
    // A very long line is shown around the place alone.
    const start = column > 80 ? column - 60 : 0;
    const shown = source.slice(start, start + 100).replace(/\t/g, " ");
    const caret = `${" ".repeat(number.length)} | ${" ".repeat(Math.max(0, column - 1 - start))}^`;
    return [first, `  ${number} | ${shown}`, `  ${caret}`, ...rest].join("\n");
  });
  const count = error.problems.length;
  return `${blocks.join("\n\n")}\n\n${count} problem${count === 1 ? "" : "s"} in the study; nothing was computed and nothing was written.\n`;
}
