import type { JointSpace } from "../probability/marginal.ts";
import { dot, type Point } from "./point-evaluator.ts";

/** An unknown whose value jumps, such as a mixture with a gap: the row of u = row·z, and the u at which it jumps. */
interface Jumping {
  readonly row: Float64Array;
  readonly jumps: readonly number[];
}

/** A half-space normal · z ≤ bound. */
export interface HalfSpace {
  readonly normal: Float64Array;
  readonly bound: number;
}

/**
 * The slabs of standard normal space between the jumps of its unknowns. Within one slab limit states are continuous; a search
 * is kept in the slab it is in, with its sides as half-spaces.
 */
export interface Segments {
  /** Number of the segment, per unknown that jumps. */
  of(z: Point): readonly number[];
  /** The sides of a slab, drawn in by a hair so that their points lie inside. */
  sides(segment: readonly number[]): readonly HalfSpace[];
  /** Starts in the other segments: the origin moved to the middle (by probability) of each, one unknown at a time. */
  readonly otherMiddles: readonly Point[];
}

const hair = 1e-9;

export function segmentsOf(space: JointSpace, middle: (from: number, to: number) => number): Segments {
  const jumping: readonly Jumping[] = space.unknowns.flatMap(({ marginal }, place) =>
    marginal.jumps.length === 0 ? [] : [{ row: space.rows[place], jumps: marginal.jumps }],
  );
  const place = (u: number, jumps: readonly number[]): number => jumps.filter((jump) => u > jump).length;
  const origin = new Float64Array(space.coordinates.length);
  return {
    of: (z) => jumping.map(({ row, jumps }) => place(dot(row, z), jumps)),
    sides: (segment) =>
      jumping.flatMap(({ row, jumps }, j) => {
        const sides: HalfSpace[] = [];
        if (segment[j] > 0) sides.push({ normal: row.map((x) => -x), bound: -(jumps[segment[j] - 1] + hair) });
        if (segment[j] < jumps.length) sides.push({ normal: row, bound: jumps[segment[j]] - hair });
        return sides;
      }),
    otherMiddles: jumping.flatMap(({ row, jumps }) => {
      const home = place(0, jumps);
      const ends = [Number.NEGATIVE_INFINITY, ...jumps, Number.POSITIVE_INFINITY];
      return ends.slice(1).flatMap((end, segment) => {
        if (segment === home) return [];
        const u = middle(ends[segment], end);
        return [origin.map((_, i) => u * row[i])];
      });
    }),
  };
}
