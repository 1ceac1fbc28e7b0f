/** Shape of the result of `size`. Values in house units, angles in degrees. */
import type { ResultBase, RunRecord } from "./results.ts";
import type { LimitStateName } from "./study/study.ts";

export interface SizePoint {
  readonly value: number;
  /** Value of the second dimension, where two vary. */
  readonly second?: number;
  readonly probability: number;
  readonly standardError: number;
  readonly interval: readonly [number, number];
  readonly reliabilityIndex: number | null;
  readonly factorAtMean: Readonly<Partial<Record<LimitStateName, number>>>;
}

export interface SizeResult extends ResultBase {
  readonly kind: "size";
  readonly seed: string;
  /** Path of the dimension, words for it and its unit. */
  readonly vary: string;
  readonly label: string;
  readonly unit: string;
  readonly second?: { readonly vary: string; readonly label: string; readonly unit: string };
  readonly target?: { readonly probability: number; readonly reliabilityIndex: number };
  readonly points: readonly SizePoint[];
  /** Value at which the target is met, found between two points; null where no point or every point meets it. */
  readonly meetsTargetAt?: number | null;
  /** Which side of that value meets the target. */
  readonly meetsTargetSide?: "above" | "below";
  /** The calculation there: what factors of safety the target amounts to for this wall. */
  readonly atTarget?: SizePoint;
  readonly run: RunRecord;
}
