import type { Marginal } from "../probability/marginal.ts";
import type { LimitStates } from "../reliability/limit-states.ts";

/**
 * A decision over one wall, as plain mathematics: what can be built, what failure costs, what is believed.
 *
 * Everything hangs on a vector z of independent standard normal coordinates that all options share, so that they are
 * compared with common random numbers. Options, survivals and variables all read the same z.
 */
export interface DecisionProblem {
  /** Names of the coordinates, for streams. */
  readonly keys: readonly string[];
  readonly roles: readonly CoordinateRole[];
  /** The first is the base case. */
  readonly options: readonly DecisionOption[];
  /** By name of the limit state. Limit states that fail together cost the dearest of them. */
  readonly failureCosts: Readonly<Record<string, number>>;
  /** Length of the period; 1 where nothing is yearly. */
  readonly years: number;
  /** Greatest acceptable probability of failure in the period. */
  readonly target?: number;
  /** true: an option is open only where its probability meets the target, but for those always open. */
  readonly mustMeetTarget: boolean;
  /** The study's own variables; the learnable ones are those whose share of knowledge is above 0. */
  readonly variables: readonly BeliefVariable[];
  /** Variables that stand in for some of them in one option or in what was survived: averaged over, never learned. */
  readonly standIns: readonly Pick<BeliefVariable, "marginal" | "image">[];
  /** What the wall has stood: none of the limit states of any of these failed. */
  readonly survivals: readonly LimitStates[];
  /**
   * Likelihood of what has been seen, up to a factor, beyond what the coordinates already hold; absent where it is constant.
   * Multiplies the first n entries of `out`.
   */
  readonly likelihood?: (z: readonly Float64Array[], n: number, out: Float64Array) => void;
  /** Where the likelihood is a product of functions of one linear form each: their logarithms. */
  readonly likelihoodParts?: readonly LikelihoodPart[];
}

/**
 * knowledge: one true value, can be learned; nature: one value for this wall that cannot be learned beforehand, or the
 * coordinate of a variable that only an option has; yearly: drawn anew each year.
 */
export type CoordinateRole = "knowledge" | "nature" | "yearly";

export interface DecisionOption {
  readonly name: string;
  readonly cost: number;
  readonly states: LimitStates;
  readonly alwaysOpen: boolean;
  /** Coordinates that the limit states hang on; all of them where left out. */
  readonly reads?: readonly number[];
}

/** offset + row·z */
export interface LinearForm {
  readonly offset: number;
  readonly row: Float64Array;
}

/** Logarithm of a factor of the likelihood, as a function of k = offset + row·z. */
export interface LikelihoodPart {
  readonly form: LinearForm;
  readonly logCorrection: (k: number) => number;
}

/** X = marginal(U), U = √κ·K + √(1 − κ)·A, with U and K as linear forms of z. */
export interface BeliefVariable {
  readonly path: string;
  readonly marginal: Marginal;
  /** κ before evidence, in [0, 1]. */
  readonly knowledge: number;
  readonly yearly: boolean;
  readonly image: LinearForm;
  /** K in the scale it had before evidence (mean 0, sd 1 then). A row of zeros where κ is 0. */
  readonly known: LinearForm;
}

/** Results of n tests on one variable, made or planned. Errors are standard deviations in the variable's unit. */
export interface TestSeries {
  /** Place in `DecisionProblem.variables`. */
  readonly variable: number;
  readonly tests: number;
  /** e, of one result about the true mean, the soil's scatter included. */
  readonly error: number;
  /** t, shared by all results of the series. */
  readonly sharedError: number;
}

export interface PlannedInvestigation {
  readonly name: string;
  readonly cost?: number;
  readonly informs: readonly TestSeries[];
}

/** Results in hand: their mean is all that counts. */
export interface SeenResults extends TestSeries {
  readonly mean: number;
}

/** Whether what is believed is jointly normal in z with nothing left to weigh. */
export function isGaussian(problem: DecisionProblem): boolean {
  return problem.survivals.length === 0 && problem.likelihood === undefined;
}

/** Σ row·z + offset for the first n samples. */
export function applyForm(form: LinearForm, z: readonly Float64Array[], n: number, out: Float64Array): void {
  out.fill(form.offset, 0, n);
  form.row.forEach((weight, j) => {
    if (weight === 0) return;
    const column = z[j];
    for (let i = 0; i < n; i++) out[i] += weight * column[i];
  });
}

/** Standard deviation of a linear form of independent standard normals. */
export function formSd(form: LinearForm): number {
  return Math.sqrt(form.row.reduce((sum, weight) => sum + weight * weight, 0));
}

/**
 * K of a variable from its row over coordinates: the part of U that rests on knowledge, brought to unit length.
 *
 * @param row U = row·z, of unit length
 */
export function knowledgePart(
  row: Float64Array,
  roles: readonly CoordinateRole[],
): { share: number; row: Float64Array } {
  const part = row.map((weight, j) => (roles[j] === "knowledge" ? weight : 0));
  const share = part.reduce((sum, weight) => sum + weight * weight, 0);
  const size = Math.sqrt(share);
  return { share, row: size === 0 ? part : part.map((weight) => weight / size) };
}
