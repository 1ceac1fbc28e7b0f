import type { SheetLine } from "../results.ts";
import type { Columns, Kernel, Step } from "./kernel.ts";

/** The calculation sheet of a run with one sample: each step beside its column. */
export function calculationSheet(kernel: Kernel, columns: Columns): readonly SheetLine[] {
  const angles = new Set(kernel.angles);
  const shown = kernel.steps.filter(
    ({ unless }) => unless === undefined || columns[unless[0]][0] !== columns[unless[1]][0],
  );
  const ranked = shown.map((step, place) => ({ step, rank: rankOf(step.heading), place }));
  ranked.sort((a, b) => a.rank - b.rank || a.place - b.place);
  return ranked.map(({ step }) => ({
    heading: step.heading,
    symbol: step.symbol,
    text: step.text,
    formula: withSymbols(step.formula),
    substituted: step.formula.includes("{") ? withNumbers(step, columns, angles) : "",
    value: columns[step.slot][0] * (angles.has(step.slot) ? 180 / Math.PI : 1),
    unit: angles.has(step.slot) ? "°" : step.unit,
    ...(step.source === undefined ? {} : { source: step.source }),
  }));
}

/** The order in which one would do the calculation by hand. */
const order = [
  "Outline",
  "Loads",
  "Water",
  "Earth pressure",
  "Earthquake",
  "Earth thrust",
  "Weights",
  "Front",
  "Base",
  "Sliding",
  "Overturning",
  "Bearing",
  "Eccentricity",
  "Deep-seated failure",
];

function rankOf(heading: string): number {
  const rank = order.findIndex((start) => heading.startsWith(start));
  return rank < 0 ? order.length : rank;
}

const braces = /\{([^}]*)\}/g;

function withSymbols(formula: string): string {
  return formula.replace(braces, "$1");
}

function withNumbers(step: Step, columns: Columns, angles: ReadonlySet<number>): string {
  return step.formula.replace(braces, (whole, name: string) => {
    const slot = step.of[name];
    if (slot === undefined) return whole.slice(1, -1);
    const value = columns[slot][0];
    if (angles.has(slot)) return `${fourFigures((value * 180) / Math.PI)}°`;
    const text = fourFigures(value);
    return value < 0 ? `(${text})` : text;
  });
}

/** Four significant figures, as one writes beside a hand calculation. */
export function fourFigures(value: number): string {
  if (value === 0 || !Number.isFinite(value)) return String(value);
  const size = Math.floor(Math.log10(Math.abs(value)));
  if (size < -4 || size > 6) return value.toExponential(3);
  return String(Number(value.toFixed(Math.max(0, 3 - size)))).replace("-", "−");
}
