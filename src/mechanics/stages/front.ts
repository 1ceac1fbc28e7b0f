import { columnwise } from "../columnwise.ts";
import { positiveForce, positiveMoment } from "../formulas/linear-pressure.ts";
import { passiveCoefficientRankine } from "../formulas/rankine.ts";
import { type Slot, waterUnitWeight } from "../kernel.ts";
import type { KernelBuilder } from "../kernel-builder.ts";
import { clamp, type SoilSlots } from "./layers.ts";
import type { Ponds } from "./water.ts";

/** Level of the water in front as pore pressure follows it, no higher than the ground; −1e6 where the ground is dry. */
const waterInSoil = (water: number, ground: number): number => Math.min(water, ground);
const dryLevel = -1e6;

/**
 * Vertical effective stress in the ground in front at a level, kPa: moist above the water, γ_sat − γw (1 + i) below it down to the
 * underside, γ_sat − γw below the underside (hydrostatic from the toe's head). Not cut at zero.
 *
 * @param water level of the water in the soil, no higher than the ground; far below where dry
 */
export function frontStress(
  level: number,
  ground: number,
  water: number,
  gradient: number,
  moist: number,
  saturated: number,
): number {
  const upper = Math.max(water, 0);
  const lower = Math.min(water, 0);
  const between = water >= 0 ? saturated - waterUnitWeight * (1 + gradient) : moist;
  const above = moist * (ground - Math.max(level, upper));
  const middle = between * (upper - clamp(level, lower, upper));
  return above + middle + (saturated - waterUnitWeight) * (lower - Math.min(level, lower));
}

const positiveFrontStress = (
  level: number,
  ground: number,
  water: number,
  gradient: number,
  moist: number,
  saturated: number,
): number => Math.max(frontStress(level, ground, water, gradient, moist, saturated), 0);
const surchargeInFront = (atUnderside: number, atIgnored: number): number => Math.max(atUnderside - atIgnored, 0);
const less = (a: number, b: number): number => a - b;
const negative = (x: number): number => -x;

export interface FrontGround {
  /** Local level of the ground in front. */
  readonly level: Slot;
  readonly soil: SoilSlots;
  readonly water: Slot;
  readonly ignoredTo: Slot;
  readonly gradient: Slot;
}

export function prepareFrontGround(b: KernelBuilder, level: Slot, soil: SoilSlots, ponds: Ponds): FrontGround {
  const water =
    ponds.frontAsGiven === undefined
      ? b.constant(dryLevel)
      : b.formula("water in the front soil", waterInSoil, [ponds.frontAsGiven, level]);
  const ignoredTo = b.formula("top of the front soil that counts", less, [level, b.input("ground.front.ignore_top")]);
  return { level, soil, water, ignoredTo, gradient: ponds.gradient };
}

/** q0: effective stress in front at the underside, less that of the ignored top; never below zero. */
export function prepareFrontSurcharge(b: KernelBuilder, front: FrontGround): Slot {
  const rest = [front.level, front.water, front.gradient, front.soil.moist, front.soil.saturated];
  const zero = b.constant(0);
  const at = b.formula("front stress at the underside", positiveFrontStress, [zero, ...rest]);
  const ignored = b.formula("front stress at the ignored top", positiveFrontStress, [front.ignoredTo, ...rest]);
  const slot = b.formula("stress beside the base", surchargeInFront, [at, ignored]);
  b.step(
    "Bearing",
    slot,
    "q0",
    "vertical effective stress beside the base",
    "{σ′v,underside} − {σ′v,ignored top}",
    { "σ′v,underside": at, "σ′v,ignored top": ignored },
    "kPa",
  );
  return slot;
}

export interface Passive {
  readonly force: Slot;
  readonly moment: Slot;
}

/** Passive resistance in front, mobilised: ∫ (Kp σ′v + 2 c √Kp) dz from front.level − ignore_top to the underside, or the tip of the key. */
export function preparePassive(b: KernelBuilder, front: FrontGround): Passive | undefined {
  if (b.isCertainly("ground.front.mobilised", 0)) return undefined;
  const mobilised = b.input("ground.front.mobilised");
  const tip = b.has("wall.shear_key.depth")
    ? b.formula("tip of the key", negative, [b.input("wall.shear_key.depth")])
    : b.constant(0);
  const coefficient = b.formula(`Kp ${front.soil.key}`, passiveCoefficientRankine, [front.soil.frictionAngle]);
  const { moist, saturated, cohesion } = front.soil;
  const [force, moment] = [b.slot("passive resistance"), b.slot("passive moment")];
  const { level, water, gradient, ignoredTo } = front;
  b.stage({
    name: "passive resistance",
    reads: [mobilised, tip, coefficient, moist, saturated, cohesion, level, water, gradient, ignoredTo],
    writes: [force, moment],
    run(c, count) {
      const [m, e, k, g, gs, co, gl, wl, gr, ig, f, mo] = [
        c[mobilised],
        c[tip],
        c[coefficient],
        c[moist],
        c[saturated],
        c[cohesion],
        c[level],
        c[water],
        c[gradient],
        c[ignoredTo],
        c[force],
        c[moment],
      ];
      for (let i = 0; i < count; i++) {
        const end = e[i];
        const start = Math.max(ig[i], end);
        let sum = 0;
        let about = 0;
        let top = start;
        let stressTop = frontStress(top, gl[i], wl[i], gr[i], g[i], gs[i]);
        const constant = 2 * co[i] * Math.sqrt(k[i]);
        for (let part = 0; part < 3; part++) {
          const bottom = part === 2 ? end : clamp(part === 0 ? Math.max(wl[i], 0) : Math.min(wl[i], 0), end, start);
          const stressBottom = frontStress(bottom, gl[i], wl[i], gr[i], g[i], gs[i]);
          const length = top - bottom;
          const soil = positiveForce(k[i] * stressTop, k[i] * stressBottom, length);
          const adhesive = constant * length;
          sum += soil + adhesive;
          about +=
            positiveMoment(k[i] * stressTop, k[i] * stressBottom, length) +
            soil * bottom +
            adhesive * (bottom + 0.5 * length);
          top = bottom;
          stressTop = stressBottom;
        }
        f[i] = m[i] * sum;
        mo[i] = m[i] * about;
      }
    },
  });
  const towards = b.formula("passive resistance, towards the front", negative, [force]);
  const towardsMoment = b.formula("passive moment, towards the front", negative, [moment]);
  b.forces.push({
    name: "Passive resistance",
    group: "front",
    horizontal: towards,
    momentZ: towardsMoment,
    x: b.constant(0),
  });
  b.step(
    "Front",
    coefficient,
    "Kp",
    "passive earth pressure coefficient",
    "tan²(45° + {φ}/2)",
    { φ: front.soil.frictionAngle },
    "–",
    "Rankine (1857)",
  );
  b.step(
    "Front",
    force,
    "P_p",
    "passive resistance that is counted",
    "{mobilised}·∫ ({Kp}·σ′v + 2·{c′}·√{Kp}) dz from {z_bottom} to {z_top}",
    { mobilised, Kp: coefficient, "c′": cohesion, z_top: ignoredTo, z_bottom: tip },
    "kN/m",
  );
  return { force, moment };
}

// Loops written out one by one, so that each is compiled for its own formula.
columnwise(waterInSoil, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = waterInSoil(a[i], b[i]);
});
columnwise(less, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = less(a[i], b[i]);
});
columnwise(positiveFrontStress, (y, n, a, b, c, d, e, f) => {
  for (let i = 0; i < n; i++) y[i] = positiveFrontStress(a[i], b[i], c[i], d[i], e[i], f[i]);
});
columnwise(surchargeInFront, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = surchargeInFront(a[i], b[i]);
});
columnwise(negative, (y, n, a) => {
  for (let i = 0; i < n; i++) y[i] = negative(a[i]);
});
columnwise(passiveCoefficientRankine, (y, n, a) => {
  for (let i = 0; i < n; i++) y[i] = passiveCoefficientRankine(a[i]);
});
