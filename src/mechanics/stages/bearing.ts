import type { Study } from "../../study/study.ts";
import { columnwise } from "../columnwise.ts";
import {
  bearingFactorNc,
  bearingFactorNgammaEn1997,
  bearingFactorNgammaMeyerhof,
  bearingFactorNgammaVesic,
  bearingFactorNq,
  inclinationBase,
  inclinationNc,
  inclinationNgamma,
  inclinationNq,
  leastDrainedFrictionAngle,
  meyerhofInclinationNgamma,
  meyerhofInclinationNq,
  undrainedInclination,
} from "../formulas/bearing-factors.ts";
import { type Slot, waterUnitWeight } from "../kernel.ts";
import type { KernelBuilder } from "../kernel-builder.ts";
import type { BaseForces } from "./base.ts";
import type { SoilSlots } from "./layers.ts";
import { finish } from "./sliding.ts";
import type { Ponds } from "./water.ts";

/** Drained formulas below φ′ = 0.1° are taken at 0.1°. */
const atLeast = (frictionAngle: number): number => Math.max(frictionAngle, leastDrainedFrictionAngle);
const cotangent = (frictionAngle: number): number => 1 / Math.tan(atLeast(frictionAngle));
const tangent = (frictionAngle: number): number => Math.tan(atLeast(frictionAngle));
const kink = (): readonly number[] => [leastDrainedFrictionAngle];

/** γ′ = γ_b + (γ − γ_b) min(d/B′, 1), d the depth of the water below the underside. */
export function unitWeightBelow(moist: number, saturated: number, depth: number, effectiveWidth: number): number {
  const buoyant = saturated - waterUnitWeight;
  return buoyant + (moist - buoyant) * (effectiveWidth > 0 ? Math.min(depth / effectiveWidth, 1) : 1);
}

const applied = (normal: number, effectiveWidth: number): number => (effectiveWidth > 0 ? normal / effectiveWidth : 0);
const pushing = (driving: number): number => Math.max(driving, 0);
const loadInclination = (driving: number, normal: number): number =>
  normal > 0 ? Math.atan(driving / normal) : Math.PI / 2;

/** One term of the capacity, strength × factor × inclination. */
const term = (strength: number, factor: number, inclination: number): number => strength * factor * inclination;
const weightTerm = (unitWeight: number, width: number, factor: number, inclination: number): number =>
  0.5 * unitWeight * Math.max(width, 0) * factor * inclination;
const capacity = (cohesion: number, surcharge: number, weight: number, factor: number): number =>
  factor * Math.max(cohesion + surcharge + weight, 0);
const undrainedCapacity = (strength: number, inclination: number, surcharge: number, factor: number): number =>
  factor * ((Math.PI + 2) * strength * inclination + surcharge);

export function prepareBearing(
  b: KernelBuilder,
  study: Study,
  base: BaseForces,
  below: SoilSlots,
  ponds: Ponds,
  surcharge: Slot,
): void {
  const heading = "Bearing";
  const factor = b.input("model.factors.bearing_capacity");
  const pressure = b.formula("pressure on the effective width", applied, [base.normal, base.effectiveWidth]);
  const horizontal = b.formula("H", pushing, [base.driving]);
  b.step(
    heading,
    pressure,
    "N′/B′",
    "pressure on the effective width",
    "{N′}/{B′}",
    { "N′": base.normal, "B′": base.effectiveWidth },
    "kPa",
  );
  const resisting = below.undrained
    ? undrained(b, base, below, horizontal, surcharge, factor)
    : drained(b, study, base, below, ponds, horizontal, surcharge, factor);
  finish(b, {
    limitState: "bearing",
    heading,
    resisting,
    driving: pressure,
    normal: base.effectiveWidth,
    unit: "kPa",
    formula: "{resisting}/{driving}",
  });
}

function undrained(
  b: KernelBuilder,
  base: BaseForces,
  below: SoilSlots,
  horizontal: Slot,
  surcharge: Slot,
  factor: Slot,
): Slot {
  const inclination = b.formula("ic, undrained", undrainedInclination, [
    horizontal,
    base.effectiveWidth,
    below.cohesion,
  ]);
  const resisting = b.formula("bearing capacity", undrainedCapacity, [below.cohesion, inclination, surcharge, factor]);
  const source = "EN 1997-1:2004, Annex D.3 (strip, without base inclination)";
  b.step(
    "Bearing",
    inclination,
    "ic",
    "inclination factor",
    "½·(1 + √(1 − {H}/({B′}·{c_u})))",
    { H: horizontal, "B′": base.effectiveWidth, c_u: below.cohesion },
    "–",
    source,
  );
  b.step(
    "Bearing",
    resisting,
    "q_ult",
    "bearing capacity, undrained",
    "{f_q}·((π + 2)·{c_u}·{ic} + {q0})",
    { f_q: factor, c_u: below.cohesion, ic: inclination, q0: surcharge },
    "kPa",
    source,
  );
  return resisting;
}

const ngammaOf = {
  vesic: bearingFactorNgammaVesic,
  en1997: bearingFactorNgammaEn1997,
  meyerhof: bearingFactorNgammaMeyerhof,
} as const;
const sourceOf = {
  vesic: "Vesić (1973)",
  en1997: "EN 1997-1:2004, Annex D.4 (strip)",
  meyerhof: "Meyerhof (1963)",
} as const;
const ngammaText = {
  vesic: "2·({Nq} + 1)·tan {φ′}",
  en1997: "2·({Nq} − 1)·tan {φ′}",
  meyerhof: "({Nq} − 1)·tan(1.4·{φ′})",
} as const;

function drained(
  b: KernelBuilder,
  study: Study,
  base: BaseForces,
  below: SoilSlots,
  ponds: Ponds,
  horizontal: Slot,
  surcharge: Slot,
  factor: Slot,
): Slot {
  const { bearing } = study.model;
  const heading = "Bearing";
  const source = sourceOf[bearing];
  const phi = below.frictionAngle;
  const of = (name: string, formula: (angle: number) => number): Slot =>
    b.formula(name, (angle) => formula(atLeast(angle)), [phi], kink);
  const [nq, nc, ngamma] = [of("Nq", bearingFactorNq), of("Nc", bearingFactorNc), of("Nγ", ngammaOf[bearing])];
  const inclination =
    bearing === "meyerhof"
      ? meyerhofInclination(b, base, below, horizontal)
      : bracketInclination(b, base, below, horizontal, nc);
  const unitWeight =
    ponds.depthBelow === undefined
      ? below.moist
      : b.formula("unit weight below the base", unitWeightBelow, [
          below.moist,
          below.saturated,
          ponds.depthBelow,
          base.effectiveWidth,
        ]);
  const cohesive = below.hasCohesion
    ? b.formula("cohesion term", term, [below.cohesion, nc, inclination.c])
    : b.constant(0);
  const beside = b.formula("surcharge term", term, [surcharge, nq, inclination.q]);
  const weight = b.formula("weight term", weightTerm, [unitWeight, base.effectiveWidth, ngamma, inclination.gamma]);
  const resisting = b.formula("bearing capacity", capacity, [cohesive, beside, weight, factor]);
  b.step(
    heading,
    nq,
    "Nq",
    "bearing factor",
    "e^(π·tan {φ′})·tan²(45° + {φ′}/2)",
    { "φ′": phi },
    "–",
    "Prandtl (1921); Reissner (1924)",
  );
  b.step(heading, nc, "Nc", "bearing factor", "({Nq} − 1)/tan {φ′}", { Nq: nq, "φ′": phi }, "–", "Prandtl (1921)");
  b.step(heading, ngamma, "Nγ", "bearing factor", ngammaText[bearing], { Nq: nq, "φ′": phi }, "–", source);
  for (const [symbol, slot, formula, tied] of inclination.steps)
    b.step(heading, slot, symbol, "inclination factor", formula, tied, "–", source);
  if (unitWeight !== below.moist)
    b.step(
      heading,
      unitWeight,
      "γ′",
      "unit weight below the base, by the depth of the water",
      "({γ_sat} − 9.81) + ({γ} − {γ_sat} + 9.81)·min({d}/{B′}, 1)",
      { γ: below.moist, γ_sat: below.saturated, d: ponds.depthBelow ?? below.moist, "B′": base.effectiveWidth },
      "kN/m³",
    );
  b.step(
    heading,
    resisting,
    "q_ult",
    "bearing capacity",
    "{f_q}·({c′}·{Nc}·{ic} + {q0}·{Nq}·{iq} + ½·{γ′}·{B′}·{Nγ}·{iγ})",
    {
      f_q: factor,
      "c′": below.cohesion,
      Nc: nc,
      ic: inclination.c,
      q0: surcharge,
      Nq: nq,
      iq: inclination.q,
      "γ′": unitWeight,
      "B′": base.effectiveWidth,
      Nγ: ngamma,
      iγ: inclination.gamma,
    },
    "kPa",
    source,
  );
  return resisting;
}

interface Inclination {
  readonly c: Slot;
  readonly q: Slot;
  readonly gamma: Slot;
  readonly steps: readonly (readonly [symbol: string, slot: Slot, formula: string, tied: Record<string, Slot>])[];
}

/** Vesić and EN 1997-1 on a strip: powers 2 and 3 of one bracket. */
function bracketInclination(
  b: KernelBuilder,
  base: BaseForces,
  below: SoilSlots,
  horizontal: Slot,
  nc: Slot,
): Inclination {
  const cot = b.formula("cot φ'", cotangent, [below.frictionAngle], kink);
  const bracket = b.formula("inclination bracket", inclinationBase, [
    horizontal,
    base.normal,
    base.effectiveWidth,
    below.cohesion,
    cot,
  ]);
  const q = b.formula("iq", inclinationNq, [bracket]);
  const gamma = b.formula("iγ", inclinationNgamma, [bracket]);
  const tan = b.formula("tan φ'", tangent, [below.frictionAngle], kink);
  const c = below.hasCohesion ? b.formula("ic", inclinationNc, [q, nc, tan]) : b.constant(0);
  const tied = { H: horizontal, "N′": base.normal, "B′": base.effectiveWidth, "c′": below.cohesion, "cot φ′": cot };
  const inner = "1 − {H}/({N′} + {B′}·{c′}·{cot φ′})";
  return {
    c,
    q,
    gamma,
    steps: [
      ["iq", q, `(${inner})²`, tied],
      ["iγ", gamma, `(${inner})³`, tied],
      ...(below.hasCohesion
        ? [["ic", c, "{iq} − (1 − {iq})/({Nc}·{tan φ′})", { iq: q, Nc: nc, "tan φ′": tan }] as const]
        : []),
    ],
  };
}

function meyerhofInclination(b: KernelBuilder, base: BaseForces, below: SoilSlots, horizontal: Slot): Inclination {
  const angle = b.asAngle(b.formula("inclination of the load", loadInclination, [horizontal, base.normal]));
  const phi = b.asAngle(b.formula("φ' at least 0.1°", atLeast, [below.frictionAngle], kink));
  const q = b.formula("iq, Meyerhof", meyerhofInclinationNq, [angle]);
  const gamma = b.formula("iγ, Meyerhof", meyerhofInclinationNgamma, [angle, phi]);
  return {
    c: q,
    q,
    gamma,
    steps: [
      ["ic = iq", q, "(1 − {α}/90°)²", { α: angle }],
      ["iγ", gamma, "(1 − {α}/{φ′})²", { α: angle, "φ′": phi }],
    ],
  };
}

// Loops written out one by one, so that each is compiled for its own formula.
columnwise(applied, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = applied(a[i], b[i]);
});
columnwise(pushing, (y, n, a) => {
  for (let i = 0; i < n; i++) y[i] = pushing(a[i]);
});
columnwise(undrainedCapacity, (y, n, a, b, c, d) => {
  for (let i = 0; i < n; i++) y[i] = undrainedCapacity(a[i], b[i], c[i], d[i]);
});
columnwise(unitWeightBelow, (y, n, a, b, c, d) => {
  for (let i = 0; i < n; i++) y[i] = unitWeightBelow(a[i], b[i], c[i], d[i]);
});
columnwise(term, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = term(a[i], b[i], c[i]);
});
columnwise(weightTerm, (y, n, a, b, c, d) => {
  for (let i = 0; i < n; i++) y[i] = weightTerm(a[i], b[i], c[i], d[i]);
});
columnwise(capacity, (y, n, a, b, c, d) => {
  for (let i = 0; i < n; i++) y[i] = capacity(a[i], b[i], c[i], d[i]);
});
columnwise(cotangent, (y, n, a) => {
  for (let i = 0; i < n; i++) y[i] = cotangent(a[i]);
});
columnwise(tangent, (y, n, a) => {
  for (let i = 0; i < n; i++) y[i] = tangent(a[i]);
});
columnwise(loadInclination, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = loadInclination(a[i], b[i]);
});
columnwise(atLeast, (y, n, a) => {
  for (let i = 0; i < n; i++) y[i] = atLeast(a[i]);
});
columnwise(undrainedInclination, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = undrainedInclination(a[i], b[i], c[i]);
});
columnwise(inclinationBase, (y, n, a, b, c, d, e) => {
  for (let i = 0; i < n; i++) y[i] = inclinationBase(a[i], b[i], c[i], d[i], e[i]);
});
columnwise(inclinationNq, (y, n, a) => {
  for (let i = 0; i < n; i++) y[i] = inclinationNq(a[i]);
});
columnwise(inclinationNgamma, (y, n, a) => {
  for (let i = 0; i < n; i++) y[i] = inclinationNgamma(a[i]);
});
columnwise(inclinationNc, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = inclinationNc(a[i], b[i], c[i]);
});
columnwise(meyerhofInclinationNq, (y, n, a) => {
  for (let i = 0; i < n; i++) y[i] = meyerhofInclinationNq(a[i]);
});
columnwise(meyerhofInclinationNgamma, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = meyerhofInclinationNgamma(a[i], b[i]);
});
