import { columnwise } from "../columnwise.ts";
import { factorCap, mark, type Slot } from "../kernel.ts";
import type { KernelBuilder } from "../kernel-builder.ts";
import type { EarthThrust } from "./earth-thrust.ts";
import type { Passive } from "./front.ts";
import type { Ledger, Weight } from "./ledger.ts";
import type { Outline } from "./outline.ts";
import type { Uplift } from "./water.ts";

/** The resultant at the base: N′, E, moments about the toe, x_R and B′. */
export interface BaseForces {
  readonly normal: Slot;
  readonly driving: Slot;
  readonly stabilising: Slot;
  readonly overturning: Slot;
  readonly resultantX: Slot;
  /** B′ = 2 min(x_R, B − x_R); 0 or less without contact. */
  readonly effectiveWidth: Slot;
}

const product = (a: number, b: number): number => a * b;

/** Inertia of what shakes: kh W towards the front, kv W upwards, at the centroids. */
function prepareInertia(b: KernelBuilder, ledger: Ledger): void {
  if (!b.has("loads.earthquake.kh")) return;
  const [kh, kv] = [b.input("loads.earthquake.kh"), b.input("loads.earthquake.kv")];
  const lightening = b.formula("−kv", negative, [kv]);
  for (const entry of ledger.weights.filter((weight) => weight.shakes)) {
    if (entry.momentZ === undefined) throw new RangeError(`${entry.name} shakes but has no height`);
    const of = (factor: Slot, slot: Slot): Slot => b.formula("inertia", product, [factor, slot]);
    const row = {
      horizontal: of(kh, entry.weight),
      momentZ: of(kh, entry.momentZ),
      vertical: of(lightening, entry.weight),
      momentX: of(lightening, entry.momentX),
    };
    b.forces.push({
      name: `Inertia, ${entry.name}`,
      group: "inertia",
      ...row,
      x: b.formula("x of the centroid", centroid, [entry.momentX, entry.weight]),
    });
    ledger.pushes.push({
      name: `F_E ${entry.name.toLowerCase()}`,
      force: row.horizontal,
      moment: row.momentZ,
      sign: 1,
    });
    ledger.weights.push(inertiaWeight(entry, row.vertical, row.momentX));
    b.step(
      "Earthquake",
      row.horizontal,
      "F_E",
      `inertia of ${entry.name.toLowerCase()}`,
      "{kh}·{W}",
      { kh, W: entry.weight },
      "kN/m",
    );
  }
}

const inertiaWeight = (entry: Weight, weight: Slot, momentX: Slot): Weight => ({
  name: `Inertia, ${entry.name}`,
  group: "inertia",
  weight,
  momentX,
  shakes: false,
});
const negative = (x: number): number => -x;
const centroid = (moment: number, weight: number): number => (weight === 0 ? 0 : moment / weight);

export function prepareBase(
  b: KernelBuilder,
  ledger: Ledger,
  o: Outline,
  thrust: EarthThrust,
  uplift: Uplift | undefined,
  passive: Passive | undefined,
): BaseForces {
  prepareInertia(b, ledger);
  const heading = "Base";
  const weights = b.sum(
    "ΣW",
    ledger.weights.map((entry) => ({ slot: entry.weight })),
  );
  const up = uplift === undefined ? [] : [{ slot: uplift.force, sign: -1 as const }];
  const normal = b.sum("N'", [{ slot: weights }, { slot: thrust.vertical }, ...up]);
  const driving = b.sum(
    "E",
    ledger.pushes.map((push) => ({ slot: push.force, sign: push.sign })),
  );
  const stabilising = b.sum("stabilising moment", [
    ...ledger.weights.map((entry) => ({ slot: entry.momentX })),
    { slot: thrust.verticalMoment },
    ...(passive === undefined ? [] : [{ slot: passive.moment }]),
  ]);
  const overturning = b.sum("overturning moment", [
    ...ledger.pushes.map((push) => ({ slot: push.moment, sign: push.sign })),
    ...(uplift === undefined ? [] : [{ slot: uplift.moment }]),
  ]);
  const [resultantX, effectiveWidth] = [b.slot("x_R"), b.slot("B'")];
  b.stage({
    name: "resultant",
    reads: [normal, stabilising, overturning, o.width, b.marks],
    writes: [resultantX, effectiveWidth, b.marks],
    run(c, count) {
      const [n, s, m, w, x, e, marks] = [
        c[normal],
        c[stabilising],
        c[overturning],
        c[o.width],
        c[resultantX],
        c[effectiveWidth],
        c[b.marks],
      ];
      for (let i = 0; i < count; i++) {
        const at = n[i] > 0 ? (s[i] - m[i]) / n[i] : 0;
        x[i] = at;
        e[i] = 2 * Math.min(at, w[i] - at);
        if (e[i] <= 0) marks[i] |= mark.lostContact;
      }
    },
  });
  b.step(
    heading,
    weights,
    "ΣW",
    "all weights over the base",
    ...sumText(ledger.weights.map((entry) => [entry.name, entry.weight, 1])),
    "kN/m",
  );
  b.step(
    heading,
    normal,
    "N′",
    "vertical force on the base, net of the uplift",
    "{ΣW} + {P_v} − {U}",
    { ΣW: weights, P_v: thrust.vertical, U: uplift?.force ?? b.constant(0) },
    "kN/m",
  );
  b.step(
    heading,
    driving,
    "E",
    "horizontal driving force",
    ...sumText(ledger.pushes.map((push) => [push.name, push.force, push.sign])),
    "kN/m",
  );
  b.step(
    heading,
    stabilising,
    "M_stab",
    "stabilising moment about the toe",
    ...sumText([
      ...ledger.weights.map((entry): Term => [`M ${entry.name.toLowerCase()}`, entry.momentX, 1]),
      ["P_v·x", thrust.verticalMoment, 1],
      ...(passive === undefined ? [] : [["P_p·z", passive.moment, 1] as Term]),
    ]),
    "kNm/m",
  );
  b.step(
    heading,
    overturning,
    "M_over",
    "overturning moment about the toe",
    ...sumText([
      ...ledger.pushes.map((push): Term => [`${push.name}·z`, push.moment, push.sign]),
      ...(uplift === undefined ? [] : [["U·x_U", uplift.moment, 1] as Term]),
    ]),
    "kNm/m",
  );
  b.step(
    heading,
    resultantX,
    "x_R",
    "resultant from the toe",
    "({M_stab} − {M_over})/{N′}",
    { M_stab: stabilising, M_over: overturning, "N′": normal },
    "m",
  );
  b.step(
    heading,
    effectiveWidth,
    "B′",
    "effective width",
    "2·min({x_R}, {B} − {x_R})",
    { x_R: resultantX, B: o.width },
    "m",
  );
  Object.assign(b.places, { normal, driving, resultantX, effectiveWidth });
  return { normal, driving, stabilising, overturning, resultantX, effectiveWidth };
}

type Term = readonly [name: string, slot: Slot, sign: 1 | -1];

/** A sum written out: each term by its name, and by its number beside it. */
function sumText(terms: readonly Term[]): [formula: string, of: Record<string, Slot>] {
  const formula = terms
    .map(([name, , sign], place) => `${sign === 1 ? (place === 0 ? "" : " + ") : " − "}{${name}}`)
    .join("");
  return [formula, Object.fromEntries(terms.map(([name, slot]) => [name, slot]))];
}

/** Factor of safety between 0 and the cap; a driving action of zero or less gives the cap. */
export function cappedRatio(resisting: number, driving: number): number {
  return driving > 0 ? Math.min(Math.max(resisting / driving, 0), factorCap) : factorCap;
}

// Loops written out one by one, so that each is compiled for its own formula.
columnwise(negative, (y, n, a) => {
  for (let i = 0; i < n; i++) y[i] = negative(a[i]);
});
columnwise(product, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = product(a[i], b[i]);
});
columnwise(centroid, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = centroid(a[i], b[i]);
});
