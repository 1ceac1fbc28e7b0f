import { escapeHtml } from "./escape.ts";
import { withVariables } from "./palette.ts";
import type { Chart } from "./render-chart.ts";

/**
 * A rendered chart as it stands in the page: colours as variables, one text alternative for the whole, and on every mark that has
 * a description a `<title>`, which browsers show on hover without any script.
 *
 * A description written `@sliding|words` also ties its mark to a limit state.
 */
export function pageSvg(svg: string, chart: Pick<Chart, "title" | "alternative">): string {
  const words = escapeHtml(`${chart.title}. ${chart.alternative}`);
  const tidy = svg
    .replace(/ role="graphics-[a-z]+"/g, "")
    .replace(/ aria-roledescription="[^"]*"/g, "")
    .replace(/ aria-hidden="true"/g, "")
    .replace(/ (?:stroke-miterlimit="10"|xmlns:xlink="[^"]*"|version="1\.1"|opacity="1")/g, "")
    .replace(/<path class="background" d="M0,0h0v0h0Z"[^>]*\/>/g, "")
    .replace(/<(path|line|rect)((?: [a-z0-9-]+="[^"]*")*?) aria-label="([^"]*)"([^>]*?)\/>/g, markWithWords)
    .replace(/ aria-label="[^"]*"/g, "")
    .replace(/^<svg /, `<svg role="img" aria-label="${words}" `);
  return withVariables(tidy);
}

function markWithWords(_: string, name: string, before: string, described: string, after: string): string {
  const parts = /^@([a-z_]+)\|(.*)$/s.exec(described);
  const state = parts === null ? "" : ` data-state="${parts[1]}"`;
  const words = parts === null ? described : parts[2];
  return `<${name}${before}${state}${after}><title>${words}</title></${name}>`;
}

/** What a mark says on hover, and which limit state it belongs to. */
export const markWords = (words: string, state?: string): string =>
  state === undefined ? words : `@${state}|${words}`;
