import { normalUpper, normalUpperQuantile } from "../numeric/normal.ts";
import type { JointSpace } from "../probability/marginal.ts";
import {
  type DesignPointStatus,
  farthest,
  type LocalSearch,
  type Margins,
  near,
  searchDesignPoint,
} from "./design-point.ts";
import { drawBack, explore, startsFrom } from "./exploration.ts";
import type { LimitStates } from "./limit-states.ts";
import { between, norm, type Point, pointEvaluator, scaled } from "./point-evaluator.ts";
import { type Segments, segmentsOf } from "./segments.ts";

export interface DesignPoint {
  /** Place of the limit state. */
  readonly state: number;
  readonly point: Point;
  /** Distance from the origin; below 0 where the origin itself fails. */
  readonly reliabilityIndex: number;
  readonly status: Exclude<DesignPointStatus, "none">;
  readonly gradient: Point;
}

export interface StateSearch {
  /** Distinct points, the nearest first; empty where nothing failing was found. */
  readonly points: readonly DesignPoint[];
  readonly originFails: boolean;
  readonly evaluations: number;
}

export interface DesignPointSearch {
  /** One per limit state. */
  readonly states: readonly StateSearch[];
  readonly evaluations: number;
}

const startsPerState = 5;

/**
 * Design points of every limit state, from several starts: the origin, the middles of other segments where an unknown jumps, and
 * failing points far out.
 *
 * One start is not enough: on a wall whose drains work or are blocked, the search from the origin converges to a point that is
 * not the nearest.
 *
 * @param known points of limit states much like these, to start from as well
 */
export function findDesignPoints(
  states: LimitStates,
  space: JointSpace,
  seed: string,
  known: readonly DesignPoint[] = [],
): DesignPointSearch {
  const evaluator = pointEvaluator(states);
  const segments = segmentsOf(space, middleOf);
  const before = evaluationsOf(states);
  const exploration = explore(states, evaluator, seed);
  const origin = new Float64Array(states.dimension);
  const atOrigin = evaluator.factors([origin]);
  const searches = states.names.map((_, place): StateSearch => {
    const start = evaluationsOf(states);
    const originFails = atOrigin[place][0] < 1;
    const margins: Margins = originFails
      ? (points) => evaluator.margins(place, points).map((value) => -value)
      : (points) => evaluator.margins(place, points);
    const starts = originFails
      ? [origin]
      : [
          origin,
          ...segments.otherMiddles,
          ...startsFrom(exploration, margins, place, startsPerState),
          ...known.filter(({ state }) => state === place).map(({ point }) => point),
        ];
    const found = searchAll(margins, segments, starts);
    const points = found.map(({ point, status, gradient }) => ({
      state: place,
      point,
      reliabilityIndex: originFails ? -norm(point) : norm(point),
      status: status as DesignPoint["status"],
      gradient,
    }));
    return { points, originFails, evaluations: evaluationsOf(states) - start };
  });
  return { states: searches, evaluations: evaluationsOf(states) - before };
}

export const evaluationsOf = (states: LimitStates): number => states.evaluations.exact + states.evaluations.batched;

/** The middle of a range of a standard normal by its probability. */
export function middleOf(from: number, to: number): number {
  if (from + to < 0) return -middleOf(-to, -from);
  const beyond = to === Number.POSITIVE_INFINITY ? 0 : normalUpper(to);
  return normalUpperQuantile(0.5 * (normalUpper(from) + beyond));
}

/** Searches from every start, drops what was found before, nearest first. */
export function searchAll(margins: Margins, segments: Segments, starts: readonly Point[]): LocalSearch[] {
  const kept: LocalSearch[] = [];
  for (const start of starts) {
    const proven = kept.filter(({ status }) => status !== "usable").map(({ point }) => point);
    const found = atLeastUsable(margins, searchDesignPoint(margins, segments, start, proven), start);
    if (found === undefined || norm(found.point) > farthest) continue;
    const twin = kept.findIndex((other) => near(other.point, found.point));
    if (twin < 0) kept.push(found);
    else if (better(found, kept[twin])) kept[twin] = found;
  }
  return kept
    .filter((search) => search.status !== "usable" || !kept.some((other) => inBasinOf(margins, search, other)))
    .sort((a, b) => norm(a.point) - norm(b.point));
}

/** Whether failure goes on all the way from a point that nothing proves to a nearer one that is proven. */
function inBasinOf(margins: Margins, search: LocalSearch, other: LocalSearch): boolean {
  if (other === search || other.status === "usable" || norm(other.point) > norm(search.point)) return false;
  // a hair beyond the surface, on which both ends lie
  const shares = [0.1, 0.3, 0.5, 0.7, 0.9];
  return margins(shares.map((share) => scaled(between(search.point, other.point, share), 1.01))).every(
    (value) => value < 0,
  );
}

/** A search that did not converge still gives a failing point on the surface, from where it ended or from its start. */
function atLeastUsable(margins: Margins, found: LocalSearch, start: Point): LocalSearch | undefined {
  if (found.status !== "usable") return found.status === "none" ? undefined : found;
  const trials = [found.point, scaled(found.point, 1.001), scaled(found.point, 1.02), start].filter(
    (point) => norm(point) > 0,
  );
  const values = margins(trials);
  const failing = trials.filter((_, i) => values[i] < 0).sort((a, b) => norm(a) - norm(b))[0];
  if (failing === undefined) return undefined;
  return { ...found, point: drawBack(margins, [failing], 20)[0], status: "usable" };
}

function better(a: LocalSearch, b: LocalSearch): boolean {
  const proven = (search: LocalSearch): number => (search.status === "usable" ? 0 : 1);
  return proven(a) > proven(b) || (proven(a) === proven(b) && norm(a.point) < norm(b.point) - 1e-9);
}
