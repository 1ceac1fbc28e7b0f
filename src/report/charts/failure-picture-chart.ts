import type { AssessResult, FailurePicture } from "../../results.ts";
import { capitalised, type Display } from "../display.ts";
import { significant } from "../number.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";
import { shortened } from "./labels.ts";

/** Small pictures: each unknown as believed and as found among the failures; those that shift most. */
export function failurePictureChart(
  result: AssessResult,
  pictures: readonly FailurePicture[],
  display: Display,
): Chart | undefined {
  if (pictures.length === 0) return undefined;
  const variables = new Map(result.variables.map((variable) => [variable.path, variable]));
  const shiftOf = (picture: FailurePicture): number => {
    const variable = variables.get(picture.path);
    return variable === undefined || variable.sd === 0 ? 0 : (picture.meanGivenFailure - variable.mean) / variable.sd;
  };
  const shown = [...pictures].sort((a, b) => Math.abs(shiftOf(b)) - Math.abs(shiftOf(a))).slice(0, 6);
  const charts = shown.map((picture) => {
    const variable = variables.get(picture.path);
    const unit = variable?.unit ?? "–";
    const factor = display.factor(unit);
    const values = (["prior", "givenFailure"] as const).flatMap((key) =>
      steps(picture, key).map(({ x, y }) => ({
        x: x * factor,
        y,
        which: key === "prior" ? "as believed" : "among failures",
      })),
    );
    const name = display.unit(unit) === "–" ? "" : `, ${display.unit(unit)}`;
    return {
      data: { values },
      width: 165,
      height: 90,
      title: { text: shortened(variable?.label ?? picture.path, 34), fontSize: 12, fontWeight: 500 },
      mark: { type: "area", interpolate: "step-after", opacity: 0.55, line: true },
      encoding: {
        x: {
          field: "x",
          type: "quantitative",
          title: `Value${name}`,
          scale: { zero: false, nice: false },
          axis: { tickCount: 4, grid: false },
        },
        y: { field: "y", type: "quantitative", title: null, stack: null, axis: null },
        color: {
          field: "which",
          type: "nominal",
          title: null,
          scale: { domain: ["as believed", "among failures"], range: [palette.soft, palette.fail] },
        },
      },
    };
  });
  const words = shown
    .slice(0, 3)
    .map(
      (picture) =>
        `${variables.get(picture.path)?.label ?? picture.path} shifts by ${significant(shiftOf(picture), 2)} standard deviations`,
    );
  return {
    id: "failure-picture",
    title: "The unknowns as believed, and among the samples in which the wall fails",
    alternative: `${capitalised(words.join("; "))}.`,
    spec: { concat: charts, columns: 3, spacing: 26 },
  };
}

/** Density as steps: share over width of each bin of finite width. */
function steps(picture: FailurePicture, key: "prior" | "givenFailure"): readonly { x: number; y: number }[] {
  const { edges } = picture;
  const rows = picture[key].flatMap((share, bin) => {
    const width = edges[bin + 1] - edges[bin];
    return width > 1e-12 * Math.max(1, Math.abs(edges[bin])) && bin >= 6 && bin < picture[key].length - 6
      ? [{ x: edges[bin], y: share / width, end: edges[bin + 1] }]
      : [];
  });
  const last = rows.at(-1);
  return last === undefined ? [] : [...rows.map(({ x, y }) => ({ x, y })), { x: last.end, y: 0 }];
}
