/**
 * The same wall by numerical integration, from the conventions alone and without the program's formulas: pressures, weights
 * and moments are sums over thin slices, written down as an engineer would, one wall at a time. It shares no code with src/.
 */
import type { SoilTree, StudyTree } from "./random-study.ts";

export interface SecondOpinion {
  normal: number;
  driving: number;
  stabilising: number;
  overturning: number;
  factors: { sliding: number; overturning: number; bearing: number; eccentricity: number };
  /** Size of what was summed, for tolerances: kN/m and kNm/m. */
  scale: { force: number; moment: number };
}

const gammaWater = 9.81;
const rad = (deg: number): number => (deg * Math.PI) / 180;
const positive = (x: number): number => Math.max(x, 0);

/** ∫ f over [from, to], 3-point Gauss in each of `n` slices between neighbouring breaks. */
function integral(f: (z: number) => number, from: number, to: number, breaks: readonly number[], n = 60): number {
  const cuts = [from, ...breaks.filter((z) => z > from && z < to).sort((a, b) => a - b), to];
  let sum = 0;
  for (let i = 1; i < cuts.length; i++) {
    const step = (cuts[i] - cuts[i - 1]) / n;
    for (let k = 0; k < n; k++) {
      const middle = cuts[i - 1] + (k + 0.5) * step;
      const off = step * 0.5 * Math.sqrt(0.6);
      sum += (step * (5 * f(middle - off) + 8 * f(middle) + 5 * f(middle + off))) / 18;
    }
  }
  return to > from ? sum : 0;
}

/** The stress where a trapezoid of pressure first turns positive is found by bisection: a second way to the crack. */
function bisect(f: (z: number) => number, low: number, high: number): number {
  for (let k = 0; k < 80; k++) {
    const middle = (low + high) / 2;
    if (f(middle) > 0) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

const strength = (soil: SoilTree): { phi: number; c: number } =>
  soil.drainage === "undrained"
    ? { phi: 0, c: soil.undrained_strength ?? 0 }
    : { phi: rad(soil.friction_angle ?? 0), c: soil.cohesion ?? 0 };

/** Where the closed form runs out: no seismic angle, and no thrust steeper than 89° (the program's own convention). */
const steepest = rad(89);

/** Müller-Breslau and Mononobe–Okabe as printed; the root 0 where it has none. */
function wedge(phi: number, delta: number, theta: number, beta: number, psi: number): number {
  const thrust = Math.max(Math.cos(delta + theta + psi), Math.cos(steepest));
  const inner = (Math.sin(phi + delta) * Math.sin(phi - beta - psi)) / (thrust * Math.cos(theta - beta));
  const root = Math.sin(phi - beta - psi) > 0 ? Math.sqrt(inner) : 0;
  return Math.cos(phi - theta - psi) ** 2 / (Math.cos(psi) * Math.cos(theta) ** 2 * thrust * (1 + root) ** 2);
}

/** ψ, below water with the mass of the pore water; soil without buoyant weight has a million times its mass. */
function seismic(kh: number, kv: number, wet: boolean, saturated: number): number {
  const mass = wet ? Math.min(saturated / positive(saturated - gammaWater), 1e6) : 1;
  return Math.min(Math.atan((kh / (1 - kv)) * mass), steepest);
}

/** Pressure per metre of height along its own direction, before the cut at zero. */
function pressureOf(tree: StudyTree, soil: SoilTree, stress: number, theta: number): number {
  const { phi, c } = strength(soil);
  const beta = rad(tree.ground.behind.slope);
  const [cb, cf, sf] = [Math.cos(beta), Math.cos(phi), Math.sin(phi)];
  switch (tree.model.earth_pressure) {
    case "at_rest":
      return (1 - sf) * Math.sqrt(soil.overconsolidation_ratio ?? 1) * (1 + Math.sin(beta)) * stress;
    case "coulomb": {
      const k = wedge(phi, rad(tree.model.wall_friction ?? 0), theta, beta, 0);
      return k * stress - 2 * c * Math.sqrt(k);
    }
    case "rankine": {
      if (c === 0 || beta === 0) {
        const r = Math.sqrt(positive(cb * cb - cf * cf));
        const k = (cb * (cb - r)) / (cb + r);
        return k * stress - 2 * c * Math.sqrt(k); // the cohesive part only on level ground
      }
      const radicand =
        4 * cb * cb * (cb * cb - cf * cf) * stress ** 2 + 4 * c * c * cf * cf + 8 * c * stress * cb * cb * sf * cf;
      return cb * ((2 * cb * cb * stress + 2 * c * cf * sf - Math.sqrt(positive(radicand))) / (cf * cf) - stress);
    }
  }
}

export function secondOpinion(tree: StudyTree): SecondOpinion {
  // outline
  const { stem, base, shear_key: key } = tree.wall;
  const [toe, heel, t] = base ? [base.toe, base.heel, base.thickness] : [0, 0, 0];
  const { height: h, crest_width: crest, foot_width: foot, back_run: backRun } = stem;
  const frontRun = foot - crest - backRun;
  const B = toe + foot + heel;
  const [zCrest, xCrest] = [t + h, toe + foot - backRun];
  const beta = rad(tree.ground.behind.slope);
  const zSurface = zCrest + (B - xCrest) * Math.tan(beta);
  const coulomb = tree.model.earth_pressure === "coulomb";
  const realBack = coulomb && (!base || heel <= (h + t) / 10);
  const theta = realBack ? Math.atan(backRun / h) : 0;
  const zTop = realBack ? zCrest : zSurface;
  const underside = tree.wall.underside_level ?? 0;
  const xPlane = (z: number): number => (realBack ? toe + foot - (z - t) * Math.tan(theta) : B);

  // water
  const { front, behind } = tree.ground;
  const zGround = positive(front.level - underside);
  const behindLevel = tree.water.behind === undefined ? undefined : tree.water.behind.level - underside;
  const frontLevel = tree.water.front === undefined ? undefined : tree.water.front.level - underside;
  const zw = Math.min(positive(behindLevel ?? 0), zTop);
  const zf = positive(frontLevel ?? 0);
  const ze = Math.min(zf, zGround);
  const i = tree.water.flow === "seepage" ? (zw - zf) / (zw + B + ze) : 0;
  const poreBehind = (z: number): number => gammaWater * positive(zw - z) * (1 - i);
  const atToe = gammaWater * (zf + i * ze);
  const poreFront = (z: number): number => {
    if (z < 0) {
      // in front of a key the water stands as it is: none where there is none, lower where it is lower
      if (frontLevel === undefined) return 0;
      return frontLevel < 0 ? gammaWater * positive(frontLevel - z) : atToe - gammaWater * z;
    }
    if (z > zf) return 0;
    return z > ze ? gammaWater * (zf - z) : gammaWater * (zf + i * (ze - z) - z);
  };

  // ground behind
  const bottoms = behind.layers.map((layer) => (layer.bottom ?? Number.NEGATIVE_INFINITY) - underside);
  const soilAt = (z: number): SoilTree => tree.soils[behind.layers[bottoms.findIndex((bottom) => z > bottom)].soil];
  const bulk = (z: number): number => (z < zw ? soilAt(z).saturated_unit_weight : soilAt(z).unit_weight);
  const breaks = [...bottoms, zw, t, zCrest, zf, ze, zGround].filter(Number.isFinite);
  const q = tree.loads.surcharge?.pressure ?? 0;
  const qOnPlane = realBack ? (q * Math.cos(theta) * Math.cos(beta)) / Math.cos(theta - beta) : q;
  // γ is constant between breaks: one Gauss slice each is exact
  const stress = (z: number): number => qOnPlane + integral(bulk, z, zTop, breaks, 1) - poreBehind(z);

  // earth pressure
  const factor = tree.model.factors.earth_thrust;
  const direction = coulomb ? rad(tree.model.wall_friction ?? 0) + theta : beta;
  const atRest = tree.model.earth_pressure === "at_rest";
  const [across, along] = atRest ? [1, Math.tan(beta)] : [Math.cos(direction), Math.sin(direction)];
  const raw = (z: number): number => pressureOf(tree, soilAt(z), stress(z), theta);
  const segments = [0, ...breaks.filter((z) => z > 0 && z < zTop).sort((a, b) => a - b), zTop];
  const turns: number[] = [];
  let crack = zTop;
  let cracked = true;
  for (let k = segments.length - 1; k > 0; k--) {
    const eps = 1e-12 * zTop;
    const [low, high] = [segments[k - 1] + eps, segments[k] - eps];
    if (!(high > low)) continue;
    const [atHigh, atLow] = [raw(high), raw(low)];
    const turn = bisect((z) => (atLow > 0 ? raw(z) : -raw(z)), low, high);
    if (atHigh < 0 !== atLow < 0) turns.push(turn);
    if (stress(high) < 0 !== stress(low) < 0)
      turns.push(bisect((z) => (stress(low) > 0 ? stress(z) : -stress(z)), low, high));
    if (!cracked) continue;
    if (atHigh > 1e-9 * (1 + Math.abs(atLow)) || (atHigh > -1e-9 && atLow > 0)) {
      crack = segments[k];
      cracked = false;
    } else if (atLow > 0) {
      crack = turn;
      cracked = false;
    } else crack = segments[k - 1];
  }
  const pressure = (z: number): number => factor * positive(raw(z));
  const earthBreaks = [...breaks, ...turns];
  const thrust = integral(pressure, 0, zTop, earthBreaks);
  const thrustZ = integral((z) => pressure(z) * z, 0, zTop, earthBreaks);
  let Ph = thrust * across;
  let PhZ = thrustZ * across;
  let Pv = thrust * along;
  let PvX = along * integral((z) => pressure(z) * xPlane(z), 0, zTop, earthBreaks);

  // earthquake
  const quake = tree.loads.earthquake;
  if (quake) {
    const delta = coulomb ? rad(tree.model.wall_friction ?? 0) : beta;
    const rise = (z: number): number => {
      const soil = soilAt(z);
      const { phi } = strength(soil);
      const psi = seismic(quake.kh, quake.kv, z < zw, soil.saturated_unit_weight);
      return (1 - quake.kv) * wedge(phi, delta, theta, beta, psi) - wedge(phi, delta, theta, beta, 0);
    };
    const increment = factor * integral((z) => rise(z) * positive(stress(z)), 0, zTop, earthBreaks);
    const turn = atRest ? [Math.cos(beta), Math.sin(beta)] : [across, along];
    Ph += increment * turn[0];
    PhZ += increment * turn[0] * 0.6 * zTop;
    Pv += increment * turn[1];
    PvX += increment * turn[1] * xPlane(0.6 * zTop);
  }

  // strip and line loads
  const face = realBack ? xCrest : B;
  const loadPressure = (s: number): number => {
    let sum = 0;
    for (const { force, at } of tree.loads.lines) {
      const a = xCrest + at - face;
      if (a > 0) sum += ((4 * force) / Math.PI) * ((a * a * s) / (a * a + s * s) ** 2);
    }
    for (const { pressure: p, from, width } of tree.loads.strips) {
      const [a1, a2] = [positive(xCrest + from - face), positive(xCrest + from + width - face)];
      const shape = (a: number): number => (a > 0 ? Math.atan(a / s) - (a * s) / (a * a + s * s) : 0);
      if (a2 > a1) sum += ((2 * p) / Math.PI) * (shape(a2) - shape(a1));
    }
    return factor * sum;
  };
  const distances = [
    ...tree.loads.lines.map(({ at }) => xCrest + at - face),
    ...tree.loads.strips.flatMap(({ from, width }) => [xCrest + from - face, xCrest + from + width - face]),
  ];
  const near = distances.flatMap((a) => [0.01, 0.1, 0.3, 1, 3, 10, 100].map((share) => zTop - share * a));
  for (const { force, at } of tree.loads.lines) {
    if (!(realBack && at === 0)) continue; // a load at the very edge is the limit a → 0: all of its 2Q/π at the top
    Ph += (factor * 2 * force) / Math.PI;
    PhZ += ((factor * 2 * force) / Math.PI) * zTop;
  }
  Ph += integral((z) => loadPressure(zTop - z), 0, zTop, near);
  PhZ += integral((z) => loadPressure(zTop - z) * z, 0, zTop, near);

  // water on both sides
  const crackWater =
    tree.model.tension_crack === "water" &&
    !atRest &&
    behind.layers.some(({ soil }) => strength(tree.soils[soil]).c > 0);
  const waterBehind = (z: number): number => (crackWater && z > crack ? gammaWater * (zTop - z) : poreBehind(z));
  const waterBreaks = [...breaks, crack];
  const water = integral(waterBehind, 0, zTop, waterBreaks) - integral(poreFront, 0, zf, breaks);
  const waterZ =
    integral((z) => waterBehind(z) * z, 0, zTop, waterBreaks) - integral((z) => poreFront(z) * z, 0, zf, breaks);
  const down = realBack ? Math.tan(theta) : 0;
  const waterDown = down * integral(waterBehind, 0, zTop, waterBreaks);
  const waterDownX = down * integral((z) => waterBehind(z) * xPlane(z), 0, zTop, waterBreaks);

  // weights: [weight, moment about x = 0, moment about z = 0, shakes]
  const weights: [number, number, number, boolean][] = [];
  const region = (
    density: (z: number) => number,
    left: (z: number) => number,
    right: (z: number) => number,
    low: number,
    high: number,
    shakes: boolean,
  ): void => {
    const width = (z: number): number => positive(right(z) - left(z));
    const at = (f: (z: number) => number): number => integral((z) => density(z) * f(z), low, high, breaks);
    weights.push([at(width), at((z) => (width(z) * (left(z) + right(z))) / 2), at((z) => width(z) * z), shakes]);
  };
  const wall = (): number => tree.wall.unit_weight;
  const frontFace = (z: number): number => toe + ((z - t) * frontRun) / h;
  const backFace = (z: number): number => toe + foot - ((z - t) * backRun) / h;
  region(wall, frontFace, backFace, t, zCrest, true);
  if (base)
    region(
      wall,
      () => 0,
      () => B,
      0,
      t,
      true,
    );
  if (key)
    region(
      wall,
      () => key.from_toe,
      () => key.from_toe + key.width,
      -key.depth,
      0,
      true,
    );
  if (!realBack) {
    region(bulk, backFace, () => B, t, zCrest, true);
    const surface = (z: number): number => xCrest + (z - zCrest) / Math.tan(beta);
    if (beta > 0) region(bulk, surface, () => B, zCrest, zSurface, true);
  }
  const frontSoil = tree.soils[front.soil];
  const soaked = frontLevel ?? Number.NEGATIVE_INFINITY;
  const wetFront = (z: number): number => (z < soaked ? frontSoil.saturated_unit_weight : frontSoil.unit_weight);
  const soilTop = front.toe_soil ? Math.min(Math.max(zGround, t), zCrest) : t;
  if (front.toe_soil) region(wetFront, () => 0, frontFace, t, soilTop, false);
  region(
    () => gammaWater,
    () => 0,
    frontFace,
    soilTop,
    Math.max(Math.min(zf, zCrest), soilTop),
    false,
  );
  const onHeel = (pressure: number, from: number, to: number): void => {
    const length = positive(Math.min(to, B) - from);
    weights.push([pressure * length, pressure * length * (from + length / 2), 0, false]);
  };
  if (!realBack) {
    if (tree.loads.surcharge?.on_heel) onHeel(q, xCrest, B);
    for (const strip of tree.loads.strips)
      if (strip.on_heel) onHeel(strip.pressure, xCrest + strip.from, xCrest + strip.from + strip.width);
    for (const line of tree.loads.lines)
      if (line.on_heel && xCrest + line.at <= B) weights.push([line.force, line.force * (xCrest + line.at), 0, false]);
  }
  const [kh, kv] = [quake?.kh ?? 0, quake?.kv ?? 0];
  let [W, WX, inertia, inertiaZ] = [waterDown, waterDownX, 0, 0];
  for (const [weight, momentX, momentZ, shakes] of weights) {
    W += weight * (shakes ? 1 - kv : 1);
    WX += momentX * (shakes ? 1 - kv : 1);
    if (shakes) [inertia, inertiaZ] = [inertia + kh * weight, inertiaZ + kh * momentZ];
  }

  // uplift, linear from heel to toe
  const atHeel = poreBehind(0);
  const U = ((atHeel + atToe) / 2) * B;
  const UX = (B * B * (2 * atHeel + atToe)) / 6;

  // passive resistance and the stress beside the base
  const total = (z: number): number =>
    integral(wetFront, z, zGround, [soaked, 0], 1) + gammaWater * positive(zf - Math.max(zGround, z));
  const frontStress = (z: number): number => positive(total(z) - poreFront(z));
  const { phi: phiFront, c: cFront } = strength(frontSoil);
  const kp = (1 + Math.sin(phiFront)) / (1 - Math.sin(phiFront));
  const tip = key ? -key.depth : 0;
  const passiveAt = (z: number): number => front.mobilised * (kp * frontStress(z) + 2 * cFront * Math.sqrt(kp));
  const passiveTop = zGround - front.ignore_top;
  const passiveBreaks = [...breaks, 0, soaked];
  const passive = integral(passiveAt, tip, Math.max(passiveTop, tip), passiveBreaks);
  const passiveZ = integral((z) => passiveAt(z) * z, tip, Math.max(passiveTop, tip), passiveBreaks);
  const q0 = positive(frontStress(0) - frontStress(passiveTop));

  // sums
  const normal = W + Pv - U;
  const driving = Ph + water + inertia;
  const stabilising = WX + PvX + (front.in_overturning ? passiveZ : 0);
  const overturning = PhZ + waterZ + UX + inertiaZ;
  const xR = (stabilising - overturning) / normal;
  const width = normal > 0 ? 2 * Math.min(xR, B - xR) : 0;
  const e = B / 2 - xR;
  const contact = normal > 0 && width > 0;
  const capped = (resisting: number, acting: number): number =>
    acting > 0 ? Math.min(positive(resisting / acting), 1000) : 1000;

  // sliding
  const below = tree.soils[tree.ground.below.soil];
  const { phi, c } = strength(below);
  const undrained = below.drainage === "undrained";
  const grip = tree.model.factors.base_resistance;
  const { ratio, angle, adhesion } = tree.wall.sliding_friction;
  const delta = ratio === undefined ? rad(angle ?? 0) : ratio * phi;
  const compressed = contact ? Math.min(B, 1.5 * width) : 0;
  const resisting = undrained
    ? grip * c * positive(width) + passive
    : grip * (normal * Math.tan(delta) + adhesion * compressed) + passive;
  const sliding = normal > 0 ? capped(resisting, driving) : 0;

  // bearing
  const H = positive(driving);
  const waterBelow = frontLevel ?? behindLevel;
  const depth = waterBelow === undefined ? Number.POSITIVE_INFINITY : positive(-waterBelow);
  const buoyant = below.saturated_unit_weight - gammaWater;
  const own = buoyant + (below.unit_weight - buoyant) * Math.min(depth / width, 1);
  let capacity: number;
  if (undrained) capacity = (Math.PI + 2) * c * 0.5 * (1 + (H > 0 ? Math.sqrt(positive(1 - H / (width * c))) : 1)) + q0;
  else {
    const f = Math.max(phi, rad(0.1));
    const nq = Math.exp(Math.PI * Math.tan(f)) * Math.tan(Math.PI / 4 + f / 2) ** 2;
    const nc = (nq - 1) / Math.tan(f);
    const method = tree.model.bearing;
    const ng =
      method === "vesic"
        ? 2 * (nq + 1) * Math.tan(f)
        : method === "en1997"
          ? 2 * (nq - 1) * Math.tan(f)
          : (nq - 1) * Math.tan(1.4 * f);
    const bracket = positive(1 - H / (normal + (width * c) / Math.tan(f)));
    const alpha = Math.atan(H / normal);
    const [iq, ig] =
      method === "meyerhof"
        ? [(1 - alpha / (Math.PI / 2)) ** 2, alpha > f ? 0 : (1 - alpha / f) ** 2]
        : [bracket ** 2, bracket ** 3];
    const ic = method === "meyerhof" ? iq : positive(iq - (1 - iq) / (nc * Math.tan(f)));
    capacity = c * nc * ic + q0 * nq * iq + 0.5 * own * width * ng * ig;
  }
  const bearing = contact ? capped(tree.model.factors.bearing_capacity * capacity, normal / width) : 0;

  return {
    normal,
    driving,
    stabilising,
    overturning,
    factors: {
      sliding,
      overturning: capped(stabilising, overturning),
      bearing,
      eccentricity: contact ? capped(tree.assessment.eccentricity_limit * B, Math.abs(e)) : 0,
    },
    scale: {
      force: Math.abs(W) + Math.abs(Ph) + Math.abs(Pv) + Math.abs(U) + Math.abs(water) + inertia,
      moment: Math.abs(WX) + Math.abs(PhZ) + Math.abs(PvX) + Math.abs(UX) + Math.abs(waterZ) + Math.abs(inertiaZ),
    },
  };
}
