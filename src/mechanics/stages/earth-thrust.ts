import { columnwise } from "../columnwise.ts";
import { activeCoefficientCoulomb } from "../formulas/coulomb.ts";
import { positiveCentre, positiveForce, positiveLength } from "../formulas/linear-pressure.ts";
import { slopeUnstable } from "../formulas/mazindrani-ganjali.ts";
import { activeCoefficientMononobeOkabe, seismicAngle, submergedMassRatio } from "../formulas/mononobe-okabe.ts";
import { mark, type Slot, waterUnitWeight } from "../kernel.ts";
import type { KernelBuilder } from "../kernel-builder.ts";
import type { PlanePart } from "./earth-pressure.ts";
import type { Ledger } from "./ledger.ts";
import type { Outline } from "./outline.ts";
import { listPartSteps } from "./part-sheet.ts";
import type { PlaneOfPressure } from "./pressure-law.ts";

/** The earth thrust at the base: horizontal and vertical part, and their moments. */
export interface EarthThrust {
  readonly horizontal: Slot;
  readonly horizontalMoment: Slot;
  readonly vertical: Slot;
  /** About the tip of the toe. */
  readonly verticalMoment: Slot;
}

const product = (a: number, b: number): number => a * b;
const productOfThree = (a: number, b: number, c: number): number => a * b * c;
/** Σ V x on the plane: x = B on the virtual back, footX − (z − t) tan θ on a real one. */
const momentOnBack = (
  vertical: number,
  verticalTimesZ: number,
  footX: number,
  thickness: number,
  tangent: number,
): number => vertical * (footX + thickness * tangent) - tangent * verticalTimesZ;

/** Sums the parts, adds the earthquake's increment, turns both into their direction and applies model.factors.earth_thrust. */
export function prepareEarthThrust(
  b: KernelBuilder,
  ledger: Ledger,
  o: Outline,
  plane: PlaneOfPressure,
  parts: readonly PlanePart[],
  surcharge: Slot,
  hasWater: boolean,
  gradient: Slot,
): EarthThrust {
  const factor = b.input("model.factors.earth_thrust");
  const terms = parts.map((part) => ({ slot: part.thrust }));
  const moments = parts.map((part) => ({ slot: part.moment }));
  const quake = b.has("loads.earthquake.kh") ? prepareIncrement(b, o, plane, parts) : undefined;
  const total = b.sum("earth thrust along its direction", [...terms, ...(quake ? [{ slot: quake.thrust }] : [])]);
  const totalMoment = b.sum("moment of the earth thrust along its direction", [
    ...moments,
    ...(quake ? [{ slot: quake.moment }] : []),
  ]);
  const { horizontal: across, vertical: along } = plane.direction;
  const horizontal = b.formula("horizontal earth thrust", productOfThree, [total, across, factor]);
  const horizontalMoment = b.formula("moment of the horizontal earth thrust", productOfThree, [
    totalMoment,
    across,
    factor,
  ]);
  const upright = b.constantOf(along) === 0;
  const zero = b.constant(0);
  const vertical = upright ? zero : b.formula("vertical earth thrust", productOfThree, [total, along, factor]);
  const timesZ = upright
    ? zero
    : b.formula("vertical earth thrust times z", productOfThree, [totalMoment, along, factor]);
  const verticalMoment = upright
    ? zero
    : plane.kind === "virtual_back"
      ? b.formula("moment of the vertical earth thrust", product, [vertical, o.width])
      : b.formula("moment of the vertical earth thrust", momentOnBack, [
          vertical,
          timesZ,
          o.footX,
          o.thickness,
          o.backTangent,
        ]);
  ledger.pushes.push({ name: "P_h", force: horizontal, moment: horizontalMoment, sign: 1 });
  listEarthForces(b, o, plane, parts, surcharge, factor, hasWater, gradient, quake);
  const heading = "Earth thrust";
  b.step(
    heading,
    horizontal,
    "P_h",
    "horizontal part of the whole earth thrust",
    "{ΣP}·{cos}·{f_E}",
    { ΣP: total, cos: across, f_E: factor },
    "kN/m",
  );
  b.step(
    heading,
    horizontalMoment,
    "P_h·z",
    "its moment about the underside",
    "{ΣPz}·{cos}·{f_E}",
    { ΣPz: totalMoment, cos: across, f_E: factor },
    "kNm/m",
  );
  if (b.constantOf(along) !== 0) {
    b.step(
      heading,
      vertical,
      "P_v",
      "vertical part of the whole earth thrust",
      "{ΣP}·{sin}·{f_E}",
      { ΣP: total, sin: along, f_E: factor },
      "kN/m",
    );
    b.step(
      heading,
      verticalMoment,
      "P_v·x",
      "its moment about the toe",
      plane.kind === "virtual_back" ? "{P_v}·{B}" : "Σ P·x along the back face, {P_v} in all",
      { P_v: vertical, B: o.width },
      "kNm/m",
    );
  }
  return { horizontal, horizontalMoment, vertical, verticalMoment };
}

/** Rows of the list: each part without the surcharge's share, the share of all parts together, the earthquake's increment. */
function listEarthForces(
  b: KernelBuilder,
  o: Outline,
  plane: PlaneOfPressure,
  parts: readonly PlanePart[],
  surcharge: Slot,
  factor: Slot,
  hasWater: boolean,
  gradient: Slot,
  quake: { thrust: Slot; moment: Slot } | undefined,
): void {
  const hasSurcharge = b.constantOf(surcharge) !== 0;
  const shares: { readonly thrust: Slot; readonly moment: Slot }[] = [];
  for (const part of parts) {
    let { thrust, moment } = part;
    if (hasSurcharge && part.law.kind === "linear") {
      const share = surchargeShare(b, part, part.law.coefficient, part.law.cut, surcharge);
      shares.push(share);
      thrust = b.sum("thrust of the soil alone", [{ slot: part.thrust }, { slot: share.thrust, sign: -1 }]);
      moment = b.sum("moment of the soil alone", [{ slot: part.moment }, { slot: share.moment, sign: -1 }]);
    }
    listPartSteps(b, part, hasWater, gradient);
    pushThrustRow(
      b,
      o,
      plane,
      `Earth, ${part.layer.soil.name}${hasWater ? (part.wet ? ", below water" : ", above water") : ""}`,
      "earth",
      thrust,
      moment,
      factor,
    );
  }
  if (shares.length > 0)
    pushThrustRow(
      b,
      o,
      plane,
      "Surcharge",
      "surcharge",
      b.sum(
        "surcharge thrust",
        shares.map((share) => ({ slot: share.thrust })),
      ),
      b.sum(
        "surcharge moment",
        shares.map((share) => ({ slot: share.moment })),
      ),
      factor,
    );
  if (quake) pushThrustRow(b, o, plane, "Earthquake increment", "earth", quake.thrust, quake.moment, factor);
}

function pushThrustRow(
  b: KernelBuilder,
  o: Outline,
  plane: PlaneOfPressure,
  name: string,
  group: "earth" | "surcharge",
  thrust: Slot,
  moment: Slot,
  factor: Slot,
): void {
  const { horizontal: across, vertical: along } = plane.direction;
  const horizontal = b.formula(`${name}: horizontal`, productOfThree, [thrust, across, factor]);
  const momentZ = b.formula(`${name}: moment z`, productOfThree, [moment, across, factor]);
  const vertical = b.formula(`${name}: vertical`, productOfThree, [thrust, along, factor]);
  const timesZ = b.formula(`${name}: vertical times z`, productOfThree, [moment, along, factor]);
  const tangent = plane.kind === "virtual_back" ? b.constant(0) : o.backTangent;
  const footX = plane.kind === "virtual_back" ? o.width : o.footX;
  const momentX = b.formula(`${name}: moment x`, momentOnBack, [vertical, timesZ, footX, o.thickness, tangent]);
  b.forces.push({ name, group, horizontal, vertical, momentX, momentZ, x: footX });
}

/** K q over the stretch where the pressure is positive: what the surcharge adds to a part that is linear. */
function surchargeShare(
  b: KernelBuilder,
  part: PlanePart,
  coefficient: Slot,
  cut: Slot | undefined,
  surcharge: Slot,
): { thrust: Slot; moment: Slot } {
  const [thrust, moment] = [b.slot("surcharge share"), b.slot("surcharge share moment")];
  const { top, bottom, stressTop, stressBottom } = part;
  b.stage({
    name: "share of the surcharge",
    reads: [top, bottom, stressTop, stressBottom, coefficient, surcharge, ...(cut === undefined ? [] : [cut])],
    writes: [thrust, moment],
    run(c, count) {
      for (let i = 0; i < count; i++) {
        const [k, q] = [c[coefficient][i], cut === undefined ? 0 : c[cut][i]];
        const [p0, p1, length] = [k * c[stressTop][i] - q, k * c[stressBottom][i] - q, c[top][i] - c[bottom][i]];
        c[thrust][i] = k * c[surcharge][i] * positiveLength(p0, p1, length);
        c[moment][i] = c[thrust][i] * (c[bottom][i] + positiveCentre(p0, p1, length));
      }
    },
  });
  return { thrust, moment };
}

const massRatio = (saturated: number): number => submergedMassRatio(saturated, waterUnitWeight);
const dryRatio = (): number => 1;
const quakeRise = (kv: number, quake: number, rest: number): number => (1 - kv) * quake - rest;
const incrementOf = (rise: number, stressTop: number, stressBottom: number, top: number, bottom: number): number =>
  rise * positiveForce(stressTop, stressBottom, top - bottom);
const alongSlope = (thrust: number, slope: number): number => thrust * Math.cos(slope);
const atSixTenths = (thrust: number, height: number): number => thrust * 0.6 * height;

/** ∫ [(1 − kv) K_AE − K_A] σ′v dz, part by part, at 0.6 of the plane's height. */
function prepareIncrement(
  b: KernelBuilder,
  o: Outline,
  plane: PlaneOfPressure,
  parts: readonly PlanePart[],
): { thrust: Slot; moment: Slot } {
  const [kh, kv] = [b.input("loads.earthquake.kh"), b.input("loads.earthquake.kv")];
  const heading = "Earthquake";
  const terms = parts.map((part) => {
    const { soil } = part.layer;
    const ratio = part.wet
      ? b.formula(`mass ratio ${soil.key}`, massRatio, [soil.saturated])
      : b.formula("mass ratio, dry", dryRatio, [b.constant(1)]);
    const angle = b.asAngle(b.formula("seismic angle", seismicAngle, [kh, kv, ratio]));
    const shape = [plane.wallFriction, plane.inclination, o.slope];
    const rest = b.formula(`K_A ${soil.key}`, activeCoefficientCoulomb, [soil.frictionAngle, ...shape], () =>
      kinks(b, o.slope),
    );
    const quake = b.formula(
      `K_AE ${soil.key}`,
      activeCoefficientMononobeOkabe,
      [soil.frictionAngle, ...shape, angle],
      (varying) => (varying === 0 ? kinks(b, o.slope, angle) : []),
    );
    const rise = b.formula("rise of the coefficient", quakeRise, [kv, quake, rest]);
    b.step(
      heading,
      angle,
      "ψ",
      `seismic angle, ${soil.name}${part.wet ? " below water" : ""}`,
      "atan({kh}/(1 − {kv})·{mass ratio})",
      { kh, kv, "mass ratio": ratio },
      "rad",
      part.wet ? "EN 1998-5:2004, Annex E" : "Mononobe and Matsuo (1929); Okabe (1926)",
    );
    b.step(
      heading,
      quake,
      "K_AE",
      "active coefficient in the earthquake",
      "Mononobe–Okabe with φ′ = {φ}, ψ = {ψ}",
      { φ: soil.frictionAngle, ψ: angle },
      "–",
      "Mononobe and Matsuo (1929); Okabe (1926)",
    );
    b.step(
      heading,
      rest,
      "K_A",
      "active coefficient without the earthquake",
      "Mononobe–Okabe with φ′ = {φ}, ψ = 0",
      { φ: soil.frictionAngle },
      "–",
    );
    return b.formula("increment", incrementOf, [rise, part.stressTop, part.stressBottom, part.top, part.bottom]);
  });
  const along = b.sum(
    "earthquake increment along the slope",
    terms.map((slot) => ({ slot })),
  );
  // At rest the direction is given as horizontal 1, vertical tan β, so the increment goes in by its horizontal part.
  const thrust =
    plane.theory === "at_rest" && o.sloping ? b.formula("earthquake increment", alongSlope, [along, o.slope]) : along;
  const moment = b.formula("moment of the increment", atSixTenths, [thrust, plane.top]);
  b.step(
    heading,
    thrust,
    "ΔP_E",
    "increment of the earth thrust, along its direction",
    "Σ ∫ [(1 − {kv})·K_AE − K_A]·σ′v dz",
    { kv },
    "kN/m",
  );
  b.step(
    heading,
    moment,
    "ΔP_E·z",
    "at 0.6 of the height of the plane",
    "{ΔP_E}·0.6·{z_top}",
    { ΔP_E: thrust, z_top: plane.top },
    "kNm/m",
  );
  return { thrust, moment };
}

function kinks(b: KernelBuilder, slope: Slot, angle?: Slot): readonly number[] {
  const value = b.constantOf(slope);
  const more = angle === undefined ? 0 : b.constantOf(angle);
  return value === undefined || more === undefined || value + more === 0 ? [] : [value + more];
}

/** Marks samples in which the slope, or the slope in the earthquake, is steeper than a soil on the plane can bear. */
export function prepareSlopeMarks(
  b: KernelBuilder,
  o: Outline,
  plane: PlaneOfPressure,
  parts: readonly PlanePart[],
): void {
  const shaken = b.has("loads.earthquake.kh");
  if (!shaken && (!o.sloping || plane.theory === "at_rest")) return;
  const { marks } = b;
  for (const part of parts) {
    const { frictionAngle, cohesion, saturated } = part.layer.soil;
    const cohesive = part.law.kind === "curved" && !shaken;
    const { top, bottom, stressBottom } = part;
    const zero = b.constant(0);
    const [kh, kv] = shaken ? [b.input("loads.earthquake.kh"), b.input("loads.earthquake.kv")] : [zero, zero];
    const wetMass = part.wet && shaken;
    b.stage({
      name: `slope against friction angle, layer ${part.place}`,
      reads: [
        top,
        bottom,
        stressBottom,
        frictionAngle,
        cohesion,
        o.slope,
        kh,
        kv,
        ...(wetMass ? [saturated] : []),
        marks,
      ],
      writes: [marks],
      run(c, count) {
        const [t, e, s1, fr, co, sl, h, v, out, gs] = [
          c[top],
          c[bottom],
          c[stressBottom],
          c[frictionAngle],
          c[cohesion],
          c[o.slope],
          c[kh],
          c[kv],
          c[marks],
          c[saturated],
        ];
        for (let i = 0; i < count; i++) {
          if (t[i] <= e[i]) continue;
          const unstable = cohesive
            ? slopeUnstable(s1[i], co[i], fr[i], sl[i])
            : sl[i] + (shaken ? seismicAngle(h[i], v[i], wetMass ? massRatio(gs[i]) : 1) : 0) > fr[i];
          if (unstable) out[i] |= mark.slopeUnstable;
        }
      },
    });
  }
}

// Loops written out one by one, so that each is compiled for its own formula.
columnwise(productOfThree, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = productOfThree(a[i], b[i], c[i]);
});
columnwise(product, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = product(a[i], b[i]);
});
columnwise(momentOnBack, (y, n, a, b, c, d, e) => {
  for (let i = 0; i < n; i++) y[i] = momentOnBack(a[i], b[i], c[i], d[i], e[i]);
});
columnwise(massRatio, (y, n, a) => {
  for (let i = 0; i < n; i++) y[i] = massRatio(a[i]);
});
columnwise(dryRatio, (y, n) => {
  for (let i = 0; i < n; i++) y[i] = dryRatio();
});
columnwise(quakeRise, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = quakeRise(a[i], b[i], c[i]);
});
columnwise(incrementOf, (y, n, a, b, c, d, e) => {
  for (let i = 0; i < n; i++) y[i] = incrementOf(a[i], b[i], c[i], d[i], e[i]);
});
columnwise(alongSlope, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = alongSlope(a[i], b[i]);
});
columnwise(atSixTenths, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = atSixTenths(a[i], b[i]);
});
columnwise(seismicAngle, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = seismicAngle(a[i], b[i], c[i]);
});
columnwise(activeCoefficientMononobeOkabe, (y, n, a, b, c, d, e) => {
  for (let i = 0; i < n; i++) y[i] = activeCoefficientMononobeOkabe(a[i], b[i], c[i], d[i], e[i]);
});
