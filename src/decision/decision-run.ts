import { beliefSampleSize, drawBeliefs } from "./belief-sample.ts";
import { type DecisionBasis, decisionBasis } from "./decision-basis.ts";
import type { DecisionProblem } from "./decision-problem.ts";
import type { CentreSearch } from "./failure-centres.ts";
import { failureModes } from "./failure-modes.ts";
import { drawFailures, type FailureSample } from "./failure-sample.ts";
import type { LearningBasis } from "./investigation.ts";
import { type KnowledgeLedger, knowledgeLedger } from "./knowledge-ledger.ts";
import { beliefMixture, type FailureCentre, failureMixture } from "./mixture.ts";
import { valueOfPerfectInformation } from "./perfect-information.ts";

export interface RunSettings {
  readonly seed: string;
  /** Most samples of the main run. */
  readonly most: number;
  /** Standard error aimed at, as a share of the value of perfect information. */
  readonly precision: number;
}

export interface DecisionRun extends LearningBasis {
  readonly centres: readonly FailureCentre[];
  readonly evaluations: number;
  /** Regions that the pilot found beside the design points. */
  readonly regionsAdded: number;
}

const pilotSize = 16_384;
const folds = 10;

/**
 * A pilot looks for regions that the centres miss and sizes the main run, which is fresh.
 *
 * Size: so that the standard error of perfect information does not exceed `precision` of its value, or a thousandth of the
 * expected failure cost of today's best, whichever is larger.
 */
export function runDecision(problem: DecisionProblem, search: CentreSearch, settings: RunSettings): DecisionRun {
  const { seed } = settings;
  let centres = search.centres;
  let evaluations = search.evaluations;
  let pilot: FailureSample;
  let regionsAdded = 0;
  const dimension = problem.keys.length;
  const draw = (samples: number, purpose: string): FailureSample => {
    const strata = failureMixture(centres, problem.options.length, dimension);
    const sample = drawFailures(problem, strata, { seed, purpose, samples, folds });
    evaluations += sample.evaluations;
    return sample;
  };
  for (let round = 0; ; round++) {
    pilot = draw(pilotSize, `decision pilot ${round}`);
    const missed = round < 3 ? missedRegions(problem, pilot, centres) : [];
    if (missed.length === 0) break;
    regionsAdded += missed.length;
    centres = [...centres, ...missed];
  }
  const beliefs = drawBeliefs(problem, beliefStrata(problem, search, centres), {
    seed,
    purpose: "beliefs",
    samples: beliefSampleSize,
    folds,
  });
  evaluations += beliefs.evaluations;
  const first = decisionBasis(problem, pilot, beliefs);
  const samples = Math.min(
    Math.max(sizeFor(first, centres, pilot.drawn, settings.precision), 2 * pilotSize),
    settings.most,
  );
  const basis = decisionBasis(problem, draw(samples, "decision"), beliefs);
  return { ...learningBasis(basis, centres, seed), centres, evaluations, regionsAdded };
}

export function learningBasis(basis: DecisionBasis, centres: readonly FailureCentre[], seed: string): LearningBasis {
  const ledgers = new Map<number, KnowledgeLedger>();
  return {
    basis,
    modes: failureModes(basis, centres),
    seed,
    ledger(variable) {
      const ledger = ledgers.get(variable) ?? knowledgeLedger(basis, basis.problem.variables[variable]);
      ledgers.set(variable, ledger);
      return ledger;
    },
  };
}

/** About the origin, about the knowledge part of every centre, and where what was survived is likely. */
function beliefStrata({ roles, keys }: DecisionProblem, search: CentreSearch, centres: readonly FailureCentre[]) {
  const known = centres.map(({ point, originFails }) =>
    point.map((x, j) => (roles[j] === "knowledge" && !originFails ? x : 0)),
  );
  return beliefMixture([...search.survivalPoints, ...known], keys.length);
}

/**
 * Failing samples that no centre of their option accounts for: clearly nearer to the origin than all of them, or carrying
 * more than a twentieth of the option's weight. At most two of each option, the ones that weigh most.
 */
export function missedRegions(
  problem: DecisionProblem,
  sample: FailureSample,
  centres: readonly FailureCentre[],
): FailureCentre[] {
  return problem.options.flatMap(({ states }, option) => {
    const own = centres.filter((centre) => centre.option === option);
    if (own.some((centre) => centre.originFails)) return [];
    const nearest = Math.min(...own.map(({ point }) => Math.hypot(...point)));
    const failure = sample.failure[option];
    let total = 0;
    for (let i = 0; i < sample.count; i++) total += sample.weight[i] * failure[i];
    const found: { point: Float64Array; share: number }[] = [];
    for (let i = 0; i < sample.count; i++) {
      if (failure[i] === 0) continue;
      const share = (sample.weight[i] * failure[i]) / total;
      const point = Float64Array.from(sample.z, (column) => column[i]);
      if (share > 0.05 || Math.hypot(...point) < nearest - 0.3) found.push({ point, share });
    }
    return found
      .sort((a, b) => b.share - a.share)
      .slice(0, 2)
      .map(({ point }) => ({ option, limitState: states.names[0], point }));
  });
}

/** Samples of a main run with the standard error wanted, from the pilot's. */
function sizeFor(basis: DecisionBasis, centres: readonly FailureCentre[], drawn: number, precision: number): number {
  const { problem, outcomes, today, runnerUp } = basis;
  const perfect = valueOfPerfectInformation(basis, failureModes(basis, centres), { careful: false }).value;
  const failureCost = outcomes[today].expectedCost.value - problem.options[today].cost;
  const wanted = Math.max(precision * perfect.value, 1e-3 * failureCost);
  if (!(wanted > 0)) return 0;
  const needed = (error: number, allowed: number): number => Math.ceil(drawn * (error / allowed) ** 2);
  if (runnerUp === undefined) return needed(perfect.standardError, wanted);
  const { value, standardError } = runnerUp.difference;
  // a runner-up that is clearly dearer needs no sharper figure
  const clear = Math.max(0.008 * perfect.value, 0.05 * Math.abs(value), wanted);
  return Math.max(needed(perfect.standardError, wanted), needed(standardError, clear));
}
