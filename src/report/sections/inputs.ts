import type { AssessResult, ReportInput, VariableSummary } from "../../results.ts";
import { quantitiesOf } from "../../study/quantities.ts";
import type { Study } from "../../study/study.ts";
import { displayUnit } from "../../study/units.ts";
import { densityPicture } from "../charts/density-picture.ts";
import { capitalised, type Display } from "../display.ts";
import { escapeHtml } from "../escape.ts";
import { type Cell, htmlTable, type PageSection, paragraph, section } from "../markup.ts";
import { shareText, significant, threeFigures } from "../number.ts";

/** Everything that was put in: the uncertain values with their spread and a small picture, then the certain ones. */
export function inputsSection({ assess, study }: ReportInput, display: Display): PageSection {
  return section(
    "inputs",
    "What was put in",
    assess.variables.length === 0 ? paragraph("Nothing in the study is uncertain.") : uncertainTable(assess, display),
    correlationTable(study, assess.variables),
    modelWords(study),
    certainTable(study, assess),
  );
}

function uncertainTable({ variables }: AssessResult, display: Display): string {
  const rows = variables.map((variable): readonly Cell[] => {
    const number = (value: number): string => display.number(value, variable.unit);
    return [
      { html: `${escapeHtml(variable.label)}${sourceHtml(variable)}` },
      display.unit(variable.unit),
      distributionWords(variable, display),
      number(variable.mean),
      number(variable.sd),
      number(variable.fractile5),
      number(variable.fractile95),
      { html: densityPicture(variable) },
      shareText(variable.knowledge),
    ];
  });
  return htmlTable(
    [
      { heading: "Uncertain value" },
      { heading: "Unit" },
      { heading: "Distribution" },
      { heading: "Mean", numeric: true },
      { heading: "Standard deviation", numeric: true },
      { heading: "5 %", numeric: true },
      { heading: "95 %", numeric: true },
      { heading: "Density" },
      { heading: "Could be learned", numeric: true },
    ],
    rows,
    { caption: "Where a value comes from stands under its name, as the study gives it." },
  );
}

const sourceHtml = ({ source }: VariableSummary): string =>
  source === undefined ? "" : `<span class="words">${escapeHtml(source)}</span>`;

/** Words of the study file, and what they leave unsaid. */
function distributionWords(variable: VariableSummary, display: Display): string {
  const words = [variable.distribution.replaceAll("_", " ")];
  if (variable.ticks !== undefined) words.push(`${variable.ticks.length} values`);
  if (variable.yearly) words.push("largest of one year");
  if (variable.parent !== undefined)
    words.push(
      `before the cut ${display.number(variable.parent.mean, variable.unit)} ± ${display.number(variable.parent.sd, variable.unit)}`,
    );
  return words.join(", ");
}

function correlationTable({ correlations }: Study, variables: readonly VariableSummary[]): string {
  if (correlations.length === 0) return "";
  const label = (path: string): string => variables.find((variable) => variable.path === path)?.label ?? path;
  return htmlTable(
    [{ heading: "Vary together" }, { heading: "with" }, { heading: "Correlation", numeric: true }],
    correlations.map(({ between: [a, b], coefficient }) => [label(a), label(b), significant(coefficient, 2)]),
  );
}

const modelNames: Readonly<Record<string, string>> = {
  rankine: "Rankine",
  coulomb: "Coulomb",
  at_rest: "at rest",
  vesic: "Vesić",
  en1997: "EN 1997-1, Annex D",
  meyerhof: "Meyerhof",
};

/** How the engine was told to compute. */
function modelWords({ model, water }: Study): string {
  const name = (key: string): string => modelNames[key] ?? key;
  const words = [
    `earth pressure ${name(model.earthPressure)}`,
    `bearing capacity ${name(model.bearing)}`,
    water.behind === undefined && water.front === undefined
      ? "dry ground"
      : water.flow === "seepage"
        ? "steady seepage around the base"
        : "hydrostatic water",
    model.tensionCrack === "water" ? "tension cracks filled with water" : "tension cracks dry",
  ];
  return paragraph(`Model: ${words.join("; ")}.`);
}

function certainTable(study: Study, { variables }: AssessResult): string {
  const uncertain = new Set(variables.map((variable) => variable.path));
  const rows = quantitiesOf(study).flatMap(({ path, quantity, label, field }): (readonly Cell[])[] => {
    if (typeof quantity !== "number" || uncertain.has(path)) return [];
    const { unit, factor } = displayUnit(field.dimension, study.units);
    const shown = `${threeFigures(quantity * factor)}${unit === "–" ? "" : unit === "°" ? "°" : ` ${unit}`}`;
    return [
      [
        { html: `${escapeHtml(capitalised(label))}` },
        { html: `<code>${escapeHtml(path)}</code>` },
        shown,
        study.sources[path] ?? "",
      ],
    ];
  });
  return htmlTable(
    [
      { heading: "Certain value" },
      { heading: "Path in the study" },
      { heading: "Value", numeric: true },
      { heading: "Source" },
    ],
    rows,
    { caption: "Taken as certain, defaults included." },
  );
}
