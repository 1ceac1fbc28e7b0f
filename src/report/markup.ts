import { escapeHtml } from "./escape.ts";

export interface HtmlColumn {
  readonly heading: string;
  readonly numeric?: boolean;
}

/** A table of plain text; every cell is escaped. A cell given as `{ html }` is markup of our own. */
export type Cell = string | { readonly html: string };

export function htmlTable(columns: readonly HtmlColumn[], rows: readonly (readonly Cell[])[], caption = ""): string {
  const side = (column: HtmlColumn): string => (column.numeric ? ' class="n"' : "");
  const head = columns.map((column) => `<th scope="col"${side(column)}>${escapeHtml(column.heading)}</th>`).join("");
  const body = rows
    .map((row) => `<tr>${row.map((cell, k) => `<td${side(columns[k])}>${cellHtml(cell)}</td>`).join("")}</tr>`)
    .join("");
  const title = caption === "" ? "" : `<caption>${escapeHtml(caption)}</caption>`;
  return `<div class="scroll"><table>${title}<thead><tr>${head}</tr></thead><tbody>${body}</tbody></table></div>`;
}

const cellHtml = (cell: Cell): string => (typeof cell === "string" ? escapeHtml(cell) : cell.html);

export const paragraph = (text: string, kind = ""): string =>
  `<p${kind === "" ? "" : ` class="${kind}"`}>${escapeHtml(text)}</p>`;

export const section = (id: string, title: string, ...content: readonly string[]): string =>
  `<section id="${id}"><h2>${escapeHtml(title)}</h2>${content.join("")}</section>`;

export function figure(svg: string, title: string, text: string): string {
  return `<figure>${svg}<figcaption><b>${escapeHtml(title)}.</b> ${escapeHtml(text)}</figcaption></figure>`;
}
