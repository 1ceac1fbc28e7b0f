/** Small pieces of SVG. Words are escaped here, so that nothing from a study is markup. */
import { escapeHtml } from "../escape.ts";
import { palette } from "../palette.ts";

export type Point = readonly [x: number, y: number];

/** A tenth of a pixel is enough; never "-0". */
export const fixed = (value: number): string => (Math.round(value * 10) / 10 + 0).toString();

const list = (points: readonly Point[]): string => points.map(([x, y]) => `${fixed(x)},${fixed(y)}`).join(" ");

export const polygon = (points: readonly Point[], attributes: string): string =>
  `<polygon points="${list(points)}" ${attributes}/>`;

export const polyline = (points: readonly Point[], attributes: string): string =>
  `<polyline points="${list(points)}" fill="none" ${attributes}/>`;

export const line = (x1: number, y1: number, x2: number, y2: number, attributes: string): string =>
  `<line x1="${fixed(x1)}" y1="${fixed(y1)}" x2="${fixed(x2)}" y2="${fixed(y2)}" ${attributes}/>`;

export const rect = (x: number, y: number, width: number, height: number, attributes: string): string =>
  `<rect x="${fixed(x)}" y="${fixed(y)}" width="${fixed(Math.max(width, 0))}" height="${fixed(Math.max(height, 0))}" ${attributes}/>`;

export const text = (x: number, y: number, words: string, attributes = ""): string =>
  `<text x="${fixed(x)}" y="${fixed(y)}" ${attributes.includes("fill=") ? "" : `fill="${palette.ink}" `}${attributes}>${escapeHtml(words)}</text>`;

/** Text that stands over a drawing: a halo of paper keeps it readable. */
export const label = (x: number, y: number, words: string, attributes = ""): string =>
  text(
    x,
    y,
    words,
    `stroke="${palette.paper}" stroke-width="3.5" paint-order="stroke" stroke-linejoin="round" ${attributes}`,
  );

/**
 * Places of labels in one column: each as near to where it belongs as the gap between neighbours allows.
 *
 * @param wanted ascending
 */
export function spread(wanted: readonly number[], gap: number, lowest: number, highest: number): readonly number[] {
  const places: number[] = [];
  for (const place of wanted) places.push(Math.max(place, lowest, (places.at(-1) ?? Number.NEGATIVE_INFINITY) + gap));
  for (let k = places.length - 1, most = highest; k >= 0 && places[k] > most; k--) {
    places[k] = most;
    most -= gap;
  }
  return places;
}
