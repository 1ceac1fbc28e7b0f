import { columnwise } from "../columnwise.ts";
import { atRestCoefficient } from "../formulas/at-rest.ts";
import { activeCoefficientCoulomb } from "../formulas/coulomb.ts";
import {
  activeCoefficientRankine,
  activeCoefficientRankineSloping,
  rootActiveCoefficientRankine,
} from "../formulas/rankine.ts";
import type { Slot } from "../kernel.ts";
import type { KernelBuilder } from "../kernel-builder.ts";
import type { SoilSlots } from "./layers.ts";
import type { Outline } from "./outline.ts";

/**
 * How vertical stress becomes pressure in one soil.
 *
 * linear: p = K σ′v − cut, cut at zero. curved: Mazindrani and Ganjali on a slope with cohesion.
 */
export type PressureLaw =
  | { readonly kind: "linear"; readonly coefficient: Slot; readonly cut: Slot | undefined }
  | { readonly kind: "curved"; readonly frictionAngle: Slot; readonly cohesion: Slot; readonly slope: Slot };

/** Horizontal and vertical part of a thrust: multiplied by p's own size. */
export interface ThrustDirection {
  readonly horizontal: Slot;
  readonly vertical: Slot;
}

export interface PlaneOfPressure {
  readonly kind: "virtual_back" | "wall_back";
  readonly theory: "rankine" | "coulomb" | "at_rest";
  readonly top: Slot;
  readonly wallFriction: Slot;
  /** θ, rad; 0 on the virtual back. */
  readonly inclination: Slot;
  readonly direction: ThrustDirection;
}

const cosOfSum = (a: number, b: number): number => Math.cos(a + b);
const sinOfSum = (a: number, b: number): number => Math.sin(a + b);

export function preparePlane(
  b: KernelBuilder,
  o: Outline,
  kind: PlaneOfPressure["kind"],
  theory: PlaneOfPressure["theory"],
): PlaneOfPressure {
  const zero = b.constant(0);
  const coulomb = theory === "coulomb";
  const onWall = kind === "wall_back";
  const wallFriction = coulomb ? b.input("model.wall_friction") : o.slope;
  const inclination = onWall ? b.asAngle(b.formula("inclination of the back", Math.atan, [o.backTangent])) : zero;
  const direction: ThrustDirection = coulomb
    ? {
        horizontal: b.formula("cos(δ + θ)", cosOfSum, [wallFriction, inclination]),
        vertical: b.formula("sin(δ + θ)", sinOfSum, [wallFriction, inclination]),
      }
    : theory === "at_rest"
      ? { horizontal: b.constant(1), vertical: o.slopeTangent }
      : { horizontal: b.formula("cos β", Math.cos, [o.slope]), vertical: b.formula("sin β", Math.sin, [o.slope]) };
  return { kind, theory, top: onWall ? o.crestLevel : o.virtualTop, wallFriction, inclination, direction };
}

const doubled = (cohesion: number, root: number): number => 2 * cohesion * root;
const doubledRoot = (cohesion: number, coefficient: number): number => 2 * cohesion * Math.sqrt(coefficient);

export function preparePressureLaw(
  b: KernelBuilder,
  o: Outline,
  plane: PlaneOfPressure,
  soil: SoilSlots,
  heading: string,
): PressureLaw {
  const { frictionAngle, cohesion, key } = soil;
  if (plane.theory === "at_rest") {
    const coefficient = b.formula(`K0 ${key}`, atRestCoefficient, [
      frictionAngle,
      soil.overconsolidationRatio,
      o.slope,
    ]);
    b.step(
      heading,
      coefficient,
      "K0",
      "earth pressure coefficient at rest",
      "(1 − sin {φ})·√{OCR}·(1 + sin {β})",
      { φ: frictionAngle, OCR: soil.overconsolidationRatio, β: o.slope },
      "–",
      "Jaky (1944); EN 1997-1:2004, 9.5.2",
    );
    return { kind: "linear", coefficient, cut: undefined };
  }
  if (plane.theory === "coulomb") {
    const coefficient = b.formula(
      `Ka ${key}`,
      activeCoefficientCoulomb,
      [frictionAngle, plane.wallFriction, plane.inclination, o.slope],
      () => kinkAt(b, o.slope),
    );
    b.step(
      heading,
      coefficient,
      "Ka",
      "active coefficient, wall friction and inclined back",
      "Müller-Breslau with φ′ = {φ}, δ = {δ}, θ = {θ}, β = {β}",
      { φ: frictionAngle, δ: plane.wallFriction, θ: plane.inclination, β: o.slope },
      "–",
      "Coulomb (1776); Müller-Breslau (1906)",
    );
    return {
      kind: "linear",
      coefficient,
      cut: cutOf(b, soil, b.formula(`2c√Ka ${key}`, doubledRoot, [cohesion, coefficient]), heading),
    };
  }
  if (!o.sloping) {
    const coefficient = b.formula(`Ka ${key}`, activeCoefficientRankine, [frictionAngle]);
    b.step(
      heading,
      coefficient,
      "Ka",
      "active earth pressure coefficient",
      "tan²(45° − {φ}/2)",
      { φ: frictionAngle },
      "–",
      "Rankine (1857)",
    );
    const root = b.formula(`√Ka ${key}`, rootActiveCoefficientRankine, [frictionAngle]);
    return {
      kind: "linear",
      coefficient,
      cut: cutOf(b, soil, b.formula(`2c√Ka ${key}`, doubled, [cohesion, root]), heading),
    };
  }
  if (soil.hasCohesion) return { kind: "curved", frictionAngle, cohesion, slope: o.slope };
  const coefficient = b.formula(`Ka ${key}`, activeCoefficientRankineSloping, [frictionAngle, o.slope], () =>
    kinkAt(b, o.slope),
  );
  b.step(
    heading,
    coefficient,
    "Ka",
    "active coefficient on a slope, thrust parallel to it",
    "cos {β}·(cos {β} − √(cos² {β} − cos² {φ}))/(cos {β} + √(cos² {β} − cos² {φ}))",
    { φ: frictionAngle, β: o.slope },
    "–",
    "Rankine (1857); an approximation with water or layers",
  );
  return { kind: "linear", coefficient, cut: undefined };
}

function cutOf(b: KernelBuilder, soil: SoilSlots, slot: Slot, heading: string): Slot | undefined {
  if (!soil.hasCohesion) return undefined;
  b.step(
    heading,
    slot,
    "2c√Ka",
    soil.undrained ? "undrained strength takes off the pressure" : "cohesion takes off the pressure",
    "2·{c}·√Ka",
    { c: soil.cohesion },
    "kPa",
  );
  return slot;
}

/** The friction angle at which the slope is just stable, where the slope is certain. */
function kinkAt(b: KernelBuilder, slope: Slot): readonly number[] {
  const value = b.constantOf(slope);
  return value === undefined || value === 0 ? [] : [value];
}

// Loops written out one by one, so that each is compiled for its own formula.
columnwise(cosOfSum, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = cosOfSum(a[i], b[i]);
});
columnwise(sinOfSum, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = sinOfSum(a[i], b[i]);
});
columnwise(doubledRoot, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = doubledRoot(a[i], b[i]);
});
columnwise(doubled, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = doubled(a[i], b[i]);
});
columnwise(Math.tan, (y, n, a) => {
  for (let i = 0; i < n; i++) y[i] = Math.tan(a[i]);
});
columnwise(Math.cos, (y, n, a) => {
  for (let i = 0; i < n; i++) y[i] = Math.cos(a[i]);
});
columnwise(Math.sin, (y, n, a) => {
  for (let i = 0; i < n; i++) y[i] = Math.sin(a[i]);
});
columnwise(atRestCoefficient, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = atRestCoefficient(a[i], b[i], c[i]);
});
columnwise(activeCoefficientCoulomb, (y, n, a, b, c, d) => {
  for (let i = 0; i < n; i++) y[i] = activeCoefficientCoulomb(a[i], b[i], c[i], d[i]);
});
columnwise(activeCoefficientRankine, (y, n, a) => {
  for (let i = 0; i < n; i++) y[i] = activeCoefficientRankine(a[i]);
});
columnwise(rootActiveCoefficientRankine, (y, n, a) => {
  for (let i = 0; i < n; i++) y[i] = rootActiveCoefficientRankine(a[i]);
});
columnwise(activeCoefficientRankineSloping, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = activeCoefficientRankineSloping(a[i], b[i]);
});
