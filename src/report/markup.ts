import { escapeHtml } from "./escape.ts";

/** A part of the page with its place in the contents. */
export interface PageSection {
  readonly id: string;
  readonly title: string;
  readonly html: string;
}

export interface HtmlColumn {
  readonly heading: string;
  readonly numeric?: boolean;
}

/** Plain text is escaped; `html` is markup of our own; `value` is what a column is sorted by. */
export type Cell = string | { readonly html: string } | { readonly text: string; readonly value: number };

export interface TableOptions {
  readonly caption?: string;
  /** Columns can be sorted where scripts run. */
  readonly sortable?: boolean;
  /** The limit state of each row, by place. */
  readonly states?: readonly (string | undefined)[];
}

/** Tables of up to so many rows stay on one printed page. */
const shortTable = 14;

/** The first column heads its row. */
export function htmlTable(
  columns: readonly HtmlColumn[],
  rows: readonly (readonly Cell[])[],
  { caption = "", sortable = false, states = [] }: TableOptions = {},
): string {
  const side = (column: HtmlColumn): string => (column.numeric ? ' class="n"' : "");
  const head = columns.map((column) => `<th scope="col"${side(column)}>${escapeHtml(column.heading)}</th>`).join("");
  const body = rows
    .map(
      (row, place) =>
        `<tr${stateOf(states[place])}>${row.map((cell, k) => tableCell(cell, columns[k], k)).join("")}</tr>`,
    )
    .join("");
  const kinds = [...(sortable ? ["sortable"] : []), ...(rows.length <= shortTable ? ["short"] : [])];
  const title = caption === "" ? "" : `<caption>${escapeHtml(caption)}</caption>`;
  return scrolling(
    `<table${kinds.length === 0 ? "" : ` class="${kinds.join(" ")}"`}>${title}<thead><tr>${head}</tr></thead><tbody>${body}</tbody></table>`,
    columns[0].heading,
  );
}

function tableCell(cell: Cell, column: HtmlColumn, place: number): string {
  const kind = column.numeric ? ' class="n"' : "";
  const value = typeof cell === "object" && "value" in cell ? ` data-value="${cell.value}"` : "";
  const inside = typeof cell === "string" ? escapeHtml(cell) : "html" in cell ? cell.html : escapeHtml(cell.text);
  return place === 0 ? `<th scope="row">${inside}</th>` : `<td${kind}${value}>${inside}</td>`;
}

const stateOf = (state: string | undefined): string =>
  state === undefined ? "" : ` data-state="${escapeHtml(state)}"`;

/** Wide content that a narrow screen may move sideways, with the keyboard too. */
export const scrolling = (content: string, name: string): string =>
  `<div class="scroll" tabindex="0" role="region" aria-label="${escapeHtml(name)}">${content}</div>`;

export const paragraph = (text: string, kind = ""): string =>
  `<p${kind === "" ? "" : ` class="${kind}"`}>${escapeHtml(text)}</p>`;

export const bullets = (items: readonly string[], kind = ""): string =>
  `<ul${kind === "" ? "" : ` class="${kind}"`}>${items.map((item) => `<li>${escapeHtml(item)}</li>`).join("")}</ul>`;

export const subheading = (text: string): string => `<h3>${escapeHtml(text)}</h3>`;

export const section = (id: string, title: string, ...content: readonly string[]): PageSection => ({
  id,
  title,
  html: `<section id="${id}" aria-labelledby="${id}-heading"><h2 id="${id}-heading">${escapeHtml(title)}</h2>${content.join("")}</section>`,
});

export interface Figure {
  readonly svg: string;
  readonly title: string;
  readonly text: string;
  readonly state?: string;
}

/** A picture with its caption: what it shows in bold, then how to read it. */
export function figure({ svg, title, text, state }: Figure): string {
  return `<figure${stateOf(state)}>${scrolling(svg, title)}<figcaption><b>${escapeHtml(title)}.</b> ${escapeHtml(text)}</figcaption></figure>`;
}
