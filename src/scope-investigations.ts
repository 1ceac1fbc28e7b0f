/** Values of investigations, alone, in pairs and one after the other, in the words of the study. */
import type { LearningAnswer } from "./decision/answer.ts";
import type { PlannedInvestigation } from "./decision/decision-problem.ts";
import type { DecisionRun } from "./decision/decision-run.ts";
import { labelsOf } from "./evidence.ts";
import type { InvestigationResult, PairResult, ScopeResult } from "./results-decision.ts";
import type { Study } from "./study/study.ts";

/** No bound is null in the result file. */
const bound = (x: number): number | null => (Number.isFinite(x) ? x : null);

/** A value below two standard errors, or of no account beside the whole, is not distinguishable from zero. */
function isDoubtful(value: number, standardError: number, scale: number): boolean {
  return Math.abs(value) <= 2 * standardError || Math.abs(value) <= 1e-9 * scale;
}

export function investigationResults(
  study: Study,
  { basis }: DecisionRun,
  planned: readonly PlannedInvestigation[],
  answer: LearningAnswer,
): InvestigationResult[] {
  const { options, variables, mustMeetTarget } = basis.problem;
  const labels = labelsOf(study);
  const scale = basis.outcomes[basis.today].expectedCost.value;
  return planned.map(({ name, cost, informs }, i) => {
    const { value, chanceItChangesTheDecision, steps } = answer.investigations[i];
    // where the choice is free no investigation does harm; a value below 0 is the noise of a rule
    const worth = mustMeetTarget ? value.value : Math.max(value.value, 0);
    const curve = answer.curves[i];
    return {
      name,
      cost: cost ?? null,
      value: worth,
      standardError: value.standardError,
      netValue: cost === undefined ? null : worth - cost,
      chanceItChangesTheDecision: chanceItChangesTheDecision.value,
      chanceStandardError: chanceItChangesTheDecision.standardError,
      notDistinguishable: isDoubtful(value.value, value.standardError, scale),
      informs: informs.map(({ variable, tests, error, sharedError }) => {
        const { path } = variables[variable];
        return { path, ...labels(path), tests, error, sharedError };
      }),
      ...(steps === undefined
        ? {}
        : {
            rule: steps.map((step) => ({
              from: bound(step.from),
              to: bound(step.to),
              option: options[step.option].name,
              chance: step.chance,
            })),
          }),
      ...(curve === undefined
        ? {}
        : {
            byNumberOfTests: curve.points.map((point) => ({
              ...point,
              value: point.value.value,
              standardError: point.value.standardError,
            })),
            ...(curve.best === undefined ? {} : { bestNumberOfTests: curve.best }),
          }),
    };
  });
}

/** Greatest net value first, then those without a price by value. */
export function rankingOf(results: readonly InvestigationResult[]): string[] {
  const key = ({ netValue, value }: InvestigationResult): readonly [number, number] =>
    netValue === null ? [1, -value] : [0, -netValue];
  return [...results].sort((a, b) => key(a)[0] - key(b)[0] || key(a)[1] - key(b)[1]).map(({ name }) => name);
}

export function pairResults(
  planned: readonly PlannedInvestigation[],
  { pairs, investigations }: LearningAnswer,
): PairResult[] {
  return pairs.map(({ places: [i, j], value: { value } }) => {
    const [first, second] = [planned[i], planned[j]];
    const cost = first.cost === undefined || second.cost === undefined ? null : first.cost + second.cost;
    return {
      names: [first.name, second.name],
      value: value.value,
      standardError: value.standardError,
      cost,
      netValue: cost === null ? null : value.value - cost,
      sumOfValues: investigations[i].value.value + investigations[j].value.value,
    };
  });
}

export function twoStageResult(
  { basis }: DecisionRun,
  planned: readonly PlannedInvestigation[],
  { plans }: LearningAnswer,
  results: readonly InvestigationResult[],
): Pick<ScopeResult, "twoStage"> {
  const [plan] = plans;
  if (plan === undefined) return {};
  const single = results
    .flatMap(({ name, netValue }) => (netValue === null ? [] : [{ name, netValue }]))
    .reduce((best, one) => (one.netValue > best.netValue ? one : best));
  return {
    twoStage: {
      first: planned[plan.first].name,
      netValue: plan.netValue.value,
      standardError: plan.netValue.standardError,
      chanceOfSecond: plan.chanceOfSecond,
      steps: plan.steps.map(({ from, to, chance, choice }) => ({
        ...(from === undefined || to === undefined ? {} : { from: bound(from), to: bound(to) }),
        chance,
        ...(choice.kind === "build"
          ? { build: basis.problem.options[choice.option].name }
          : { investigate: planned[choice.investigation].name }),
      })),
      bestSingle: single,
    },
  };
}
