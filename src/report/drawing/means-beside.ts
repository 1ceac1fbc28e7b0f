import type { PressurePoint, Section } from "../../results.ts";
import type { Display } from "../display.ts";
import { palette } from "../palette.ts";
import type { Frame } from "./frame.ts";
import { label, line } from "./svg.ts";

/** The same wall at its means, drawn in broken lines into the drawing of a failure. */
export interface MeansBeside {
  readonly section: Section;
  readonly pressure: readonly PressurePoint[];
}

/** Pixels that a level must have moved to be drawn, and to have room for its words. */
const seen = 3;
const room = 14;

/** Levels at the means where they differ: water behind and in front, boundaries between soils behind. */
export function meansBeside(s: Section, f: Frame, display: Display, means: MeansBeside): string {
  const moved = (now: number | undefined, then: number | undefined): then is number =>
    then !== undefined && then > f.low && Math.abs(f.y(now ?? f.low) - f.y(then)) >= seen;
  const level = (then: number, now: number | undefined, from: number, to: number, colour: string): string => {
    const y = f.y(then);
    const words = `${display.length(then + s.undersideLevel)} at the means`;
    const apart = Math.abs(f.y(now ?? f.low) - y) >= room;
    return (
      line(f.x(from), y, f.x(to), y, `stroke="${colour}" stroke-width="1.3" stroke-dasharray="7 4"`) +
      (apart ? label(f.x(to) - 4, y - 3, words, `fill="${colour}" text-anchor="end" font-size="11"`) : "")
    );
  };
  const { water, layers } = means.section;
  const back = Math.max(s.baseWidth, s.toe + s.footWidth);
  const face = s.toe + s.footWidth;
  return [
    moved(s.water.behind, water.behind)
      ? level(water.behind, s.water.behind, water.behind < s.baseThickness ? back : face, f.right, palette.water)
      : "",
    moved(s.water.front, water.front) ? level(water.front, s.water.front, f.left, 0, palette.water) : "",
    ...layers.map(({ bottom }, place) => {
      const now = s.layers[place]?.bottom;
      return bottom !== undefined && bottom > 0 && moved(now, bottom)
        ? level(bottom, now, face, f.right, palette.muted)
        : "";
    }),
  ].join("");
}
