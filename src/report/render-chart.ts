import { chartWidth } from "./charts/common.ts";
import { palette } from "./palette.ts";
import { textWidth } from "./text-width.ts";

/** A Vega-Lite specification as plain data. */
export type ChartSpec = Readonly<Record<string, unknown>>;

export interface Chart {
  /** Used as a file name and an anchor. */
  readonly id: string;
  /** Says what the chart shows. */
  readonly title: string;
  /** The same for those who cannot see it, with the figures that matter. */
  readonly alternative: string;
  /** Limit state, where the whole chart is of one. */
  readonly state?: string;
  readonly spec: ChartSpec;
}

/** The look that all charts share: no frame, few lines, the page's type. */
const look = {
  background: "transparent",
  font: "system-ui, 'Segoe UI', Roboto, 'Helvetica Neue', Arial, sans-serif",
  padding: 2,
  view: { stroke: null },
  axis: {
    labelColor: palette.ink,
    titleColor: palette.muted,
    titleFontWeight: 400,
    labelFontSize: 12,
    titleFontSize: 12,
    gridColor: palette.grid,
    domainColor: palette.muted,
    tickColor: palette.muted,
    labelLimit: 0,
    titlePadding: 8,
  },
  legend: {
    labelColor: palette.ink,
    titleColor: palette.ink,
    labelFontSize: 12,
    titleFontSize: 12,
    orient: "top",
    labelLimit: 0,
    symbolStrokeWidth: 1.5,
  },
  header: { labelColor: palette.ink, titleColor: palette.ink, labelFontSize: 12, labelFontWeight: 600 },
  title: { color: palette.ink, fontSize: 12, fontWeight: 600, anchor: "start" },
  text: { color: palette.ink, fontSize: 12 },
} as const;

/**
 * Chart → SVG text in the light colours. Vega is loaded on first use; its loader refuses every address, and expressions run
 * through the interpreter, so that nothing is fetched and no code is made from strings.
 */
export async function renderChart(chart: Pick<Chart, "spec">): Promise<string> {
  const [vega, { compile }, { expressionInterpreter }] = await Promise.all([
    import("vega"),
    import("vega-lite"),
    import("vega-interpreter"),
  ]);
  textMetricsOf(vega).width = (item, words) => textWidth(String(words ?? ""), item.fontSize ?? 11);
  const { spec } = compile({ ...fitted(chart.spec), config: look } as never, { logger: quiet } as never);
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

/** Charts of one view fill the width they ask for, labels included; grids and facets reckon their own. */
function fitted(spec: ChartSpec): ChartSpec {
  const single = !("facet" in spec || "concat" in spec || "hconcat" in spec || "vconcat" in spec);
  return {
    $schema: "https://vega.github.io/schema/vega-lite/v6.json",
    ...(single ? { width: chartWidth, autosize: { type: "fit-x", contains: "padding" } } : {}),
    ...spec,
  };
}

/**
 * How Vega measures words: by a canvas where there is one. Without it every letter counts 0.8 of the size, and labels that would fit
 * are cut; the page, made once on a machine without a canvas, must not depend on where it was made either.
 */
interface TextMetrics {
  width: (item: { readonly fontSize?: number }, words: unknown) => number;
}

const textMetricsOf = (vega: object): TextMetrics => (vega as { readonly textMetrics: TextMetrics }).textMetrics;

const quiet = { level: () => quiet, error: () => quiet, warn: () => quiet, info: () => quiet, debug: () => quiet };
