import { waterUnitWeight } from "../kernel.ts";
import type { SlipCircle } from "./circle.ts";
import type { Profile } from "./profile.ts";
import { layerAt, type Zone } from "./zone.ts";

/**
 * A circle laid through the ground: its arc in stretches inside which soil, wetness and all that stands above are smooth.
 * α is the slope of the arc, sin α = (x − xc)/R, positive where weight drives; x = xc + R sin α, z = zc − R cos α.
 *
 * On each stretch with friction the vertical stress less the pore pressure is normal0 + normal1 sin α + normal2 cos α.
 */
export interface Arc {
  count: number;
  radius: number;
  /** Driving moment about the centre, kNm/m. */
  driving: number;
  /** Resisting moment of stretches without friction, kNm/m. */
  frictionless: number;
  /** Factors of safety between which m_α is 0.2 or more wherever there is friction. */
  least: number;
  greatest: number;
  /** Row-major, count × `terms`; see the constants below. */
  stretches: Float64Array;
  /** Line loads over friction: sin α, cos α, force, tan φ. */
  lineCount: number;
  lines: Float64Array;
}

export const terms = 11;
/** Columns of a stretch: both ends' sine and cosine, its angle, cohesion, tan φ, the three of the normal stress, tiltless stress at the ends. */
export const column = {
  sin1: 0,
  cos1: 1,
  sin2: 2,
  cos2: 3,
  angle: 4,
  cohesion: 5,
  tanFriction: 6,
  normal0: 7,
  normal1: 8,
  normal2: 9,
  /** Least of the normal stress at the ends: below 0 the stretch may lose contact whatever the cohesion. */
  leastNormal: 10,
} as const;

/** m_α = cos α + sin α tan φ/F may not be smaller where there is friction. */
export const leastTilt = 0.2;

export function makeArc(profile: Profile): Arc {
  const capacity = profile.zones.reduce((sum, zone) => sum + 2 * zone.count + 5, 0);
  return {
    count: 0,
    radius: 0,
    driving: 0,
    frictionless: 0,
    least: 0,
    greatest: 0,
    stretches: new Float64Array(capacity * terms),
    lineCount: 0,
    lines: new Float64Array(4 * profile.lines.length),
  };
}

let cuts = new Float64Array(64);

/** Fills `arc` with the stretches of a circle and its driving moment. */
export function layArc(profile: Profile, circle: SlipCircle, arc: Arc): void {
  arc.count = 0;
  arc.lineCount = 0;
  arc.radius = circle.radius;
  arc.driving = 0;
  arc.frictionless = 0;
  arc.least = 0;
  arc.greatest = Number.POSITIVE_INFINITY;
  const { edges, bands } = profile;
  const { x: xc, radius } = circle;
  const tiny = 1e-12 * radius;
  for (let j = 0; j < bands; j++) {
    const from = Math.max(edges[j], circle.exitX);
    const to = Math.min(edges[j + 1], circle.entryX);
    if (!(to - from > tiny)) continue;
    const count = cutBand(profile, j, circle, from, to);
    let sin1 = (from - xc) / radius;
    for (let i = 1; i < count; i++) {
      const sin2 = (cuts[i] - xc) / radius;
      addStretch(profile, j, circle, arc, Math.max(sin1, -1), Math.min(sin2, 1));
      sin1 = sin2;
    }
  }
  addLines(profile, circle, arc);
  const pond = profile.frontWater - circle.exitZ;
  if (pond > 0) arc.driving -= 0.5 * waterUnitWeight * pond * pond * (circle.z - circle.exitZ - pond / 3);
}

/** Ends of the stretches inside a band, ascending in `cuts`: where the arc meets a boundary of layers or the water line. */
function cutBand(profile: Profile, j: number, circle: SlipCircle, from: number, to: number): number {
  const zone = profile.zones[j];
  if (cuts.length < 2 * zone.count + 8) cuts = new Float64Array(4 * zone.count + 64);
  let count = 0;
  cuts[count++] = from;
  for (let i = 0; i < zone.count - 1; i++) count = cutAtLine(circle, zone.bottom[i], 0, from, to, count);
  const level = profile.water[2 * j];
  if (level !== Number.NEGATIVE_INFINITY) count = cutAtLine(circle, level, profile.water[2 * j + 1], from, to, count);
  // few and nearly in order: by insertion
  for (let i = 2; i < count; i++) {
    const x = cuts[i];
    let k = i;
    for (; k > 1 && cuts[k - 1] > x; k--) cuts[k] = cuts[k - 1];
    cuts[k] = x;
  }
  cuts[count++] = to;
  return count;
}

/** Adds where the lower half of the circle meets the line z = level + slope·x inside (from, to). */
function cutAtLine(circle: SlipCircle, level: number, slope: number, from: number, to: number, count: number): number {
  // with t = x − xc: zc − √(R² − t²) = h + slope·t, h the line's level at the centre, below it
  const drop = circle.z - (level + slope * circle.x);
  const square = 1 + slope * slope;
  const rest = circle.radius * circle.radius * square - drop * drop;
  if (!(rest > 0)) return count;
  const root = Math.sqrt(rest);
  for (let side = -1; side <= 1; side += 2) {
    const t = (slope * drop + side * root) / square;
    const x = circle.x + t;
    if (x > from && x < to && drop - slope * t >= 0) cuts[count++] = x;
  }
  return count;
}

function addStretch(profile: Profile, j: number, circle: SlipCircle, arc: Arc, sin1: number, sin2: number): void {
  if (!(sin2 > sin1)) return;
  const { x: xc, z: zc, radius } = circle;
  const cos1 = Math.sqrt((1 - sin1) * (1 + sin1));
  const cos2 = Math.sqrt((1 - sin2) * (1 + sin2));
  const angle = Math.atan2(sin2 * cos1 - cos2 * sin1, cos1 * cos2 + sin1 * sin2);
  const middle = 0.5 * (sin1 + sin2);
  const xm = xc + radius * middle;
  const zm = zc - radius * Math.sqrt((1 - middle) * (1 + middle));
  const zone = profile.zones[j];
  const i = layerAt(zone, zm);
  const water0 = profile.water[2 * j];
  const water1 = profile.water[2 * j + 1];
  const wet = zm < water0 + water1 * xm;
  // mass, then with loads and without what the earthquake lifts: v0 + v1 sin α + v2 cos α
  let mass0 = profile.mass[2 * j];
  let mass1 = profile.mass[2 * j + 1];
  if (!wet) {
    mass0 -= profile.lift[2 * j];
    mass1 -= profile.lift[2 * j + 1];
  }
  const unitWeight = wet ? zone.saturated[i] : zone.moist[i];
  mass0 += mass1 * xc - (wet ? zone.saturatedStart[i] : zone.moistStart[i]) - unitWeight * zc;
  mass1 *= radius;
  const mass2 = unitWeight * radius;
  const lighter = 1 - profile.kv;
  const load1 = profile.load[2 * j + 1];
  const v0 = lighter * mass0 + profile.load[2 * j] + load1 * xc;
  const v1 = lighter * mass1 + load1 * radius;
  const v2 = lighter * mass2;
  arc.driving +=
    radius *
    radius *
    ((v0 * (sin2 - sin1) * (sin2 + sin1)) / 2 +
      (v1 * (sin2 * sin2 * sin2 - sin1 * sin1 * sin1)) / 3 -
      (v2 * (cos2 * cos2 * cos2 - cos1 * cos1 * cos1)) / 3);
  if (profile.kh !== 0) {
    const arms =
      mass0 * (sin2 - sin1) +
      (mass1 * (sin2 - sin1) * (sin2 + sin1)) / 2 +
      (mass2 * (angle + sin2 * cos2 - sin1 * cos1)) / 2;
    const about = firstMoment(profile, j, zone, i, wet, circle, sin1, cos1, sin2, cos2, angle);
    arc.driving += profile.kh * (zc * radius * arms - about);
  }
  const cohesion = zone.cohesion[i];
  const tanFriction = zone.tanFriction[i];
  if (tanFriction === 0) {
    arc.frictionless += radius * radius * cohesion * angle;
    return;
  }
  const u0 = wet ? waterUnitWeight * (water0 + water1 * xc - zc) : 0;
  const u1 = wet ? waterUnitWeight * water1 * radius : 0;
  const u2 = wet ? waterUnitWeight * radius : 0;
  const normal0 = v0 - u0;
  const normal1 = v1 - u1;
  const normal2 = v2 - u2;
  const at = arc.count * terms;
  const s = arc.stretches;
  s[at + column.sin1] = sin1;
  s[at + column.cos1] = cos1;
  s[at + column.sin2] = sin2;
  s[at + column.cos2] = cos2;
  s[at + column.angle] = angle;
  s[at + column.cohesion] = cohesion;
  s[at + column.tanFriction] = tanFriction;
  s[at + column.normal0] = normal0;
  s[at + column.normal1] = normal1;
  s[at + column.normal2] = normal2;
  // at the surface it is 0 but for rounding
  const rounding = 1e-12 * (Math.abs(normal0) + Math.abs(normal2));
  s[at + column.leastNormal] =
    Math.min(normal0 + normal1 * sin1 + normal2 * cos1, normal0 + normal1 * sin2 + normal2 * cos2) + rounding;
  arc.count++;
  limitTilt(arc, sin1, cos1, tanFriction);
  limitTilt(arc, sin2, cos2, tanFriction);
}

/** Narrows the factors of safety to those with m_α ≥ 0.2 at an end; m_α is concave in α, so ends are enough. */
function limitTilt(arc: Arc, sin: number, cos: number, tanFriction: number): void {
  const spare = cos - leastTilt;
  if (sin < 0) arc.least = Math.max(arc.least, spare > 0 ? (-tanFriction * sin) / spare : Number.POSITIVE_INFINITY);
  else if (spare < 0) arc.greatest = Math.min(arc.greatest, (tanFriction * sin) / -spare);
}

/** ∫ (moment of the mass above the arc about z = 0) dx over a stretch. */
function firstMoment(
  profile: Profile,
  j: number,
  zone: Zone,
  i: number,
  wet: boolean,
  circle: SlipCircle,
  sin1: number,
  cos1: number,
  sin2: number,
  cos2: number,
  angle: number,
): number {
  const { x: xc, z: zc, radius } = circle;
  const coefficient = (k: number): number => profile.moment[3 * j + k] - (wet ? 0 : profile.liftMoment[3 * j + k]);
  const x1 = xc + radius * sin1;
  const x2 = xc + radius * sin2;
  const start = wet ? zone.saturatedMomentStart[i] : zone.moistMomentStart[i];
  const unitWeight = wet ? zone.saturated[i] : zone.moist[i];
  const above =
    (coefficient(0) - start) * (x2 - x1) +
    (coefficient(1) * (x2 - x1) * (x2 + x1)) / 2 +
    (coefficient(2) * (x2 * x2 * x2 - x1 * x1 * x1)) / 3;
  // ∫ z² dx with z = zc − R cos α
  const squares =
    radius *
    (zc * zc * (sin2 - sin1) -
      zc * radius * (angle + sin2 * cos2 - sin1 * cos1) +
      radius * radius * (sin2 - sin1 - (sin2 * sin2 * sin2 - sin1 * sin1 * sin1) / 3));
  return above - (unitWeight * squares) / 2;
}

/** Line loads from the crest to where the circle enters, the entry included. */
function addLines(profile: Profile, circle: SlipCircle, arc: Arc): void {
  const { x: xc, z: zc, radius } = circle;
  for (const { x, force } of profile.lines) {
    if (!(x <= circle.entryX + 1e-9 * radius && x > circle.exitX)) continue;
    arc.driving += force * (x - xc);
    const sin = Math.min((x - xc) / radius, 1);
    const cos = Math.sqrt((1 - sin) * (1 + sin));
    const zone = zoneUnder(profile, x);
    const i = layerAt(zone, zc - radius * cos);
    const at = 4 * arc.lineCount++;
    arc.lines[at] = sin;
    arc.lines[at + 1] = cos;
    arc.lines[at + 2] = force;
    arc.lines[at + 3] = zone.tanFriction[i];
  }
}

function zoneUnder(profile: Profile, x: number): Zone {
  let j = 0;
  while (j < profile.bands - 1 && x > profile.edges[j + 1]) j++;
  return profile.zones[j];
}
