/** Tests to look at where a study lists no investigation: one kind for every variable that can be learned on site. */
import type { LearningBasis } from "./decision/investigation.ts";
import { testsCurve } from "./decision/number-of-tests.ts";
import type { DecisionModel } from "./decision-model.ts";
import { labelsOf } from "./evidence.ts";
import type { ProposalResult } from "./results-decision.ts";
import { quantityAt } from "./study/quantities.ts";
import type { Study } from "./study/study.ts";

/** Standard deviation of one result about the true mean, the scatter of the soil included; common practice. */
const typicalErrors: readonly { readonly ends: string; readonly error?: number; readonly share?: number }[] = [
  { ends: ".friction_angle", error: 2.5 },
  { ends: ".unit_weight", share: 0.05 },
  { ends: ".cohesion", share: 0.3 },
  { ends: ".undrained_strength", share: 0.2 },
  { ends: ".level", error: 0.2 },
  { ends: ".bottom", error: 0.2 },
  { ends: ".pressure", share: 0.15 },
];

const mostTests = 16;

export function proposalsFor(study: Study, model: DecisionModel, learning: LearningBasis): ProposalResult[] {
  const labels = labelsOf(study);
  return model.problem.variables.flatMap(({ path, marginal, knowledge }): ProposalResult[] => {
    // what the formulas themselves may be off by is not found out by tests on the ground
    if (!(knowledge > 0) || path.startsWith("model.")) return [];
    const typical = typicalError(study, path, marginal.mean, marginal.sd);
    const series = model.series({ path, tests: 1, ...(typical.error === undefined ? {} : { error: typical.error }) });
    const { points } = testsCurve(learning, { name: `tests on ${path}`, informs: [series] }, mostTests);
    return [
      {
        path,
        ...labels(path),
        error: series.error,
        sharedError: series.sharedError,
        basis: typical.basis,
        points: points.map(({ tests, value }) => ({ tests, value: value.value, standardError: value.standardError })),
      },
    ];
  });
}

/** None where the variable's scatter says it. */
function typicalError(study: Study, path: string, mean: number, sd: number): { error?: number; basis: string } {
  const quantity = quantityAt(study, path);
  if (typeof quantity === "object" && quantity.scatter !== undefined && quantity.scatter.inherent > 0)
    return { basis: "inherent scatter and measurement error of the study" };
  const row = typicalErrors.find(({ ends }) => path.endsWith(ends));
  if (row === undefined)
    return { error: 0.5 * sd, basis: "half of the standard deviation believed, for want of better" };
  return { error: row.error ?? row.share! * Math.abs(mean), basis: "typical of routine tests, common practice" };
}
