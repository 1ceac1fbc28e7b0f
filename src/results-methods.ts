/** Shapes of what an assessment gives besides, where every method and measure is asked for. House units, angles in degrees. */

/** Mean and standard deviation of a factor of safety by a classic hand method, with the indices that go with them. */
export interface HandMethod {
  readonly mean: number;
  readonly sd: number;
  readonly reliabilityIndexNormal: number;
  readonly reliabilityIndexLognormal: number;
  readonly probabilityNormal: number;
  readonly probabilityLognormal: number;
}

export interface HandMethods {
  /** First-order second-moment with the derivative at the means (steps of a hundredth of a standard deviation). */
  readonly smallSteps: HandMethod;
  /** Rosenblueth's 2ⁿ points; absent for more than 12 unknowns. */
  readonly twoPoints?: HandMethod;
  /** Harr's 2n points. */
  readonly eigenvectorPoints?: HandMethod;
}

export interface WithInterval {
  readonly value: number;
  readonly interval: readonly [number, number];
}

export interface Derivative {
  /** Change of the failure probability per unit; null where it is not known. */
  readonly value: number | null;
  readonly standardError: number | null;
  readonly from: "score" | "design_point";
}

export interface DerivativesOf {
  readonly path: string;
  readonly perMean: Derivative;
  readonly perSd: Derivative;
}

/** One unknown in the ranking; null or absent where a measure was not computed. */
export interface RankedUnknown {
  readonly path: string;
  readonly rank: number;
  /** Mean of its parts of all measures. */
  readonly weight: number;
  readonly adverse: "low" | "high" | "unclear";
  readonly knowledge: number;
  readonly share?: number | null;
  readonly importance?: number | null;
  readonly firstIndex?: number | null;
  readonly totalIndex?: number | null;
  readonly rankCorrelation?: number | null;
  readonly shiftGivenFailure?: number | null;
  /** Where measures disagree, and why that may be. */
  readonly disagreements: readonly string[];
}

/** Every measure of what drives one limit state. */
export interface AllDrivers {
  readonly ranking: readonly RankedUnknown[];
  /** Sobol' indices by path. */
  readonly varianceIndices: Readonly<Record<string, { readonly first: WithInterval; readonly total: WithInterval }>>;
  /** factor: of the factor of safety; margin: of its logarithm, because factors at the cap would rule. */
  readonly indicesOf: "factor" | "margin";
  /** true where unknowns are correlated: a first index then counts what an unknown tells about the others, and no sum is 1. */
  readonly correlated: boolean;
  readonly rankCorrelations: Readonly<Record<string, WithInterval>>;
  readonly derivatives: readonly DerivativesOf[];
}

/** Probability of the system with one unknown at each of several values. */
export interface FragilityCurve {
  readonly path: string;
  readonly points: readonly {
    readonly value: number;
    readonly probability: number;
    readonly standardError: number;
    readonly interval: readonly [number, number];
    readonly method: string;
  }[];
}

/** The system from its design points alone: half-spaces behind them. */
export interface SystemFromDesignPoints {
  readonly probability: number;
  readonly cornell: readonly [number, number];
  readonly ditlevsen: readonly [number, number];
  /** Limit states whose nearest point takes part, in order. */
  readonly limitStates: readonly string[];
  /** Correlation of their linearised margins. */
  readonly correlation: readonly (readonly number[])[];
}
