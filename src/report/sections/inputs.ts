import type { ReportInput, VariableSummary } from "../../results.ts";
import { quantitiesOf } from "../../study/quantities.ts";
import { displayUnit } from "../../study/units.ts";
import type { Display } from "../display.ts";
import { htmlTable, paragraph, section } from "../markup.ts";
import { significant, threeFigures } from "../number.ts";
import { palette, withVariables } from "../palette.ts";

/** Everything that was put in: the uncertain values with their spread and a small picture, then the certain ones. */
export function inputsSection({ assess, study }: ReportInput, display: Display): string {
  const rows = assess.variables.map((variable) => {
    const extra =
      variable.parent === undefined
        ? ""
        : ` (before the cut: ${display.number(variable.parent.mean, variable.unit)} ± ${display.number(variable.parent.sd, variable.unit)})`;
    return [
      variable.label,
      display.unit(variable.unit),
      variable.distribution.replace("_", " ") + (variable.yearly ? ", of one year" : "") + extra,
      display.number(variable.mean, variable.unit),
      display.number(variable.sd, variable.unit),
      display.number(variable.fractile5, variable.unit),
      display.number(variable.fractile95, variable.unit),
      `${Math.round(variable.knowledge * 100)} %`,
      { html: densityPicture(variable) },
      variable.source ?? "",
    ];
  });
  const uncertain = new Set(assess.variables.map((variable) => variable.path));
  const certain = quantitiesOf(study).filter(
    ({ path, quantity }) => typeof quantity === "number" && !uncertain.has(path),
  );
  const fixedRows = certain.map(({ path, quantity, label, field }) => {
    const { unit, factor } = displayUnit(field.dimension, study.units);
    return [
      label,
      { html: `<code>${displayPath(path)}</code>` },
      `${threeFigures((quantity as number) * factor)}${unit === "–" ? "" : unit === "°" ? "°" : ` ${unit}`}`,
      study.sources[path] ?? "",
    ];
  });
  const pairs = study.correlations.map(({ between: [a, b], coefficient }) => [
    labelOf(assess.variables, a),
    labelOf(assess.variables, b),
    significant(coefficient, 2),
  ]);
  return section(
    "inputs",
    "What was put in",
    rows.length === 0
      ? paragraph("Nothing in the study is uncertain.")
      : htmlTable(
          [
            { heading: "Uncertain value" },
            { heading: "Unit" },
            { heading: "Distribution" },
            { heading: "Mean", numeric: true },
            { heading: "Sd", numeric: true },
            { heading: "5 %", numeric: true },
            { heading: "95 %", numeric: true },
            { heading: "Could be learned", numeric: true },
            { heading: "Density" },
            { heading: "Source" },
          ],
          rows,
        ),
    ...(pairs.length === 0
      ? []
      : [
          htmlTable(
            [{ heading: "Vary together" }, { heading: "with" }, { heading: "Correlation", numeric: true }],
            pairs,
          ),
        ]),
    htmlTable(
      [
        { heading: "Certain value" },
        { heading: "Path in the study" },
        { heading: "Value", numeric: true },
        { heading: "Source" },
      ],
      fixedRows,
    ),
  );
}

const displayPath = (path: string): string => path.replace(/[^A-Za-z0-9_.-]/g, (sign) => `&#${sign.charCodeAt(0)};`);
const labelOf = (variables: readonly VariableSummary[], path: string): string =>
  variables.find((variable) => variable.path === path)?.label ?? path;

/** The density as a small filled curve; measured values as ticks under it. */
export function densityPicture({ density, ticks }: Pick<VariableSummary, "density" | "ticks">): string {
  const { x, y } = density;
  const [low, high, top] = [x[0], x[x.length - 1], Math.max(...y.filter(Number.isFinite), 1e-300)];
  const px = (value: number): number => 1 + (108 * (value - low)) / (high - low || 1);
  const points = x.map((value, k) => `${px(value).toFixed(1)},${(22 - (20 * Math.min(y[k], top)) / top).toFixed(1)}`);
  const marks = (ticks ?? [])
    .map(
      (tick) =>
        `<line x1="${px(tick).toFixed(1)}" x2="${px(tick).toFixed(1)}" y1="22" y2="26" stroke="${palette.ink}"/>`,
    )
    .join("");
  return withVariables(
    `<svg class="density" viewBox="0 0 110 26" aria-hidden="true"><polygon points="1,22 ${points.join(" ")} 109,22" fill="${palette.soft}" stroke="${palette.main}"/>${marks}</svg>`,
  );
}
