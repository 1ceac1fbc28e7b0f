/**
 * Units at the door: what a study may be written in, and what results are shown in.
 *
 * A table of our own, because the unit libraries that were looked at read `lb/ft3` as a mass per volume: in this trade
 * `lb` is a force, and the compound units in use are so few that a table is shorter than the exceptions would be.
 *
 * Definitions: 1 ft = 0.3048 m and 1 lb (mass) = 0.45359237 kg exactly (international yard and pound agreement, 1959);
 * standard gravity 9.80665 m/s² exactly (CGPM, 1901), so 1 lb (force) = 4.4482216152605 N.
 */
import type { Units } from "./study.ts";

/** What a number measures. `ratio` is everything without a unit; `moment` occurs in results only. */
export type Dimension =
  | "length"
  | "level"
  | "angle"
  | "slope"
  | "unit_weight"
  | "pressure"
  | "line_force"
  | "moment"
  | "ratio";

const foot = 0.3048;
const poundForce = 4.4482216152605e-3; // kN

const lengths: Readonly<Record<string, number>> = { m: 1, cm: 0.01, mm: 0.001, ft: foot, in: foot / 12 };
const forces: Readonly<Record<string, number>> = {
  N: 1e-3,
  kN: 1,
  MN: 1e3,
  lb: poundForce,
  lbf: poundForce,
  kip: 1e3 * poundForce,
  kips: 1e3 * poundForce,
};
const angles: Readonly<Record<string, number>> = {
  deg: 1,
  degree: 1,
  degrees: 1,
  "°": 1,
  rad: 180 / Math.PI,
  radians: 180 / Math.PI,
};

/** Every force over every length to the given power: `kN/m3`, `lb/ft2`, … */
function forcePerLength(power: 1 | 2 | 3): Record<string, number> {
  const found: Record<string, number> = {};
  for (const [force, kilonewtons] of Object.entries(forces)) {
    for (const [length, metres] of Object.entries(lengths)) {
      found[`${force}/${length}${power === 1 ? "" : power}`] = kilonewtons / metres ** power;
    }
  }
  return found;
}

const poundsPerSquareFoot = poundForce / foot ** 2;

/** Factor from a unit to the house unit (m, kN/m, kPa, kN/m³, degrees), by dimension. */
const unitTables: Readonly<Record<Dimension, Readonly<Record<string, number>>>> = {
  length: lengths,
  level: lengths,
  angle: angles,
  slope: angles,
  unit_weight: { ...forcePerLength(3), pcf: poundForce / foot ** 3, kcf: (1e3 * poundForce) / foot ** 3 },
  pressure: {
    ...forcePerLength(2),
    Pa: 1e-3,
    kPa: 1,
    MPa: 1e3,
    psf: poundsPerSquareFoot,
    ksf: 1e3 * poundsPerSquareFoot,
    psi: 144 * poundsPerSquareFoot,
    ksi: 144e3 * poundsPerSquareFoot,
  },
  line_force: { ...forcePerLength(1), plf: poundForce / foot, klf: (1e3 * poundForce) / foot },
  moment: {},
  ratio: { "%": 0.01 },
};

/** The unit of a plain number, as it is written in a file; empty for a ratio. */
const plainUnits: Readonly<Record<Units, Readonly<Record<Dimension, string>>>> = {
  metric: {
    length: "m",
    level: "m",
    angle: "degrees",
    slope: "degrees",
    unit_weight: "kN/m3",
    pressure: "kPa",
    line_force: "kN/m",
    moment: "kNm/m",
    ratio: "",
  },
  us: {
    length: "ft",
    level: "ft",
    angle: "degrees",
    slope: "degrees",
    unit_weight: "lb/ft3",
    pressure: "lb/ft2",
    line_force: "lb/ft",
    moment: "lb ft/ft",
    ratio: "",
  },
};

/** Unit for messages, as one would type it: `kN/m3`, `degrees`; empty for a ratio. */
export function plainUnit(dimension: Dimension, units: Units): string {
  return plainUnits[units][dimension];
}

/** House value of a plain number of a study: feet, pounds or metric, as `units` says. */
export function fromPlain(value: number, dimension: Dimension, units: Units): number {
  return value / displayUnit(dimension, units).factor;
}

/**
 * How results are shown: shown value = factor · house value (m, kN/m, kPa, kN/m³, kNm/m, degrees).
 *
 * @example displayUnit("length", "us") // { unit: "ft", factor: 3.2808… }
 */
export function displayUnit(dimension: Dimension, units: Units): { readonly unit: string; readonly factor: number } {
  const plain = plainUnit(dimension, units);
  if (dimension === "angle" || dimension === "slope") return { unit: "°", factor: 1 };
  if (dimension === "ratio") return { unit: "–", factor: 1 };
  if (dimension === "moment")
    return { unit: units === "us" ? "lb·ft/ft" : plain, factor: units === "us" ? 1 / poundForce : 1 };
  const house = unitTables[dimension][plain]!;
  return { unit: plain.replace("3", "³").replace("2", "²"), factor: units === "metric" ? 1 : 1 / house };
}

/** The units a field may be written with, for messages and the schema: the usual ones, not all that are understood. */
export function usualUnits(dimension: Dimension): readonly string[] {
  switch (dimension) {
    case "length":
    case "level":
      return ["m", "cm", "mm", "ft", "in"];
    case "angle":
      return ["deg", "rad"];
    case "slope":
      return ["deg", "rad", "1v:2h"];
    case "unit_weight":
      return ["kN/m3", "lb/ft3", "pcf"];
    case "pressure":
      return ["kPa", "kN/m2", "MPa", "lb/ft2", "psf", "ksf", "psi"];
    case "line_force":
      return ["kN/m", "lb/ft", "kip/ft"];
    case "ratio":
      return ["%"];
    case "moment":
      return [];
  }
}

/** A house value, or why the text is none. */
export type Measure = { readonly value: number } | { readonly message: string; readonly hint?: string };

const numberAndUnit = /^([+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?)\s*(.*)$/i;
const riseOverRun = /^(\d+\.?\d*|\.\d+)\s*v\s*:\s*(\d+\.?\d*|\.\d+)\s*h$/i;

/**
 * House value of `"120 lb/ft3"`, `"2.5 m"`, `"0.2 rad"`, `"1v:2h"`; a number without a unit is plain, as `units` says.
 * m² and m^2 are m2; upper and lower case matter as they do in print (mm is not Mm).
 */
export function readMeasure(text: string, dimension: Dimension, units: Units): Measure {
  const trimmed = text.trim();
  const slope = dimension === "slope" ? riseOverRun.exec(trimmed) : null;
  if (slope) return slopeAngle(Number(slope[1]), Number(slope[2]));
  const parts = numberAndUnit.exec(trimmed);
  if (!parts) return { message: `found ${quoted(text)}, which is not a number${withUnit(dimension)}` };
  const value = Number(parts[1]);
  const unit = canonicalUnit(parts[2]!);
  if (!Number.isFinite(value)) return { message: `found ${quoted(text)}, which is too large` };
  if (unit === "") return { value: fromPlain(value, dimension, units) };
  const table = unitTables[dimension];
  if (Object.hasOwn(table, unit)) return { value: value * table[unit]! };
  return {
    message: `found ${quoted(text)}, whose unit is not one of this value's${wantedUnits(dimension)}`,
    hint: unitHint(value, unit, dimension),
  };
}

function slopeAngle(rise: number, run: number): Measure {
  if (rise === 0 && run === 0) return { message: "a slope of 0v:0h has no direction" };
  return { value: (Math.atan2(rise, run) * 180) / Math.PI };
}

function canonicalUnit(text: string): string {
  return text
    .trim()
    .replace(/³/g, "3")
    .replace(/²/g, "2")
    .replace(/\s+|\^|\.$/g, "")
    .replace("sqft", "ft2");
}

function withUnit(dimension: Dimension): string {
  return usualUnits(dimension).length === 0 ? "" : `, with or without a unit${wantedUnits(dimension)}`;
}

function wantedUnits(dimension: Dimension): string {
  const units = usualUnits(dimension);
  return units.length === 0 ? "" : ` (${units.join(", ")})`;
}

function unitHint(value: number, unit: string, dimension: Dimension): string | undefined {
  const digits = /^,(\d+)/.exec(unit)?.[1];
  if (digits !== undefined) return commaHint(value, digits);
  if (dimension === "unit_weight" && /^(kg|t|Mg|g)\/c?m3$/.test(unit)) {
    const perCubicMetre = { "kg/m3": 1, "t/m3": 1e3, "Mg/m3": 1e3, "g/cm3": 1e3 }[unit];
    if (perCubicMetre === undefined) return "that is a density; a unit weight is a force per volume";
    return `that is a density; as a unit weight it is "${((value * perCubicMetre * 9.80665) / 1e3).toPrecision(3)} kN/m3"`;
  }
  if (dimension === "slope" && /^:/.test(unit))
    return 'write a slope as degrees or as "1v:2h" (1 vertical in 2 horizontal)';
  const sameButCase = Object.keys(unitTables[dimension]).find((known) => known.toLowerCase() === unit.toLowerCase());
  return sameButCase === undefined ? undefined : `did you mean ${sameButCase}?`;
}

function quoted(text: string): string {
  const short = text.length > 40 ? `${text.slice(0, 37)}…` : text;
  return `"${short}"`;
}

function commaHint(value: number, digits: string): string {
  const fraction = `write ${value}.${digits} with a decimal point`;
  return digits.length === 3 ? `${fraction}, or ${value}${digits} without a comma` : fraction;
}
