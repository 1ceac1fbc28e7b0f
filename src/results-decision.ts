/** Shapes of the results of evidence and of `scope`. Money is in the study's currency, of the whole period. */
import type { ResultBase, RunRecord } from "./results.ts";

export interface BeliefMoments {
  readonly mean: number;
  readonly sd: number;
}

/** What has been seen on site, and what it does to the beliefs. Probabilities are of one year, of the study as it stands. */
export interface EvidenceResult {
  readonly priorProbability: number;
  readonly priorStandardError: number;
  readonly probability: number;
  readonly standardError: number;
  /** Chance, under the beliefs, of all the survivals; null where there are only results. */
  readonly chanceOfEvidence: number | null;
  /** Of X itself, nature included. */
  readonly variables: readonly {
    readonly path: string;
    readonly label: string;
    readonly unit: string;
    readonly prior: BeliefMoments;
    readonly posterior: BeliefMoments;
  }[];
  /** Evidence that the beliefs make nearly impossible (chance below 1e-6), and what it conflicts with. */
  readonly conflicts: readonly EvidenceConflict[];
}

export interface EvidenceConflict {
  /** Paths of the variables that were tested; empty for what was survived. */
  readonly paths: readonly string[];
  readonly chance: number;
  readonly message: string;
}

export interface ScopeResult extends ResultBase {
  readonly kind: "scope";
  readonly seed: string;
  readonly currency: string;
  /** Years that all costs and probabilities are of; absent where nothing is yearly: they hold for the ground as it is. */
  readonly years?: number;
  readonly options: readonly ScopeOption[];
  /** Least expected cost of those that are open. */
  readonly bestOption: string;
  /** The next best today, and how much more it is expected to cost; absent where there is no other. */
  readonly runnerUp?: {
    readonly name: string;
    readonly difference: number;
    readonly standardError: number;
    /** The two cannot be told apart by this run. */
    readonly withinError: boolean;
  };
  readonly target?: { readonly probability: number; readonly reliabilityIndex: number; readonly mustMeet: boolean };
  /** Value of knowing all that can be known: no investigation can be worth more. */
  readonly perfectInformation: number;
  readonly perfectInformationStandardError: number;
  /** The same with one variable known. They do not add up. */
  readonly perfectByVariable: Readonly<Record<string, number>>;
  readonly perfectByVariableStandardErrors: Readonly<Record<string, number>>;
  readonly investigations: readonly InvestigationResult[];
  /** Names, the greatest net value first; those without a price last, by value. */
  readonly ranking: readonly string[];
  readonly pairs: readonly PairResult[];
  /** Where the study lists no investigation: what tests of typical error on each variable would be worth. */
  readonly proposals: readonly ProposalResult[];
  readonly twoStage?: TwoStageResult;
  readonly breakEven: BreakEvenResult;
  readonly evidence?: EvidenceResult;
  readonly variables: readonly ScopeVariable[];
  readonly run: RunRecord;
}

export interface ScopeOption {
  readonly name: string;
  readonly cost: number;
  readonly probability: number;
  readonly probabilityStandardError: number;
  /** Price and expected cost of failure. */
  readonly expectedCost: number;
  readonly expectedCostStandardError: number;
  readonly reliabilityIndex: number | null;
  /** Absent without a target. */
  readonly meetsTarget?: boolean;
  /** The target lies within the error of the probability. */
  readonly targetWithinError?: boolean;
  /** Allowed: always, unless the target must be met. */
  readonly open: boolean;
}

export interface InvestigationResult {
  readonly name: string;
  readonly cost: number | null;
  readonly value: number;
  readonly standardError: number;
  /** Null without a price. */
  readonly netValue: number | null;
  readonly chanceItChangesTheDecision: number;
  readonly chanceStandardError: number;
  /** The value is not distinguishable from zero. */
  readonly notDistinguishable: boolean;
  readonly informs: readonly InformedResult[];
  /** What to build for which mean result, where one variable is informed; null is no bound. */
  readonly rule?: readonly RuleResult[];
  readonly byNumberOfTests?: readonly TestsPoint[];
  /** Where the next test costs more than it brings, at the price of one test of this investigation. */
  readonly bestNumberOfTests?: number;
}

export interface InformedResult {
  readonly path: string;
  readonly label: string;
  readonly unit: string;
  readonly tests: number;
  /** Standard deviation of one result about the true mean, and of the error that all share. */
  readonly error: number;
  readonly sharedError: number;
}

export interface RuleResult {
  readonly from: number | null;
  readonly to: number | null;
  readonly option: string;
  readonly chance: number;
}

export interface TestsPoint {
  readonly tests: number;
  readonly value: number;
  readonly standardError: number;
  readonly cost?: number;
}

export interface PairResult {
  readonly names: readonly [string, string];
  readonly value: number;
  readonly standardError: number;
  readonly cost: number | null;
  readonly netValue: number | null;
  /** What the two are worth one by one, added: pairs are not additive. */
  readonly sumOfValues: number;
}

export interface ProposalResult extends Omit<InformedResult, "tests"> {
  readonly points: readonly TestsPoint[];
  /** Where the error comes from, in words. */
  readonly basis: string;
}

export interface TwoStageResult {
  readonly first: string;
  /** Expected saving against the best option today, all investigations paid. */
  readonly netValue: number;
  readonly standardError: number;
  readonly chanceOfSecond: number;
  readonly steps: readonly TwoStageStep[];
  /** The best single investigation by net value, for comparison. */
  readonly bestSingle: { readonly name: string; readonly netValue: number };
}

export interface TwoStageStep {
  /** Range of the first mean result, in its own unit; absent where the first informs several variables. */
  readonly from?: number | null;
  readonly to?: number | null;
  readonly chance: number;
  readonly build?: string;
  readonly investigate?: string;
}

export interface BreakEvenResult {
  /** Where the decision tips as the failure cost is multiplied; 1 is the cost as given. */
  readonly failureCost: readonly {
    readonly multiple: number;
    readonly standardError: number;
    /** The failure cost itself, where it is one number. */
    readonly failureCost?: number;
    readonly below: string;
    readonly above: string;
  }[];
  /** Best option if the target had to be met, by range of the acceptable probability; null where none meets it. */
  readonly target: readonly { readonly from: number; readonly to: number; readonly option: string | null }[];
}

export interface ScopeVariable {
  readonly path: string;
  readonly label: string;
  readonly unit: string;
  /** κ, the share that can be learned. */
  readonly knowledge: number;
  readonly yearly: boolean;
}
