import { StudyError } from "../errors.ts";
import { collectFindings } from "./findings.ts";
import { readTree, textPlaces } from "./yaml-tree.ts";

/**
 * Gives problems that were found after reading (correlations without a joint distribution, say) the file, and the place in the text
 * that reading would have given them.
 */
export function placeProblems(error: StudyError, text: string, file: string): StudyError {
  if (error.problems.every((problem) => problem.at !== undefined) && error.file !== "") return error;
  const at = textPlaces(text);
  readTree(text, at, collectFindings(at.places));
  const findings = collectFindings(at.places);
  for (const { at: place, path, message, hint } of error.problems) {
    if (place === undefined) findings.problem(path, message, hint);
    else findings.placedProblem(place, path, message, hint);
  }
  return new StudyError(findings.problems, error.file === "" ? file : error.file);
}
