/**
 * Shapes of the results, as every room and the public door see them. House units, angles in degrees. In the result file
 * (`--json`) the same keys appear in snake_case; keys that are paths (they hold a dot) and limit state names stay as they are.
 */

import type { EvidenceResult, ScopeResult } from "./results-decision.ts";
import type { DesignResult } from "./results-design.ts";
import type { AllDrivers, FragilityCurve, HandMethods, SystemFromDesignPoints } from "./results-methods.ts";
import type { SizeResult } from "./results-size.ts";
import type { LimitStateName, Notice, Study } from "./study/study.ts";

export interface ResultBase {
  /** Title of the study. */
  readonly study: string;
  readonly warnings: readonly Notice[];
  readonly cautions: readonly string[];
}

// ── check ────────────────────────────────────────────────────────────────────────────────────────────────────────────

export interface CheckResult extends ResultBase {
  readonly kind: "check";
  /** mean, cautious, design_point:sliding, or a file's name. */
  readonly at: string;
  /** The value used for every uncertain path. */
  readonly values: Readonly<Record<string, number>>;
  readonly forces: readonly Force[];
  readonly pressure: readonly PressurePoint[];
  readonly base: BaseResult;
  readonly limitStates: Readonly<Partial<Record<LimitStateName, LimitStateCheck>>>;
  readonly sheet: readonly SheetLine[];
  /** Words for the marks that were set: slope_unstable, lost_contact, capped, out_of_range. */
  readonly marks: readonly string[];
  /** The wall as it stands at these values, for drawing. */
  readonly section: Section;
  /** With partial factors, where they were given. */
  readonly design?: DesignResult;
}

export interface Force {
  readonly name: string;
  readonly group: "weight" | "earth" | "water" | "surcharge" | "inertia" | "front";
  /** kN/m; horizontal positive towards the front (driving), vertical positive downwards. */
  readonly horizontal: number;
  readonly vertical: number;
  /** Point of application, m. */
  readonly x: number;
  readonly z: number;
}

/** kPa, both sides of every break point, from the top down. horizontal is earth without water; loads is strips and lines. */
export interface PressurePoint {
  readonly z: number;
  readonly verticalEffective: number;
  readonly horizontal: number;
  readonly water: number;
  readonly loads: number;
  readonly soil: string;
}

export interface BaseResult {
  readonly vertical: number;
  readonly horizontal: number;
  readonly resultantX: number | null;
  readonly eccentricity: number | null;
  readonly effectiveWidth: number;
  readonly pressureToe: number | null;
  readonly pressureHeel: number | null;
}

export interface LimitStateCheck {
  readonly factorOfSafety: number;
  readonly resisting: number;
  readonly driving: number;
  readonly unit: string;
}

export interface SheetLine {
  /** The block of the calculation it belongs to, in order: "Geometry", "Earth pressure: fill", … */
  readonly heading: string;
  readonly symbol: string;
  readonly text: string;
  readonly formula: string;
  /** The formula with the numbers put in; empty where it holds words alone. */
  readonly substituted: string;
  readonly value: number;
  readonly unit: string;
  readonly source?: string;
}

/** Plain numbers, local axes (x from the tip of the toe, z from the underside), m. */
export interface Section {
  readonly baseWidth: number;
  readonly toe: number;
  readonly footWidth: number;
  readonly heel: number;
  readonly baseThickness: number;
  readonly stemHeight: number;
  readonly crestWidth: number;
  readonly backRun: number;
  readonly frontRun: number;
  readonly key?: { readonly fromToe: number; readonly width: number; readonly depth: number };
  /** Degrees. */
  readonly slope: number;
  readonly plane: "virtual_back" | "wall_back";
  readonly planeTop: number;
  /** From the top down; bottom is absent on the last. */
  readonly layers: readonly { readonly soil: string; readonly name: string; readonly bottom?: number }[];
  readonly below: { readonly soil: string; readonly name: string };
  readonly front: {
    readonly level: number;
    readonly soil: string;
    readonly name: string;
    readonly ignoreTop: number;
    readonly toeSoil: boolean;
    readonly passive: boolean;
  };
  readonly water: { readonly behind?: number; readonly front?: number; readonly flow: "hydrostatic" | "seepage" };
  readonly surcharge?: number;
  readonly strips: readonly { readonly pressure: number; readonly from: number; readonly width: number }[];
  readonly lines: readonly { readonly force: number; readonly at: number }[];
  readonly undersideLevel: number;
  /** Centre and radius of the critical circle, where deep-seated failure was asked for. */
  readonly circle?: {
    readonly x: number;
    readonly z: number;
    readonly radius: number;
    readonly entryX: number;
    readonly exitX: number;
  };
}

// ── assess ───────────────────────────────────────────────────────────────────────────────────────────────────────────

export interface VariableSummary {
  readonly path: string;
  /** Words for people: "Friction angle of Medium sand". */
  readonly label: string;
  /** In house units: "m", "kN/m³", "°", "–", "kPa", "kN/m". */
  readonly unit: string;
  readonly distribution: string;
  readonly mean: number;
  readonly sd: number;
  readonly fractile5: number;
  readonly fractile95: number;
  readonly knowledge: number;
  readonly yearly: boolean;
  readonly source?: string;
  /** Density on a grid of x, for the small picture. */
  readonly density: { readonly x: readonly number[]; readonly y: readonly number[] };
  /** The values of a `measured` quantity. */
  readonly ticks?: readonly number[];
  /** Mean and sd before truncation, of a truncated normal. */
  readonly parent?: { readonly mean: number; readonly sd: number };
}

export interface SamplingCounts {
  readonly slopeUnstable: number;
  readonly lostContact: number;
  readonly capped: number;
  readonly outOfRange: number;
}

export interface MonteCarloResult {
  readonly probability: number;
  readonly standardError: number;
  /** 95 % Clopper–Pearson. */
  readonly interval: readonly [number, number];
  readonly failures: number;
  readonly samples: number;
  /** −Φ⁻¹(probability); null where there are no failures or nothing but failures. */
  readonly reliabilityIndex: number | null;
  /** Mean and sd of the factor of safety, without samples at the cap or at 0; null for the system. */
  readonly factorMean: number | null;
  readonly factorSd: number | null;
  readonly counts: SamplingCounts;
  /** Probability among the samples not marked slope_unstable; absent where none is marked. */
  readonly probabilityAmongStable?: number;
}

export interface Histogram {
  /** edges.length = counts.length + 1. */
  readonly edges: readonly number[];
  readonly counts: readonly number[];
  /** Samples beyond the first and the last edge. */
  readonly below: number;
  readonly above: number;
}

/** The estimate after so many samples, at the checkpoints of the stop rule. */
export interface ConvergencePoint {
  readonly samples: number;
  readonly probability: number;
  readonly interval: readonly [number, number];
}

export interface SecondMomentResult {
  readonly mean: number;
  readonly sd: number;
  readonly reliabilityIndexNormal: number;
  readonly reliabilityIndexLognormal: number;
  readonly probabilityNormal: number;
  readonly probabilityLognormal: number;
  readonly contributions: Readonly<Record<string, number>>;
}

export interface FirstOrderResult {
  readonly converged: boolean;
  /** Why not, or at what kind of point: smooth, corner, usable, none. */
  readonly status: string;
  readonly reliabilityIndex: number | null;
  readonly probability: number | null;
  readonly designPoint: Readonly<Record<string, number>>;
  readonly importance: Readonly<Record<string, number>>;
  /** Change of the index per unit of each mean and standard deviation; null where there is none. */
  readonly derivatives?: Readonly<Record<string, { readonly perMean: number | null; readonly perSd: number | null }>>;
  /** Further design points, farther out. */
  readonly others?: readonly {
    readonly reliabilityIndex: number;
    readonly status: string;
    readonly designPoint: Readonly<Record<string, number>>;
  }[];
  readonly evaluations: number;
}

/** Only where the design point is smooth. */
export interface SecondOrderResult {
  readonly reliabilityIndex: number | null;
  /** Hohenbichler and Rackwitz (1988). */
  readonly probability: number | null;
  /** Breitung (1984). */
  readonly breitung?: number;
  /** Main curvatures of the limit surface at the design point, positive away from the origin. */
  readonly curvatures?: readonly number[];
  readonly evaluations?: number;
}

export interface Driver {
  readonly path: string;
  /** First-order share of the variance of the factor of safety; null for the system, which has no single factor. */
  readonly share: number | null;
  readonly adverse: "low" | "high" | "unclear";
  readonly knowledge: number;
  /** Mean given failure less mean, in standard deviations; null without failures. */
  readonly shiftGivenFailure: number | null;
}

/** Factor of safety with one variable at its 5 and 95 % fractile, the others at their means. */
export interface TornadoBar {
  readonly path: string;
  readonly factorAt5: number;
  readonly factorAt95: number;
}

/** Distribution of one variable over all samples and among those that fail, on common edges (shares, not counts). */
export interface FailurePicture {
  readonly path: string;
  readonly edges: readonly number[];
  readonly prior: readonly number[];
  readonly givenFailure: readonly number[];
  readonly meanGivenFailure: number;
  readonly sdGivenFailure: number;
  /** Failures it rests on. */
  readonly failures: number;
}

export interface LimitStateAssessment {
  readonly factorAtMean: number;
  readonly monteCarlo: MonteCarloResult;
  readonly firstOrderSecondMoment: SecondMomentResult;
  readonly firstOrderReliability?: FirstOrderResult;
  readonly secondOrderReliability?: SecondOrderResult;
  /** Only where every measure was asked for, as the next. */
  readonly handMethods?: HandMethods;
  readonly allDrivers?: AllDrivers;
  readonly drivers: readonly Driver[];
  readonly tornado: readonly TornadoBar[];
  readonly failurePicture: readonly FailurePicture[];
  readonly histogram: Histogram;
  readonly convergence: readonly ConvergencePoint[];
}

/** Where the study has yearly values: failure in any year of the period. */
export interface PeriodAssessment {
  readonly years: number;
  readonly probability: number;
  readonly standardError: number;
  readonly interval: readonly [number, number];
  /** Periods that were drawn, and those in which the wall failed. */
  readonly periods: number;
  readonly failures: number;
  /** Probability of failing in each year, given that the wall stood until then; null once no period stands. */
  readonly yearlyGivenSurvival: readonly (number | null)[];
}

export interface SystemAssessment {
  readonly monteCarlo: MonteCarloResult;
  readonly period?: PeriodAssessment;
  readonly bounds: readonly [number, number];
  readonly drivers: readonly Driver[];
  readonly failurePicture: readonly FailurePicture[];
  readonly convergence: readonly ConvergencePoint[];
  /** Only where every measure was asked for, as the next. */
  readonly fromDesignPoints?: SystemFromDesignPoints;
  /** Probability of the system as a function of its strongest unknowns, one at a time. */
  readonly fragility?: readonly FragilityCurve[];
}

export interface BestEstimate {
  readonly method: string;
  readonly probability: number;
  readonly standardError: number;
  readonly interval: readonly [number, number];
  readonly reliabilityIndex: number | null;
  readonly evaluations: number;
  readonly years?: number;
  readonly meetsTarget?: boolean;
  /** How the interval was made. */
  readonly intervalKind?: string;
  /** Why this method was taken. */
  readonly reason?: string;
  /** Reasons not to trust it; empty where there is none. */
  readonly doubts?: readonly string[];
  /** The same probability by an independent method; its evaluations are not among those above. */
  readonly crossCheck?: {
    readonly method: string;
    readonly probability: number;
    readonly standardError: number;
    readonly interval: readonly [number, number];
    readonly evaluations: number;
    /** Whether the two lie within chance of each other (a false alarm once in a thousand). */
    readonly agrees: boolean;
    /** Factor between the two that the check could have seen; null where it saw no failure. */
    readonly seesFactor: number | null;
  };
}

export interface AssessResult extends ResultBase {
  readonly kind: "assess";
  readonly seed: string;
  readonly variables: readonly VariableSummary[];
  readonly limitStates: Readonly<Partial<Record<LimitStateName, LimitStateAssessment>>>;
  readonly system: SystemAssessment;
  readonly bestEstimate: BestEstimate;
  /** Where the study has evidence; samples then follow what is believed after it, everything else what was believed before. */
  readonly evidence?: EvidenceResult;
  /** At the means with partial factors, where they were given. */
  readonly design?: DesignResult;
  readonly target?: {
    readonly probability: number;
    readonly reliabilityIndex: number;
    readonly period?: number;
    readonly reason?: string;
  };
  readonly run: RunRecord;
}

export interface RunRecord {
  readonly version: string;
  readonly seed: string;
  readonly workers: number;
  /** false when it was stopped by the user; what is shown is then of the samples so far. */
  readonly complete: boolean;
  readonly sampling: { readonly evaluations: number; readonly seconds: number };
}

/** What the report is written from. */
export interface ReportInput {
  readonly study: Study;
  readonly check: CheckResult;
  readonly assess: AssessResult;
  /** Where the study has a decision. */
  readonly scope?: ScopeResult;
  /** The wall at the values of `failurePoint(assess)`, for drawing; left out, the page gives the values alone. */
  readonly atFailure?: CheckResult;
  /** What another dimension would bring, where one was varied. */
  readonly size?: SizeResult;
}
