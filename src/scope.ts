/** Which investigation is worth its price, and which option is best today? */
import { cautions } from "./cautions.ts";
import { type LearningAnswer, learningAnswer } from "./decision/answer.ts";
import { failureCostTippingPoints, targetTippingPoints } from "./decision/break-even.ts";
import { conditionOnResults } from "./decision/condition-on-results.ts";
import type { DecisionBasis } from "./decision/decision-basis.ts";
import { type DecisionRun, runDecision } from "./decision/decision-run.ts";
import { findFailureCentres } from "./decision/failure-centres.ts";
import { decisionModel } from "./decision-model.ts";
import { StudyError } from "./errors.ts";
import { evidence, labelsOf } from "./evidence.ts";
import { normalUpperQuantile } from "./numeric/normal.ts";
import type { BreakEvenResult, ScopeOption, ScopeResult } from "./results-decision.ts";
import { investigationResults, pairResults, rankingOf, twoStageResult } from "./scope-investigations.ts";
import { scopeNotes } from "./scope-notes.ts";
import { proposalsFor } from "./scope-proposals.ts";
import type { Decision, Study } from "./study/study.ts";
import { version } from "./version.ts";

export interface ScopeOptions {
  /** In place of the study's own. */
  readonly seed?: string;
  /** Most samples of the main run; a sample is evaluated for every option. */
  readonly samples?: number;
  /**
   * Standard error of perfect information aimed at, as a share of it; 0.0024 where left out, because values of several results have
   * up to three times its error and may be half as large.
   */
  readonly precision?: number;
  /** A clock in seconds, for the time shown beside the result; no time is shown without one. */
  readonly clock?: () => number;
  readonly onProgress?: (done: number, of: number) => void;
}

const defaults = { samples: 400_000, precision: 0.0024 };

/** Where people can be hurt, money does not decide. */
export const decisionCaution =
  "Where people can be hurt, expected cost does not decide: the target reliability governs, whatever is cheapest.";

/**
 * @throws StudyError where the study has no decision, or its correlations have no joint distribution
 */
export async function scope(study: Study, options: ScopeOptions = {}): Promise<ScopeResult> {
  const { decision } = study;
  if (decision === undefined)
    throw new StudyError(
      [
        {
          path: "decision",
          message: "is missing: scope weighs options against each other",
          hint: "give decision.options",
        },
      ],
      study.file,
    );
  const start = options.clock?.() ?? 0;
  const seed = options.seed ?? study.assessment.seed;
  const progress = stepsOf(options.onProgress);
  const model = decisionModel(study);
  const problem = conditionOnResults(model.problem, model.results);
  await progress();
  const search = findFailureCentres(problem, seed);
  await progress();
  const run = runDecision(problem, search, {
    seed,
    most: options.samples ?? defaults.samples,
    precision: options.precision ?? defaults.precision,
  });
  await progress();
  const planned = decision.investigations.map(({ name, cost, informs }) => ({
    name,
    ...(cost === undefined ? {} : { cost }),
    informs: informs.map(model.series),
  }));
  const answer = learningAnswer(run, planned);
  await progress();
  const investigations = investigationResults(study, run, planned, answer);
  const found = evidence(study, { seed });
  await progress();
  const result: ScopeResult = {
    study: study.title,
    kind: "scope",
    seed,
    currency: decision.currency,
    ...(problem.roles.includes("yearly") ? { years: problem.years } : {}),
    options: problem.options.map((_, o) => optionResult(run.basis, o)),
    bestOption: problem.options[run.basis.today].name,
    ...runnerUpOf(run.basis),
    ...targetOf(study, decision),
    ...perfectResults(study, run, answer),
    investigations,
    ranking: rankingOf(investigations),
    pairs: pairResults(planned, answer),
    proposals: decision.investigations.length > 0 ? [] : proposalsFor(study, model, run),
    ...twoStageResult(run, planned, answer, investigations),
    breakEven: breakEvenResult(run.basis, decision),
    ...(found === undefined ? {} : { evidence: found }),
    variables: problem.variables.map(({ path, knowledge, yearly }) => ({
      path,
      ...labelsOf(study)(path),
      knowledge,
      yearly,
    })),
    run: {
      version,
      seed,
      workers: 1,
      complete: true,
      sampling: { evaluations: run.evaluations, seconds: (options.clock?.() ?? 0) - start },
    },
    warnings: [],
    cautions: [decisionCaution, ...cautions],
  };
  return { ...result, warnings: [...study.notices, ...model.notices, ...scopeNotes(study, result, run)] };
}

/** Reports progress and lets others run in between. */
function stepsOf(onProgress: ScopeOptions["onProgress"]): () => Promise<void> {
  let done = 0;
  return async () => {
    onProgress?.(++done, 5);
    await new Promise((resolve) => setTimeout(resolve, 0));
  };
}

function optionResult({ problem, outcomes }: DecisionBasis, o: number): ScopeOption {
  const { probability, expectedCost, meetsTarget, open } = outcomes[o];
  const { name, cost } = problem.options[o];
  const { target } = problem;
  return {
    name,
    cost,
    probability: probability.value,
    probabilityStandardError: probability.standardError,
    expectedCost: expectedCost.value,
    expectedCostStandardError: expectedCost.standardError,
    reliabilityIndex: probability.value > 0 && probability.value < 1 ? normalUpperQuantile(probability.value) : null,
    ...(meetsTarget === undefined || target === undefined
      ? {}
      : { meetsTarget, targetWithinError: Math.abs(probability.value - target) < 1.96 * probability.standardError }),
    open,
  };
}

function runnerUpOf({ problem, runnerUp }: DecisionBasis): Pick<ScopeResult, "runnerUp"> {
  if (runnerUp === undefined) return {};
  const { value, standardError } = runnerUp.difference;
  return {
    runnerUp: {
      name: problem.options[runnerUp.option].name,
      difference: value,
      standardError,
      withinError: value < 1.96 * standardError,
    },
  };
}

function targetOf({ assessment }: Study, { mustMeetTarget }: Decision): Pick<ScopeResult, "target"> {
  const { target } = assessment;
  if (target === undefined) return {};
  const { probability, reliabilityIndex } = target;
  return { target: { probability, reliabilityIndex, mustMeet: mustMeetTarget } };
}

function perfectResults(study: Study, { basis }: DecisionRun, { perfect, perfectByVariable }: LearningAnswer) {
  const shown = (value: number): number => (study.decision?.mustMeetTarget ? value : Math.max(value, 0));
  const entries = [...perfectByVariable].map(([v, { value }]) => [basis.problem.variables[v].path, value] as const);
  return {
    perfectInformation: shown(perfect.value.value),
    perfectInformationStandardError: perfect.value.standardError,
    perfectByVariable: Object.fromEntries(entries.map(([path, { value }]) => [path, shown(value)])),
    perfectByVariableStandardErrors: Object.fromEntries(
      entries.map(([path, { standardError }]) => [path, standardError]),
    ),
  };
}

function breakEvenResult(basis: DecisionBasis, { failureCost }: Decision): BreakEvenResult {
  const { options } = basis.problem;
  return {
    failureCost: failureCostTippingPoints(basis).map(({ at, standardError, below, above }) => ({
      multiple: at,
      standardError,
      ...(typeof failureCost === "number" ? { failureCost: at * failureCost } : {}),
      below: options[below].name,
      above: options[above].name,
    })),
    target: targetTippingPoints(basis).map(({ from, to, option }) => ({
      from,
      to,
      option: option === undefined ? null : options[option].name,
    })),
  };
}
