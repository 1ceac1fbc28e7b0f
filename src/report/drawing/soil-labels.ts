import type { Section } from "../../results.ts";
import type { Display } from "../display.ts";
import { palette } from "../palette.ts";
import { shortened } from "../shortened.ts";
import { type Frame, surfaceAt } from "./frame.ts";
import type { SoilLook } from "./soils.ts";
import { label, line, rect, spread, text } from "./svg.ts";

interface Named {
  readonly soil: string;
  readonly name: string;
  /** Pixels of its middle at the right edge of the drawing. */
  readonly y: number;
  /** Down to which level, for layers that end. */
  readonly to?: string;
}

/** Room for the column of names, pixels. */
export const soilColumn = 178;
/** Letters that fit it. */
const letters = 21;

/** The soils by name beside the drawing, each with a swatch, as near to its layer as the others allow. */
export function soilLabels(s: Section, f: Frame, look: SoilLook, display: Display): string {
  const named = layersInView(s, f, display);
  const wanted = named.map((layer) => layer.y);
  const roomy = spread(wanted, 30, 14, f.height - 14);
  const twoLines = roomy.every((place, k) => Math.abs(place - wanted[k]) < 12);
  const gap = Math.max(Math.min(16, (f.height - 8) / named.length), 9);
  const places = twoLines ? roomy : spread(wanted, gap, 10, f.height - 4);
  const x = f.x(f.right) + 12;
  const rows = named.map((layer, k) => {
    const y = places[k];
    const lead =
      Math.abs(y - layer.y) > 2
        ? line(f.x(f.right), layer.y, x - 2, y, `stroke="${palette.muted}" stroke-width="0.8"`)
        : "";
    const swatch =
      rect(x, y - 6, 14, 12, `fill="${look.tint(layer.soil)}" stroke="${palette.muted}" stroke-width="0.8"`) +
      rect(x, y - 6, 14, 12, `fill="${look.hatch(layer.soil)}"`);
    const size = gap < 13 && !twoLines ? 'font-size="10.5"' : "";
    if (layer.to === undefined) return lead + swatch + text(x + 20, y + 4, shortened(layer.name, letters), size);
    if (!twoLines) {
      const end = `, to ${layer.to}`;
      return lead + swatch + text(x + 20, y + 4, shortened(layer.name, letters + 2 - end.length) + end, size);
    }
    return (
      lead +
      swatch +
      text(x + 20, y, shortened(layer.name, letters)) +
      text(x + 20, y + 13, `to ${layer.to}`, `fill="${palette.muted}" font-size="11"`)
    );
  });
  return rows.join("") + frontName(s, f);
}

function layersInView(s: Section, f: Frame, display: Display): readonly Named[] {
  const out: Named[] = [];
  let top = surfaceAt(s, f.right);
  for (const layer of s.layers) {
    const bottom = Math.max(layer.bottom ?? 0, 0);
    if (bottom < top) {
      const to =
        layer.bottom === undefined
          ? {}
          : { to: `${display.length(layer.bottom + s.undersideLevel)} ${display.unit("m")}` };
      const foot = layer.bottom === undefined && layer.soil === s.below.soil ? f.low : bottom;
      out.push({ soil: layer.soil, name: layer.name, y: f.y((top + foot) / 2), ...to });
    }
    top = Math.min(top, bottom);
  }
  const last = out.at(-1);
  if (last === undefined || last.soil !== s.below.soil || last.to !== undefined)
    out.push({ soil: s.below.soil, name: s.below.name, y: f.y(f.low / 2) });
  return out;
}

/** The soil in front where it is another than the one below. */
function frontName(s: Section, f: Frame): string {
  const height = s.front.level * f.scale;
  if (s.front.soil === s.below.soil || height < 16) return "";
  return label(f.x(f.left) + 6, f.y(0) - 5, shortened(s.front.name, Math.max(Math.floor((-f.left * f.scale) / 7), 6)));
}
