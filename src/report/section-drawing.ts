import type { PressurePoint, Section } from "../results.ts";
import type { Display } from "./display.ts";
import { escapeHtml } from "./escape.ts";
import { palette, soilTints } from "./palette.ts";

/** What the drawing shows beside the wall itself. */
export interface SectionExtras {
  /** 5 and 95 % fractile of a water level that is uncertain, above the underside, m. */
  readonly waterBehindRange?: readonly [number, number];
  readonly waterFrontRange?: readonly [number, number];
  readonly pressure?: readonly PressurePoint[];
  readonly title: string;
}

interface Frame {
  readonly left: number;
  readonly right: number;
  readonly low: number;
  readonly high: number;
  /** Pixels per metre. */
  readonly scale: number;
  x(metres: number): number;
  y(metres: number): number;
}

const drawingWidth = 640;
const drawingHeight = 400;
const diagramWidth = 250;
const margin = 46;

/**
 * The wall in section, to scale, with soils, water, loads and dimensions, and the pressure on its plane beside it.
 *
 * @returns one SVG element in the light colours; everything from the study is escaped
 */
export function sectionDrawing(section: Section, display: Display, extras: SectionExtras): string {
  const frame = frameOf(section);
  const tint = tintsOf(section);
  const parts = [
    ground(section, frame, tint),
    waterBands(section, frame, extras),
    wall(section, frame),
    planeLine(section, frame),
    loads(section, frame, display),
    waterMarks(section, frame, display),
    soilNames(section, frame),
    dimensions(section, frame, display),
    ...(extras.pressure === undefined ? [] : [pressureDiagram(section, frame, display, extras.pressure)]),
  ];
  const width = drawingWidth + (extras.pressure === undefined ? 0 : diagramWidth);
  const words = `Section through the wall, to scale: stem ${display.quantity(section.stemHeight, "m")} high, base ${display.quantity(section.baseWidth, "m")} wide${section.water.behind === undefined ? ", no water behind" : `, water behind ${display.quantity(Math.max(section.water.behind, 0), "m")} above the underside`}.`;
  return `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${width} ${drawingHeight}" width="${width}" height="${drawingHeight}" role="img" aria-label="${escapeHtml(`${extras.title}. ${words}`)}" font-family="system-ui, 'Segoe UI', Roboto, Arial, sans-serif" font-size="12"><title>${escapeHtml(extras.title)}</title>${parts.join("")}</svg>`;
}

function frameOf(s: Section): Frame {
  const height = s.baseThickness + s.stemHeight;
  const reach = Math.max(
    0.7 * height,
    ...s.strips.map((strip) => strip.from + Math.min(strip.width, height) + 0.3),
    ...s.lines.map((line) => line.at + 0.3),
  );
  const crestX = s.toe + s.footWidth - s.backRun;
  const right = Math.max(s.baseWidth + 0.5 * height, crestX + Math.min(reach, 2 * height));
  const left = -Math.max(0.45 * height, 0.8);
  const low = -Math.max(0.28 * height, (s.key?.depth ?? 0) + 0.25 * height);
  const top = Math.max(height, s.planeTop, surfaceAt(s, right), s.front.level, s.water.front ?? 0);
  const high = top + 0.2 * height;
  const scale = Math.min((drawingWidth - 2 * 8) / (right - left), (drawingHeight - 2 * 8) / (high - low));
  const width = (right - left) * scale;
  const offset = (drawingWidth - width) / 2;
  return { left, right, low, high, scale, x: (m) => offset + (m - left) * scale, y: (m) => 8 + (high - m) * scale };
}

function surfaceAt(s: Section, x: number): number {
  const crestX = s.toe + s.footWidth - s.backRun;
  return s.baseThickness + s.stemHeight + Math.max(x - crestX, 0) * Math.tan((s.slope * Math.PI) / 180);
}

function tintsOf(s: Section): (soil: string) => string {
  const soils = [...new Set([...s.layers.map((layer) => layer.soil), s.front.soil, s.below.soil])];
  return (soil) => soilTints[soils.indexOf(soil) % soilTints.length];
}

const fixed = (value: number): string => value.toFixed(1);
const path = (f: Frame, points: readonly (readonly [number, number])[]): string =>
  points.map(([x, z]) => `${fixed(f.x(x))},${fixed(f.y(z))}`).join(" ");
const polygon = (f: Frame, points: readonly (readonly [number, number])[], attributes: string): string =>
  `<polygon points="${path(f, points)}" ${attributes}/>`;
const line = (x1: number, y1: number, x2: number, y2: number, attributes: string): string =>
  `<line x1="${fixed(x1)}" y1="${fixed(y1)}" x2="${fixed(x2)}" y2="${fixed(y2)}" ${attributes}/>`;
const text = (x: number, y: number, words: string, attributes = ""): string =>
  `<text x="${fixed(x)}" y="${fixed(y)}" fill="${palette.ink}" ${attributes}>${escapeHtml(words)}</text>`;
/** Text that stands over a drawing: a halo of paper keeps it readable. */
const label = (x: number, y: number, words: string, attributes = ""): string =>
  text(
    x,
    y,
    words,
    `stroke="${palette.paper}" stroke-width="3" paint-order="stroke" stroke-linejoin="round" ${attributes}`,
  );

/** Outline of the ground behind: back face, surface, right edge, underside. */
function behindOutline(s: Section, f: Frame): readonly (readonly [number, number])[] {
  const crestX = s.toe + s.footWidth - s.backRun;
  const t = s.baseThickness;
  return [
    [s.toe + s.footWidth, t],
    [crestX, t + s.stemHeight],
    [f.right, surfaceAt(s, f.right)],
    [f.right, 0],
    [s.baseWidth, 0],
    [s.baseWidth, t],
  ];
}

function frontOutline(s: Section, f: Frame): readonly (readonly [number, number])[] {
  const t = s.baseThickness;
  const level = Math.min(s.front.level, t + s.stemHeight);
  if (level <= t)
    return [
      [f.left, 0],
      [0, 0],
      [0, level],
      [f.left, level],
    ];
  const face = s.toe + (s.frontRun * (level - t)) / s.stemHeight;
  return [
    [f.left, 0],
    [0, 0],
    [0, t],
    [s.toe, t],
    [face, level],
    [f.left, level],
  ];
}

function ground(s: Section, f: Frame, tint: (soil: string) => string): string {
  const bands: string[] = [];
  let top = f.high;
  for (const layer of s.layers) {
    const bottom = Math.max(layer.bottom ?? 0, 0);
    if (bottom < top)
      bands.push(
        polygon(
          f,
          [
            [f.left, top],
            [f.right, top],
            [f.right, bottom],
            [f.left, bottom],
          ],
          `fill="${tint(layer.soil)}"`,
        ),
      );
    top = Math.min(top, bottom);
  }
  const edges = s.layers
    .filter((layer) => layer.bottom !== undefined && layer.bottom > 0)
    .map((layer) =>
      line(
        f.x(f.left),
        f.y(layer.bottom ?? 0),
        f.x(f.right),
        f.y(layer.bottom ?? 0),
        `stroke="${palette.muted}" stroke-width="1"`,
      ),
    );
  const below = polygon(
    f,
    [
      [f.left, 0],
      [f.right, 0],
      [f.right, f.low],
      [f.left, f.low],
    ],
    `fill="${tint(s.below.soil)}"`,
  );
  const front =
    s.front.level > 0
      ? polygon(f, frontOutline(s, f), `fill="${tint(s.front.soil)}" ${s.front.toeSoil ? "" : 'opacity="0.5"'}`)
      : "";
  const surface = `<polyline points="${path(f, [behindOutline(s, f)[1], behindOutline(s, f)[2]])}" fill="none" stroke="${palette.ink}" stroke-width="1.5"/>`;
  const frontSurface =
    s.front.level > 0
      ? `<polyline points="${path(f, [[f.left, s.front.level], frontOutline(s, f)[s.front.level > s.baseThickness ? 4 : 2]])}" fill="none" stroke="${palette.ink}" stroke-width="1.5"/>`
      : line(f.x(f.left), f.y(0), f.x(0), f.y(0), `stroke="${palette.ink}" stroke-width="1.5"`);
  return `<clipPath id="behind">${polygon(f, behindOutline(s, f), "")}</clipPath><clipPath id="front">${polygon(
    f,
    [
      [f.left, f.low],
      [s.toe, f.low],
      [s.toe + s.frontRun, f.high],
      [f.left, f.high],
    ],
    "",
  )}</clipPath>${below}<g clip-path="url(#behind)">${bands.join("")}${edges.join("")}</g>${front}${surface}${frontSurface}`;
}

/** Water as a band over its likely range, darker up to the level of this run. */
function waterBands(s: Section, f: Frame, extras: SectionExtras): string {
  const rect = (low: number, high: number, clip: string, opacity: number): string => {
    if (!(high > low)) return "";
    return `<g clip-path="url(#${clip})">${polygon(
      f,
      [
        [f.left, high],
        [f.right, high],
        [f.right, low],
        [f.left, low],
      ],
      `fill="${palette.water}" opacity="${opacity}"`,
    )}</g>`;
  };
  const side = (level: number | undefined, range: readonly [number, number] | undefined, clip: string): string => {
    if (level === undefined) return "";
    return `${rect(0, Math.max(level, 0), clip, 0.16)}${range === undefined ? "" : rect(Math.max(range[0], 0), Math.max(range[1], 0), clip, 0.22)}`;
  };
  return side(s.water.behind, extras.waterBehindRange, "behind") + side(s.water.front, extras.waterFrontRange, "front");
}

function wall(s: Section, f: Frame): string {
  const t = s.baseThickness;
  const style = `fill="${palette.wall}" stroke="${palette.ink}" stroke-width="1"`;
  const base =
    t > 0
      ? polygon(
          f,
          [
            [0, 0],
            [s.baseWidth, 0],
            [s.baseWidth, t],
            [0, t],
          ],
          style,
        )
      : "";
  const key =
    s.key === undefined
      ? ""
      : polygon(
          f,
          [
            [s.key.fromToe, 0],
            [s.key.fromToe + s.key.width, 0],
            [s.key.fromToe + s.key.width, -s.key.depth],
            [s.key.fromToe, -s.key.depth],
          ],
          style,
        );
  const stem = polygon(
    f,
    [
      [s.toe, t],
      [s.toe + s.frontRun, t + s.stemHeight],
      [s.toe + s.footWidth - s.backRun, t + s.stemHeight],
      [s.toe + s.footWidth, t],
    ],
    style,
  );
  return key + base + stem;
}

function planeLine(s: Section, f: Frame): string {
  if (s.plane === "wall_back") return "";
  return line(
    f.x(s.baseWidth),
    f.y(0),
    f.x(s.baseWidth),
    f.y(s.planeTop),
    `stroke="${palette.ink}" stroke-width="1.2" stroke-dasharray="5 4"`,
  );
}

const arrow = (x: number, from: number, to: number): string =>
  `${line(x, from, x, to - 4, `stroke="${palette.fail}" stroke-width="1.4"`)}<polygon points="${fixed(x - 3)},${fixed(to - 6)} ${fixed(x + 3)},${fixed(to - 6)} ${fixed(x)},${fixed(to)}" fill="${palette.fail}"/>`;

function loads(s: Section, f: Frame, display: Display): string {
  const crestX = s.toe + s.footWidth - s.backRun;
  const out: string[] = [];
  const row = (from: number, to: number, words: string): void => {
    const end = Math.min(to, f.right);
    const count = Math.max(2, Math.min(9, Math.round(((end - from) * f.scale) / 26)));
    for (let k = 0; k < count; k++) {
      const x = from + ((end - from) * k) / (count - 1);
      const ground = f.y(surfaceAt(s, x));
      out.push(arrow(f.x(x), ground - 20, ground));
    }
    out.push(
      line(
        f.x(from),
        f.y(surfaceAt(s, from)) - 20,
        f.x(end),
        f.y(surfaceAt(s, end)) - 20,
        `stroke="${palette.fail}" stroke-width="1.4"`,
      ),
    );
    out.push(label(f.x((from + end) / 2), f.y(surfaceAt(s, (from + end) / 2)) - 25, words, 'text-anchor="middle"'));
  };
  if (s.surcharge !== undefined && s.surcharge > 0)
    row(s.plane === "wall_back" ? crestX : s.baseWidth, f.right, display.quantity(s.surcharge, "kPa"));
  for (const strip of s.strips)
    row(crestX + strip.from, crestX + strip.from + strip.width, display.quantity(strip.pressure, "kPa"));
  for (const load of s.lines) {
    const ground = f.y(surfaceAt(s, crestX + load.at));
    out.push(
      arrow(f.x(crestX + load.at), ground - 34, ground),
      label(f.x(crestX + load.at) + 5, ground - 26, display.quantity(load.force, "kN/m")),
    );
  }
  return out.join("");
}

/** The usual mark of a free water surface: a triangle on its level, over two short lines. */
function waterMarks(s: Section, f: Frame, display: Display): string {
  const mark = (x: number, level: number, from: number, to: number): string => {
    const y = f.y(level);
    return `${line(f.x(from), y, f.x(to), y, `stroke="${palette.water}" stroke-width="1.6"`)}<polygon points="${fixed(x - 6)},${fixed(y - 10)} ${fixed(x + 6)},${fixed(y - 10)} ${fixed(x)},${fixed(y)}" fill="${palette.water}"/>${line(x - 5, y + 3, x + 5, y + 3, `stroke="${palette.water}"`)}${line(x - 3, y + 6, x + 3, y + 6, `stroke="${palette.water}"`)}${label(x + 9, y - 2, display.quantity(level + s.undersideLevel, "m"))}`;
  };
  const out: string[] = [];
  if (s.water.behind !== undefined && s.water.behind > 0)
    out.push(
      mark(
        f.x(Math.max(s.baseWidth, s.toe + s.footWidth)) + 14,
        s.water.behind,
        Math.max(s.baseWidth, s.toe + s.footWidth),
        f.right,
      ),
    );
  if (s.water.front !== undefined && s.water.front > f.low) out.push(mark(f.x(f.left) + 16, s.water.front, f.left, 0));
  return out.join("");
}

function soilNames(s: Section, f: Frame): string {
  const out: string[] = [];
  let top = surfaceAt(s, f.right);
  const short = (name: string): string => ([...name].length > 30 ? `${[...name].slice(0, 29).join("")}…` : name);
  for (const layer of s.layers) {
    const bottom = Math.max(layer.bottom ?? 0, 0);
    if ((top - bottom) * f.scale > 15)
      out.push(label(f.x(f.right) - 8, f.y((top + bottom) / 2) + 4, short(layer.name), 'text-anchor="end"'));
    top = bottom;
  }
  out.push(label(f.x(f.right) - 8, f.y(f.low) - 8, short(s.below.name), 'text-anchor="end"'));
  if (s.front.soil !== s.below.soil && s.front.level * f.scale > 34)
    out.push(label(f.x(f.left) + 4, f.y(0) - 6, short(s.front.name)));
  return out.join("");
}

function dimensions(s: Section, f: Frame, display: Display): string {
  const ink = `stroke="${palette.ink}" stroke-width="0.8"`;
  const out: string[] = [];
  const across = (from: number, to: number, z: number, drop: number): void => {
    if (!(to - from > 1e-6)) return;
    const y = f.y(z) + drop;
    const [x1, x2] = [f.x(from), f.x(to)];
    out.push(line(x1, y, x2, y, ink), line(x1, y - 4, x1, y + 4, ink), line(x2, y - 4, x2, y + 4, ink));
    out.push(label((x1 + x2) / 2, y - 4, display.number(to - from, "m"), 'text-anchor="middle" font-size="11"'));
  };
  const upright = (x: number, from: number, to: number): void => {
    if (!(to - from > 1e-6)) return;
    const [y1, y2] = [f.y(from), f.y(to)];
    out.push(line(x, y1, x, y2, ink), line(x - 4, y1, x + 4, y1, ink), line(x - 4, y2, x + 4, y2, ink));
    out.push(label(x - 5, (y1 + y2) / 2 + 4, display.number(to - from, "m"), 'text-anchor="end" font-size="11"'));
  };
  const under = -(s.key?.depth ?? 0);
  if (s.baseThickness > 0) {
    across(0, s.toe, under, 18);
    across(s.toe, s.toe + s.footWidth, under, 18);
    across(s.toe + s.footWidth, s.baseWidth, under, 18);
  }
  across(0, s.baseWidth, under, s.baseThickness > 0 ? 38 : 18);
  const x = f.x(0) - 16;
  upright(x, s.baseThickness, s.baseThickness + s.stemHeight);
  if (s.baseThickness > 0) {
    const beside = f.x(s.baseWidth) + 10;
    out.push(
      line(beside, f.y(0), beside, f.y(s.baseThickness), ink),
      line(beside - 4, f.y(0), beside + 4, f.y(0), ink),
    );
    out.push(line(beside - 4, f.y(s.baseThickness), beside + 4, f.y(s.baseThickness), ink));
    out.push(label(beside + 6, f.y(s.baseThickness / 2) + 4, display.number(s.baseThickness, "m"), 'font-size="11"'));
  }
  across(s.toe + s.frontRun, s.toe + s.footWidth - s.backRun, s.baseThickness + s.stemHeight, -8);
  out.push(label(f.x(f.left) + 4, f.y(f.low) - 8, `Dimensions in ${display.unit("m")}`, 'font-size="11"'));
  return out.join("");
}

/** Earth and water pressure on the plane, drawn from the same points as the calculation; the jump at a boundary stays a jump. */
function pressureDiagram(s: Section, f: Frame, display: Display, points: readonly PressurePoint[]): string {
  const left = drawingWidth + 12;
  const width = diagramWidth - margin - 26;
  const largest = Math.max(1e-9, ...points.map((point) => point.horizontal + point.loads + point.water));
  const px = (pressure: number): number => left + (pressure / largest) * width;
  const outline = (value: (point: PressurePoint) => number, under: (point: PressurePoint) => number): string =>
    [
      ...points.map((point) => [px(value(point)), f.y(point.z)] as const),
      ...[...points].reverse().map((point) => [px(under(point)), f.y(point.z)] as const),
    ]
      .map(([x, y]) => `${fixed(x)},${fixed(y)}`)
      .join(" ");
  const earth = (point: PressurePoint): number => point.horizontal + point.loads;
  const shapes = [
    `<polygon points="${outline(earth, () => 0)}" fill="${palette.failSoft}" stroke="${palette.fail}" stroke-width="1.2"/>`,
    points.some((point) => point.water > 0)
      ? `<polygon points="${outline((point) => earth(point) + point.water, earth)}" fill="${palette.waterSoft}" stroke="${palette.water}" stroke-width="1.2"/>`
      : "",
  ];
  const seen = new Set<string>();
  let lastY = Number.NEGATIVE_INFINITY;
  const numbers = breakPoints(points).flatMap((point) => {
    const total = earth(point) + point.water;
    const key = `${point.z.toFixed(3)} ${total.toFixed(1)}`;
    if (seen.has(key) || total < 0.005 * largest) return [];
    seen.add(key);
    const y = Math.max(f.y(point.z) + 4, lastY + 12);
    lastY = y;
    return [label(px(total) + 5, y, display.number(total, "kPa"), 'font-size="11"')];
  });
  const axis = line(left, f.y(0), left, f.y(s.planeTop), `stroke="${palette.ink}" stroke-width="1.2"`);
  const legend = `<rect x="${left}" y="${drawingHeight - 34}" width="11" height="11" fill="${palette.failSoft}" stroke="${palette.fail}"/>${text(left + 16, drawingHeight - 24, `earth${points.some((point) => point.loads > 0) ? " and loads" : ""}`)}<rect x="${left + 120}" y="${drawingHeight - 34}" width="11" height="11" fill="${palette.waterSoft}" stroke="${palette.water}"/>${text(left + 136, drawingHeight - 24, "water")}${text(left, drawingHeight - 6, `Horizontal pressure, ${display.unit("kPa")}`)}`;
  return shapes.join("") + axis + numbers.join("") + legend;
}

/** The ends of each stretch of one soil: where a number is worth writing. */
function breakPoints(points: readonly PressurePoint[]): readonly PressurePoint[] {
  return points.filter((point, place) => {
    const [before, after] = [points[place - 1], points[place + 1]];
    if (before === undefined || after === undefined) return true;
    return before.z === point.z || after.z === point.z;
  });
}
