import type { CheckResult, ReportInput, SheetLine } from "../../results.ts";
import type { Display } from "../display.ts";
import { escapeHtml } from "../escape.ts";
import { htmlTable, type PageSection, paragraph, scrolling, section, subheading } from "../markup.ts";
import { threeFigures } from "../number.ts";
import { type SheetBlock, sheetBlocks } from "../sheet-blocks.ts";
import { baseSentences } from "../terminal-check.ts";

/** The stability calculation at the means: forces, base, and every step so that it can be followed by hand. */
export function calculationSection({ check }: ReportInput, display: Display): PageSection {
  return section(
    "calculation",
    "The calculation, step by step",
    subheading(`Forces at the means, per ${display.units === "us" ? "foot" : "metre"} run`),
    forceTable(check, display),
    paragraph(baseSentences(check, display).join(" ")),
    subheading("Every step at the means"),
    paragraph(
      display.units === "us"
        ? "Each line gives the formula, the numbers put in and the result. The numbers put in are in m, kN and kPa, in which the program reckons; results are in the study's units."
        : "Each line gives the formula, the numbers put in and the result.",
      "quiet",
    ),
    sheetTable(check.sheet, display),
  );
}

const groupNames: Readonly<Record<string, string>> = {
  weight: "weight",
  earth: "earth",
  water: "water",
  surcharge: "load",
  inertia: "inertia",
  front: "resistance in front",
};

function forceTable({ forces }: CheckResult, display: Display): string {
  const rows = forces.map((force) => [
    force.name,
    groupNames[force.group] ?? force.group,
    display.number(force.horizontal, "kN/m"),
    display.number(force.vertical, "kN/m"),
    display.number(force.x, "m"),
    display.number(force.z, "m"),
  ]);
  return htmlTable(
    [
      { heading: "Force" },
      { heading: "Kind" },
      { heading: `Horizontal, ${display.unit("kN/m")}`, numeric: true },
      { heading: `Vertical, ${display.unit("kN/m")}`, numeric: true },
      { heading: `x, ${display.unit("m")}`, numeric: true },
      { heading: `z, ${display.unit("m")}`, numeric: true },
    ],
    rows,
    {
      caption:
        "Horizontal is positive towards the front, vertical downwards; x from the tip of the toe, z from the underside of the base.",
    },
  );
}

/** z_w as z with a small w below: escaped first, so nothing but our own marks is markup. */
export function withSubscripts(text: string): string {
  return escapeHtml(text).replace(/_([A-Za-z0-9′γ]+(?:,[A-Za-z0-9]+)?)/g, "<sub>$1</sub>");
}

function sheetTable(sheet: readonly SheetLine[], display: Display): string {
  const headings = ["Symbol", "What it is", "Formula, and the numbers put in"]
    .map((heading) => `<th scope="col">${heading}</th>`)
    .join("");
  return scrolling(
    `<table class="sheet"><thead><tr>${headings}<th scope="col" class="n">Result</th></tr></thead>${sheetBlocks(sheet)
      .map((block) => sheetBlock(block, display))
      .join("")}</table>`,
    "The calculation",
  );
}

function sheetBlock({ heading, lines }: SheetBlock, display: Display): string {
  const rows = lines.map((line) => {
    const value = line.unit === "–" ? threeFigures(line.value) : display.quantity(line.value, line.unit);
    const source = line.source === undefined ? "" : `<span class="words">${escapeHtml(line.source)}</span>`;
    const numbers =
      line.substituted === "" || line.substituted === line.formula
        ? ""
        : `<span class="numbers">= ${escapeHtml(line.substituted)}</span>`;
    return `<tr><th scope="row" class="formula">${withSubscripts(line.symbol)}</th><td>${escapeHtml(line.text)}${source}</td><td class="formula">${withSubscripts(line.formula)}${numbers}</td><td class="n">${escapeHtml(value)}</td></tr>`;
  });
  return `<tbody><tr class="block"><th colspan="4" scope="rowgroup">${escapeHtml(heading)}</th></tr>${rows.join("")}</tbody>`;
}
