import type { ReportInput } from "../../results.ts";
import { chartFigure } from "../chart-figure.ts";
import { sizeContourChart } from "../charts/size-contour.ts";
import { sizeCurveChart, sizeFactorsChart } from "../charts/size-curve.ts";
import type { Display } from "../display.ts";
import { type PageSection, paragraph, section } from "../markup.ts";
import { answer } from "../terminal-size.ts";

/** What another dimension would bring; undefined where no dimension was varied. */
export async function sizeSection({ size }: ReportInput, display: Display): Promise<PageSection | undefined> {
  if (size === undefined) return undefined;
  const contour = sizeContourChart(size, display);
  const unfinished = size.run.complete
    ? []
    : [paragraph("This was stopped before its end: the range is not whole.", "callout")];
  const figures =
    contour === undefined
      ? [
          await chartFigure(
            sizeCurveChart(size, display),
            "Every point sees the same draws, so the curve is smooth; the band is the 95 % interval of the sampling.",
          ),
          await chartFigure(
            sizeFactorsChart(size, display),
            "One calculation a point, with every uncertain value at its mean.",
          ),
        ]
      : [
          await chartFigure(
            contour,
            size.target === undefined
              ? "Stronger colour is surer."
              : "Stronger colour is surer; along the dashed line the target is met, between neighbouring cells by a straight line.",
          ),
        ];
  return section(
    "size",
    `Another ${[size, ...(size.second === undefined ? [] : [size.second])].map(({ label }) => lower(label)).join(" and ")}`,
    ...unfinished,
    ...answer(size, display).map((sentence) => paragraph(sentence)),
    ...figures,
  );
}

const lower = (label: string): string => label.charAt(0).toLowerCase() + label.slice(1);
