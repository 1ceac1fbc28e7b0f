import type { LimitStateName, Notice } from "../study/study.ts";

/** One Float64Array per slot; the first n entries are valid. */
export type Columns = readonly Float64Array[];
export type Slot = number;

/**
 * A line of the calculation sheet: value = columns[slot][0] after a run with n = 1.
 *
 * `formula` is a template: `{Ka}·{σ}` prints as `Ka·σ′v` with symbols and as `0.283·54.0` with the numbers put in;
 * `of` ties each name in braces to its slot.
 */
export interface Step {
  readonly heading: string;
  readonly slot: Slot;
  readonly symbol: string;
  readonly text: string;
  readonly formula: string;
  readonly of: Readonly<Record<string, Slot>>;
  readonly unit: string;
  readonly source?: string;
  /** Left out of the sheet where these two columns are equal: a stretch of no length. */
  readonly unless?: readonly [Slot, Slot];
}

/** The one formula y = value(x), x an input. May be tabulated where x hangs on a single unknown; a test bounds every table. */
export interface Coefficient {
  readonly name: string;
  readonly from: Slot;
  readonly into: Slot;
  /** x in the units of the column `from` (radians for angles). */
  readonly value: (x: number) => number;
  /** Values of x, in the column's units, where the formula is not smooth. */
  readonly kinks: readonly number[];
}

/** One page of formulas over a block: thrust of layer i, uplift, base, bearing. */
export interface Stage {
  readonly name: string;
  readonly reads: readonly Slot[];
  readonly writes: readonly Slot[];
  run(columns: Columns, count: number): void;
}

export interface KernelInput {
  readonly path: string;
  readonly slot: Slot;
  /** Physical range in the study's unit (degrees for angles); a sample outside is taken at the limit and marked. */
  readonly lowest: number;
  readonly highest: number;
  /** column value = scale · value in the study's unit (π/180 for angles, else 1). */
  readonly scale: number;
  /** In the study's unit; present where the quantity is certain: the column is filled once. */
  readonly fixed?: number;
}

export interface LimitStateSlots {
  readonly limitState: LimitStateName;
  readonly factor: Slot;
  readonly resisting: Slot;
  readonly driving: Slot;
  readonly unit: string;
}

/**
 * A row of the list of forces. Points of application are moments over forces: x = momentX / vertical, z = momentZ /
 * (horizontal, or vertical for a weight, whose momentZ is weight times height).
 */
export interface ForceSlots {
  readonly name: string;
  readonly group: "weight" | "earth" | "water" | "surcharge" | "inertia" | "front";
  readonly horizontal?: Slot;
  readonly vertical?: Slot;
  readonly momentX?: Slot;
  readonly momentZ?: Slot;
  /** x where there is no vertical part to take it from, z where there is no momentZ. */
  readonly x?: Slot;
  readonly z?: Slot;
}

/** One stretch of the pressure diagram, linear in vertical stress between two levels of one soil. */
export interface PressurePart {
  readonly soil: string;
  readonly top: Slot;
  readonly bottom: Slot;
  readonly stressTop: Slot;
  readonly stressBottom: Slot;
  /** Earth pressure, horizontal part in kPa, of a vertical stress at this place; cut at zero. */
  pressure(columns: Columns, verticalStress: number): number;
}

export interface Kernel {
  readonly slots: number;
  readonly names: readonly string[];
  readonly inputs: readonly KernelInput[];
  /** Slots that hold the same value in every sample: certain inputs and all that follows from them alone. */
  readonly constants: readonly { readonly slot: Slot; readonly value: number }[];
  readonly coefficients: readonly Coefficient[];
  /** What varies, in order: a test checks that each reads only what is written before. */
  readonly stages: readonly Stage[];
  readonly limitStates: readonly LimitStateSlots[];
  /** Bits of `mark`, one number per sample; starts from `constantMarks`. */
  readonly marks: Slot;
  readonly constantMarks: number;
  readonly steps: readonly Step[];
  /** Slots that hold angles in radians: the sheet prints them in degrees. */
  readonly angles: readonly Slot[];
  readonly forces: readonly ForceSlots[];
  readonly pressure: readonly PressurePart[];
  /** Slots by name that reading out a result needs (base width, resultant, …). */
  readonly places: Readonly<Record<string, Slot>>;
  /** Notes that only a run of its own can give, at the values of its first sample. */
  readonly notes: readonly ((columns: Columns) => readonly Notice[])[];
  /** Formulas of the surface loads' pressure on the plane at a depth below its top, kPa, horizontal. */
  readonly loadPressure: readonly ((columns: Columns, depth: number) => number)[];
}

/** Bits that a stage or the caller sets beside a sample; they are counted and shown, never hidden. */
export const mark = { slopeUnstable: 1, lostContact: 2, capped: 4, outOfRange: 8 } as const;

/** Every factor of safety lies between 0 and this. */
export const factorCap = 1e3;

/** Unit weight of water, kN/m³. */
export const waterUnitWeight = 9.81;
