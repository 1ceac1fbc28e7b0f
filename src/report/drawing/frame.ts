import type { Section } from "../../results.ts";
import type { Point } from "./svg.ts";

/** Where the drawing's metres lie on its canvas: true to scale, both ways alike. */
export interface Frame {
  /** Ends of the drawn ground, m. */
  readonly left: number;
  readonly right: number;
  readonly low: number;
  /** Highest thing drawn, m. */
  readonly high: number;
  /** Pixels per metre. */
  readonly scale: number;
  /** Pixels down to the lower edge of the ground. */
  readonly height: number;
  x(metres: number): number;
  y(metres: number): number;
  at(point: Point): Point;
}

export interface Canvas {
  /** Pixels that the ground may take. */
  readonly width: number;
  readonly height: number;
  /** Pixels kept free on the left and above. */
  readonly padLeft: number;
  readonly padTop: number;
  /** Pixels that the dimensions take below the base. */
  readonly below: number;
}

export function frameOf(s: Section, canvas: Canvas): Frame {
  const { left, right, low: wanted, high } = extentOf(s);
  const scale = Math.min(canvas.width / (right - left), canvas.height / (high - wanted));
  const low = Math.min(wanted, -(s.key?.depth ?? 0) - canvas.below / scale);
  const offset = canvas.padLeft + (canvas.width - (right - left) * scale) / 2;
  const x = (metres: number): number => offset + (metres - left) * scale;
  const y = (metres: number): number => canvas.padTop + (high - metres) * scale;
  return { left, right, low, high, scale, height: y(low), x, y, at: ([px, pz]) => [x(px), y(pz)] };
}

/** As much ground as the wall needs around it: half its height behind, the loads, the circle where there is one. */
function extentOf(s: Section): Pick<Frame, "left" | "right" | "low" | "high"> {
  const height = s.baseThickness + s.stemHeight;
  const crest = crestOf(s);
  const back = Math.max(s.baseWidth, s.toe + s.footWidth);
  const loads = [
    ...s.strips.map((strip) => strip.from + strip.width + 0.1 * height),
    ...s.lines.map((load) => load.at + 0.2 * height),
  ];
  const reach = Math.min(Math.max(...loads, 0), 3 * height);
  const right = Math.max(back + 0.65 * height, crest + reach, (s.circle?.entryX ?? 0) + 0.15 * height);
  const left = Math.min(-Math.max(0.55 * height, 0.8), (s.circle?.exitX ?? 0) - 0.15 * height);
  const circleFoot = s.circle === undefined ? 0 : s.circle.radius - s.circle.z + 0.06 * height;
  const low = -Math.max(0.26 * height, (s.key?.depth ?? 0) + 0.2 * height, circleFoot);
  const high = Math.max(height, surfaceAt(s, right), s.front.level, s.water.front ?? 0);
  return { left, right, low, high };
}

/** x of the crest of the back face, m. */
export const crestOf = (s: Section): number => s.toe + s.footWidth - s.backRun;

/** Level of the ground surface behind, m; that of the crest in front of it. */
export function surfaceAt(s: Section, x: number): number {
  const rise = Math.tan((s.slope * Math.PI) / 180);
  return s.baseThickness + s.stemHeight + Math.max(x - crestOf(s), 0) * rise;
}
