import type { Section } from "../../results.ts";
import type { Display } from "../display.ts";
import { palette } from "../palette.ts";
import { textWidth } from "../text-width.ts";
import { crestOf, type Frame, surfaceAt } from "./frame.ts";
import { label, line, polygon } from "./svg.ts";

const red = `stroke="${palette.fail}" stroke-width="1.4"`;
/** Strips and lines stand on top of a surcharge, so that each can be read. */
const lifted = 24;

/** Pixels that arrows and their words take above the surface. */
export function loadRoom(s: Section): number {
  const local = s.strips.length + s.lines.length > 0;
  const even = (s.surcharge ?? 0) > 0;
  return (even || local ? 18 : 0) + (even && local ? lifted + 6 : 0) + (s.lines.length > 0 ? 8 : 0);
}

const arrow = (x: number, from: number, to: number): string =>
  line(x, from, x, to - 5, red) +
  polygon(
    [
      [x - 3.2, to - 7],
      [x + 3.2, to - 7],
      [x, to],
    ],
    `fill="${palette.fail}"`,
  );

/** Surcharge, strips and lines as arrows on the surface, each with its value. */
export function loads(s: Section, f: Frame, display: Display): string {
  const crest = crestOf(s);
  const out: string[] = [];
  const lift = (s.surcharge ?? 0) > 0 ? lifted : 0;
  if (s.surcharge !== undefined && s.surcharge > 0) {
    const from = s.plane === "wall_back" ? crest : s.baseWidth;
    // Beside other loads its words stand at the edge, clear of theirs.
    const shared = s.strips.length + s.lines.length > 0;
    out.push(row(s, f, [from, f.right], display.quantity(s.surcharge, "kPa"), display, 0, shared));
  }
  for (const strip of s.strips) {
    const from = crest + strip.from;
    out.push(row(s, f, [from, from + strip.width], display.quantity(strip.pressure, "kPa"), display, lift));
  }
  for (const load of s.lines)
    out.push(single(s, f, crest + load.at, display.quantity(load.force, "kN/m"), display, lift));
  return out.join("");
}

/** A row of arrows along the surface; one that runs past the drawing is cut there. */
function row(
  s: Section,
  f: Frame,
  [from, to]: readonly [number, number],
  words: string,
  display: Display,
  lift: number,
  atEdge = false,
): string {
  if (from >= f.right) return beyond(s, f, words, display.quantity(from - crestOf(s), "m"));
  const end = Math.min(to, f.right);
  const count = Math.max(2, Math.min(12, Math.round(((end - from) * f.scale) / 24)));
  const arrows = Array.from({ length: count }, (_, k) => {
    const x = from + ((end - from) * k) / (count - 1);
    const surface = f.y(surfaceAt(s, x));
    return arrow(f.x(x), surface - lift - 20, surface);
  });
  const top = (x: number): number => f.y(surfaceAt(s, x)) - lift - 20;
  const middle = (from + end) / 2;
  // On a slope the row rises under its words.
  const rise = Math.tan((s.slope * Math.PI) / 180) * 0.5 * Math.min(textWidth(words), (end - from) * f.scale);
  return (
    arrows.join("") +
    line(f.x(from), top(from), f.x(end), top(end), red) +
    (atEdge
      ? label(f.x(end), top(end) - 6, words, 'text-anchor="end"')
      : label(f.x(middle), top(middle) - 6 - rise, words, 'text-anchor="middle"'))
  );
}

function single(s: Section, f: Frame, x: number, words: string, display: Display, lift: number): string {
  if (x >= f.right) return beyond(s, f, words, display.quantity(x - crestOf(s), "m"));
  const surface = f.y(surfaceAt(s, x));
  const side = f.x(x) > f.x(f.right) - 70 ? -1 : 1;
  return (
    arrow(f.x(x), surface - lift - 36, surface) +
    label(f.x(x) + 7 * side, surface - lift - 27, words, side < 0 ? 'text-anchor="end"' : "")
  );
}

/** A load too far away to be drawn to scale is named at the edge. */
function beyond(s: Section, f: Frame, words: string, distance: string): string {
  const y = f.y(surfaceAt(s, f.right)) - 8;
  return label(f.x(f.right) - 4, y, `${words}, ${distance} behind the crest →`, 'text-anchor="end"');
}
