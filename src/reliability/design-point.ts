import { nearestPoint } from "../numeric/nonnegative-least-squares.ts";
import { between, cosine, dot, norm, type Point, scaled } from "./point-evaluator.ts";
import type { HalfSpace, Segments } from "./segments.ts";

/**
 * smooth: the gradient there points at the origin. corner: several linearisations meet, or the side of a jump holds it.
 * usable: it fails and lies on the surface, but nothing shows that it is the nearest. none: nothing failing was found.
 */
export type DesignPointStatus = "smooth" | "corner" | "usable" | "none";

export interface LocalSearch {
  readonly point: Point;
  readonly status: DesignPointStatus;
  /** Gradient of the margin there, by differences on one side. */
  readonly gradient: Point;
  readonly iterations: number;
  /** Length of the last step: what is left of the search where it has not converged. */
  readonly lastStep: number;
}

/** A margin that is negative on failure, at several points at once. */
export type Margins = (points: readonly Point[]) => Float64Array;

interface Linearisation {
  readonly at: Point;
  readonly margin: number;
  readonly gradient: Point;
}

const difference = 1e-5;
const stepTolerance = 1e-4;
const marginTolerance = 1e-7;
const longestStep = 4;
const patience = 12;
const mostIterations = 60;
/** Beyond this distance a probability (2e-33) means nothing. */
export const farthest = 12;

/**
 * Nearest point to the origin of the surface where a margin is 0, from one start.
 *
 * Each step aims at the nearest point of the linearised failing side, kept within the segment between jumps; with one
 * linearisation in hand this is the iteration of Hasofer, Lind, Rackwitz and Fiessler, made safe by a descent of
 * `½|z|² + c|margin|`. Where that stalls, as it does at corners, linearisations within a radius of 1 are kept and the nearest
 * point is sought that meets them all; the multipliers then say which of them hold it.
 *
 * @param start in any segment, on either side of the surface
 * @param known design points found before: a search that comes near to one ends there, with status none
 * @source A. M. Hasofer and N. C. Lind (1974), ASCE J. Eng. Mech. 100, 111–121; P.-L. Liu and A. Der Kiureghian (1991),
 *   Optimization algorithms for structural reliability, Structural Safety 9, 161–177 (the merit function); corners by
 *   least distance programming, Lawson and Hanson (1974), chapter 23
 */
export function searchDesignPoint(
  margins: Margins,
  segments: Segments,
  start: Point,
  known: readonly Point[] = [],
): LocalSearch {
  let z: Point = start;
  let [margin] = margins([z]);
  let bundle: readonly Linearisation[] = [];
  let stalled = false;
  let lastStep = Number.POSITIVE_INFINITY;
  let gradient: Point = z.map(() => 0);
  let iterations = 0;
  let nearest = Number.POSITIVE_INFINITY;
  let since = 0;
  const ended = (point: Point, status: DesignPointStatus): LocalSearch => ({
    point,
    status,
    gradient,
    iterations,
    lastStep,
  });
  for (; iterations < mostIterations; iterations++) {
    gradient = gradientAt(margins, segments, z, margin);
    const here: Linearisation = { at: z, margin, gradient };
    bundle = [here, ...bundle.filter((other) => ofAnotherPiece(other, here))];
    const sides = segments.sides(segments.of(z));
    const aim = aimAt(stalled ? bundle : [here], sides) ?? aimAt([here], sides);
    if (aim === undefined) return ended(z, "none");
    lastStep = norm(aim.point.map((value, i) => value - z[i]));
    const onSurface = Math.abs(margin) <= marginTolerance || (margin < 0 && aim.holders.length === 0);
    if (lastStep <= stepTolerance * Math.max(1, norm(z)) && onSurface) {
      const held = aim.holders.length > 1 || aim.heldBySide;
      const onward: Point | undefined = held ? nearerFailure(margins, aim, sides) : undefined;
      if (onward === undefined)
        return ended(aim.point, held && (aim.heldBySide || !isSmooth(margins, aim.point)) ? "corner" : "smooth");
      stalled = false;
      bundle = [];
      z = onward;
      [margin] = margins([z]);
      continue;
    }
    const heading = lastStep < 2 ? [z, aim.point] : [z];
    if (norm(z) > farthest || known.some((point) => heading.some((at) => near(point, at)))) return ended(z, "none");
    const reachable = lastStep > longestStep ? between(z, aim.point, longestStep / lastStep) : aim.point;
    const next: Step = descend(margins, z, margin, gradient, reachable);
    stalled ||= next.stalled;
    z = next.point;
    margin = next.margin;
    // distance of the point and, counted twice, of the surface from it: does the search still get nearer?
    const reached = norm(z) + (2 * Math.abs(margin)) / norm(gradient);
    if (reached < nearest - 1e-7) {
      nearest = reached;
      since = 0;
    } else if (++since > patience) break;
  }
  const settled = lastStep <= 1e-3 * Math.max(1, norm(z)) && Math.abs(margin) <= 1e-3;
  if (!settled) return ended(z, "usable");
  return ended(
    z.map((value, i) => value - (margin * gradient[i]) / dot(gradient, gradient)),
    "smooth",
  );
}

/** Whether the surface is smooth at a point: differences to both sides agree, and point at the origin. 2 d + 1 evaluations. */
export function isSmooth(margins: Margins, z: Point): boolean {
  const step = 1e-4;
  const moved = Array.from(z, (_, j) => j).flatMap((j) =>
    [step, -step].map((move) => z.map((value, i) => (i === j ? value + move : value))),
  );
  const [margin, ...values] = margins([z, ...moved]);
  const gradient = z.map((_, j) => (values[2 * j] - values[2 * j + 1]) / (2 * step));
  const bend = z.map((_, j) => (values[2 * j] + values[2 * j + 1] - 2 * margin) / step);
  return norm(bend) < 0.05 * norm(gradient) && Math.abs(cosine(z, gradient)) > 0.999;
}

/** Whether two points lie in the same region, for all that a search needs to know. */
export function near(a: Point, b: Point): boolean {
  return norm(a.map((value, i) => value - b[i])) < 0.3;
}

/** Forward differences; backward for a coordinate along which the forward step would cross a jump. */
function gradientAt(margins: Margins, segments: Segments, z: Point, margin: number): Point {
  const segment = segments.of(z).join();
  const steps = z.map((_, j) => {
    const moved = z.slice();
    moved[j] += difference;
    return segments.of(moved).join() === segment ? difference : -difference;
  });
  const points = Array.from(z, (value, j) => {
    const moved = z.slice();
    moved[j] = value + steps[j];
    return moved;
  });
  return margins(points).map((value, j) => (value - margin) / steps[j]);
}

/**
 * Whether two linearisations belong to different pieces of the surface: their normals differ by more than the curvature of one
 * piece (at most 1.5) explains at their distance.
 */
function ofAnotherPiece(old: Linearisation, latest: Linearisation): boolean {
  const apart = norm(old.at.map((value, i) => value - latest.at[i]));
  const angle = Math.acos(Math.min(1, Math.max(-1, cosine(old.gradient, latest.gradient))));
  return apart <= 1 && angle > 1e-3 + 1.5 * apart;
}

interface Aim {
  readonly point: Point;
  /** Linearised half-spaces that hold the point, and whether the side of a segment does. */
  readonly holders: readonly HalfSpace[];
  readonly heldBySide: boolean;
}

/**
 * Where a search goes on from a point that only seems to be a corner: one of the pieces that hold it fails alone, nearer to the
 * origin; or failure goes on across the jump that holds it.
 */
function nearerFailure(margins: Margins, aim: Aim, sides: readonly HalfSpace[]): Point | undefined {
  const alone = aim.holders.flatMap((holder) => {
    const held = [holder, ...sides];
    const found = nearestPoint(
      held.map(({ normal }) => normal),
      held.map(({ bound }) => bound),
    );
    return found.feasible && norm(found.point) < norm(aim.point) - 1e-3 ? [found.point] : [];
  });
  const across = sides
    .filter(({ normal, bound }) => dot(normal, aim.point) > bound - 1e-7)
    .map(({ normal }) => aim.point.map((value, i) => value + 1e-6 * normal[i]));
  const trials = [...alone, ...across];
  const values = margins(trials);
  return trials.find((_, i) => values[i] < (i < alone.length ? 1e-3 : 0));
}

function aimAt(bundle: readonly Linearisation[], sides: readonly HalfSpace[]): Aim | undefined {
  const steep = bundle.filter(({ gradient }) => norm(gradient) > 1e-12);
  if (steep.length === 0) return undefined;
  // rows of unit length, so that multipliers can be compared
  const normals = steep.map(({ gradient }) => scaled(gradient, 1 / norm(gradient)));
  const bounds = steep.map(({ at, margin, gradient }, j) => dot(normals[j], at) - margin / norm(gradient));
  const found = nearestPoint(
    [...normals, ...sides.map(({ normal }) => normal)],
    [...bounds, ...sides.map(({ bound }) => bound)],
  );
  if (!found.feasible) return undefined;
  const { multipliers } = found;
  const enough = 1e-3 * Math.max(...multipliers);
  const holders = normals.map((normal, j) => ({ normal, bound: bounds[j] })).filter((_, j) => multipliers[j] > enough);
  return {
    point: found.point,
    holders,
    heldBySide: multipliers.subarray(steep.length).some((value) => value > enough),
  };
}

interface Step {
  readonly point: Point;
  readonly margin: number;
  readonly stalled: boolean;
}

/** The largest of four trial steps that lowers the merit function as Armijo demands. */
function descend(margins: Margins, z: Point, margin: number, gradient: Point, aim: Point): Step {
  const penalty = 2 * Math.max(norm(z) / norm(gradient), (0.5 * dot(aim, aim)) / Math.max(Math.abs(margin), 0.05));
  const merit = (at: Point, value: number): number => 0.5 * dot(at, at) + penalty * Math.abs(value);
  const before = merit(z, margin);
  const direction = aim.map((value, i) => value - z[i]);
  const slope = dot(z, direction) - penalty * Math.abs(margin);
  const goodEnough = (trial: Point, value: number, share: number): boolean =>
    merit(trial, value) <= before + 0.1 * share * Math.min(slope, 0);
  // most steps are good at their full length: the shorter ones are tried only after it, all at once
  const [full] = margins([aim]);
  if (goodEnough(aim, full, 1)) return { point: aim, margin: full, stalled: false };
  const shares = [0.5, 0.2, 0.05];
  const trials = shares.map((share) => between(z, aim, share));
  const values = margins(trials);
  const enough = trials.findIndex((trial, i) => goodEnough(trial, values[i], shares[i]));
  const merits = trials.map((trial, i) => merit(trial, values[i]));
  const best = enough >= 0 ? enough : merits.indexOf(Math.min(...merits));
  return { point: trials[best], margin: values[best], stalled: true };
}

/**
 * A smooth design point to more digits, by central differences. Each step is as long as the two before it say: longer where they
 * creep, shorter where they swing to and fro.
 *
 * @returns the point whose next step is the shortest, with its gradient
 */
export function refineSmoothPoint(
  margins: Margins,
  found: { readonly point: Point; readonly gradient: Point },
): { readonly point: Point; readonly gradient: Point } {
  let best = found;
  let shortest = Number.POSITIVE_INFINITY;
  let point = found.point;
  let share = 1;
  let before: Point | undefined;
  for (let round = 0; round < 20; round++) {
    const gradient = centralGradient(margins, point);
    const [margin] = margins([point]);
    const step = scaled(gradient, (dot(gradient, point) - margin) / dot(gradient, gradient)).map(
      (value, i) => value - point[i],
    );
    const length = norm(step);
    if (length < shortest) {
      shortest = length;
      best = { point, gradient };
    }
    if (!(length > 1e-9 && length < 1)) break;
    if (before !== undefined)
      share = Math.min(Math.max(share / Math.max(1 - dot(step, before) / dot(before, before), 0.1), 0.01), 5);
    point = point.map((value, i) => value + share * step[i]);
    before = step;
  }
  return best;
}

/** Central differences. */
export function centralGradient(margins: Margins, z: Point): Point {
  const step = 1e-4;
  const points = Array.from(z, (_, j) => j).flatMap((j) =>
    [step, -step].map((move) => {
      const moved = z.slice();
      moved[j] += move;
      return moved;
    }),
  );
  const values = margins(points);
  return z.map((_, j) => (values[2 * j] - values[2 * j + 1]) / (2 * step));
}
