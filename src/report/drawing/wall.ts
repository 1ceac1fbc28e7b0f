import type { Section } from "../../results.ts";
import { palette } from "../palette.ts";
import type { Frame } from "./frame.ts";
import { fixed, line, type Point, polygon } from "./svg.ts";

/** Stem, base slab and key in one outline. */
export function wall(s: Section, f: Frame): string {
  return polygon(
    wallOutline(s).map(f.at),
    `fill="${palette.wall}" stroke="${palette.ink}" stroke-width="1.4" stroke-linejoin="round"`,
  );
}

/** Corners of the wall from the tip of the toe, upwards and round. */
export function wallOutline(s: Section): readonly Point[] {
  const t = s.baseThickness;
  const stem: readonly Point[] = [
    [s.toe, t],
    [s.toe + s.frontRun, t + s.stemHeight],
    [s.toe + s.footWidth - s.backRun, t + s.stemHeight],
    [s.toe + s.footWidth, t],
  ];
  const slab: readonly Point[] = t > 0 ? [[0, 0], [0, t], ...stem, [s.baseWidth, t], [s.baseWidth, 0]] : stem;
  if (s.key === undefined) return slab;
  const { fromToe, width, depth } = s.key;
  return [...slab, [fromToe + width, 0], [fromToe + width, -depth], [fromToe, -depth], [fromToe, 0]];
}

/** The plane on which the pressure is reckoned, where it is not the wall's own face. */
export function planeLine(s: Section, f: Frame): string {
  if (s.plane === "wall_back") return "";
  const x = f.x(s.baseWidth);
  return line(x, f.y(0), x, f.y(s.planeTop), `stroke="${palette.ink}" stroke-width="1.3" stroke-dasharray="6 4"`);
}

/** The critical circle from where it enters behind to where it leaves in front. */
export function circleArc(s: Section, f: Frame): string {
  if (s.circle === undefined) return "";
  const { x, z, radius, entryX, exitX } = s.circle;
  const low = (at: number): number => z - Math.sqrt(Math.max(radius * radius - (at - x) ** 2, 0));
  const [x1, y1] = f.at([exitX, low(exitX)]);
  const [x2, y2] = f.at([entryX, low(entryX)]);
  const r = fixed(radius * f.scale);
  const large = entryX - exitX > 1.99 * radius ? 1 : 0;
  return `<path d="M${fixed(x1)} ${fixed(y1)}A${r} ${r} 0 ${large} 0 ${fixed(x2)} ${fixed(y2)}" fill="none" stroke="${palette.fail}" stroke-width="2" stroke-dasharray="9 4 2 4"/>`;
}
