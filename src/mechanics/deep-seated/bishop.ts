import { type Arc, column, terms } from "./arc.ts";

/**
 * Resisting moment of an arc about its centre by Bishop's simplified method, slices infinitely thin, kNm/m:
 *
 *   M_R = R ∫ s′ dl = R ∫ (c + N′ tan φ) dl,   N′ = (σ_v − u − c tan α/F) / m_α · cos α per metre of arc,  m_α = cos α + sin α tan φ/F
 *
 * so that where N′ > 0 the strength along dx is (c + (σ_v − u) tan φ)/m_α, and where it would be negative c/cos α.
 *
 * @source A. W. Bishop (1955), The use of the slip circle in the stability analysis of slopes, Géotechnique 5(1), 7–17
 */
export function resistingMoment(arc: Arc, factor: number): number {
  const s = arc.stretches;
  let sum = 0;
  for (let i = 0; i < arc.count; i++) {
    const at = i * terms;
    sum += losesContact(s, at, factor)
      ? partlyInContact(s, at, factor)
      : inContact(s, at, factor, s[at], s[at + 1], s[at + 2], s[at + 3], s[at + 4]);
  }
  let lines = 0;
  for (let i = 0; i < arc.lineCount; i++) {
    const at = 4 * i;
    const tanFriction = arc.lines[at + 3];
    const tilt = arc.lines[at + 1] + (arc.lines[at] * tanFriction) / factor;
    if (tanFriction > 0) lines += (arc.lines[at + 2] * tanFriction) / tilt;
  }
  return Math.max(arc.frictionless + arc.radius * (arc.radius * sum + lines), 0);
}

/**
 * ∫ (c + σ′ tan φ)/m_α cos α dα in closed form, σ′ = n0 + n1 sin α + n2 cos α. With tan δ = tan φ/F and β = α − δ,
 * m_α = cos β/cos δ, and with Λ = ∫ dβ/cos β
 *
 *   ∫ cos α/cos β       = cos δ β + sin δ ln cos β
 *   ∫ sin α cos α/cos β = −cos 2δ cos β + ½ sin 2δ (2 sin β − Λ)
 *   ∫ cos² α/cos β      =  cos 2δ sin β + sin 2δ cos β + sin² δ Λ
 */
function inContact(
  s: Float64Array,
  at: number,
  factor: number,
  sin1: number,
  cos1: number,
  sin2: number,
  cos2: number,
  angle: number,
): number {
  const tanFriction = s[at + column.tanFriction];
  const slope = tanFriction / factor;
  const cosD = 1 / Math.sqrt(1 + slope * slope);
  const sinD = slope * cosD;
  const sinB1 = sin1 * cosD - cos1 * sinD;
  const cosB1 = cos1 * cosD + sin1 * sinD;
  const sinB2 = sin2 * cosD - cos2 * sinD;
  const cosB2 = cos2 * cosD + sin2 * sinD;
  const cos2D = (cosD - sinD) * (cosD + sinD);
  const sin2D = 2 * sinD * cosD;
  const secant = Math.log(secantGrowth(sinB2, cosB2) / secantGrowth(sinB1, cosB1));
  const rise = sinB2 - sinB1;
  const fall = cosB2 - cosB1;
  const one = cosD * angle + sinD * Math.log(cosB2 / cosB1);
  const sine = -cos2D * fall + sin2D * (rise - 0.5 * secant);
  const cosine = cos2D * rise + sin2D * fall + sinD * sinD * secant;
  const constant = s[at + column.cohesion] + tanFriction * s[at + column.normal0];
  return cosD * (constant * one + tanFriction * (s[at + column.normal1] * sine + s[at + column.normal2] * cosine));
}

/** e^Λ = (1 + sin β)/cos β, whose logarithm is ∫ dβ/cos β. */
function secantGrowth(sin: number, cos: number): number {
  return sin >= 0 ? (1 + sin) / cos : cos / (1 - sin);
}

/** N′ m_α/cos α at a point of a stretch, kPa: positive in contact. */
function contact(s: Float64Array, at: number, factor: number, sin: number, cos: number): number {
  return (
    s[at + column.normal0] +
    s[at + column.normal1] * sin +
    s[at + column.normal2] * cos -
    (s[at + column.cohesion] * sin) / (factor * cos)
  );
}

/**
 * Whether N′ may be negative somewhere on a stretch. σ′ is concave in x where n2 ≥ 0, and −c tan α is concave right of the
 * centre and positive left of it: then it is enough to look at the ends.
 */
function losesContact(s: Float64Array, at: number, factor: number): boolean {
  if (s[at + column.normal2] < 0 || s[at + column.leastNormal] < 0) return true;
  if (s[at + column.cohesion] === 0) return false;
  const [sin1, sin2] = [s[at + column.sin1], s[at + column.sin2]];
  return (
    (sin1 > 0 && !(contact(s, at, factor, sin1, s[at + column.cos1]) >= 0)) ||
    (sin2 > 0 && !(contact(s, at, factor, sin2, s[at + column.cos2]) >= 0))
  );
}

/** Places on a stretch at which the sign of N′ is looked at; a lens of lost contact narrower than that may be missed. */
const looks = 8;

/** The integral of a stretch cut where N′ changes its sign; without contact the strength is c/cos α dx = c R dα. */
function partlyInContact(s: Float64Array, at: number, factor: number): number {
  const start = Math.atan2(s[at + column.sin1], s[at + column.cos1]);
  const angle = s[at + column.angle];
  const valueAt = (share: number): number => {
    const alpha = start + share * angle;
    return contact(s, at, factor, Math.sin(alpha), Math.max(Math.cos(alpha), 1e-300));
  };
  const piece = (from: number, to: number, touching: boolean): number => {
    if (!touching) return s[at + column.cohesion] * (to - from) * angle;
    const [a1, a2] = [start + from * angle, start + to * angle];
    return inContact(s, at, factor, Math.sin(a1), Math.cos(a1), Math.sin(a2), Math.cos(a2), a2 - a1);
  };
  let sum = 0;
  let from = 0;
  let last = valueAt(0);
  let touching = last >= 0;
  for (let i = 1; i <= looks; i++) {
    const share = i / looks;
    const value = valueAt(share);
    if (value >= 0 !== touching) {
      const crossing = signChange(valueAt, (i - 1) / looks, share, last, value);
      sum += piece(from, crossing, touching);
      from = crossing;
      touching = !touching;
    }
    last = value;
  }
  return sum + piece(from, 1, touching);
}

/** Where a function changes its sign between two places, by the Illinois variant of false position, to 1e-13. */
function signChange(f: (x: number) => number, low: number, high: number, atLow: number, atHigh: number): number {
  let [a, b, fa, fb] = [low, high, atLow, Math.max(atHigh, -1e12)];
  let side = 0;
  for (let i = 0; i < 60 && Math.abs(b - a) > 1e-13; i++) {
    const x = i % 8 === 7 ? 0.5 * (a + b) : (a * fb - b * fa) / (fb - fa);
    const fx = f(x);
    if (fx === 0) return x;
    if (fx > 0 === fb > 0) {
      [b, fb] = [x, fx];
      if (side === 1) fa *= 0.5;
      side = 1;
    } else {
      [a, fa] = [x, fx];
      if (side === -1) fb *= 0.5;
      side = -1;
    }
    if (Math.abs(fx) < 1e-12 * (Math.abs(atLow) + Math.abs(fb))) return x;
  }
  return 0.5 * (a + b);
}
