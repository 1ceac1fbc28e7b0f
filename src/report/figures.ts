/** The pictures of the page, each to stand alone: taken from the page itself, so that picture and page cannot differ. */
import { kebab, palette } from "./palette.ts";

export interface FigureFile {
  /** File name without its ending: its place on the page, then its title in letters, digits and hyphens. */
  readonly name: string;
  readonly title: string;
  /** One SVG document in the light colours. */
  readonly svg: string;
}

const figurePattern = /<figure[^>]*>[\s\S]*?(<svg[\s\S]*?<\/svg>)[\s\S]*?<figcaption><b>([\s\S]*?)\.<\/b>/g;

/** @param page of `htmlReport` */
export function figureFiles(page: string): readonly FigureFile[] {
  const names = new Map<string, number>();
  return [...page.matchAll(figurePattern)].map(([, svg, title], place) => {
    const base = slug(plain(title));
    const count = (names.get(base) ?? 0) + 1;
    names.set(base, count);
    const number = String(place + 1).padStart(2, "0");
    return { name: `${number}-${base}${count === 1 ? "" : `-${count}`}`, title: plain(title), svg: standing(svg) };
  });
}

const longest = 64;

function slug(title: string): string {
  const words = title
    .toLowerCase()
    .normalize("NFKD")
    .replace(/[^a-z0-9]+/g, "-")
    .replace(/^-|-$/g, "");
  return (words.length > longest ? words.slice(0, words.lastIndexOf("-", longest)) : words) || "figure";
}

const plain = (html: string): string =>
  html
    .replace(/&lt;/g, "<")
    .replace(/&gt;/g, ">")
    .replace(/&quot;/g, '"')
    .replace(/&#39;/g, "'")
    .replace(/&amp;/g, "&");

const colours: ReadonlyMap<string, string> = new Map(
  Object.entries(palette).map(([role, colour]) => [kebab(role), colour]),
);

/** With colours of its own in place of the page's variables, a type face, and paper behind it. */
function standing(svg: string): string {
  const coloured = svg.replace(/var\(--([a-z0-9-]+)\)/g, (whole, role: string) => colours.get(role) ?? whole);
  const open = /^<svg[^>]*>/.exec(coloured)?.[0] ?? "<svg>";
  const named = open.includes("xmlns=") ? open : open.replace("<svg", '<svg xmlns="http://www.w3.org/2000/svg"');
  const typed = named.includes("font-family")
    ? named
    : named.replace("<svg", `<svg font-family="'DejaVu Sans', system-ui, sans-serif"`);
  return `<?xml version="1.0" encoding="UTF-8"?>\n${typed}<rect width="100%" height="100%" fill="${palette.paper}"/>${coloured.slice(open.length)}\n`;
}
