import type { AssessResult, ReportInput } from "../../results.ts";
import { chartFigure } from "../chart-figure.ts";
import { failurePictureChart } from "../charts/failure-picture-chart.ts";
import { sharesChart } from "../charts/shares.ts";
import { tornadoChart } from "../charts/tornado-chart.ts";
import { type Display, limitStateName } from "../display.ts";
import { type Cell, htmlTable, type PageSection, paragraph, section } from "../markup.ts";
import { grouped, shareText, shiftText } from "../number.ts";
import { fragility, measuresOf } from "./measures.ts";

/** Which unknown drives the risk: shares, one at a time, and what the failures look like. */
export async function driversSection({ assess }: ReportInput, display: Display): Promise<PageSection> {
  if (assess.variables.length === 0)
    return section(
      "drivers",
      "What drives it",
      paragraph("Nothing in the study is uncertain: there is nothing that could drive a probability."),
    );
  return section(
    "drivers",
    "What drives it",
    await chartFigure(
      sharesChart(assess),
      "What the spread of each unknown adds to the variance of the factor of safety (first-order second-moment). A share below zero can come from correlation.",
    ),
    driverTable(assess, display),
    await pictures(assess, display),
    ...(await tornadoes(assess, display)),
    measuresOf(assess),
    await fragility(assess, display),
  );
}

async function tornadoes(assess: AssessResult, display: Display): Promise<readonly string[]> {
  return Promise.all(
    Object.entries(assess.limitStates).map(([name, state]) =>
      chartFigure(
        tornadoChart(assess, name, state, display),
        "Each unknown at its 5 and its 95 % value (written at the ends), the others at their means; at the red line the factor is 1.",
      ),
    ),
  );
}

async function pictures(assess: AssessResult, display: Display): Promise<string> {
  const chart = failurePictureChart(assess, assess.system.failurePicture, display);
  if (chart === undefined) return paragraph("No sample failed, so there is no picture of the failures.");
  const failures = assess.system.failurePicture[0]?.failures ?? 0;
  return chartFigure(
    chart,
    `From ${failures === 1 ? "one failing sample" : `${grouped(failures)} failing samples`}. Where the two pictures part, failure depends on that unknown.`,
  );
}

function driverTable(assess: AssessResult, display: Display): string {
  const states = Object.entries(assess.limitStates);
  const system = new Map(assess.system.drivers.map((driver) => [driver.path, driver]));
  const pictured = new Map(assess.system.failurePicture.map((picture) => [picture.path, picture]));
  const strength = (path: string): number =>
    Math.max(...states.map(([, state]) => Math.abs(state.firstOrderSecondMoment.contributions[path] ?? 0)));
  const rows = [...assess.variables]
    .sort((a, b) => strength(b.path) - strength(a.path))
    .map((variable): readonly Cell[] => {
      const driver = system.get(variable.path);
      const picture = pictured.get(variable.path);
      const shift = driver?.shiftGivenFailure ?? null;
      const shares = states.map(([, state]) => state.firstOrderSecondMoment.contributions[variable.path] ?? 0);
      return [
        variable.label,
        ...shares.map((share) => ({ text: shareText(share), value: share })),
        picture === undefined ? "–" : display.quantity(picture.meanGivenFailure, variable.unit),
        shift === null ? "–" : { text: shiftText(shift), value: Math.abs(shift) },
        driver === undefined || driver.adverse === "unclear" ? "–" : driver.adverse,
        { text: shareText(variable.knowledge), value: variable.knowledge },
      ];
    });
  return htmlTable(
    [
      { heading: "Unknown" },
      ...states.map(([name]) => ({ heading: limitStateName(name), numeric: true })),
      { heading: "Mean among failures", numeric: true },
      { heading: "Shift, standard deviations", numeric: true },
      { heading: "Harmful end" },
      { heading: "Could be learned", numeric: true },
    ],
    rows,
    {
      caption:
        "Shares by limit state, the strongest first; then what distinguishes the samples in which any limit state fails. “Could be learned” is the part of the spread that is lack of knowledge.",
      sortable: true,
    },
  );
}
