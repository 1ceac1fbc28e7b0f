import type { ReportInput } from "../../results.ts";
import { failurePictureChart } from "../charts/failure-picture-chart.ts";
import { sharesChart } from "../charts/shares.ts";
import { tornadoChart } from "../charts/tornado-chart.ts";
import { capitalised, type Display, limitStateWords } from "../display.ts";
import { escapeHtml } from "../escape.ts";
import { figure, htmlTable, paragraph, section } from "../markup.ts";
import { shareText, significant } from "../number.ts";
import { type Chart, pageSvg, renderChart } from "../render-chart.ts";

/** Which unknown drives the risk: shares, one at a time, and what the failures look like. */
export async function driversSection({ assess }: ReportInput, display: Display): Promise<string> {
  if (assess.variables.length === 0)
    return section(
      "drivers",
      "What drives it",
      paragraph("Nothing in the study is uncertain: there is nothing that could drive a probability."),
    );
  const draw = async (chart: Chart, text: string): Promise<string> =>
    figure(pageSvg(await renderChart(chart), chart, escapeHtml), chart.title, text);
  const shares = await draw(
    sharesChart(assess),
    "First-order second-moment: each share is what the spread of one unknown adds to the variance of the factor of safety. A share can be below zero where unknowns are correlated.",
  );
  const tornadoes = await Promise.all(
    Object.entries(assess.limitStates).map(async ([name, state]) =>
      draw(
        tornadoChart(assess, name, state),
        "Dark at the 5 % value, light at the 95 % value of the unknown, the others at their means; the red line is a factor of 1.",
      ),
    ),
  );
  const picture = failurePictureChart(assess, assess.system.failurePicture, display);
  const pictures =
    picture === undefined
      ? paragraph("No sample failed, so there is no picture of the failures.")
      : await draw(
          picture,
          `From ${assess.system.failurePicture[0]?.failures ?? 0} failing samples. An unknown whose two pictures differ is one that failure depends on.`,
        );
  return section("drivers", "What drives it", shares, driverTable({ assess }, display), ...tornadoes, pictures);
}

function driverTable({ assess }: Pick<ReportInput, "assess">, display: Display): string {
  const states = Object.entries(assess.limitStates);
  const system = new Map(assess.system.drivers.map((driver) => [driver.path, driver]));
  const pictures = new Map(assess.system.failurePicture.map((picture) => [picture.path, picture]));
  const strength = (path: string): number =>
    Math.max(...states.map(([, state]) => Math.abs(state.firstOrderSecondMoment.contributions[path] ?? 0)));
  const rows = [...assess.variables]
    .sort((a, b) => strength(b.path) - strength(a.path))
    .map((variable) => {
      const driver = system.get(variable.path);
      const picture = pictures.get(variable.path);
      const shift = driver?.shiftGivenFailure;
      return [
        variable.label,
        ...states.map(([, state]) => shareText(state.firstOrderSecondMoment.contributions[variable.path] ?? 0)),
        picture === undefined ? "–" : display.quantity(picture.meanGivenFailure, variable.unit),
        shift === null || shift === undefined ? "–" : `${shift > 0 ? "+" : ""}${significant(shift, 2)}`,
        driver?.adverse ?? "–",
        `${Math.round(variable.knowledge * 100)} %`,
      ];
    });
  return htmlTable(
    [
      { heading: "Unknown" },
      ...states.map(([name]) => ({ heading: `Share, ${capitalised(limitStateWords[name] ?? name)}`, numeric: true })),
      { heading: "Mean among failures", numeric: true },
      { heading: "Shift, standard deviations", numeric: true },
      { heading: "Harmful end" },
      { heading: "Could be learned", numeric: true },
    ],
    rows,
    "Strongest first. The shift is that of the mean among the samples in which any limit state fails.",
  );
}
