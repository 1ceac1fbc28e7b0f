import { palette, withVariables } from "./palette.ts";

/** A Vega-Lite specification as plain data. */
export type ChartSpec = Readonly<Record<string, unknown>>;

export interface Chart {
  /** Used as a file name and an anchor. */
  readonly id: string;
  /** Says what the chart shows. */
  readonly title: string;
  /** The same for those who cannot see it, with the figures that matter. */
  readonly alternative: string;
  readonly spec: ChartSpec;
}

/** The look that all charts share: no frame, few lines, the page's type. */
const look = {
  background: "transparent",
  font: "system-ui, 'Segoe UI', Roboto, 'Helvetica Neue', Arial, sans-serif",
  padding: 4,
  view: { stroke: null },
  axis: {
    labelColor: palette.muted,
    titleColor: palette.ink,
    titleFontWeight: 500,
    labelFontSize: 12,
    titleFontSize: 12,
    gridColor: palette.grid,
    domainColor: palette.muted,
    tickColor: palette.muted,
    labelLimit: 480,
  },
  legend: {
    labelColor: palette.ink,
    titleColor: palette.ink,
    labelFontSize: 12,
    titleFontSize: 12,
    orient: "top",
    labelLimit: 300,
  },
  header: { labelColor: palette.ink, titleColor: palette.ink, labelFontSize: 12 },
  title: { color: palette.ink, fontSize: 13, fontWeight: 600, anchor: "start" },
} as const;

/**
 * Chart → SVG text in the light colours. Vega is loaded on first use; its loader refuses every address, and expressions run through
 * the interpreter, so that nothing is fetched and no code is made from strings.
 */
export async function renderChart(chart: Chart): Promise<string> {
  const [vega, { compile }, { expressionInterpreter }] = await Promise.all([
    import("vega"),
    import("vega-lite"),
    import("vega-interpreter"),
  ]);
  const { spec } = compile(
    { $schema: "https://vega.github.io/schema/vega-lite/v6.json", config: look, ...chart.spec } as never,
    {
      logger: quiet,
    } as never,
  );
  const loader = vega.loader();
  loader.load = async () => {
    throw new Error("a chart of the report loads nothing");
  };
  const runtime = vega.parse(spec, undefined, { ast: true } as never);
  const view = new vega.View(runtime, {
    renderer: "none",
    loader,
    expr: expressionInterpreter,
    logLevel: vega.Error,
  } as never);
  try {
    return await view.toSVG();
  } finally {
    view.finalize();
  }
}

const quiet = { level: () => quiet, error: () => quiet, warn: () => quiet, info: () => quiet, debug: () => quiet };

/** For the page: colours as variables, a title and a description for screen readers. */
export function pageSvg(
  svg: string,
  chart: Pick<Chart, "title" | "alternative">,
  escapeText: (text: string) => string,
): string {
  const named = svg.replace(
    /<svg /,
    `<svg role="img" aria-label="${escapeText(`${chart.title}. ${chart.alternative}`)}" `,
  );
  return withVariables(named);
}
