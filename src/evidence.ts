/** What has been seen on site: prior and posterior of every variable and of the probability, and conflicts between them. */
import { conflictChance } from "./decision/evidence-conflicts.ts";
import { type EvidenceOutcome, evidenceOutcome } from "./decision/evidence-outcome.ts";
import { type DecisionModel, decisionModel } from "./decision-model.ts";
import type { EvidenceConflict, EvidenceResult } from "./results-decision.ts";
import { quantitiesOf } from "./study/quantities.ts";
import type { Notice, Study } from "./study/study.ts";
import { displayUnit } from "./study/units.ts";

export interface EvidenceOptions {
  /** In place of the study's own. */
  readonly seed?: string;
  readonly samples?: number;
}

const defaultSamples = 65_536;

/**
 * @returns undefined where the study has no evidence
 * @throws StudyError where correlations or shares of knowledge have no joint distribution
 */
export function evidence(
  study: Study,
  options: EvidenceOptions = {},
  model: DecisionModel = decisionModel({ ...study, decision: undefined }),
): EvidenceResult | undefined {
  if (study.evidence.length === 0) return undefined;
  const outcome = evidenceOutcome(model.problem, model.results, {
    seed: options.seed ?? study.assessment.seed,
    samples: options.samples ?? defaultSamples,
  });
  const labels = labelsOf(study);
  return {
    priorProbability: outcome.priorProbability.value,
    priorStandardError: outcome.priorProbability.standardError,
    probability: outcome.probability.value,
    standardError: outcome.probability.standardError,
    chanceOfEvidence: outcome.chanceOfSurvival?.value ?? null,
    variables: outcome.variables.map((variable) => ({ ...variable, ...labels(variable.path) })),
    conflicts: conflictsOf(outcome, labels),
  };
}

/** Words and unit of a path. */
export function labelsOf(study: Study): (path: string) => { label: string; unit: string } {
  const entries = new Map(quantitiesOf(study).map((entry) => [entry.path, entry]));
  return (path) => {
    const entry = entries.get(path);
    if (entry === undefined) return { label: path, unit: "–" };
    return { label: entry.label, unit: displayUnit(entry.field.dimension, "metric").unit };
  };
}

function conflictsOf(outcome: EvidenceOutcome, labels: (path: string) => { label: string }): EvidenceConflict[] {
  const { surprises, variables, chanceOfSurvival } = outcome;
  const found = surprises
    .filter(({ chance }) => chance < conflictChance)
    .map(({ variables: places, chance }): EvidenceConflict => {
      const paths = places.map((v) => variables[v].path);
      const names = paths.map((path) => labels(path).label).join(", ");
      return {
        paths,
        chance,
        message:
          places.length === 1
            ? `these results conflict with what is believed of ${names}: the beliefs give results as far out a chance of ${chance.toExponential(1)}`
            : `taken together, the results on ${names} conflict with the beliefs and their correlations: a chance of ${chance.toExponential(1)}`,
      };
    });
  if (chanceOfSurvival === undefined || !(chanceOfSurvival.value < conflictChance)) return found;
  const moved = [...variables].sort((a, b) => movedBy(b) - movedBy(a)).slice(0, 2);
  const names = moved.map(({ path }) => labels(path).label).join(" and ");
  return [
    ...found,
    {
      paths: [],
      chance: chanceOfSurvival.value,
      message: `the beliefs give the wall a chance of only ${chanceOfSurvival.value.toExponential(1)} of surviving what it has survived; this conflicts most with what is believed of ${names}`,
    },
  ];
}

function movedBy({ prior, posterior }: EvidenceOutcome["variables"][number]): number {
  return Math.abs(posterior.mean - prior.mean) / prior.sd;
}

/** What the reader of a study with evidence should know. */
export function evidenceNotes(study: Study, result: EvidenceResult): readonly Notice[] {
  const notes: Notice[] = result.conflicts.map(({ message, paths }) => ({ path: paths[0] ?? "evidence", message }));
  const survived = study.evidence.some((entry) => entry.kind === "survived");
  const { factors } = study.model;
  const certain = [factors.earthThrust, factors.baseResistance, factors.bearingCapacity].every(
    (value) => typeof value === "number",
  );
  const left = [
    ...(certain ? ["model uncertainty"] : []),
    ...(study.ground.front.mobilised === 0 ? ["passive resistance"] : []),
  ];
  if (survived && left.length > 0)
    notes.push({
      path: "evidence",
      message: `the study leaves out ${left.join(" and ")}; what the wall has survived is then credited to the strength of the ground`,
    });
  return notes;
}
