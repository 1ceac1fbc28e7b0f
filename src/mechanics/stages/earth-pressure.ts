import { columnwise } from "../columnwise.ts";
import { positiveForce, positiveMoment, zeroCrossing } from "../formulas/linear-pressure.ts";
import { slopingCohesivePressure, slopingCohesiveThrust } from "../formulas/mazindrani-ganjali.ts";
import { type Columns, type Slot, waterUnitWeight } from "../kernel.ts";
import type { KernelBuilder } from "../kernel-builder.ts";
import { buoyantUnitWeight, clamp, type LayerSlots } from "./layers.ts";
import type { PlaneOfPressure, PressureLaw } from "./pressure-law.ts";
import type { Ponds } from "./water.ts";

/** A stretch of one soil on the plane, dry or wet, from the top down. Zero length adds zero. */
export interface PlanePart {
  readonly layer: LayerSlots;
  readonly place: number;
  readonly wet: boolean;
  readonly law: PressureLaw;
  readonly top: Slot;
  readonly bottom: Slot;
  readonly stressTop: Slot;
  readonly stressBottom: Slot;
  /** Thrust along its own direction, and its moment about the underside; before model.factors.earth_thrust. */
  readonly thrust: Slot;
  readonly moment: Slot;
}

/**
 * Cuts the plane into parts and carries the vertical effective stress down: σ′v = q + ∫ γ dz − u. At a boundary σ′v goes on and
 * the pressure jumps, because each part has its own coefficient.
 */
export function preparePlaneParts(
  b: KernelBuilder,
  plane: PlaneOfPressure,
  layers: readonly LayerSlots[],
  laws: readonly PressureLaw[],
  ponds: Ponds,
  surcharge: Slot,
): readonly PlanePart[] {
  const underside = b.constant(0);
  const parts: PlanePart[] = [];
  let top = plane.top;
  let stress = surcharge;
  layers.forEach((layer, place) => {
    const bottom =
      layer.givenBottom === undefined
        ? underside
        : b.formula("bottom on the plane", clamp, [layer.givenBottom, underside, top]);
    const split =
      ponds.behind === undefined ? bottom : b.formula("water in the layer", clamp, [ponds.behind, bottom, top]);
    const add = (wet: boolean, from: Slot, to: Slot): void => {
      const gain = wet
        ? b.formula(`buoyant ${layer.soil.key}`, buoyantUnitWeight, [layer.soil.saturated, ponds.gradient])
        : layer.soil.moist;
      const below = b.formula("stress below", stressBelow, [stress, gain, from, to]);
      parts.push({
        layer,
        place,
        wet,
        law: laws[place],
        top: from,
        bottom: to,
        stressTop: stress,
        stressBottom: below,
        thrust: b.slot("thrust"),
        moment: b.slot("thrust moment"),
      });
      stress = below;
    };
    add(false, top, split);
    if (ponds.behind !== undefined) add(true, split, bottom);
    top = bottom;
  });
  for (const part of parts) thrustStage(b, part);
  return parts;
}

const stressBelow = (stress: number, unitWeight: number, top: number, bottom: number): number =>
  stress + unitWeight * (top - bottom);

function thrustStage(b: KernelBuilder, part: PlanePart): void {
  const { law, top, bottom, stressTop, stressBottom, thrust, moment } = part;
  const name = `thrust, layer ${part.place}${part.wet ? ", wet" : ""}`;
  if (law.kind === "curved") {
    const { cohesion, frictionAngle, slope } = law;
    const both = new Float64Array(2);
    b.stage({
      name,
      reads: [top, bottom, stressTop, stressBottom, cohesion, frictionAngle, slope],
      writes: [thrust, moment],
      run(c, count) {
        const [t, e, s0, s1, co, fr, sl, f, m] = [
          c[top],
          c[bottom],
          c[stressTop],
          c[stressBottom],
          c[cohesion],
          c[frictionAngle],
          c[slope],
          c[thrust],
          c[moment],
        ];
        for (let i = 0; i < count; i++) {
          const length = t[i] - e[i];
          slopingCohesiveThrust(both, s0[i], s1[i], length, co[i], fr[i], sl[i]);
          f[i] = both[0];
          m[i] = both[1] + both[0] * e[i];
        }
      },
    });
    return;
  }
  const { coefficient, cut } = law;
  const at = cut ?? coefficient;
  const cohesive = cut !== undefined;
  b.stage({
    name,
    reads: [top, bottom, stressTop, stressBottom, coefficient, ...(cohesive ? [at] : [])],
    writes: [thrust, moment],
    run: cohesive
      ? (c, count) => {
          const [t, e, s0, s1, k, q, f, m] = [
            c[top],
            c[bottom],
            c[stressTop],
            c[stressBottom],
            c[coefficient],
            c[at],
            c[thrust],
            c[moment],
          ];
          for (let i = 0; i < count; i++) {
            const length = t[i] - e[i];
            const p0 = k[i] * s0[i] - q[i];
            const p1 = k[i] * s1[i] - q[i];
            f[i] = positiveForce(p0, p1, length);
            m[i] = positiveMoment(p0, p1, length) + f[i] * e[i];
          }
        }
      : (c, count) => {
          const [t, e, s0, s1, k, f, m] = [
            c[top],
            c[bottom],
            c[stressTop],
            c[stressBottom],
            c[coefficient],
            c[thrust],
            c[moment],
          ];
          for (let i = 0; i < count; i++) {
            const length = t[i] - e[i];
            const p0 = k[i] * s0[i];
            const p1 = k[i] * s1[i];
            if (p0 >= 0 && p1 >= 0) {
              // What positiveForce and positiveMoment give here, written out: this is the common case and it is hot.
              const force = 0.5 * (p0 + p1) * length;
              f[i] = force;
              m[i] = (length * length * (2 * p0 + p1)) / 6 + force * e[i];
            } else {
              f[i] = positiveForce(p0, p1, length);
              m[i] = positiveMoment(p0, p1, length) + f[i] * e[i];
            }
          }
        },
  });
}

/** Pressure of a vertical stress along the thrust's direction, kPa, not cut: for the diagram, the crack and the sheet. */
export function pressureAt(columns: Columns, law: PressureLaw, verticalStress: number, i = 0): number {
  if (law.kind === "curved")
    return slopingCohesivePressure(
      verticalStress,
      columns[law.cohesion][i],
      columns[law.frictionAngle][i],
      columns[law.slope][i],
    );
  return columns[law.coefficient][i] * verticalStress - (law.cut === undefined ? 0 : columns[law.cut][i]);
}

/** Depth below the top of a part at which its pressure first turns positive; its length where it never does. */
export function turnsPositiveAt(
  columns: Columns,
  law: PressureLaw,
  stressTop: number,
  stressBottom: number,
  length: number,
  i: number,
): number {
  if (law.kind === "linear")
    return zeroCrossing(pressureAt(columns, law, stressTop, i), pressureAt(columns, law, stressBottom, i), length);
  const threshold = 2 * columns[law.cohesion][i] * Math.tan(Math.PI / 4 + columns[law.frictionAngle][i] / 2);
  return zeroCrossing(stressTop - threshold, stressBottom - threshold, length);
}

/**
 * Level of the foot of the tension crack: where, from the surface down, pressure first turns positive; the underside if it never does.
 * A part belongs to the crack while everything above it does.
 */
export function prepareCrack(b: KernelBuilder, plane: PlaneOfPressure, parts: readonly PlanePart[]): Slot | undefined {
  if (plane.theory === "at_rest" || !parts.some((part) => part.layer.soil.hasCohesion)) return undefined;
  const crack = b.slot("foot of the crack");
  const laws = parts.flatMap((part) =>
    part.law.kind === "linear"
      ? [part.law.coefficient, ...(part.law.cut === undefined ? [] : [part.law.cut])]
      : [part.law.cohesion, part.law.frictionAngle, part.law.slope],
  );
  b.stage({
    name: "tension crack",
    reads: [plane.top, ...parts.flatMap((part) => [part.top, part.bottom, part.stressTop, part.stressBottom]), ...laws],
    writes: [crack],
    run(c, count) {
      const [foot, top] = [c[crack], c[plane.top]];
      for (let i = 0; i < count; i++) {
        let level = top[i];
        for (let k = 0; k < parts.length; k++) {
          const part = parts[k];
          const start = c[part.top][i];
          const end = c[part.bottom][i];
          if (start <= end) continue;
          if (level > start) break;
          const depth = turnsPositiveAt(c, part.law, c[part.stressTop][i], c[part.stressBottom][i], start - end, i);
          level = depth >= start - end ? end : start - depth;
        }
        foot[i] = level;
      }
    },
  });
  return crack;
}

/** Water pressure on the plane at a level, kPa: in a full crack from the surface, in the ground from the water level. */
export function waterPressureBehind(
  level: number,
  waterLevel: number,
  gradient: number,
  top: number,
  crack: number | undefined,
): number {
  if (crack !== undefined && level > crack) return waterUnitWeight * (top - level);
  return waterUnitWeight * (1 - gradient) * Math.max(waterLevel - level, 0);
}

// Loops written out one by one, so that each is compiled for its own formula.
columnwise(stressBelow, (y, n, a, b, c, d) => {
  for (let i = 0; i < n; i++) y[i] = stressBelow(a[i], b[i], c[i], d[i]);
});
