/** House values as the study's reader wants them: metric or US. */

import type { Units } from "../study/study.ts";
import { type Dimension, displayUnit } from "../study/units.ts";
import { threeFigures } from "./number.ts";

/** Dimensions by the unit that results carry. */
const byUnit: Readonly<Record<string, Dimension>> = {
  m: "length",
  "kN/m": "line_force",
  kPa: "pressure",
  "kN/m³": "unit_weight",
  "kNm/m": "moment",
  "°": "angle",
  "–": "ratio",
};

export interface Display {
  readonly units: Units;
  /** 3.28 ft for 1 m: the number alone. */
  number(value: number, houseUnit: string): string;
  unit(houseUnit: string): string;
  /** Number and unit. */
  quantity(value: number, houseUnit: string): string;
  factor(houseUnit: string): number;
  /** A length or level as one writes it in a drawing: two decimals, one from 100 up; without its unit. */
  length(metres: number): string;
}

export function displayIn(units: Units): Display {
  const of = (houseUnit: string): { unit: string; factor: number } => {
    if (houseUnit === "m²")
      return units === "us"
        ? { unit: "ft²", factor: displayUnit("length", "us").factor ** 2 }
        : { unit: "m²", factor: 1 };
    const dimension = byUnit[houseUnit];
    return dimension === undefined ? { unit: houseUnit, factor: 1 } : displayUnit(dimension, units);
  };
  return {
    units,
    number: (value, houseUnit) => threeFigures(value * of(houseUnit).factor),
    unit: (houseUnit) => of(houseUnit).unit,
    factor: (houseUnit) => of(houseUnit).factor,
    length: (metres) => {
      const value = metres * of("m").factor;
      return (Math.abs(value) < 0.005 ? 0 : value).toFixed(Math.abs(value) < 100 ? 2 : 1).replace("-", "−");
    },
    quantity: (value, houseUnit) => {
      const { unit, factor } = of(houseUnit);
      const number = threeFigures(value * factor);
      return unit === "–" ? number : unit === "°" ? `${number}°` : `${number} ${unit}`;
    },
  };
}

/** Words for a limit state, as they stand in a sentence. */
export const limitStateWords: Readonly<Record<string, string>> = {
  sliding: "sliding",
  overturning: "overturning",
  bearing: "bearing failure",
  eccentricity: "too great an eccentricity",
  deep_seated: "deep-seated failure",
};

/** The same at the start of a line or over a column. */
export const limitStateName = (name: string): string =>
  name === "eccentricity" ? "Eccentricity" : capitalised(limitStateWords[name] ?? name);

export const capitalised = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** The same within a sentence: "friction angle of Medium sand". */
export const uncapitalised = (text: string): string => text.charAt(0).toLowerCase() + text.slice(1);
