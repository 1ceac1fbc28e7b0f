import { figure } from "./markup.ts";
import { pageSvg } from "./page-svg.ts";
import { type Chart, renderChart } from "./render-chart.ts";

/** A chart drawn and captioned for the page. */
export async function chartFigure(chart: Chart, text: string): Promise<string> {
  return figure({
    svg: pageSvg(await renderChart(chart), chart),
    title: chart.title,
    text,
    ...(chart.state === undefined ? {} : { state: chart.state }),
  });
}
