import type { BeliefSample } from "./belief-sample.ts";
import type { DecisionProblem } from "./decision-problem.ts";
import type { FailureSample } from "./failure-sample.ts";
import { type Estimate, largestShare, stratifiedSum } from "./stratified-sample.ts";

/** One weighted sample of failures, one of beliefs, and what follows from them today. */
export interface DecisionBasis {
  readonly problem: DecisionProblem;
  /** Weights divided by the chance of the evidence: weighted sums are posterior expectations. */
  readonly failures: FailureSample;
  /** Weights that add up to 1. */
  readonly beliefs: BeliefSample;
  readonly outcomes: readonly OptionOutcome[];
  /** Place of the option that is best with what is known today. */
  readonly today: number;
  /** The next best of those open today; absent where there is no other. */
  readonly runnerUp?: { readonly option: number; readonly difference: Estimate };
}

export interface OptionOutcome {
  /** Of failure in the period. */
  readonly probability: Estimate;
  /** Price and expected cost of failure. */
  readonly expectedCost: Estimate;
  /** Absent without a target. */
  readonly meetsTarget?: boolean;
  /** Allowed today: always, unless the target must be met. */
  readonly open: boolean;
  /** Largest share of the probability that one sample carries. */
  readonly largestShare: number;
}

export function decisionBasis(problem: DecisionProblem, drawn: FailureSample, believed: BeliefSample): DecisionBasis {
  const { chance } = believed;
  if (!(chance.value > 0)) throw new RangeError("no sample of what is believed agrees with the evidence");
  const failures = { ...drawn, weight: drawn.weight.map((w) => w / chance.value) };
  const total = believed.weight.reduce((sum, w) => sum + w, 0);
  const beliefs = { ...believed, weight: believed.weight.map((w) => w / total) };
  const doubt = chance.standardError / chance.value;
  const posterior = (y: Float64Array): Estimate => withDoubt(stratifiedSum(failures, y), doubt);
  const outcomes = problem.options.map((option, o): OptionOutcome => {
    const probability = posterior(failures.failure[o]);
    const cost = posterior(failures.cost[o]);
    const meets = problem.target === undefined ? undefined : probability.value <= problem.target;
    return {
      probability,
      expectedCost: { value: option.cost + cost.value, standardError: cost.standardError },
      ...(meets === undefined ? {} : { meetsTarget: meets }),
      open: !problem.mustMeetTarget || option.alwaysOpen || meets !== false,
      largestShare: largestShare(failures, failures.failure[o]),
    };
  });
  const ranked = outcomes
    .map((_, o) => o)
    .filter((o) => outcomes[o].open)
    .sort((a, b) => outcomes[a].expectedCost.value - outcomes[b].expectedCost.value);
  if (ranked.length === 0) throw new RangeError("no option is open: mark one that is always open");
  const [today, next] = ranked;
  if (next === undefined) return { problem, failures, beliefs, outcomes, today };
  const difference = posterior(failures.cost[next].map((cost, i) => cost - failures.cost[today][i]));
  const price = problem.options[next].cost - problem.options[today].cost;
  const runnerUp = { option: next, difference: { ...difference, value: difference.value + price } };
  return { problem, failures, beliefs, outcomes, today, runnerUp };
}

/** An estimate divided by one with a relative error of its own. */
function withDoubt({ value, standardError }: Estimate, doubt: number): Estimate {
  return { value, standardError: Math.hypot(standardError, value * doubt) };
}
