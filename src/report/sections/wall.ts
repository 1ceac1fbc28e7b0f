import type { ReportInput, VariableSummary } from "../../results.ts";
import { capitalised, type Display, limitStateWords } from "../display.ts";
import { figure, htmlTable, paragraph, section } from "../markup.ts";
import { significant } from "../number.ts";
import { withVariables } from "../palette.ts";
import { sectionDrawing } from "../section-drawing.ts";

/** The wall to scale at its mean values, with the pressure on its plane. */
export function wallSection({ check, assess }: ReportInput, display: Display): string {
  const behind = rangeOf(assess.variables, "water.behind.level", check.section.undersideLevel);
  const front = rangeOf(assess.variables, "water.front.level", check.section.undersideLevel);
  const drawing = sectionDrawing(check.section, display, {
    title: "The wall at the mean values",
    pressure: check.pressure,
    ...(behind === undefined ? {} : { waterBehindRange: behind }),
    ...(front === undefined ? {} : { waterFrontRange: front }),
  });
  const band =
    behind === undefined && front === undefined
      ? ""
      : " The darker band is the range of the water level from its 5 to its 95 % fractile.";
  const plane =
    check.section.plane === "virtual_back"
      ? "The broken line is the virtual back, the plane on which the pressure is reckoned."
      : "The pressure is reckoned on the real back face.";
  const rows = Object.entries(check.limitStates).map(([name, state]) => [
    capitalised(limitStateWords[name] ?? name),
    display.quantity(state.resisting, state.unit),
    display.quantity(state.driving, state.unit),
    significant(state.factorOfSafety, 3),
  ]);
  return section(
    "wall",
    "The wall",
    figure(
      withVariables(drawing),
      "The wall at the mean values, to scale",
      `${plane}${band} At a boundary between soils the pressure jumps, because the coefficient changes there.`,
    ),
    htmlTable(
      [
        { heading: "At the means" },
        { heading: "Resisting", numeric: true },
        { heading: "Driving", numeric: true },
        { heading: "Factor of safety", numeric: true },
      ],
      rows,
    ),
    ...(check.marks.includes("lost_contact")
      ? [paragraph("At the means the base has lost contact with the ground.")]
      : []),
  );
}

function rangeOf(
  variables: readonly VariableSummary[],
  path: string,
  underside: number,
): readonly [number, number] | undefined {
  const variable = variables.find((candidate) => candidate.path === path);
  return variable === undefined ? undefined : [variable.fractile5 - underside, variable.fractile95 - underside];
}
