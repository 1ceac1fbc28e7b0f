/**
 * A study after reading: plain data, safe to clone to a worker or a browser.
 *
 * Every number is in m, kN, kPa, kN/m³ per metre run of wall, whatever units the file was written in; angles are in
 * degrees, as in the study and result files (mechanics turns them into radians at its own door). Keys are camelCase here;
 * `path` strings everywhere keep the words of the file (`soils.fill.friction_angle`).
 */
export interface Study {
  readonly title: string;
  readonly notes: string;
  readonly units: Units;
  readonly wall: Wall;
  readonly soils: Readonly<Record<string, Soil>>;
  readonly ground: Ground;
  readonly water: Water;
  readonly loads: Loads;
  readonly model: Model;
  readonly correlations: readonly Correlation[];
  readonly assessment: Assessment;
  readonly evidence: readonly Evidence[];
  readonly decision?: Decision;
  /** Free text of where a value came from, by path. */
  readonly sources: Readonly<Record<string, string>>;
  /** The file's own tree as plain JSON (after `--set`), so that `change` and `--set` can be applied and read again. */
  readonly document: unknown;
  /** File name for messages; empty when built in code. */
  readonly file: string;
  /** Notes that reading raised (plausibility, defaults), never refusals. */
  readonly notices: readonly Notice[];
}

export interface Notice {
  readonly path: string;
  readonly message: string;
}

export type Units = "metric" | "us";

/** A certain number or an uncertain one; house units, angles in degrees. */
export type Quantity = number | UncertainQuantity;

export interface UncertainQuantity {
  readonly distribution: Distribution;
  /** The distribution is of one year's largest value. */
  readonly yearly: boolean;
  /**
   * κ, the share of the variance that is knowledge, where the study states one (scatter, measured, yearly); absent for a
   * plain distribution (then 1 before correlation). A yearly variable without a stated share has 0.
   */
  readonly knowledge?: number;
  /** What `scatter` said, for the report and for investigations. */
  readonly scatter?: Scatter;
  /** A range in the engineer's words, where the spread came from one. */
  readonly range?: {
    readonly lowest: number;
    readonly likely: number;
    readonly highest: number;
    readonly widthInSd: number;
  };
}

export interface Scatter {
  readonly inherent: number;
  readonly scaleOfFluctuation?: number;
  readonly averagedOver?: number;
  readonly averaging: "simple" | "exponential" | "gaussian" | "triangular";
  readonly measurement: number;
  readonly transformation: number;
  readonly tests: number;
  /** Γ², the variance reduction, 1 without averaging. */
  readonly varianceReduction: number;
}

/** Mean and sd are those of the variable itself, but for truncated_normal (its parent). All fields in the quantity's unit. */
export type Distribution =
  | { readonly kind: "normal"; readonly mean: number; readonly sd: number }
  | { readonly kind: "lognormal"; readonly mean: number; readonly sd: number; readonly shift: number }
  | {
      readonly kind: "truncated_normal";
      readonly mean: number;
      readonly sd: number;
      readonly from: number;
      readonly to: number;
    }
  | { readonly kind: "uniform"; readonly from: number; readonly to: number }
  | { readonly kind: "triangular"; readonly from: number; readonly peak: number; readonly to: number }
  | { readonly kind: "beta"; readonly from: number; readonly to: number; readonly mean: number; readonly sd: number }
  | { readonly kind: "gumbel"; readonly mean: number; readonly sd: number }
  | { readonly kind: "weibull"; readonly shape: number; readonly scale: number; readonly shift: number }
  | { readonly kind: "gamma"; readonly mean: number; readonly sd: number }
  | { readonly kind: "mixture"; readonly parts: readonly { readonly share: number; readonly of: Distribution }[] }
  /** varianceReduction: the Γ² that replaces the 1 in s²(1 + 1/n); 1 without averaging. */
  | {
      readonly kind: "measured";
      readonly values: readonly number[];
      readonly as: "normal" | "lognormal";
      readonly varianceReduction: number;
    };

export interface Wall {
  readonly stem: {
    readonly height: Quantity;
    readonly crestWidth: Quantity;
    readonly footWidth: Quantity;
    readonly backRun: Quantity;
  };
  readonly base?: { readonly toe: Quantity; readonly heel: Quantity; readonly thickness: Quantity };
  readonly shearKey?: { readonly depth: Quantity; readonly width: Quantity; readonly fromToe: Quantity };
  readonly unitWeight: Quantity;
  /** Site level of z = 0; levels in the study are site levels then. 0 where the study names none. */
  readonly undersideLevel: Quantity;
  /** Absent only where the soil below is undrained. */
  readonly slidingFriction?: { readonly ratio?: Quantity; readonly angle?: Quantity; readonly adhesion: Quantity };
}

export interface Soil {
  readonly name: string;
  readonly unitWeight: Quantity;
  /** Absent: the moist unit weight, whatever it turns out to be, plus 2 kN/m³. */
  readonly saturatedUnitWeight?: Quantity;
  readonly frictionAngle: Quantity;
  readonly cohesion: Quantity;
  readonly drainage: "drained" | "undrained";
  readonly undrainedStrength?: Quantity;
  readonly overconsolidationRatio?: Quantity;
}

export interface Ground {
  readonly behind: { readonly slope: Quantity; readonly layers: readonly Layer[] };
  readonly below: { readonly soil: string; readonly layers: readonly Layer[]; readonly firmLevel?: Quantity };
  readonly front: {
    /** Absent: the underside of the base. */
    readonly level?: Quantity;
    /** The soil below where the study names none. */
    readonly soil: string;
    readonly mobilised: Quantity;
    readonly ignoreTop: Quantity;
    readonly toeSoil: boolean;
    readonly inOverturning: boolean;
  };
}

/** From the top down; the last of a list has no bottom. */
export interface Layer {
  readonly soil: string;
  readonly bottom?: Quantity;
}

export interface Water {
  readonly behind?: { readonly level: Quantity };
  readonly front?: { readonly level: Quantity };
  readonly flow: "hydrostatic" | "seepage";
}

export interface Loads {
  readonly surcharge?: { readonly pressure: Quantity; readonly onHeel: boolean };
  readonly strips: readonly {
    readonly pressure: Quantity;
    readonly from: Quantity;
    readonly width: Quantity;
    readonly onHeel: boolean;
  }[];
  readonly lines: readonly { readonly force: Quantity; readonly at: Quantity; readonly onHeel: boolean }[];
  readonly earthquake?: { readonly kh: Quantity; readonly kv: Quantity };
}

export interface Model {
  readonly earthPressure: "rankine" | "coulomb" | "at_rest";
  /** Absent: follows the geometry. */
  readonly plane?: "virtual_back" | "wall_back";
  readonly wallFriction: Quantity;
  readonly bearing: "vesic" | "en1997" | "meyerhof";
  readonly tensionCrack: "dry" | "water";
  readonly factors: {
    readonly earthThrust: Quantity;
    readonly baseResistance: Quantity;
    readonly bearingCapacity: Quantity;
    readonly deepSeated: Quantity;
  };
}

export interface Correlation {
  readonly between: readonly [string, string];
  readonly coefficient: number;
}

export type LimitStateName = "sliding" | "overturning" | "bearing" | "eccentricity" | "deep_seated";

export interface Assessment {
  readonly limitStates: readonly LimitStateName[];
  readonly eccentricityLimit?: number;
  readonly seed: string;
  readonly samples: number;
  readonly precision: number;
  readonly period?: number;
  readonly target?: Target;
}

/** probability and reliabilityIndex are always both there: p = Φ(−β). */
export interface Target {
  readonly reliabilityIndex: number;
  readonly probability: number;
  readonly period?: number;
  readonly reason?: string;
  readonly named?: string;
}

export type Evidence =
  | {
      readonly kind: "results";
      readonly of: string;
      readonly results: readonly number[];
      readonly error?: number;
      readonly transformation?: number;
    }
  | { readonly kind: "survived"; readonly under: Readonly<Record<string, Quantity>> };

export interface Decision {
  readonly currency: string;
  readonly failureCost: number | Readonly<Partial<Record<LimitStateName, number>>>;
  readonly mustMeetTarget: boolean;
  readonly options: readonly Option[];
  readonly investigations: readonly Investigation[];
}

export interface Option {
  readonly name: string;
  readonly cost: number;
  /** Path to replacement, as written (not yet converted): applied to `document` and read again. */
  readonly change: Readonly<Record<string, unknown>>;
  readonly alwaysOpen: boolean;
}

export interface Investigation {
  readonly name: string;
  readonly cost?: number;
  readonly informs: readonly {
    readonly path: string;
    readonly tests: number;
    readonly error?: number;
    readonly transformation?: number;
  }[];
}
