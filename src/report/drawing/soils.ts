import type { Section } from "../../results.ts";
import { palette, soilTints } from "../palette.ts";

/** How the soils of a section are told apart: a tint and a hatch each, by the order in which they are met. */
export interface SoilLook {
  /** `<pattern>` elements, to stand in `<defs>`. */
  readonly defs: string;
  tint(soil: string): string;
  /** Attribute value of the hatch. */
  hatch(soil: string): string;
}

/** @param id makes the names of the patterns the drawing's own */
export function soilLook(s: Section, id: string): SoilLook {
  const soils = [...new Set([...s.layers.map((layer) => layer.soil), s.below.soil, s.front.soil])];
  const place = (soil: string): number => Math.max(soils.indexOf(soil), 0);
  return {
    defs: soils.map((_, k) => pattern(`${id}-soil-${k}`, hatches[k % hatches.length])).join(""),
    tint: (soil) => soilTints[place(soil) % soilTints.length],
    hatch: (soil) => `url(#${id}-soil-${place(soil)})`,
  };
}

interface Hatch {
  readonly size: readonly [number, number];
  readonly marks: string;
}

const stroke = `stroke="${palette.ink}" stroke-width="0.7" stroke-opacity="0.3" fill="none"`;
const dot = (x: number, y: number, r: number): string =>
  `<circle cx="${x}" cy="${y}" r="${r}" fill="${palette.ink}" fill-opacity="0.3"/>`;

/** Eleven hatches beside eight tints: no two soils of a study look alike before the 88th. */
const hatches: readonly Hatch[] = [
  { size: [14, 14], marks: dot(3, 4, 0.9) + dot(10, 11, 0.9) },
  { size: [16, 12], marks: `<path d="M2 4h6M10 10h5" ${stroke}/>` },
  { size: [12, 12], marks: `<path d="M0 12L12 0" ${stroke}/>` },
  {
    size: [18, 16],
    marks: `<circle cx="5" cy="5" r="2.2" ${stroke}/><circle cx="14" cy="12" r="1.6" ${stroke}/>${dot(13, 4, 0.7)}`,
  },
  { size: [12, 12], marks: `<path d="M0 0L12 12" ${stroke}/>` },
  { size: [14, 8], marks: `<path d="M0 4h14" ${stroke}/>` },
  { size: [10, 10], marks: dot(2, 2, 0.7) + dot(7, 5, 0.7) + dot(3, 8, 0.7) },
  { size: [16, 16], marks: `<path d="M3 5l3-3 3 3M9 13l3-3 3 3" ${stroke}/>` },
  { size: [12, 14], marks: `<path d="M3 2v5M9 9v4" ${stroke}/>` },
  { size: [16, 10], marks: `<path d="M0 5q4-4 8 0t8 0" ${stroke}/>` },
  { size: [12, 12], marks: `<path d="M0 12L12 0M0 0L12 12" ${stroke}/>` },
];

const pattern = (id: string, { size: [width, height], marks }: Hatch): string =>
  `<pattern id="${id}" width="${width}" height="${height}" patternUnits="userSpaceOnUse">${marks}</pattern>`;
