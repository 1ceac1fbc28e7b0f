import type { Section } from "../../results.ts";
import type { Display } from "../display.ts";
import { palette } from "../palette.ts";
import { textWidth } from "../text-width.ts";
import { crestOf, type Frame } from "./frame.ts";
import { label, line } from "./svg.ts";

const thin = `stroke="${palette.ink}" stroke-width="0.9"`;
const small = 'font-size="12"';

/** Dimensions along the base, up the stem and across the crest, in the study's unit. */
export function dimensions(s: Section, f: Frame, display: Display): string {
  const t = s.baseThickness;
  const under = f.y(-(s.key?.depth ?? 0));
  const foot = s.toe + s.footWidth;
  const chain = t > 0 ? [0, s.toe, foot, s.baseWidth] : [];
  const rows = [
    ...across(f, display, chain, under + 20),
    ...across(f, display, [0, s.baseWidth], under + (t > 0 ? 52 : 20)),
    upright(f, display, f.x(0) - 14, t, t + s.stemHeight),
    crestWidth(s, f, display),
  ];
  if (t > 0) rows.push(upright(f, display, f.x(0) - 14, 0, t));
  if (s.key !== undefined) {
    const { fromToe, width, depth } = s.key;
    rows.push(upright(f, display, f.x(fromToe + width) + 10, -depth, 0, "start"));
  }
  return rows.join("");
}

/** A chain of horizontal dimensions; a number that does not fit its stretch stands below the line. */
function across(f: Frame, display: Display, stops: readonly number[], y: number): readonly string[] {
  let free = Number.NEGATIVE_INFINITY;
  return stops.slice(1).flatMap((to, k) => {
    const from = stops[k];
    if (!(to - from > 1e-6)) return [];
    const [x1, x2] = [f.x(from), f.x(to)];
    const words = display.length(to - from);
    const width = textWidth(words);
    const fits = x2 - x1 > width + 2;
    const middle = fits ? (x1 + x2) / 2 : Math.max((x1 + x2) / 2, free + width / 2 + 4);
    if (!fits) free = middle + width / 2;
    return [
      line(x1, y, x2, y, thin),
      slash(x1, y),
      slash(x2, y),
      label(middle, fits ? y - 4 : y + 13, words, `text-anchor="middle" ${small}`),
    ];
  });
}

function upright(f: Frame, display: Display, x: number, from: number, to: number, anchor = "end"): string {
  if (!(to - from > 1e-6)) return "";
  const [y1, y2] = [f.y(from), f.y(to)];
  return (
    line(x, y1, x, y2, thin) +
    slash(x, y1) +
    slash(x, y2) +
    label(
      x + (anchor === "end" ? -6 : 6),
      (y1 + y2) / 2 + 4,
      display.length(to - from),
      `text-anchor="${anchor}" ${small}`,
    )
  );
}

function crestWidth(s: Section, f: Frame, display: Display): string {
  const y = f.y(s.baseThickness + s.stemHeight) - 9;
  const [x1, x2] = [f.x(s.toe + s.frontRun), f.x(crestOf(s))];
  return (
    line(x1, y, x2, y, thin) +
    slash(x1, y) +
    slash(x2, y) +
    label(x1 - 4, y + 1, display.length(s.crestWidth), `text-anchor="end" ${small}`)
  );
}

/** The draughtsman's oblique stroke at the end of a dimension. */
const slash = (x: number, y: number): string => line(x - 3, y + 3, x + 3, y - 3, `stroke="${palette.ink}"`);
