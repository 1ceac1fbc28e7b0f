/** One thing that is wrong with a study, placed where the reader can mend it. */
export interface Problem {
  /** As the user wrote it: `soils.fill.friction_angle`. Empty for the file as a whole. */
  readonly path: string;
  /** 1-based; absent when the study was built in code. */
  readonly at?: { readonly line: number; readonly column: number };
  /** What was found and what is allowed, with units. */
  readonly message: string;
  readonly hint?: string;
}

/** `file:line:column path: message` and, on a line of its own, the hint. Parts that are missing are left out. */
export function formatProblem(problem: Problem, file = ""): string {
  const place = [file, ...(problem.at ? [problem.at.line, problem.at.column] : [])]
    .filter((part) => part !== "")
    .join(":");
  const lead = [place, problem.path === "" ? "" : `${problem.path}:`].filter((part) => part !== "").join(" ");
  const hint = problem.hint === undefined ? "" : `\n  hint: ${problem.hint}`;
  return `${lead === "" ? "" : `${lead} `}${problem.message}${hint}`;
}

/** All that is wrong with a study, in the order of its lines. Thrown for things the reader of the message can fix. */
export class StudyError extends Error {
  readonly problems: readonly Problem[];
  readonly file: string;

  constructor(problems: readonly Problem[], file = "") {
    const sorted = [...problems].sort(
      (a, b) => (a.at?.line ?? 0) - (b.at?.line ?? 0) || (a.at?.column ?? 0) - (b.at?.column ?? 0),
    );
    super(sorted.map((problem) => formatProblem(problem, file)).join("\n"));
    this.name = "StudyError";
    this.problems = sorted;
    this.file = file;
  }
}
