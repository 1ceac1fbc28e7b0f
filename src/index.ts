/**
 * The public door.
 *
 *   const study = readStudy(text);
 *   check(study).limitStates.sliding?.factorOfSafety
 *   (await assess(study)).system.monteCarlo.probability
 *   await report({ study, check: check(study), assess: await assess(study) }) // one HTML page
 */

export { type AssessOptions, assess, cautiousPoint } from "./assess.ts";
// computing
export { type CheckOptions, check, type GivenValues } from "./check.ts";
export { type Problem, StudyError } from "./errors.ts";
// showing
export { htmlReport as report } from "./report/html-report.ts";
export { resultJson, resultTree } from "./report/result-json.ts";
export { terminalAssess } from "./report/terminal-assess.ts";
export { terminalCheck } from "./report/terminal-check.ts";
export type * from "./results.ts";
export type * from "./results-methods.ts";
export { studyJsonSchema } from "./study/json-schema.ts";
// reading
export { readStudy, studyWith } from "./study/read-study.ts";
export type * from "./study/study.ts";
export { version } from "./version.ts";
