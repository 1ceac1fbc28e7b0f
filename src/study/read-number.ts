/** One number of a study: its unit, its range, and what the reader may have meant where it is outside. */
import type { DistributionKey, KeyType } from "./distribution-keys.ts";
import type { Field } from "./fields.ts";
import type { Findings } from "./findings.ts";
import { shown } from "./structure.ts";
import type { Units } from "./study.ts";
import { type Dimension, displayUnit, fromPlain, plainUnit, readMeasure } from "./units.ts";

export interface NumberContext {
  readonly units: Units;
  readonly findings: Findings;
}

/** House value of a number or a text with a unit; NaN, with a problem, where it is neither. */
export function readNumber(
  raw: unknown,
  path: string,
  dimension: Dimension,
  { units, findings }: NumberContext,
): number {
  if (typeof raw === "number") return fromPlain(raw, dimension, units);
  if (typeof raw === "string") {
    const measure = readMeasure(raw, dimension, units);
    if ("value" in measure) return measure.value;
    findings.problem(path, measure.message, measure.hint);
    return Number.NaN;
  }
  findings.problem(path, `found ${shown(raw)}; a number, or a text with a number and a unit, is needed`);
  return Number.NaN;
}

/** As `readNumber`, within the physical range of the field. */
export function readValue(raw: unknown, path: string, field: Field, context: NumberContext): number {
  const value = readNumber(raw, path, field.dimension, context);
  return inRange(value, raw, path, field, context) ? value : Number.NaN;
}

function inRange(value: number, raw: unknown, path: string, field: Field, { units, findings }: NumberContext): boolean {
  if (Number.isNaN(value) || (value >= field.lowest && value <= field.highest)) return true;
  findings.problem(
    path,
    `${shown(raw).replaceAll('"', "")} is outside ${rangeText(field, units)}`,
    rangeHint(value, raw, field, units),
  );
  return false;
}

/** `0 to 60 degrees`, in the study's units. */
export function rangeText(field: Field, units: Units): string {
  const { factor } = displayUnit(field.dimension, units);
  const unit = plainUnit(field.dimension, units);
  return `${brief(field.lowest * factor)} to ${brief(field.highest * factor)}${unit === "" ? "" : ` ${unit}`}`;
}

/** At most four digits, without trailing zeros. */
export function brief(value: number): string {
  return String(Number(value.toPrecision(4)));
}

function rangeHint(value: number, raw: unknown, field: Field, units: Units): string | undefined {
  const fits = (candidate: number): boolean => candidate >= field.lowest && candidate <= field.highest;
  const plain = value * displayUnit(field.dimension, units).factor;
  if (field.dimension === "ratio" && value >= 10 && fits(value / 100))
    return `did you mean ${brief(plain / 100)}? (${brief(plain)} % is ${brief(plain / 100)})`;
  if (field.dimension === "unit_weight" && typeof raw === "number" && units === "metric") {
    const found = unitWeightHint(raw, fits);
    if (found !== undefined) return found;
  }
  if (value < 0 && fits(-value)) return `did you mean ${brief(-plain)}?`;
  if (value < 2 * field.highest) return undefined; // just outside is no slip of the decimal point
  for (const power of [10, 100, 1000]) {
    if (fits(value / power)) return `did you mean ${withPoint(plain / power)}?`;
  }
  return undefined;
}

function unitWeightHint(raw: number, fits: (candidate: number) => boolean): string | undefined {
  const fromPounds = fromPlain(raw, "unit_weight", "us");
  if (raw < 300 && fits(fromPounds)) return `if it is in pounds per cubic foot, write "${raw} lb/ft3"`;
  const fromKilograms = (raw * 9.80665) / 1e3;
  return fits(fromKilograms) ? `if it is in kg/m3, write "${fromKilograms.toPrecision(3)} kN/m3"` : undefined;
}

function withPoint(value: number): string {
  const text = String(Number(value.toPrecision(6)));
  return /^-?\d+$/.test(text) ? `${text}.0` : text;
}

const limits: Readonly<Partial<Record<KeyType, { fits: (x: number) => boolean; words: string }>>> = {
  spread: { fits: (x) => x > 0, words: "must be above 0; a certain number is written alone" },
  positive: { fits: (x) => x > 0, words: "must be above 0" },
  nonnegative: { fits: (x) => x >= 0, words: "must be 0 or more" },
  share: { fits: (x) => x > 0 && x <= 1, words: "must be above 0 and at most 1" },
  portion: { fits: (x) => x >= 0 && x <= 1, words: "must be between 0 and 1" },
  count: { fits: (x) => Number.isInteger(x) && x >= 1, words: "must be a whole number from 1" },
  length: { fits: (x) => x > 0, words: "must be above 0" },
};

/** A key of a distribution, as its type asks. */
export function readKey(
  raw: unknown,
  path: string,
  key: Pick<DistributionKey, "type">,
  field: Field,
  context: NumberContext,
): number {
  if (key.type === "value") return readValue(raw, path, field, context);
  const value = readNumber(raw, path, keyDimension(key.type, field), context);
  const limit = limits[key.type];
  if (Number.isNaN(value) || limit === undefined || limit.fits(value)) return value;
  const percent = (key.type === "share" || key.type === "portion") && value > 1 && value <= 100;
  context.findings.problem(
    path,
    `${shown(raw).replaceAll('"', "")} ${limit.words}`,
    percent ? `did you mean ${brief(value / 100)}?` : undefined,
  );
  return Number.NaN;
}

function keyDimension(type: KeyType, field: Field): Dimension {
  if (type === "length") return "length";
  if (type === "parent") return field.dimension;
  if (type === "spread") return field.dimension === "slope" ? "angle" : field.dimension;
  return "ratio";
}
