/** One wall at one set of values: forces, factors of safety, the whole calculation. */
import { cautions } from "./cautions.ts";
import { StudyError } from "./errors.ts";
import { mechanicsNotes } from "./mechanics/notes.ts";
import { readOut, sectionOf } from "./mechanics/read-out.ts";
import { calculationSheet } from "./mechanics/sheet.ts";
import { createWorkspace } from "./mechanics/workspace.ts";
import { buildModel, type Model } from "./model.ts";
import type { CheckResult } from "./results.ts";
import type { Study } from "./study/study.ts";

export interface GivenValues {
  /** Name to show: a file's name, "cautious", "design point of sliding". */
  readonly name: string;
  /** By path, in the units of the result file; paths left out stand at their means. */
  readonly values: Readonly<Record<string, number>>;
}

export interface CheckOptions {
  readonly at?: "mean" | GivenValues;
}

/**
 * @throws StudyError where a given path is not an uncertain value of the study
 */
export function check(study: Study, options: CheckOptions = {}): CheckResult {
  return checkModel(buildModel(study), options.at ?? "mean");
}

export function checkModel(model: Model, at: "mean" | GivenValues): CheckResult {
  const { study, kernel, space } = model;
  const given = at === "mean" ? {} : at.values;
  refuseStrangers(model, given);
  const values = Object.fromEntries(space.unknowns.map(({ path, marginal }) => [path, given[path] ?? marginal.mean]));
  const workspace = createWorkspace(kernel, 1);
  for (const input of kernel.inputs) {
    if (input.fixed !== undefined) continue;
    workspace.columns[input.slot][0] =
      input.scale * Math.min(Math.max(values[input.path], input.lowest), input.highest);
  }
  workspace.run(1);
  return {
    study: study.title,
    kind: "check",
    at: at === "mean" ? "mean" : at.name,
    values,
    ...readOut(kernel, workspace.columns),
    sheet: calculationSheet(kernel, workspace.columns),
    section: sectionOf(study, kernel, workspace.columns),
    warnings: [...study.notices, ...mechanicsNotes(study, kernel, workspace.columns)],
    cautions,
  };
}

function refuseStrangers(model: Model, given: Readonly<Record<string, number>>): void {
  const known = new Set(model.space.unknowns.map((unknown) => unknown.path));
  const problems = Object.keys(given)
    .filter((path) => !known.has(path))
    .map((path) => ({
      path,
      message: "is not an uncertain value of this study",
      hint: `uncertain here: ${[...known].join(", ")}`,
    }));
  if (problems.length > 0) throw new StudyError(problems, model.study.file);
}
