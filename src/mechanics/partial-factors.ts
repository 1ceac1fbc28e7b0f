/** Partial factors: the user's own numbers, read from a file. No code's set is built in; whatever is left out is 1. */
import { StudyError } from "../errors.ts";
import { collectFindings, type Findings } from "../study/findings.ts";
import { isRecord } from "../study/paths.ts";
import { shown } from "../study/structure.ts";
import { didYouMean } from "../study/suggest.ts";
import { readTree, textPlaces } from "../study/yaml-tree.ts";

export interface PartialFactors {
  /** Multiply forces. A favourable variable action is left out, as is common practice. */
  readonly actions: {
    readonly permanentUnfavourable: number;
    readonly permanentFavourable: number;
    readonly variable: number;
  };
  /** Divide strengths, and the unit weight of soils. */
  readonly strength: {
    /** Of tan φ. */
    readonly tanFrictionAngle: number;
    readonly cohesion: number;
    readonly undrainedStrength: number;
    readonly unitWeight: number;
  };
  /** Divide resistances. */
  readonly resistance: { readonly sliding: number; readonly bearing: number; readonly passive: number };
}

export const unfactored: PartialFactors = {
  actions: { permanentUnfavourable: 1, permanentFavourable: 1, variable: 1 },
  strength: { tanFrictionAngle: 1, cohesion: 1, undrainedStrength: 1, unitWeight: 1 },
  resistance: { sliding: 1, bearing: 1, passive: 1 },
};

/** Keys of the file by group; a factor that divides may not be 0. */
const groups: Readonly<Record<string, { readonly keys: readonly string[]; readonly lowest: number }>> = {
  actions: { keys: ["permanent_unfavourable", "permanent_favourable", "variable"], lowest: 0 },
  strength: { keys: ["tan_friction_angle", "cohesion", "undrained_strength", "unit_weight"], lowest: 0.1 },
  resistance: { keys: ["sliding", "bearing", "passive"], lowest: 0.1 },
};
const highest = 10;

/**
 * A file of partial factors:
 *
 *   actions: { permanent_unfavourable: 1.35, permanent_favourable: 1, variable: 1.5 }
 *   strength: { tan_friction_angle: 1.25 }
 *   resistance: { sliding: 1.1 }
 *
 * Action factors lie between 0 and 10, the others between 0.1 and 10.
 *
 * @throws StudyError with every problem found
 */
export function readPartialFactors(text: string, file = ""): PartialFactors {
  const at = textPlaces(text);
  const findings = collectFindings(at.places);
  const tree = readTree(text, at, findings);
  const given: Record<string, number> = {};
  if (isRecord(tree)) readGroups(tree, given, findings);
  else if (findings.problems.length === 0 && tree !== null)
    findings.problem(
      "",
      `found ${shown(tree)}; groups of factors are needed`,
      `known here: ${Object.keys(groups).join(", ")}`,
    );
  if (findings.problems.length > 0) throw new StudyError(findings.problems, file);
  const of = (path: string): number => given[path] ?? 1;
  return {
    actions: {
      permanentUnfavourable: of("actions.permanent_unfavourable"),
      permanentFavourable: of("actions.permanent_favourable"),
      variable: of("actions.variable"),
    },
    strength: {
      tanFrictionAngle: of("strength.tan_friction_angle"),
      cohesion: of("strength.cohesion"),
      undrainedStrength: of("strength.undrained_strength"),
      unitWeight: of("strength.unit_weight"),
    },
    resistance: {
      sliding: of("resistance.sliding"),
      bearing: of("resistance.bearing"),
      passive: of("resistance.passive"),
    },
  };
}

function readGroups(tree: Record<string, unknown>, given: Record<string, number>, findings: Findings): void {
  const names = Object.keys(groups);
  for (const [name, group] of Object.entries(tree)) {
    if (!Object.hasOwn(groups, name)) unknownKey(name, name, names, findings);
    else if (isRecord(group)) readGroup(name, group, given, findings);
    else if (group !== null)
      findings.problem(
        name,
        `found ${shown(group)}; a group of factors is needed`,
        `known here: ${groups[name].keys.join(", ")}`,
      );
  }
}

function readGroup(
  name: string,
  group: Record<string, unknown>,
  given: Record<string, number>,
  findings: Findings,
): void {
  const { keys, lowest } = groups[name];
  for (const [key, value] of Object.entries(group)) {
    const path = `${name}.${key}`;
    if (!keys.includes(key)) unknownKey(path, key, keys, findings);
    else if (typeof value !== "number") findings.problem(path, `found ${shown(value)}; a number is needed`);
    else if (!(value >= lowest && value <= highest))
      findings.problem(path, `${value} is outside ${lowest} to ${highest}`);
    else given[path] = value;
  }
}

function unknownKey(path: string, key: string, known: readonly string[], findings: Findings): void {
  findings.keyProblem(path, `unknown key "${key}"`, didYouMean(key, known, `known here: ${known.join(", ")}`));
}
