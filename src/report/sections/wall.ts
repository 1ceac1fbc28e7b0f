import type { CheckResult, ReportInput, VariableSummary } from "../../results.ts";
import { capitalised, type Display, limitStateName } from "../display.ts";
import type { WaterRanges } from "../drawing/water.ts";
import { failurePoint } from "../failure-point.ts";
import { figure, htmlTable, type PageSection, paragraph, section, subheading } from "../markup.ts";
import { shiftText, significant } from "../number.ts";
import { withVariables } from "../palette.ts";
import { sectionDrawing } from "../section-drawing.ts";

/** The wall to scale at its mean values with the pressure on its plane; then the values at which it is likely to fail. */
export function wallSection(input: ReportInput, display: Display): PageSection {
  const { check } = input;
  return section(
    "wall",
    "The wall",
    figure({
      svg: withVariables(
        sectionDrawing(check.section, display, {
          id: "at-means",
          title: "The wall at the mean values",
          pressure: check.pressure,
          water: waterRanges(input),
        }),
      ),
      title: "The wall at the mean values, to scale, and the pressure on it",
      text: readingHelp(input),
    }),
    factorTable(check, display, "At the means"),
    ...(check.marks.includes("lost_contact")
      ? [paragraph("At the means the base has lost contact with the ground.", "callout")]
      : []),
    likelyFailure(input, display),
  );
}

function waterRanges({ check, assess }: ReportInput): WaterRanges {
  const range = (path: string): readonly [number, number] | undefined => {
    const variable = assess.variables.find((candidate) => candidate.path === path);
    const { undersideLevel } = check.section;
    return variable && [variable.fractile5 - undersideLevel, variable.fractile95 - undersideLevel];
  };
  const [behind, front] = [range("water.behind.level"), range("water.front.level")];
  return { ...(behind === undefined ? {} : { behind }), ...(front === undefined ? {} : { front }) };
}

function readingHelp({ check }: ReportInput): string {
  const { plane, layers, circle } = check.section;
  const words = [
    plane === "virtual_back"
      ? "The pressure acts on the virtual back, the broken line through the heel."
      : "The pressure acts on the back face of the wall.",
    layers.length > 1
      ? "At a boundary between soils the earth pressure jumps, because its coefficient changes there."
      : "",
    circle === undefined ? "" : "The dash-dotted arc is the circle with the smallest factor.",
  ];
  return words.filter((part) => part !== "").join(" ");
}

function factorTable(check: CheckResult, display: Display, heading: string): string {
  const states = Object.entries(check.limitStates);
  const rows = states.map(([name, state]) => [
    limitStateName(name),
    display.quantity(state.resisting, state.unit),
    display.quantity(state.driving, state.unit),
    significant(state.factorOfSafety, 3),
  ]);
  return htmlTable(
    [
      { heading },
      { heading: "Resisting", numeric: true },
      { heading: "Driving", numeric: true },
      { heading: "Factor of safety", numeric: true },
    ],
    rows,
    { states: states.map(([name]) => name) },
  );
}

/** The values at which the wall is most likely to fail, and the wall as it stands then where it was computed. */
function likelyFailure(input: ReportInput, display: Display): string {
  const point = failurePoint(input.assess);
  if (point === undefined) return "";
  const { atFailure } = input;
  const drawing =
    atFailure === undefined
      ? ""
      : figure({
          svg: withVariables(
            sectionDrawing(atFailure.section, display, {
              id: "at-failure",
              title: `The wall at ${point.name}`,
              pressure: atFailure.pressure,
              means: input.check,
            }),
          ),
          title: `The wall at ${point.name}`,
          text: "Drawn with the values of the table below; levels and pressures at the means stand beside them as broken lines.",
        }) + factorTable(atFailure, display, "At these values");
  const rows = input.assess.variables.flatMap((variable) => {
    const value = point.values[variable.path];
    return value === undefined ? [] : [valueRow(variable, value, display)];
  });
  rows.sort((a, b) => Math.abs(b.shift) - Math.abs(a.shift));
  return (
    subheading(capitalised(point.name)) +
    drawing +
    htmlTable(
      [
        { heading: "Unknown" },
        { heading: "Mean", numeric: true },
        { heading: "At this failure", numeric: true },
        { heading: "Shift, standard deviations", numeric: true },
      ],
      rows.map((row) => row.cells),
      { caption: `${point.how} The unknowns that must move furthest stand first.` },
    )
  );
}

function valueRow(
  variable: VariableSummary,
  value: number,
  display: Display,
): { readonly shift: number; readonly cells: readonly string[] } {
  const shift = variable.sd > 0 ? (value - variable.mean) / variable.sd : 0;
  const quantity = (number: number): string => display.quantity(number, variable.unit);
  return { shift, cells: [variable.label, quantity(variable.mean), quantity(value), shiftText(shift)] };
}
