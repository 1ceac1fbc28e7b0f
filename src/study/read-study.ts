/** Text or tree of a study -> `Study`, or a `StudyError` with everything that is wrong. */
import { StudyError } from "../errors.ts";
import { buildStudy, treeReader } from "./build-study.ts";
import type { TryChange } from "./check-decision.ts";
import { crossCheck } from "./cross-checks.ts";
import { collectFindings, type Findings, type Places, withoutEchoes } from "./findings.ts";
import { type NotAvailable, notAvailable, refuseNotAvailable } from "./not-available.ts";
import { withValueAt } from "./paths.ts";
import { plainTree } from "./plain-tree.ts";
import { studySchema } from "./schema.ts";
import { checkStructure, withoutEmpty } from "./structure.ts";
import type { Study } from "./study.ts";
import { readTree, textPlaces } from "./yaml-tree.ts";

export interface ReadOptions {
  /** Name of the file, for messages. */
  readonly file?: string;
  /** Values to set before reading, by path; a text is read as YAML, as on a command line. */
  readonly set?: readonly (readonly [path: string, value: unknown])[];
  /** What is answered with "not available in this version"; the list of this version where left out. */
  readonly notAvailable?: readonly NotAvailable[];
}

const nowhere: Places = () => undefined;

/**
 * @param text YAML 1.2 or JSON, at most 1 MB
 * @throws StudyError with every problem found: line, column, path, what was found, what is allowed, a hint
 */
export function readStudy(text: string, options: ReadOptions = {}): Study {
  const at = textPlaces(text);
  const findings = collectFindings(at.places);
  const tree = readTree(text, at, findings);
  if (findings.problems.length > 0) throw new StudyError(findings.problems, options.file);
  return readSound(tree, at.places, options);
}

/** As `readStudy`, from a tree that is already parsed (plain objects, lists, numbers, texts). */
export function readDocument(document: unknown, options: ReadOptions = {}): Study {
  const findings = collectFindings(nowhere);
  const tree = plainTree(document, findings);
  if (findings.problems.length > 0) throw new StudyError(findings.problems, options.file);
  return readSound(tree, nowhere, options);
}

/**
 * The study with some of its paths set to other values, read anew. Values are as in the file: numbers in the study's own
 * units, texts with a unit, or distributions.
 *
 * @throws StudyError where the changed study is wrong
 */
export function studyWith(
  study: Study,
  changes: Readonly<Record<string, unknown>>,
  options: Pick<ReadOptions, "notAvailable"> = {},
): Study {
  return changedStudy(study.document, changes, { ...options, file: study.file });
}

function changedStudy(document: unknown, changes: Readonly<Record<string, unknown>>, options: ReadOptions): Study {
  const findings = collectFindings(nowhere);
  const values = plainTree(changes, findings) as Record<string, unknown>;
  const tree = setAll(document, Object.entries(values), findings);
  if (findings.problems.length > 0) throw new StudyError(findings.problems, options.file);
  return readSound(tree, nowhere, options, true);
}

function readSound(tree: unknown, places: Places, options: ReadOptions, changed = false): Study {
  const set = options.set ?? [];
  const findings = collectFindings(
    set.length === 0
      ? places
      : placesWithout(
          set.map(([path]) => path),
          places,
        ),
  );
  const document = setAll(tree, parsedValues(set, findings), findings);
  const clean = withoutEmpty(document, studySchema);
  checkStructure(studySchema, clean, "", findings);
  const list = options.notAvailable ?? notAvailable;
  refuseNotAvailable(clean, list, findings);
  const reader = treeReader(clean, findings);
  const tryChange: TryChange = (changes) =>
    changedStudy(document, changes, { ...options, set: [], notAvailable: list });
  const study = crossCheck(
    buildStudy(reader, options.file ?? "", document),
    reader,
    changed || set.length > 0,
    tryChange,
  );
  if (findings.problems.length > 0) throw new StudyError(withoutEchoes(findings.problems), options.file);
  return study;
}

function setAll(tree: unknown, values: readonly (readonly [string, unknown])[], findings: Findings): unknown {
  let here = tree;
  for (const [path, value] of values) {
    const result = withValueAt(here, path, value);
    if ("message" in result) findings.problem(path, result.message);
    else here = result.tree;
  }
  return here;
}

/** Texts as YAML: `2.5`, `2.5 m`, `{ uniform: { from: 0, to: 1 } }`. What cannot be read is left out, with a problem. */
function parsedValues(
  set: readonly (readonly [string, unknown])[],
  findings: Findings,
): (readonly [string, unknown])[] {
  return set.flatMap(([path, value]) => {
    const inside = collectFindings(nowhere);
    const parsed = typeof value === "string" ? readTree(value, textPlaces(value), inside) : plainTree(value, inside);
    const found = typeof value === "string" ? `"${value}" ` : "";
    for (const problem of inside.problems) findings.problem(path, `${found}${problem.message}`, problem.hint);
    return inside.problems.length > 0 ? [] : [[path, parsed] as const];
  });
}

/** What was set from outside, and the parents made for it, stand nowhere in the file. */
function placesWithout(set: readonly string[], places: Places): Places {
  return (path, part) => {
    if (set.some((one) => path === one || path.startsWith(`${one}.`))) return null;
    return places(path, part) ?? (set.some((one) => one.startsWith(`${path}.`)) ? null : undefined);
  };
}
