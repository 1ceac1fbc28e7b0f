import type { JointSpace } from "../probability/marginal.ts";
import { dot, norm } from "../reliability/point-evaluator.ts";

/** Directions in standard normal space that belong to one unknown. */
export interface Directions {
  /** u_i = own_i · z: along it lies all that is told by knowing x_i. */
  readonly own: readonly Float64Array[];
  /** The part of own_i at right angles to all others: along it lies what x_i alone decides; null where the others fix x_i. */
  readonly alone: readonly (Float64Array | null)[];
  /** Whether own and alone differ. */
  readonly correlated: readonly boolean[];
}

const tiny = 1e-9;

export function directionsOf(space: JointSpace): Directions {
  const { rows } = space;
  const correlated = rows.map((row, i) => rows.some((other, j) => j !== i && Math.abs(dot(row, other)) > tiny));
  const alone = rows.map((row, i) =>
    correlated[i]
      ? rest(
          row,
          rows.filter((_, j) => j !== i),
        )
      : row,
  );
  return { own: rows, alone, correlated };
}

/** What is left of a row when its projection on the others is taken off, as a unit vector. */
function rest(row: Float64Array, others: readonly Float64Array[]): Float64Array | null {
  const basis: Float64Array[] = [];
  for (const other of others) {
    const left = lessProjection(other, basis);
    const length = norm(left);
    if (length > 1e-7) basis.push(left.map((value) => value / length));
  }
  const left = lessProjection(row, basis);
  const length = norm(left);
  return length > 1e-7 ? left.map((value) => value / length) : null;
}

/** Gram–Schmidt, twice over against rounding. */
function lessProjection(vector: Float64Array, basis: readonly Float64Array[]): Float64Array {
  const left = vector.slice();
  for (let round = 0; round < 2; round++)
    for (const unit of basis) {
      const along = dot(left, unit);
      for (let j = 0; j < left.length; j++) left[j] -= along * unit[j];
    }
  return left;
}
