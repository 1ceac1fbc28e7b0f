/** A file of values at which a wall is looked at: one `path: value` a line. */
import { StudyError } from "../errors.ts";
import { fieldOfPath } from "./fields.ts";
import { collectFindings } from "./findings.ts";
import { isRecord } from "./paths.ts";
import { quantitiesOf } from "./quantities.ts";
import { readValue } from "./read-number.ts";
import { shown } from "./structure.ts";
import type { Study } from "./study.ts";
import { didYouMean } from "./suggest.ts";
import { readTree, textPlaces } from "./yaml-tree.ts";

/**
 * House values by path, of uncertain values of the study. Plain numbers are in the study's own units; a value may bring its
 * unit, as in a study.
 *
 * @throws StudyError with every problem found
 */
export function readValues(text: string, study: Study, file = ""): Readonly<Record<string, number>> {
  const at = textPlaces(text);
  const findings = collectFindings(at.places);
  const tree = readTree(text, at, findings);
  const values: Record<string, number> = {};
  if (isRecord(tree)) {
    const uncertain = quantitiesOf(study).filter(({ quantity }) => typeof quantity !== "number");
    const paths = uncertain.map(({ path }) => path);
    for (const [path, raw] of Object.entries(tree)) {
      if (!paths.includes(path)) {
        findings.keyProblem(
          path,
          "is not an uncertain value of this study",
          didYouMean(path, paths, `uncertain here: ${paths.join(", ")}`),
        );
      } else {
        values[path] = readValue(raw, path, fieldOfPath(path)!, { units: study.units, findings });
      }
    }
  } else if (findings.problems.length === 0 && tree !== null) {
    findings.problem(
      "",
      `found ${shown(tree)}; lines of path: value are needed`,
      "for example soils.sand.friction_angle: 31",
    );
  }
  if (findings.problems.length > 0) throw new StudyError(findings.problems, file);
  return values;
}
