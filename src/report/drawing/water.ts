import type { Section } from "../../results.ts";
import type { Display } from "../display.ts";
import { palette } from "../palette.ts";
import { textWidth } from "../text-width.ts";
import type { Frame } from "./frame.ts";
import { label, line, polygon, rect } from "./svg.ts";

/** 5 and 95 % fractile of an uncertain level, m above the underside. */
export interface WaterRanges {
  readonly behind?: readonly [number, number];
  readonly front?: readonly [number, number];
}

/** Water as a tint up to the level of this run, and a band over the range in which the level is likely to lie. */
export function waterBands(s: Section, f: Frame, ranges: WaterRanges, id: string): string {
  const band = (low: number, high: number, opacity: number): string =>
    high > low
      ? rect(
          f.x(f.left),
          f.y(high),
          (f.right - f.left) * f.scale,
          (high - low) * f.scale,
          `fill="${palette.water}" fill-opacity="${opacity}"`,
        )
      : "";
  const edge = (level: number): string =>
    level > f.low
      ? line(
          f.x(f.left),
          f.y(level),
          f.x(f.right),
          f.y(level),
          `stroke="${palette.water}" stroke-width="1" stroke-dasharray="3 3"`,
        )
      : "";
  const side = (
    level: number | undefined,
    range: readonly [number, number] | undefined,
    foot: number,
    name: string,
  ): string => {
    if (level === undefined) return "";
    const [low, high] = [Math.max(range?.[0] ?? foot, foot), Math.max(range?.[1] ?? foot, foot)];
    const likely = range === undefined ? "" : band(low, high, 0.26) + edge(low) + edge(high);
    return `<g clip-path="url(#${id}-${name})">${band(foot, Math.max(level, foot), 0.15)}${likely}</g>`;
  };
  return side(s.water.behind, ranges.behind, 0, "behind") + side(s.water.front, ranges.front, 0, "front");
}

/** The usual mark of a free water surface: a triangle on its level, over two short lines; the range stands beside it. */
export function waterMarks(s: Section, f: Frame, ranges: WaterRanges, display: Display): string {
  const mark = (
    x: number,
    level: number,
    [from, to]: readonly [number, number],
    range: readonly [number, number] | undefined,
    room: number,
  ): string => {
    const y = f.y(level);
    const blue = `stroke="${palette.water}"`;
    const number = (value: number): string => display.length(value + s.undersideLevel);
    const words = `${number(level)} ${display.unit("m")}`;
    const spread = range === undefined ? "" : ` (${number(range[0])} to ${number(range[1])})`;
    const shown = textWidth(words + spread) < room ? words + spread : words;
    return [
      line(f.x(from), y, f.x(to), y, `${blue} stroke-width="1.8"`),
      polygon(
        [
          [x - 6, y - 10],
          [x + 6, y - 10],
          [x, y],
        ],
        `fill="${palette.water}"`,
      ),
      line(x - 5, y + 3, x + 5, y + 3, blue),
      line(x - 3, y + 6, x + 3, y + 6, blue),
      label(x + 10, y - 4, shown, `fill="${palette.water}" font-weight="600"`),
    ].join("");
  };
  const out: string[] = [];
  if (s.water.behind !== undefined && s.water.behind > f.low) {
    const back = backFaceAt(s, s.water.behind);
    out.push(mark(f.x(back) + 15, s.water.behind, [back, f.right], ranges.behind, (f.right - back) * f.scale - 28));
  }
  if (s.water.front !== undefined && s.water.front > f.low)
    out.push(mark(f.x(f.left) + 12, s.water.front, [f.left, 0], ranges.front, -f.left * f.scale - 26));
  return out.join("");
}

/** x at which ground water meets the wall's back at a level, m. */
function backFaceAt(s: Section, level: number): number {
  const up = level - s.baseThickness;
  if (up < 0) return Math.max(s.baseWidth, s.toe + s.footWidth);
  return s.toe + s.footWidth - s.backRun * Math.min(up / s.stemHeight, 1);
}
