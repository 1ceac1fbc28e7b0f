import type { LimitStates } from "./limit-states.ts";

/** A point of standard normal space, one entry per coordinate. */
export type Point = Float64Array;

/** One limit state by its place, or any of them. */
export type FailureEvent = number | "system";

/**
 * The margin of a factor of safety, below 0 on failure: ln F for F ≥ 1, and 2 (F − 1)/(F + 1) below, which meets it with the
 * same slope and curvature and stays bounded where contact is lost (−2 at F = 0).
 */
export function marginOf(factor: number): number {
  return factor >= 1 ? Math.log(factor) : (2 * (factor - 1)) / (factor + 1);
}

export interface PointEvaluator {
  /** Factors of safety at the points: one row per limit state, one entry per point. */
  factors(points: readonly Point[], exact?: boolean): readonly Float64Array[];
  /** Margins of an event at the points; that of the system is the least of its limit states. */
  margins(event: FailureEvent, points: readonly Point[], exact?: boolean): Float64Array;
}

/** Limit states for methods that look at a few points at a time, by default exactly. */
export function pointEvaluator(states: LimitStates): PointEvaluator {
  const { dimension, capacity, names } = states;
  const z = Array.from({ length: dimension }, () => new Float64Array(capacity));
  const columns = names.map(() => new Float64Array(capacity));
  const marks = new Uint8Array(capacity);
  const factors = (points: readonly Point[], exact = true): readonly Float64Array[] => {
    const rows = names.map(() => new Float64Array(points.length));
    for (let start = 0; start < points.length; start += capacity) {
      const n = Math.min(capacity, points.length - start);
      for (let j = 0; j < dimension; j++) for (let i = 0; i < n; i++) z[j][i] = points[start + i][j];
      states.evaluate(z, n, columns, marks, exact);
      for (let k = 0; k < rows.length; k++) rows[k].set(columns[k].subarray(0, n), start);
    }
    return rows;
  };
  return {
    factors,
    margins(event, points, exact = true) {
      const rows = factors(points, exact);
      if (event !== "system") return rows[event].map(marginOf);
      return Float64Array.from(points, (_, i) => marginOf(Math.min(...rows.map((row) => row[i]))));
    },
  };
}

export function dot(a: ArrayLike<number>, b: ArrayLike<number>): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += a[i] * b[i];
  return sum;
}

export const norm = (a: ArrayLike<number>): number => Math.sqrt(dot(a, a));

/** a + share·(b − a). */
export function between(a: Point, b: Point, share: number): Point {
  return a.map((value, i) => value + share * (b[i] - value));
}

export const scaled = (a: Point, factor: number): Point => a.map((value) => value * factor);

/** Cosine of the angle between two directions; 0 where one has no length. */
export function cosine(a: Point, b: Point): number {
  const length = norm(a) * norm(b);
  return length === 0 ? 0 : dot(a, b) / length;
}
