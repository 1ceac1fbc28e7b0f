/** What an engineer should know about the value of an investigation before she orders it. */
import type { DecisionRun } from "./decision/decision-run.ts";
import { evidenceNotes } from "./evidence.ts";
import type { ScopeResult } from "./results-decision.ts";
import type { Notice, Study } from "./study/study.ts";

export function scopeNotes(study: Study, result: ScopeResult, run: DecisionRun): readonly Notice[] {
  return [
    ...(result.evidence === undefined ? [] : evidenceNotes(study, result.evidence)),
    ...groundAsItIs(result),
    ...allCanBeLearned(result),
    ...heavySamples(run),
    ...nearTie(result),
  ];
}

function groundAsItIs({ years }: ScopeResult): Notice[] {
  if (years !== undefined) return [];
  const message =
    "no value in the study is yearly: costs and probabilities hold for the ground as it is, and are not per year";
  return [{ path: "assessment", message }];
}

function allCanBeLearned({ variables, perfectByVariable }: ScopeResult): Notice[] {
  const plain = variables.filter(({ path, knowledge }) => knowledge >= 1 && perfectByVariable[path] !== undefined);
  if (plain.length === 0) return [];
  const names = plain.map(({ path }) => path).join(", ");
  return [
    {
      path: plain[0].path,
      message: `the study does not say how much of the spread is nature that no test can take away: all of it is taken as learnable for ${names}, so values of information are upper estimates there`,
    },
  ];
}

/** A single sample that carries much of a probability is a sign that a region was missed. */
function heavySamples({ basis }: DecisionRun): Notice[] {
  return basis.outcomes.flatMap(({ largestShare }, o) =>
    largestShare > 1 / 3
      ? [
          {
            path: `decision.options.${o}`,
            message: `one sample carries ${Math.round(100 * largestShare)} % of the probability of "${basis.problem.options[o].name}": a region of failure may have been missed, and its figures are not to be trusted`,
          },
        ]
      : [],
  );
}

function nearTie({ runnerUp, bestOption }: ScopeResult): Notice[] {
  if (runnerUp === undefined || !runnerUp.withinError) return [];
  const message = `"${bestOption}" and "${runnerUp.name}" cost the same within the error of this run; either may be called the best`;
  return [{ path: "decision.options", message }];
}
