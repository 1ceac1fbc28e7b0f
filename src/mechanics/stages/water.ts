import { columnwise } from "../columnwise.ts";
import { type Slot, waterUnitWeight } from "../kernel.ts";
import type { KernelBuilder } from "../kernel-builder.ts";
import { addWeight, type Ledger } from "./ledger.ts";
import type { Outline } from "./outline.ts";

/** Slots of the water on both sides of the wall. */
export interface Ponds {
  /** Level behind, between the underside and the top of the plane; undefined where the study gives none. */
  readonly behind?: Slot;
  /** Level in front, between the underside and the crest. */
  readonly front?: Slot;
  /** Level in front as it is, which may be below the underside; for a shear key. */
  readonly frontAsGiven?: Slot;
  /** Hydraulic gradient along the path of seepage; a constant 0 for hydrostatic water. */
  readonly gradient: Slot;
  /** Depth of the water below the underside, for the unit weight below the base; undefined where dry. */
  readonly depthBelow?: Slot;
}

const localLevel = (level: number, underside: number): number => level - underside;
const between = (level: number, top: number): number => Math.min(Math.max(level, 0), top);
const depthBelowUnderside = (level: number): number => Math.max(-level, 0);

/**
 * Head lost per metre of path: down the virtual back, under the base, up to ground or water in front.
 *
 *   i = (z_w − z_f) / (z_w + B + z_e),  z_e = min(z_f, level of the ground in front)
 */
export function hydraulicGradient(behind: number, front: number, width: number, frontLevel: number): number {
  return (behind - front) / (behind + width + Math.min(front, Math.max(frontLevel, 0)));
}

export function prepareWaterLevels(b: KernelBuilder, o: Outline, top: Slot, frontLevel: Slot, seepage: boolean): Ponds {
  const underside = b.input("wall.underside_level");
  const given = (side: string): Slot | undefined =>
    b.has(`water.${side}.level`)
      ? b.formula(`water ${side}, local`, localLevel, [b.input(`water.${side}.level`), underside])
      : undefined;
  const [behindAsGiven, frontAsGiven] = [given("behind"), given("front")];
  const behind = behindAsGiven === undefined ? undefined : b.formula("water behind", between, [behindAsGiven, top]);
  const front =
    frontAsGiven === undefined ? undefined : b.formula("water in front", between, [frontAsGiven, o.crestLevel]);
  const zero = b.constant(0);
  const gradient =
    seepage && (behind ?? front) !== undefined
      ? b.formula("hydraulic gradient", hydraulicGradient, [behind ?? zero, front ?? zero, o.width, frontLevel])
      : zero;
  const deepest = frontAsGiven ?? behindAsGiven;
  const heading = "Water";
  if (behind !== undefined)
    b.step(heading, behind, "z_w", "water level behind, above the underside", "{z}", { z: behind }, "m");
  if (front !== undefined)
    b.step(heading, front, "z_f", "water level in front, above the underside", "{z}", { z: front }, "m");
  if (b.constantOf(gradient) !== 0)
    b.step(
      heading,
      gradient,
      "i",
      "head lost per metre of seepage path",
      "({z_w} − {z_f}) / ({z_w} + {B} + min({z_f}, {z_g}))",
      { z_w: behind ?? zero, z_f: front ?? zero, B: o.width, z_g: frontLevel },
      "–",
      "linear head loss along the path",
    );
  Object.assign(b.places, {
    ...(behind === undefined ? {} : { waterBehind: behind }),
    ...(frontAsGiven === undefined ? {} : { waterFront: frontAsGiven }),
  });
  return {
    ...(behind === undefined ? {} : { behind }),
    ...(front === undefined || frontAsGiven === undefined ? {} : { front, frontAsGiven }),
    gradient,
    ...(deepest === undefined
      ? {}
      : { depthBelow: b.formula("depth of water below the underside", depthBelowUnderside, [deepest]) }),
  };
}

/** Pore pressure under the heel, kPa: γw z_w (1 − i). */
const headAtHeel = (behind: number, gradient: number): number => waterUnitWeight * behind * (1 - gradient);
/** Pore pressure under the toe, kPa: γw (z_f + i z_e). */
const headAtToe = (front: number, gradient: number, frontLevel: number): number =>
  waterUnitWeight * (front + gradient * Math.min(front, Math.max(frontLevel, 0)));
const upliftForce = (heel: number, toe: number, width: number): number => 0.5 * (heel + toe) * width;
const upliftMoment = (heel: number, toe: number, width: number): number => ((2 * heel + toe) * width * width) / 6;

export interface Uplift {
  readonly force: Slot;
  /** About the tip of the toe. */
  readonly moment: Slot;
  readonly atToe: Slot;
}

/** Uplift under the base, linear from heel to toe. */
export function prepareUplift(b: KernelBuilder, o: Outline, ponds: Ponds, frontLevel: Slot): Uplift | undefined {
  if (ponds.behind === undefined && ponds.front === undefined) return undefined;
  const zero = b.constant(0);
  const atHeel = b.formula("water pressure under the heel", headAtHeel, [ponds.behind ?? zero, ponds.gradient]);
  const atToe = b.formula("water pressure under the toe", headAtToe, [ponds.front ?? zero, ponds.gradient, frontLevel]);
  const force = b.formula("uplift", upliftForce, [atHeel, atToe, o.width]);
  const moment = b.formula("uplift moment", upliftMoment, [atHeel, atToe, o.width]);
  const up = b.formula("uplift, downwards", negative, [force]);
  const upMoment = b.formula("uplift moment, downwards", negative, [moment]);
  b.forces.push({ name: "Uplift", group: "water", vertical: up, momentX: upMoment, z: zero });
  const heading = "Water";
  b.step(
    heading,
    atHeel,
    "u_heel",
    "water pressure under the heel",
    "9.81·{z_w}·(1 − {i})",
    { z_w: ponds.behind ?? zero, i: ponds.gradient },
    "kPa",
  );
  b.step(
    heading,
    atToe,
    "u_toe",
    "water pressure under the toe",
    "9.81·({z_f} + {i}·min({z_f}, {z_g}))",
    { z_f: ponds.front ?? zero, i: ponds.gradient, z_g: frontLevel },
    "kPa",
  );
  b.step(
    heading,
    force,
    "U",
    "uplift, linear from heel to toe",
    "({u_heel} + {u_toe})/2·{B}",
    { u_heel: atHeel, u_toe: atToe, B: o.width },
    "kN/m",
  );
  b.step(
    heading,
    moment,
    "U·x_U",
    "its moment about the toe",
    "(2·{u_heel} + {u_toe})·{B}²/6",
    { u_heel: atHeel, u_toe: atToe, B: o.width },
    "kNm/m",
  );
  return { force, moment, atToe };
}

const negative = (x: number): number => -x;

/** Thrust of the water behind without a crack: ½ γw (1 − i) z_w². */
const thrustBehind = (level: number, gradient: number): number =>
  0.5 * waterUnitWeight * (1 - gradient) * level * level;
const third = (force: number, level: number): number => (force * level) / 3;

/**
 * Thrust of water behind where a crack is full: γw (top − z) from the surface down to the crack's foot, the ground water below.
 */
export function crackedWaterThrust(top: number, crack: number, level: number, gradient: number): number {
  const reach = Math.min(crack, level);
  const ground = waterUnitWeight * (1 - gradient) * (level - 0.5 * reach) * reach;
  return 0.5 * waterUnitWeight * (top - crack) * (top - crack) + ground;
}

/** Its moment about the underside. */
export function crackedWaterMoment(top: number, crack: number, level: number, gradient: number): number {
  const reach = Math.min(crack, level);
  const depth = top - crack;
  const ground = waterUnitWeight * (1 - gradient) * (0.5 * level - reach / 3) * reach * reach;
  return 0.5 * waterUnitWeight * depth * depth * (crack + depth / 3) + ground;
}

export interface WaterBehind {
  /** x of the back face at height z, as a straight line: x = footX − (z − t) tan θ; undefined on the virtual back. */
  readonly backTangent?: Slot;
  readonly top: Slot;
  /** Level of the foot of a crack that is full of water. */
  readonly crack?: Slot;
}

/** Water behind drives; on a real back face it also weighs on the batter. */
export function prepareWaterBehind(
  b: KernelBuilder,
  ledger: Ledger,
  o: Outline,
  ponds: Ponds,
  plane: WaterBehind,
): void {
  if (ponds.behind === undefined && plane.crack === undefined) return;
  const level = ponds.behind ?? b.constant(0);
  const cracked = plane.crack === undefined ? undefined : [plane.top, plane.crack, level, ponds.gradient];
  const force = cracked
    ? b.formula("water thrust behind", crackedWaterThrust, cracked)
    : b.formula("water thrust behind", thrustBehind, [level, ponds.gradient]);
  const moment = cracked
    ? b.formula("water moment behind", crackedWaterMoment, cracked)
    : b.formula("water moment behind", third, [force, level]);
  ledger.pushes.push({ name: "E_w", force, moment, sign: 1 });
  b.step(
    "Water",
    force,
    "E_w",
    plane.crack === undefined ? "thrust of the water behind" : "thrust of the water behind, crack full",
    plane.crack === undefined
      ? "½·9.81·(1 − {i})·{z_w}²"
      : "½·9.81·({z_top} − {z_crack})² + water in the ground below {z_crack}",
    { i: ponds.gradient, z_w: level, z_top: plane.top, z_crack: plane.crack ?? level },
    "kN/m",
  );
  b.step(
    "Water",
    moment,
    "E_w·z",
    "its moment about the underside",
    cracked ? "moment of the diagram" : "{E_w}·{z_w}/3",
    { E_w: force, z_w: level },
    "kNm/m",
  );
  if (plane.backTangent === undefined) {
    b.forces.push({ name: "Water behind", group: "water", horizontal: force, momentZ: moment, x: o.width });
    return;
  }
  const down = b.formula("water on the batter", product, [force, plane.backTangent]);
  const downX = b.formula("moment of water on the batter", batterMoment, [
    force,
    moment,
    plane.backTangent,
    o.footX,
    o.thickness,
  ]);
  b.forces.push({
    name: "Water behind",
    group: "water",
    horizontal: force,
    momentZ: moment,
    x: b.formula("x of water behind", safeRatio, [downX, down, o.footX]),
  });
  addWeight(b, ledger, {
    name: "Water on the back face",
    group: "water",
    weight: down,
    momentX: downX,
    z: b.formula("z of water behind", safeRatio, [moment, force, b.constant(0)]),
    shakes: false,
  });
}

const product = (a: number, b: number): number => a * b;
const safeRatio = (over: number, under: number, otherwise: number): number => (under === 0 ? otherwise : over / under);
/** Vertical part E tan θ at x = footX − (z − t) tan θ, summed over the height. */
const batterMoment = (force: number, moment: number, tangent: number, footX: number, thickness: number): number =>
  tangent * (force * (footX + thickness * tangent) - moment * tangent);

/** Thrust in front: ½ γw z_f², and what seepage adds as it rises through the soil, ½ γw i z_e². */
const thrustFront = (level: number, gradient: number, frontLevel: number): number => {
  const soaked = Math.min(level, Math.max(frontLevel, 0));
  return 0.5 * waterUnitWeight * (level * level + gradient * soaked * soaked);
};
const momentFront = (level: number, gradient: number, frontLevel: number): number => {
  const soaked = Math.min(level, Math.max(frontLevel, 0));
  return (waterUnitWeight * (level * level * level + gradient * soaked * soaked * soaked)) / 6;
};

export function prepareWaterFront(b: KernelBuilder, ledger: Ledger, ponds: Ponds, frontLevel: Slot): void {
  if (ponds.front === undefined) return;
  const force = b.formula("water thrust in front", thrustFront, [ponds.front, ponds.gradient, frontLevel]);
  const moment = b.formula("water moment in front", momentFront, [ponds.front, ponds.gradient, frontLevel]);
  const towards = b.formula("water thrust in front, towards the front", negative, [force]);
  const towardsMoment = b.formula("water moment in front, towards the front", negative, [moment]);
  ledger.pushes.push({ name: "E_wf", force, moment, sign: -1 });
  b.forces.push({
    name: "Water in front",
    group: "water",
    horizontal: towards,
    momentZ: towardsMoment,
    x: b.constant(0),
  });
  b.step(
    "Water",
    force,
    "E_wf",
    "thrust of the water in front",
    "½·9.81·({z_f}² + {i}·min({z_f}, {z_g})²)",
    { z_f: ponds.front, i: ponds.gradient, z_g: frontLevel },
    "kN/m",
  );
}

// Loops written out one by one, so that each is compiled for its own formula.
columnwise(localLevel, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = localLevel(a[i], b[i]);
});
columnwise(between, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = between(a[i], b[i]);
});
columnwise(hydraulicGradient, (y, n, a, b, c, d) => {
  for (let i = 0; i < n; i++) y[i] = hydraulicGradient(a[i], b[i], c[i], d[i]);
});
columnwise(depthBelowUnderside, (y, n, a) => {
  for (let i = 0; i < n; i++) y[i] = depthBelowUnderside(a[i]);
});
columnwise(headAtHeel, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = headAtHeel(a[i], b[i]);
});
columnwise(headAtToe, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = headAtToe(a[i], b[i], c[i]);
});
columnwise(upliftForce, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = upliftForce(a[i], b[i], c[i]);
});
columnwise(upliftMoment, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = upliftMoment(a[i], b[i], c[i]);
});
columnwise(negative, (y, n, a) => {
  for (let i = 0; i < n; i++) y[i] = negative(a[i]);
});
columnwise(crackedWaterThrust, (y, n, a, b, c, d) => {
  for (let i = 0; i < n; i++) y[i] = crackedWaterThrust(a[i], b[i], c[i], d[i]);
});
columnwise(thrustBehind, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = thrustBehind(a[i], b[i]);
});
columnwise(crackedWaterMoment, (y, n, a, b, c, d) => {
  for (let i = 0; i < n; i++) y[i] = crackedWaterMoment(a[i], b[i], c[i], d[i]);
});
columnwise(third, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = third(a[i], b[i]);
});
columnwise(product, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = product(a[i], b[i]);
});
columnwise(batterMoment, (y, n, a, b, c, d, e) => {
  for (let i = 0; i < n; i++) y[i] = batterMoment(a[i], b[i], c[i], d[i], e[i]);
});
columnwise(safeRatio, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = safeRatio(a[i], b[i], c[i]);
});
columnwise(thrustFront, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = thrustFront(a[i], b[i], c[i]);
});
columnwise(momentFront, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = momentFront(a[i], b[i], c[i]);
});
