import type { VariableSummary } from "../../results.ts";
import { fixed } from "../drawing/svg.ts";
import { palette, withVariables } from "../palette.ts";

const [width, height, foot] = [112, 28, 23];

/**
 * The density of one unknown as a small filled curve, with its mean; measured values stand as ticks under it. So many stand in one
 * table that they are drawn here and not by the chart library.
 */
export function densityPicture({
  density: { x, y },
  ticks = [],
  mean,
}: Pick<VariableSummary, "density" | "ticks" | "mean">): string {
  const [low, high] = [x[0], x[x.length - 1]];
  const top = Math.max(...y.filter(Number.isFinite), 1e-300);
  const px = (value: number): number => 1 + ((width - 2) * (value - low)) / (high - low || 1);
  const curve = x.map((value, k) => `${fixed(px(value))},${fixed(foot - ((foot - 2) * Math.min(y[k], top)) / top)}`);
  const upright = (value: number, from: number, to: number, colour: string): string =>
    value < low || value > high
      ? ""
      : `<line x1="${fixed(px(value))}" x2="${fixed(px(value))}" y1="${from}" y2="${to}" stroke="${colour}"/>`;
  return withVariables(
    `<svg class="density" viewBox="0 0 ${width} ${height}" aria-hidden="true"><polygon points="1,${foot} ${curve.join(" ")} ${width - 1},${foot}" fill="${palette.soft}" stroke="${palette.main}"/>${upright(mean, 2, foot, palette.ink)}${ticks.map((tick) => upright(tick, foot, height, palette.fail)).join("")}</svg>`,
  );
}
