import type { PressurePoint, Section } from "../../results.ts";
import type { Display } from "../display.ts";
import { palette } from "../palette.ts";
import type { Frame } from "./frame.ts";
import { label, line, type Point, polygon, polyline, text } from "./svg.ts";

interface Panel {
  readonly title: string;
  readonly left: number;
  readonly fill: string;
  readonly stroke: string;
  value(point: PressurePoint): number;
}

/** Pixels that numbers take right of a curve. */
const numberRoom = 36;

/**
 * Pressure on the plane beside the section and on its levels: earth (with strips and lines) and water, one scale for both.
 * Drawn from the points of the calculation: where the soil changes the pressure jumps, and stays a jump.
 *
 * @param means pressure at the means, drawn beside it as a broken line on the same scale
 */
export function pressureDiagram(
  s: Section,
  f: Frame,
  display: Display,
  points: readonly PressurePoint[],
  [left, right]: readonly [number, number],
  means: readonly PressurePoint[] = [],
): string {
  if (points.length === 0) return "";
  const both = [...points, ...means];
  const wet = both.some((point) => point.water > 0);
  const loaded = both.some((point) => point.loads > 0);
  const width = wet ? (right - left - 10) / 2 : right - left;
  const earth: Panel = {
    title: loaded ? "Earth, loads" : "Earth",
    left,
    fill: palette.failSoft,
    stroke: palette.fail,
    value: (point) => point.horizontal + point.loads,
  };
  const water: Panel = {
    title: "Water",
    left: left + width + 10,
    fill: palette.waterSoft,
    stroke: palette.water,
    value: (point) => point.water,
  };
  const panels = wet ? [earth, water] : [earth];
  const largest = Math.max(...both.flatMap((point) => panels.map((panel) => panel.value(point))), 1e-9);
  const perPressure = (width - numberRoom) / largest;
  return [
    ...panels.flatMap((panel) => [
      drawPanel(s, f, display, points, panel, perPressure),
      meansLine(f, means, panel, perPressure),
    ]),
    text(
      left,
      f.y(Math.min(...points.map((point) => point.z))) + 20,
      `Horizontal pressure, ${display.unit("kPa")}`,
      `font-size="11" fill="${palette.muted}"`,
    ),
  ].join("");
}

function drawPanel(
  s: Section,
  f: Frame,
  display: Display,
  points: readonly PressurePoint[],
  panel: Panel,
  perPressure: number,
): string {
  const px = (point: PressurePoint): number => panel.left + panel.value(point) * perPressure;
  const curve: readonly Point[] = points.map((point) => [px(point), f.y(point.z)]);
  const first = points[0];
  const last = points[points.length - 1];
  const outline: readonly Point[] = [[panel.left, f.y(first.z)], ...curve, [panel.left, f.y(last.z)]];
  return [
    polygon(outline, `fill="${panel.fill}" stroke="${panel.stroke}" stroke-width="1.3" stroke-linejoin="round"`),
    line(
      panel.left,
      f.y(Math.max(s.planeTop, first.z)) - 6,
      panel.left,
      f.y(last.z),
      `stroke="${palette.ink}" stroke-width="1.3"`,
    ),
    ...numbers(f, display, points, panel, px),
    text(panel.left, f.y(first.z) - 12, panel.title, 'font-weight="600"'),
  ].join("");
}

function meansLine(f: Frame, means: readonly PressurePoint[], panel: Panel, perPressure: number): string {
  if (means.length === 0) return "";
  const curve = means.map((point): Point => [panel.left + panel.value(point) * perPressure, f.y(point.z)]);
  return polyline(curve, `stroke="${palette.ink}" stroke-width="1.1" stroke-dasharray="5 4"`);
}

/** Values at both sides of every break, where there is room: a value above its level and the one after the jump below. */
function numbers(
  f: Frame,
  display: Display,
  points: readonly PressurePoint[],
  panel: Panel,
  px: (point: PressurePoint) => number,
): readonly string[] {
  const largest = Math.max(...points.map(panel.value));
  const wanted = breaks(points)
    .map(({ point, side }) => ({ point, words: display.number(panel.value(point), "kPa"), y: f.y(point.z) + side }))
    .filter(({ point }) => panel.value(point) > 0.004 * largest);
  const kept: { words: string; y: number; x: number }[] = [];
  const last = wanted.at(-1);
  for (const { point, words, y } of wanted) {
    const before = kept.at(-1);
    const crowded = before !== undefined && (y - before.y < 11 || (before.words === words && y - before.y < 24));
    if (crowded && point !== last?.point) continue;
    if (crowded) kept.pop();
    kept.push({ words, y, x: px(point) + 5 });
  }
  return kept.map(({ words, y, x }) => label(x, y, words, 'font-size="11"'));
}

/** Ends of each stretch, with where its number stands: over the level at the end of a stretch, under it at the start. */
function breaks(points: readonly PressurePoint[]): readonly { point: PressurePoint; side: number }[] {
  return points.flatMap((point, place) => {
    const [before, after] = [points[place - 1], points[place + 1]];
    if (before === undefined) return [{ point, side: 4 }];
    if (after === undefined) return [{ point, side: 0 }];
    if (after.z === point.z) return [{ point, side: -2 }];
    if (before.z === point.z) return [{ point, side: 10 }];
    return [];
  });
}
