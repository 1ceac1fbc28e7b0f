/** One Float64Array per coordinate or limit state; the first n entries are valid. */
export type Columns = readonly Float64Array[];

/**
 * All that reliability, drivers and decision see of a wall: factors of safety as a function of independent standard
 * normal coordinates. Below 1 is failure of that limit state; the system fails when any of them fails.
 */
export interface LimitStates {
  /** Number of independent standard normal coordinates. */
  readonly dimension: number;
  /** Coordinate keys, for streams: a stream belongs to seed, purpose, key and block. */
  readonly keys: readonly string[];
  readonly names: readonly string[];
  /** Largest n of one call. */
  readonly capacity: number;
  /**
   * @param z dimension columns of at least n entries
   * @param factors one column per name, filled with factors of safety in [0, 1000]
   * @param marks n bytes: 1 slope_unstable, 2 lost_contact, 4 capped, 8 out_of_range; overwritten
   * @param exact true: the formulas themselves; false: tables may stand in (error bounded by a test)
   * Allocates nothing. A gradient is one exact call with dimension + 1 points.
   */
  evaluate(z: Columns, n: number, factors: Columns, marks: Uint8Array, exact: boolean): void;
  /**
   * The same at physical values, exactly: for the methods that step in x (means ± one standard deviation, fractiles).
   *
   * @param x one column per unknown of the joint space, in its order and in the study's units (degrees for angles)
   */
  evaluateAt(x: Columns, n: number, factors: Columns, marks: Uint8Array): void;
  /** The only place where evaluations are counted. */
  readonly evaluations: { exact: number; batched: number };
}
