import type { CircleLimits } from "./circle-limits.ts";

/** A slip circle; the arc from exit to entry lies below its centre. m. */
export interface SlipCircle {
  /** Centre. */
  x: number;
  z: number;
  radius: number;
  entryX: number;
  entryZ: number;
  exitX: number;
  exitZ: number;
}

/**
 * The circles through an entry and an exit form a family of one parameter, the bulge b = s/a: rise s of the arc below the
 * chord over half the chord's length a. With k the height of the centre above the middle of the chord,
 *
 *   k = a (1/b − b)/2,   R = a (1/b + b)/2,   b = (√(a² + k²) − k)/a,
 *
 * and a greater b contains every smaller one, below the chord. So each limit on circles is one on b: corners of base and key
 * bound it from below, the firm level and the centre (no lower than either end) from above.
 */
interface Chord {
  /** Middle, half the length, direction from exit to entry. */
  mx: number;
  mz: number;
  a: number;
  cos: number;
  sin: number;
}

/** Where a circle is in a search: each field may be any number, and is taken to the nearest circle that is allowed. */
export interface CirclePlace {
  /** Distance from the heel to the entry, in heights h + t. */
  readonly entry: number;
  /** Distance on the way of the exits from the toe, in heights h + t. */
  readonly exit: number;
  /**
   * 0: touches base or key; 1: as deep as the first of the limits' levels; … ; between two whole numbers the bulge is taken
   * in proportion. Levels beyond what entry and exit allow are taken at the limit.
   */
  readonly depth: number;
}

/** Bulge of a circle that is all but straight: radius 50 times the chord. */
const leastBulge = 0.005;

const chord: Chord = { mx: 0, mz: 0, a: 0, cos: 1, sin: 0 };

function setEnds(limits: CircleLimits, entryX: number, exitWay: number, circle: SlipCircle): void {
  circle.entryX = entryX;
  circle.entryZ = limits.heelTop + limits.surfaceTangent * (entryX - limits.heelX);
  const face = faceLength(limits);
  const onFace = face > 0 && exitWay <= face + footWidth(limits);
  circle.exitX = onFace ? 0 : face - exitWay;
  circle.exitZ = onFace ? -Math.min(exitWay, face) : limits.exitLevel;
  const [dx, dz] = [circle.entryX - circle.exitX, circle.entryZ - circle.exitZ];
  const length = Math.sqrt(dx * dx + dz * dz);
  chord.mx = 0.5 * (circle.entryX + circle.exitX);
  chord.mz = 0.5 * (circle.entryZ + circle.exitZ);
  chord.a = 0.5 * length;
  chord.cos = dx / length;
  chord.sin = dz / length;
}

function bulgeOfHeight(k: number): number {
  // (√(a² + k²) − k)/a, without the difference of like numbers where k > 0
  const hypotenuse = Math.sqrt(chord.a * chord.a + k * k);
  return k > 0 ? chord.a / (hypotenuse + k) : (hypotenuse - k) / chord.a;
}

/** Bulge of the circle through a corner below the chord; 0 for a corner on or above it. */
function bulgeThrough(x: number, z: number): number {
  const [dx, dz] = [x - chord.mx, z - chord.mz];
  const along = dx * chord.cos + dz * chord.sin;
  const below = dx * chord.sin - dz * chord.cos;
  if (!(below > 1e-12 * chord.a)) return 0;
  return bulgeOfHeight((chord.a * chord.a - along * along - below * below) / (2 * below));
}

/** Bulge of the circle that is tangent to a level below both ends; 0 for another level. */
function bulgeTangent(level: number): number {
  const depth = chord.mz - level;
  const rest = depth * depth - chord.a * chord.a * chord.sin * chord.sin;
  if (!(depth > 0 && rest >= 0)) return 0;
  return bulgeOfHeight((chord.a * chord.a - depth * depth) / (depth * chord.cos + Math.sqrt(rest)));
}

/** Least bulge: the circle that touches base or key, or the foot of the face under the toe when it leaves beyond it. */
function leastAllowed(limits: CircleLimits, exitX: number): number {
  let least = leastBulge;
  const { cornersX, cornersZ } = limits;
  for (let i = 0; i < cornersX.length; i++) least = Math.max(least, bulgeThrough(cornersX[i], cornersZ[i]));
  if (limits.exitLevel < 0 && exitX < 0) least = Math.max(least, bulgeThrough(0, limits.exitLevel));
  return least;
}

/** Greatest bulge: tangent to the firm level, or its centre level with the higher end (k = a tan of the chord's slope). */
function greatestAllowed(limits: CircleLimits): number {
  const firm = bulgeTangent(limits.levels[limits.levels.length - 1]);
  return Math.min(firm, bulgeOfHeight((chord.a * Math.abs(chord.sin)) / chord.cos));
}

/** Greatest less least bulge for these ends: below 0 there is no circle. */
function room(limits: CircleLimits, entryX: number, exitWay: number, circle: SlipCircle): number {
  setEnds(limits, entryX, exitWay, circle);
  return greatestAllowed(limits) - leastAllowed(limits, circle.exitX);
}

/** A stretch of the way on which circles from one entry may leave. */
export interface ExitStretch {
  from: number;
  to: number;
}

const scratch: SlipCircle = { x: 0, z: 0, radius: 0, entryX: 0, entryZ: 0, exitX: 0, exitZ: 0 };

/** Length of the face under the toe, where the ground in front is dug away below the underside. */
function faceLength(limits: CircleLimits): number {
  return Math.max(-limits.exitLevel, 0);
}

/** Exits closer than this to the foot of the face are at it, so that rounding does not take them past it. */
const footWidth = (limits: CircleLimits): number => 1e-9 * limits.height;

/**
 * Where circles from this entry may leave on the ground in front, or through the face under the toe. For one entry the centres
 * that are allowed form a convex set, so each is one stretch.
 *
 * @returns false where there is none
 */
export function exitStretch(
  limits: CircleLimits,
  entryX: number,
  part: "face" | "ground",
  stretch: ExitStretch,
): boolean {
  const face = faceLength(limits);
  if (part === "ground")
    return openStretch(limits, entryX, face > 0 ? face + 2 * footWidth(limits) : 0, limits.exitWay, stretch);
  return face > 0 && openStretch(limits, entryX, 0, face, stretch);
}

function openStretch(limits: CircleLimits, entryX: number, low: number, high: number, stretch: ExitStretch): boolean {
  const steps = 24;
  const roomAt = (way: number): number => room(limits, entryX, way, scratch);
  const at = (i: number): number => low + ((high - low) * Math.min(Math.max(i, 0), steps)) / steps;
  let first = -1;
  let last = -1;
  let best = 0;
  let bestRoom = Number.NEGATIVE_INFINITY;
  for (let i = 0; i <= steps; i++) {
    const found = roomAt(at(i));
    if (found >= 0) {
      if (first < 0) first = i;
      last = i;
    }
    if (found > bestRoom) {
      bestRoom = found;
      best = i;
    }
  }
  if (first < 0) {
    const way = widest(roomAt, at(best - 1), at(best + 1));
    if (roomAt(way) < 0) return false;
    stretch.from = edge(roomAt, at(best - 1), way);
    stretch.to = edge(roomAt, at(best + 1), way);
    return true;
  }
  stretch.from = first === 0 ? low : edge(roomAt, at(first - 1), at(first));
  stretch.to = last === steps ? high : edge(roomAt, at(last + 1), at(last));
  return true;
}

/** Bisection between a way without room and one with it; the answer has room. */
function edge(roomAt: (way: number) => number, without: number, withRoom: number): number {
  let [bad, good] = [without, withRoom];
  if (roomAt(bad) >= 0) return bad;
  for (let i = 0; i < 30; i++) {
    const middle = 0.5 * (bad + good);
    if (roomAt(middle) >= 0) good = middle;
    else bad = middle;
  }
  return good;
}

/** Where there is most room, by golden section. */
function widest(roomAt: (way: number) => number, from: number, to: number): number {
  const golden = 0.5 * (Math.sqrt(5) - 1);
  let [a, b] = [from, to];
  for (let i = 0; i < 40; i++) {
    const [c, d] = [b - golden * (b - a), a + golden * (b - a)];
    if (roomAt(c) > roomAt(d)) b = d;
    else a = c;
  }
  return 0.5 * (a + b);
}

const stretch: ExitStretch = { from: 0, to: 0 };

/** The nearest exit to a way that this entry has a circle for, on the ground or on the face as the way is, else on the other; NaN where there is none. */
function nearestExit(limits: CircleLimits, entryX: number, way: number): number {
  const onFace = way <= faceLength(limits);
  const open =
    exitStretch(limits, entryX, onFace ? "face" : "ground", stretch) ||
    exitStretch(limits, entryX, onFace ? "ground" : "face", stretch);
  return open ? Math.min(Math.max(way, stretch.from), stretch.to) : Number.NaN;
}

/**
 * The circle at a place. An exit from which this entry has no circle gives way to the nearest that has one.
 *
 * @returns false where no circle enters there
 */
export function circleAt(limits: CircleLimits, place: ArrayLike<number>, circle: SlipCircle): boolean {
  const { height, heelX, farthestEntry, exitWay, levels } = limits;
  const entryX = Math.min(Math.max(heelX + place[0] * height, heelX), farthestEntry);
  let way = Math.min(Math.max(place[1] * height, 0), exitWay);
  if (!(entryX > heelX)) return false;
  if (room(limits, entryX, way, circle) < 0) {
    way = nearestExit(limits, entryX, way);
    if (Number.isNaN(way)) return false;
    setEnds(limits, entryX, way, circle);
  }
  const least = leastAllowed(limits, circle.exitX);
  const greatest = Math.max(greatestAllowed(limits), least);
  const depth = Math.min(Math.max(place[2], 0), levels.length);
  const piece = Math.min(Math.floor(depth), levels.length - 1);
  const tangent = (i: number): number =>
    i < 0 ? least : Math.min(Math.max(i === levels.length - 1 ? greatest : bulgeTangent(levels[i]), least), greatest);
  const upper = tangent(piece - 1);
  const b = upper + (depth - piece) * (tangent(piece) - upper);
  const k = (chord.a * (1 / b - b)) / 2;
  circle.x = chord.mx - k * chord.sin;
  circle.z = chord.mz + k * chord.cos;
  circle.radius = (chord.a * (1 / b + b)) / 2;
  return true;
}
