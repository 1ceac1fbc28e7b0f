import type { PressurePoint, Section } from "../results.ts";
import type { Display } from "./display.ts";
import { dimensions } from "./drawing/dimensions.ts";
import { type Canvas, type Frame, frameOf } from "./drawing/frame.ts";
import { ground, groundClips } from "./drawing/ground.ts";
import { loadRoom, loads } from "./drawing/loads.ts";
import { type MeansBeside, meansBeside } from "./drawing/means-beside.ts";
import { pressureDiagram } from "./drawing/pressure-diagram.ts";
import { soilColumn, soilLabels } from "./drawing/soil-labels.ts";
import { soilLook } from "./drawing/soils.ts";
import { fixed, text } from "./drawing/svg.ts";
import { circleArc, planeLine, wall } from "./drawing/wall.ts";
import { type WaterRanges, waterBands, waterMarks } from "./drawing/water.ts";
import { escapeHtml } from "./escape.ts";
import { palette } from "./palette.ts";

/** What the drawing shows beside the wall itself. */
export interface SectionExtras {
  /** Unique in the page: names of patterns and clips start with it. */
  readonly id: string;
  readonly title: string;
  /** 5 and 95 % fractile of a water level that is uncertain, above the underside, m. */
  readonly water?: WaterRanges;
  /** Drawn beside the section where it is given. */
  readonly pressure?: readonly PressurePoint[];
  /** The wall at its means, in broken lines, where this is a failure. */
  readonly means?: MeansBeside;
}

/** All drawings have this width, pixels; the height follows from the wall. */
export const drawingWidth = 900;
const pressureWidth = 222;

/**
 * The wall in section, to scale, with soils, water, loads and dimensions, and the pressure on its plane beside it.
 *
 * @returns one SVG element in the light colours; everything from the study is escaped
 */
export function sectionDrawing(section: Section, display: Display, extras: SectionExtras): string {
  const { id, title, pressure, water = {}, means } = extras;
  const right = pressure === undefined ? 0 : pressureWidth;
  const canvas: Canvas = {
    width: drawingWidth - soilColumn - right - 8,
    height: 400,
    padLeft: 4,
    padTop: 26 + loadRoom(section),
    below: 64,
  };
  const frame = frameOf(section, canvas);
  const look = soilLook(section, id);
  const height = frame.height + 24;
  const parts = [
    ground(section, frame, look, id),
    waterBands(section, frame, water, id),
    wall(section, frame),
    planeLine(section, frame),
    circleArc(section, frame),
    loads(section, frame, display),
    means === undefined ? "" : meansBeside(section, frame, display, means),
    waterMarks(section, frame, water, display),
    soilLabels(section, frame, look, display),
    dimensions(section, frame, display),
    pressure === undefined
      ? ""
      : pressureDiagram(section, frame, display, pressure, [drawingWidth - right, drawingWidth], means?.pressure),
    legend(section, frame, display, extras),
  ];
  const size = `viewBox="0 0 ${drawingWidth} ${fixed(height)}" width="${drawingWidth}" height="${fixed(height)}"`;
  return `<svg xmlns="http://www.w3.org/2000/svg" class="drawing" ${size} role="img" aria-labelledby="${id}-title ${id}-words" font-family="system-ui, 'Segoe UI', Roboto, 'Helvetica Neue', Arial, sans-serif" font-size="12"><title id="${id}-title">${escapeHtml(title)}</title><desc id="${id}-words">${escapeHtml(sectionWords(section, display, extras))}</desc><defs>${look.defs}${groundClips(section, frame, id)}</defs>${parts.join("")}</svg>`;
}

/** What the signs mean, under the drawing. */
function legend(s: Section, f: Frame, display: Display, { water: ranges = {}, means }: SectionExtras): string {
  const words = [
    `Lengths and levels in ${display.unit("m")}`,
    ...(ranges.behind === undefined && ranges.front === undefined ? [] : ["blue band: water level, 5 to 95 %"]),
    ...(s.plane === "virtual_back" ? [`${means === undefined ? "" : "upright "}broken line: virtual back`] : []),
    ...(s.circle === undefined ? [] : ["dash-dotted arc: critical circle"]),
    ...(means === undefined ? [] : ["other broken lines: the wall at its means"]),
  ];
  return text(f.x(f.left), f.height + 16, words.join(" · "), `font-size="11" fill="${palette.muted}"`);
}

/** The same in words, for those who cannot see it. */
function sectionWords(s: Section, display: Display, { water = {}, pressure }: SectionExtras): string {
  const q = (value: number): string => display.quantity(value, "m");
  const soils = s.layers.map((layer) => layer.name).join(", then ");
  const level = s.water.behind === undefined ? "no water" : `water at ${q(s.water.behind + s.undersideLevel)}`;
  const range =
    water.behind === undefined
      ? ""
      : `, likely between ${q(water.behind[0] + s.undersideLevel)} and ${q(water.behind[1] + s.undersideLevel)}`;
  const most = pressure?.reduce((top, point) => Math.max(top, point.horizontal + point.loads + point.water), 0);
  return [
    `Section to scale. Stem ${q(s.stemHeight)} high, base ${q(s.baseWidth)} wide, ground behind ${s.slope > 0 ? `rising at ${s.slope.toFixed(1)} degrees` : "level"}.`,
    `Behind, from the top: ${soils}; ${level}${range}. Below: ${s.below.name}.`,
    ...(most === undefined
      ? []
      : [`The largest horizontal pressure of earth and water together is ${display.quantity(most, "kPa")}.`]),
  ].join(" ");
}
