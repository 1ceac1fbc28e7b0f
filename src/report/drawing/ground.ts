import type { Section } from "../../results.ts";
import { palette } from "../palette.ts";
import { crestOf, type Frame, surfaceAt } from "./frame.ts";
import type { SoilLook } from "./soils.ts";
import { line, type Point, polygon, polyline, text } from "./svg.ts";

/** Clip paths of the ground behind and of all that lies in front, for soils and water alike. */
export function groundClips(s: Section, f: Frame, id: string): string {
  const front: readonly Point[] = [
    [f.left, f.low],
    [s.toe, f.low],
    [s.toe, s.baseThickness],
    [s.toe + s.frontRun, s.baseThickness + s.stemHeight],
    [s.toe + s.frontRun, f.high + 1],
    [f.left, f.high + 1],
  ];
  const clip = (name: string, points: readonly Point[]): string =>
    `<clipPath id="${id}-${name}">${polygon(points.map(f.at), "")}</clipPath>`;
  return clip("behind", behindOutline(s, f)) + clip("front", front);
}

/** Back face, surface, right edge, underside. */
function behindOutline(s: Section, f: Frame): readonly Point[] {
  const t = s.baseThickness;
  return [
    [s.toe + s.footWidth, t],
    [crestOf(s), t + s.stemHeight],
    [f.right, surfaceAt(s, f.right)],
    [f.right, 0],
    [s.baseWidth, 0],
    [s.baseWidth, t],
  ];
}

/** Soil in front up to its level: over the toe where it reaches there. */
export function frontOutline(s: Section, f: Frame): readonly Point[] {
  const t = s.baseThickness;
  const level = Math.min(s.front.level, t + s.stemHeight);
  const foot: readonly Point[] = [
    [f.left, 0],
    [0, 0],
  ];
  if (level <= t) return [...foot, [0, level], [f.left, level]];
  const face = s.toe + (s.frontRun * (level - t)) / s.stemHeight;
  return [...foot, [0, t], [s.toe, t], [face, level], [f.left, level]];
}

/** Soils behind, below and in front, with their boundaries and surfaces. */
export function ground(s: Section, f: Frame, look: SoilLook, id: string): string {
  const filled = (points: readonly Point[], soil: string): string => {
    const placed = points.map(f.at);
    return (
      polygon(placed, `fill="${look.tint(soil)}"`) + polygon(placed, `fill="${look.hatch(soil)}" aria-hidden="true"`)
    );
  };
  const band = (low: number, high: number): readonly Point[] => [
    [f.left, high],
    [f.right, high],
    [f.right, low],
    [f.left, low],
  ];
  const bands: string[] = [];
  let top = f.high;
  for (const layer of s.layers) {
    const bottom = Math.max(layer.bottom ?? 0, 0);
    if (bottom < top) bands.push(filled(band(bottom, top), layer.soil));
    top = Math.min(top, bottom);
  }
  const behind = `<g clip-path="url(#${id}-behind)">${bands.join("")}${boundaries(s, f)}</g>`;
  const front = s.front.level > 0 ? filled(frontOutline(s, f), s.front.soil) : "";
  return filled(band(f.low, 0), s.below.soil) + behind + front + surfaces(s, f);
}

function boundaries(s: Section, f: Frame): string {
  return s.layers
    .flatMap(({ bottom }) => (bottom === undefined || bottom <= 0 ? [] : [f.y(bottom)]))
    .map((y) => line(f.x(f.left), y, f.x(f.right), y, `stroke="${palette.muted}" stroke-width="1"`))
    .join("");
}

function surfaces(s: Section, f: Frame): string {
  const ink = `stroke="${palette.ink}" stroke-width="1.8"`;
  const behind: readonly Point[] = [
    [crestOf(s), s.baseThickness + s.stemHeight],
    [f.right, surfaceAt(s, f.right)],
  ];
  const outline = frontOutline(s, f);
  const level = Math.max(Math.min(s.front.level, s.baseThickness + s.stemHeight), 0);
  const end: Point = s.front.level > 0 ? outline[outline.length - 2] : [0, 0];
  const front: readonly Point[] = [
    [f.left, level],
    [end[0], level],
  ];
  return (
    polyline(behind.map(f.at), ink) +
    polyline(front.map(f.at), ink) +
    ticks(f, behind[0], behind[1]) +
    ticks(f, front[0], front[1]) +
    slopeWords(s, f) +
    dugAway(s, f)
  );
}

/** The short strokes that mark natural or made ground under its surface. */
function ticks(f: Frame, from: Point, to: Point): string {
  const [x1, y1] = f.at(from);
  const [x2, y2] = f.at(to);
  const length = Math.hypot(x2 - x1, y2 - y1);
  if (length < 60) return "";
  const strokes: string[] = [];
  for (const share of [0.22, 0.72]) {
    for (const step of [0, 5, 10]) {
      const x = x1 + (x2 - x1) * share + step;
      const y = y1 + ((y2 - y1) * (x - x1)) / (x2 - x1 || 1);
      strokes.push(line(x, y + 1, x - 5, y + 8, `stroke="${palette.ink}" stroke-width="1"`));
    }
  }
  return strokes.join("");
}

function slopeWords(s: Section, f: Frame): string {
  if (!(s.slope > 0.05)) return "";
  const x = crestOf(s) + 0.5 * (f.right - crestOf(s));
  const [px, py] = f.at([x, surfaceAt(s, x)]);
  return text(
    px,
    py + 17,
    `${s.slope.toFixed(1)}°`,
    `font-size="12" text-anchor="middle" transform="rotate(${(-s.slope).toFixed(1)} ${px.toFixed(1)} ${py.toFixed(1)})"`,
  );
}

/** The level below which resistance in front counts, where the top is taken as dug away. */
function dugAway(s: Section, f: Frame): string {
  if (!s.front.passive || !(s.front.ignoreTop > 0)) return "";
  const y = f.y(s.front.level - s.front.ignoreTop);
  return line(f.x(f.left), y, f.x(0), y, `stroke="${palette.ink}" stroke-width="1" stroke-dasharray="2 4"`);
}
