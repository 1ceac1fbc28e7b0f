/**
 * The public door.
 *
 *   const study = readStudy(text);
 *   check(study).limitStates.sliding?.factorOfSafety
 *   (await assess(study)).system.monteCarlo.probability
 *   (await scope(study)).bestOption                                            // where the study has a decision
 *   (await size(study, { vary: [{ path: "wall.base.heel", from: 2, to: 4 }] })).meetsTargetAt
 *   await report({ study, check: check(study), assess: await assess(study) }) // one HTML page
 *
 * Nothing here touches a file, a clock or the environment: all of it runs in a browser.
 */

export { type AssessOptions, assess, cautiousPoint } from "./assess.ts";
export { type CheckOptions, check, type GivenValues } from "./check.ts";
export { design } from "./design.ts";
export { type Problem, StudyError } from "./errors.ts";
export type { DesignCheck, DesignLimitState } from "./mechanics/design-check.ts";
export { type PartialFactors, readPartialFactors } from "./mechanics/partial-factors.ts";
export type { BlockTally, PictureTally, SamplingPlan, StateTally } from "./reliability/block-tally.ts";
export type { BlockRunner } from "./reliability/monte-carlo.ts";
export type { SamplingMethod } from "./reliability/sampling-estimate.ts";
export { htmlReport as report } from "./report/html-report.ts";
export { resultJson, resultTree } from "./report/result-json.ts";
export type { TerminalOptions } from "./report/terminal.ts";
export { terminalAssess } from "./report/terminal-assess.ts";
export { terminalCheck } from "./report/terminal-check.ts";
export { terminalScope } from "./report/terminal-scope.ts";
export { terminalSize } from "./report/terminal-size.ts";
export type * from "./results.ts";
export type * from "./results-decision.ts";
export type * from "./results-design.ts";
export type * from "./results-methods.ts";
export type * from "./results-size.ts";
export { type ScopeOptions, scope } from "./scope.ts";
export { type SizeOptions, size, type Vary } from "./size.ts";
export { type Json, studyJsonSchema } from "./study/json-schema.ts";
export type { NotAvailable } from "./study/not-available.ts";
export { type ReadOptions, readStudy, studyWith } from "./study/read-study.ts";
export type * from "./study/study.ts";
export { version } from "./version.ts";
