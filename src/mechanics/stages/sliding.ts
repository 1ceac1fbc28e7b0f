import type { Study } from "../../study/study.ts";
import { columnwise } from "../columnwise.ts";
import { factorCap, mark, type Slot } from "../kernel.ts";
import type { KernelBuilder } from "../kernel-builder.ts";
import { type BaseForces, cappedRatio } from "./base.ts";
import type { Passive } from "./front.ts";
import type { SoilSlots } from "./layers.ts";
import type { Outline } from "./outline.ts";

const tanOfShare = (share: number, frictionAngle: number): number => Math.tan(share * frictionAngle);

/** Compressed length of the base: min(B, 3 min(x_R, B − x_R)); 0 without contact. */
export function compressedLength(effectiveWidth: number, width: number): number {
  return Math.min(width, Math.max(1.5 * effectiveWidth, 0));
}

/** R = f (N′ tan δ + a L) + P_p on drained ground. */
export function drainedResistance(
  normal: number,
  tangent: number,
  adhesion: number,
  length: number,
  factor: number,
  passive: number,
): number {
  return factor * (normal * tangent + adhesion * length) + passive;
}

/** R = f c_u B′ + P_p on undrained ground; no base resistance without contact. */
export function undrainedResistance(strength: number, effectiveWidth: number, factor: number, passive: number): number {
  return factor * strength * Math.max(effectiveWidth, 0) + passive;
}

export function prepareSliding(
  b: KernelBuilder,
  study: Study,
  o: Outline,
  base: BaseForces,
  below: SoilSlots,
  passive: Passive | undefined,
): void {
  const heading = "Sliding";
  const zero = b.constant(0);
  const passiveForce = passive?.force ?? zero;
  const factorOfBase = b.input("model.factors.base_resistance");
  const resisting = below.undrained
    ? b.formula("sliding resistance", undrainedResistance, [
        below.cohesion,
        base.effectiveWidth,
        factorOfBase,
        passiveForce,
      ])
    : drained(b, study, o, base, below, factorOfBase, passiveForce);
  if (below.undrained)
    b.step(
      heading,
      resisting,
      "R",
      "resistance to sliding, undrained",
      "{f_R}·{c_u}·{B′} + {P_p}",
      { f_R: factorOfBase, c_u: below.cohesion, "B′": base.effectiveWidth, P_p: passiveForce },
      "kN/m",
    );
  finish(b, {
    limitState: "sliding",
    heading,
    resisting,
    driving: base.driving,
    normal: base.normal,
    unit: "kN/m",
    formula: "{resisting}/{driving}",
  });
}

function drained(
  b: KernelBuilder,
  study: Study,
  o: Outline,
  base: BaseForces,
  below: SoilSlots,
  factor: Slot,
  passive: Slot,
): Slot {
  const friction = study.wall.slidingFriction;
  if (friction === undefined) throw new RangeError("a wall on drained ground needs wall.sliding_friction");
  const tangent =
    friction.ratio !== undefined
      ? b.formula("tan δ of the base", tanOfShare, [b.input("wall.sliding_friction.ratio"), below.frictionAngle])
      : b.formula("tan δ of the base", Math.tan, [b.input("wall.sliding_friction.angle")]);
  const adhesion = b.input("wall.sliding_friction.adhesion");
  const length =
    b.constantOf(adhesion) === 0
      ? b.constant(0)
      : b.formula("compressed length", compressedLength, [base.effectiveWidth, o.width]);
  const resisting = b.formula("sliding resistance", drainedResistance, [
    base.normal,
    tangent,
    adhesion,
    length,
    factor,
    passive,
  ]);
  const heading = "Sliding";
  if (friction.ratio !== undefined)
    b.step(
      heading,
      tangent,
      "tan δ",
      "friction of the base",
      "tan({ratio}·{φ′})",
      { ratio: b.input("wall.sliding_friction.ratio"), "φ′": below.frictionAngle },
      "–",
    );
  else
    b.step(
      heading,
      tangent,
      "tan δ",
      "friction of the base",
      "tan {δ}",
      { δ: b.input("wall.sliding_friction.angle") },
      "–",
    );
  b.step(
    heading,
    resisting,
    "R",
    "resistance to sliding",
    "{f_R}·({N′}·{tan δ} + {a}·{L}) + {P_p}",
    { f_R: factor, "N′": base.normal, "tan δ": tangent, a: adhesion, L: length, P_p: passive },
    "kN/m",
  );
  return resisting;
}

export interface Ratio {
  readonly limitState: "sliding" | "overturning" | "bearing" | "eccentricity";
  readonly heading: string;
  readonly resisting: Slot;
  readonly driving: Slot;
  /** Where this is 0 or less, contact is lost and the factor is 0; absent for overturning. */
  readonly normal?: Slot;
  readonly unit: string;
  readonly formula: string;
}

/** F = R / E between 0 and the cap; lost contact goes first. */
export function finish(b: KernelBuilder, ratio: Ratio): void {
  const { resisting, driving, limitState } = ratio;
  const factor = b.slot(`factor of safety, ${limitState}`);
  const contact = ratio.normal ?? b.constant(1);
  b.stage({
    name: limitState,
    reads: [resisting, driving, contact, b.marks],
    writes: [factor, b.marks],
    run(c, count) {
      const [r, e, n, f, marks] = [c[resisting], c[driving], c[contact], c[factor], c[b.marks]];
      for (let i = 0; i < count; i++) {
        f[i] = n[i] > 0 ? cappedRatio(r[i], e[i]) : 0;
        if (f[i] >= factorCap) marks[i] |= mark.capped;
      }
    },
  });
  b.limitStates.push({ limitState, factor, resisting, driving, unit: ratio.unit });
  b.step(
    ratio.heading,
    factor,
    "F",
    `factor of safety against ${limitState === "bearing" ? "bearing failure" : limitState}`,
    ratio.formula,
    { resisting, driving },
    "–",
  );
}

/** Overturning about the tip of the toe: always its plain ratio. */
export function prepareOverturning(b: KernelBuilder, base: BaseForces): void {
  finish(b, {
    limitState: "overturning",
    heading: "Overturning",
    resisting: base.stabilising,
    driving: base.overturning,
    unit: "kNm/m",
    formula: "{resisting}/{driving}",
  });
}

const shareOfWidth = (share: number, width: number): number => share * width;
const offCentre = (width: number, resultantX: number): number => Math.abs(0.5 * width - resultantX);

/** Eccentricity: limit · B / |e|, 0 on lost contact. */
export function prepareEccentricity(b: KernelBuilder, o: Outline, base: BaseForces, limit: number): void {
  const allowed = b.formula("allowed eccentricity", shareOfWidth, [b.constant(limit), o.width]);
  const eccentricity = b.formula("eccentricity", offCentre, [o.width, base.resultantX]);
  b.step(
    "Eccentricity",
    eccentricity,
    "|e|",
    "distance of the resultant from the middle",
    "|{B}/2 − {x_R}|",
    { B: o.width, x_R: base.resultantX },
    "m",
  );
  finish(b, {
    limitState: "eccentricity",
    heading: "Eccentricity",
    resisting: allowed,
    driving: eccentricity,
    normal: base.effectiveWidth,
    unit: "m",
    formula: "{resisting}/{driving}",
  });
}

// Loops written out one by one, so that each is compiled for its own formula.
columnwise(undrainedResistance, (y, n, a, b, c, d) => {
  for (let i = 0; i < n; i++) y[i] = undrainedResistance(a[i], b[i], c[i], d[i]);
});
columnwise(tanOfShare, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = tanOfShare(a[i], b[i]);
});
columnwise(compressedLength, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = compressedLength(a[i], b[i]);
});
columnwise(drainedResistance, (y, n, a, b, c, d, e, f) => {
  for (let i = 0; i < n; i++) y[i] = drainedResistance(a[i], b[i], c[i], d[i], e[i], f[i]);
});
columnwise(shareOfWidth, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = shareOfWidth(a[i], b[i]);
});
columnwise(offCentre, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = offCentre(a[i], b[i]);
});
