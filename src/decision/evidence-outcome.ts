import { type Moments, normalMoments, sampledMoments } from "./belief-moments.ts";
import { type BeliefSample, beliefSampleSize, drawBeliefs } from "./belief-sample.ts";
import { conditionOnResults } from "./condition-on-results.ts";
import { type DecisionProblem, isGaussian, type SeenResults } from "./decision-problem.ts";
import { type ResultSurprise, resultSurprises } from "./evidence-conflicts.ts";
import { type CentreSearch, findFailureCentres } from "./failure-centres.ts";
import { drawFailures } from "./failure-sample.ts";
import { beliefMixture, failureMixture } from "./mixture.ts";
import { type Estimate, largestShare, stratifiedSum } from "./stratified-sample.ts";

/** What evidence does to the beliefs and to the probability of failure of the base case, of one year. */
export interface EvidenceOutcome {
  readonly priorProbability: Estimate;
  readonly probability: Estimate;
  /** Chance, under the beliefs, that the wall survived all that it has survived; absent where nothing was survived. */
  readonly chanceOfSurvival?: Estimate;
  readonly surprises: readonly ResultSurprise[];
  /** In the order of the problem's variables. */
  readonly variables: readonly { readonly path: string; readonly prior: Moments; readonly posterior: Moments }[];
  /** Largest share of the posterior probability that one sample carries. */
  readonly largestShare: number;
  readonly evaluations: number;
}

/**
 * Numerator and denominator of the posterior from separate samples, each placed where it is likely: failures about the design
 * points given what was survived, beliefs about the origin of the updated coordinates.
 *
 * @param prior of one year, without results; survivals included
 */
export function evidenceOutcome(
  prior: DecisionProblem,
  results: readonly SeenResults[],
  settings: { readonly seed: string; readonly samples: number },
): EvidenceOutcome {
  const base = { ...prior, options: prior.options.slice(0, 1), years: 1 };
  const unseen: DecisionProblem = { ...base, survivals: [] };
  const updated = conditionOnResults(base, results);
  const before = probabilityOf(unseen, settings, "without evidence");
  const after = probabilityOf(updated, settings, "with evidence");
  const survived = prior.survivals.length === 0 ? undefined : chanceOfSurvival(base, settings);
  const isExact = isGaussian(updated);
  return {
    priorProbability: before.probability,
    probability: after.probability,
    ...(survived === undefined ? {} : { chanceOfSurvival: survived.chance }),
    surprises: resultSurprises(base, results),
    variables: updated.variables.map((variable, v) => ({
      path: variable.path,
      prior: { mean: variable.marginal.mean, sd: variable.marginal.sd },
      posterior: isExact ? normalMoments(variable) : sampledMoments(updated.variables[v], after.beliefs),
    })),
    largestShare: after.largestShare,
    evaluations: before.evaluations + after.evaluations + (survived?.evaluations ?? 0),
  };
}

interface ProbabilityRun {
  readonly probability: Estimate;
  readonly beliefs: BeliefSample;
  readonly largestShare: number;
  readonly evaluations: number;
}

function probabilityOf(
  problem: DecisionProblem,
  { seed, samples }: { readonly seed: string; readonly samples: number },
  purpose: string,
): ProbabilityRun {
  const search = findFailureCentres(problem, seed);
  const strata = failureMixture(search.centres, 1, problem.keys.length);
  const failures = drawFailures(problem, strata, { seed, purpose: `failures ${purpose}`, samples, folds: 2 });
  const beliefs = believed(problem, search, seed, purpose);
  const [failure] = failures.failure;
  const sum = stratifiedSum(failures, failure);
  const { value, standardError } = beliefs.chance;
  const probability = value > 0 ? sum.value / value : Number.NaN;
  const relative = Math.hypot(sum.standardError / Math.max(sum.value, Number.MIN_VALUE), standardError / value);
  return {
    probability: { value: probability, standardError: sum.value > 0 ? probability * relative : 0 },
    beliefs,
    largestShare: largestShare(failures, failure),
    evaluations: search.evaluations + failures.evaluations + beliefs.evaluations,
  };
}

function believed(problem: DecisionProblem, search: CentreSearch, seed: string, purpose: string): BeliefSample {
  const strata = beliefMixture(search.survivalPoints, problem.keys.length);
  const samples = isGaussian(problem) ? 256 : 2 * beliefSampleSize;
  return drawBeliefs(problem, strata, { seed, purpose: `beliefs ${purpose}`, samples, folds: 2 });
}

/** Under the beliefs alone, whatever the results say. */
function chanceOfSurvival(base: DecisionProblem, { seed }: { readonly seed: string }): BeliefSample {
  const search = findFailureCentres({ ...base, options: [] }, seed);
  return believed(base, search, seed, "of survival");
}
