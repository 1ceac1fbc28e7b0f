import type { ReportInput, SheetLine } from "../../results.ts";
import { convergenceChart } from "../charts/convergence.ts";
import { factorHistogram } from "../charts/factor-histogram.ts";
import { capitalised, type Display, limitStateWords } from "../display.ts";
import { escapeHtml } from "../escape.ts";
import { figure, htmlTable, paragraph, section } from "../markup.ts";
import { grouped, indexText, probabilityText, significant, threeFigures } from "../number.ts";
import { type Chart, pageSvg, renderChart } from "../render-chart.ts";

/** How it was computed: samples, methods side by side, forces, and the calculation that can be followed by hand. */
export async function computedSection(input: ReportInput, display: Display): Promise<string> {
  const { assess, check } = input;
  const draw = async (chart: Chart, text: string): Promise<string> =>
    figure(pageSvg(await renderChart(chart), chart, escapeHtml), chart.title, text);
  const histograms = await Promise.all(
    Object.entries(assess.limitStates).map(async ([name, state]) =>
      draw(factorHistogram(name, state), "The failed part is red."),
    ),
  );
  const convergence = await draw(
    convergenceChart(assess.system.convergence),
    "The band is the 95 % interval at each stage.",
  );
  return section(
    "computed",
    "How it was computed",
    paragraph(
      `The stability calculation ran ${grouped(assess.run.sampling.evaluations)} times with values drawn from the distributions below (plain Monte Carlo sampling, seed “${assess.seed}”); a probability is the share of runs with a factor of safety below 1, with its 95 % Clopper–Pearson interval.`,
    ),
    `<div class="pair">${histograms.join("")}</div>`,
    convergence,
    methodsTable(input),
    `<h3>Forces at the means, per ${display.units === "us" ? "foot" : "metre"} run</h3>`,
    forceTable(input, display),
    "<h3>The calculation at the means, step by step</h3>",
    paragraph(
      display.units === "us"
        ? "The numbers put in are in m, kN and kPa, in which the program reckons; results are in the study's units."
        : "Each line gives the formula, the numbers put in and the result, so that it can be followed by hand.",
      "quiet",
    ),
    sheetTable(check.sheet, display),
  );
}

function methodsTable({ assess }: ReportInput): string {
  const rows = Object.entries(assess.limitStates).map(([name, { firstOrderSecondMoment: moment, monteCarlo }]) => [
    capitalised(limitStateWords[name] ?? name),
    `${significant(moment.mean, 3)} ± ${significant(moment.sd, 2)}`,
    `${indexText(moment.reliabilityIndexNormal)} (${probabilityText(moment.probabilityNormal)})`,
    `${indexText(moment.reliabilityIndexLognormal)} (${probabilityText(moment.probabilityLognormal)})`,
    monteCarlo.failures === 0
      ? "none seen"
      : `${indexText(monteCarlo.reliabilityIndex)} (${probabilityText(monteCarlo.probability)})`,
  ]);
  return htmlTable(
    [
      { heading: "Index (probability)" },
      { heading: "Factor, first-order second-moment", numeric: true },
      { heading: "if normal", numeric: true },
      { heading: "if lognormal", numeric: true },
      { heading: "by sampling", numeric: true },
    ],
    rows,
    "The classic hand method beside the sampling. Where they part, the sampling is right within its interval; the hand method guesses the shape of the tail.",
  );
}

function forceTable({ check }: ReportInput, display: Display): string {
  const rows = check.forces.map((force) => [
    force.name,
    display.number(force.horizontal, "kN/m"),
    display.number(force.vertical, "kN/m"),
    display.number(force.x, "m"),
    display.number(force.z, "m"),
  ]);
  return htmlTable(
    [
      { heading: "Force" },
      { heading: `Horizontal, ${display.unit("kN/m")}`, numeric: true },
      { heading: `Vertical, ${display.unit("kN/m")}`, numeric: true },
      { heading: `x, ${display.unit("m")}`, numeric: true },
      { heading: `z, ${display.unit("m")}`, numeric: true },
    ],
    rows,
    "Horizontal is positive towards the front, vertical downwards; x from the tip of the toe, z from the underside of the base.",
  );
}

/** z_w as z with a small w below: escaped first, so nothing but our own marks is markup. */
export function withSubscripts(text: string): string {
  return escapeHtml(text).replace(/_([A-Za-z0-9′γ]+(?:,[A-Za-z0-9]+)?)/g, "<sub>$1</sub>");
}

function sheetTable(sheet: readonly SheetLine[], display: Display): string {
  let block = "";
  const rows = sheet.map((line) => {
    const head =
      line.heading === block
        ? ""
        : `<tr class="block"><th colspan="4" scope="rowgroup">${escapeHtml(line.heading)}</th></tr>`;
    block = line.heading;
    const value = line.unit === "–" ? threeFigures(line.value) : display.quantity(line.value, line.unit);
    const source = line.source === undefined ? "" : ` <span class="words">(${escapeHtml(line.source)})</span>`;
    const numbers =
      line.substituted === "" || line.substituted === line.formula ? "" : `<br>= ${escapeHtml(line.substituted)}`;
    return `${head}<tr><td class="formula">${withSubscripts(line.symbol)}</td><td>${escapeHtml(line.text)}${source}</td><td class="formula">${withSubscripts(line.formula)}${numbers}</td><td class="n">${escapeHtml(value)}</td></tr>`;
  });
  return `<div class="scroll"><table><thead><tr><th scope="col">Symbol</th><th scope="col">What it is</th><th scope="col">Formula and numbers</th><th scope="col" class="n">Result</th></tr></thead><tbody>${rows.join("")}</tbody></table></div>`;
}
