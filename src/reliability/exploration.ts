import { fillNormals } from "../probability/streams.ts";
import type { LimitStates } from "./limit-states.ts";
import { cosine, norm, type Point, type PointEvaluator, scaled } from "./point-evaluator.ts";

/** Points that look for failure far from the origin, with the factors of every limit state there. */
export interface Exploration {
  readonly points: readonly Point[];
  readonly factors: readonly Float64Array[];
}

const stretches = [1.5, 2.5, 4];
const reach = 7;

/**
 * Points of stretched normals (standard deviation 1.5, 2.5 and 4 in turn), drawn in to a radius of 7 where they lie beyond.
 * All limit states share them.
 */
export function explore(states: LimitStates, evaluator: PointEvaluator, seed: string, count = 300): Exploration {
  const column = new Float64Array(count);
  const points = Array.from({ length: count }, () => new Float64Array(states.dimension));
  states.keys.forEach((key, j) => {
    fillNormals(seed, "exploration", key, 0, column, count);
    for (let i = 0; i < count; i++) points[i][j] = column[i] * stretches[i % stretches.length];
  });
  const held = points.map((point) => scaled(point, Math.min(1, reach / norm(point))));
  return { points: held, factors: evaluator.factors(held, false) };
}

const candidates = 12;

/**
 * Starts for a search: failing points drawn back along their ray to the surface, the nearest first, in distinct directions.
 *
 * @param most how many at most
 */
export function startsFrom(
  exploration: Exploration,
  margins: (points: readonly Point[]) => Float64Array,
  place: number,
  most: number,
): readonly Point[] {
  const factor = exploration.factors[place];
  const failing = exploration.points.filter((_, i) => factor[i] < 1).sort((a, b) => norm(a) - norm(b));
  const drawn = drawBack(margins, distinct(failing, candidates), 4).sort((a, b) => norm(a) - norm(b));
  return drawBack(margins, distinct(drawn, most), 6);
}

/** The first of the points in each direction, no two within 45 degrees of each other. */
function distinct(points: readonly Point[], most: number): Point[] {
  const kept: Point[] = [];
  for (const point of points) {
    if (kept.length === most) break;
    if (kept.every((other) => cosine(other, point) < 0.7)) kept.push(point);
  }
  return kept;
}

/** Bisection along the rays from the origin, all points at once; the ends returned fail. */
export function drawBack(
  margins: (points: readonly Point[]) => Float64Array,
  failing: readonly Point[],
  rounds: number,
): Point[] {
  const safe = failing.map(() => 0);
  const failed = failing.map(() => 1);
  for (let round = 0; round < rounds && failing.length > 0; round++) {
    const middle = failing.map((_, i) => 0.5 * (safe[i] + failed[i]));
    const values = margins(failing.map((point, i) => scaled(point, middle[i])));
    values.forEach((value, i) => {
      if (value < 0) failed[i] = middle[i];
      else safe[i] = middle[i];
    });
  }
  return failing.map((point, i) => scaled(point, failed[i]));
}
