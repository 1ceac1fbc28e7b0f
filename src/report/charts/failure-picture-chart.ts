import type { AssessResult, FailurePicture, VariableSummary } from "../../results.ts";
import type { Display } from "../display.ts";
import { grouped, shiftText } from "../number.ts";
import { markWords } from "../page-svg.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";
import { shortened } from "../shortened.ts";

/** Pictures of one chart: three in a row, two rows. */
const mostPictures = 6;
const believed = "as believed";
const failing = "among failures";
/** A bin that holds less than this is not worth the room, unless the other side fills it. */
const leastBelieved = 2e-3;
const leastFailing = 5e-3;

interface Shifted {
  readonly picture: FailurePicture;
  readonly variable: VariableSummary;
  readonly shift: number;
}

/** Small pictures: each unknown as believed and as found among the failures; those that shift most. */
export function failurePictureChart(
  result: AssessResult,
  pictures: readonly FailurePicture[],
  display: Display,
): Chart | undefined {
  const shown = shiftedMost(result, pictures);
  if (shown.length === 0) return undefined;
  const words = shown
    .slice(0, 3)
    .map(
      ({ variable, shift, picture }) =>
        `${variable.label}: mean ${display.quantity(picture.meanGivenFailure, variable.unit)} among failures, ${display.quantity(variable.mean, variable.unit)} as believed (${shiftText(shift)} standard deviations)`,
    );
  return {
    id: "failure-picture",
    title: "The unknowns as believed, and among the samples in which the wall fails",
    alternative: `${words.join("; ")}. From ${grouped(shown[0].picture.failures)} failing samples.`,
    spec: {
      concat: shown.map((one) => panel(one, display)),
      columns: 3,
      spacing: { row: 22, column: 42 },
    },
  };
}

function shiftedMost({ variables }: AssessResult, pictures: readonly FailurePicture[]): readonly Shifted[] {
  const byPath = new Map(variables.map((variable) => [variable.path, variable]));
  return pictures
    .flatMap((picture): readonly Shifted[] => {
      const variable = byPath.get(picture.path);
      if (variable === undefined || !(variable.sd > 0)) return [];
      return [{ picture, variable, shift: (picture.meanGivenFailure - variable.mean) / variable.sd }];
    })
    .sort((a, b) => Math.abs(b.shift) - Math.abs(a.shift))
    .slice(0, mostPictures);
}

function panel({ picture, variable, shift }: Shifted, display: Display): object {
  const factor = display.factor(variable.unit);
  const unit = display.unit(variable.unit);
  const values = [
    ...steps(picture, "prior").map(({ x, y }) => ({ x: x * factor, y, which: believed })),
    ...steps(picture, "givenFailure").map(({ x, y }) => ({ x: x * factor, y, which: failing })),
  ];
  const mean = (value: number): string => display.quantity(value, variable.unit);
  const tip = `${variable.label}: mean ${mean(variable.mean)} as believed, ${mean(picture.meanGivenFailure)} among failures`;
  return {
    data: { values },
    width: 254,
    height: 92,
    title: {
      text: `${shortened(variable.label, 32)}${unit === "–" ? "" : `, ${unit}`}`,
      subtitle: `shifts by ${shiftText(shift)} standard deviations`,
      subtitleColor: palette.muted,
      subtitleFontSize: 11.5,
      offset: 6,
    },
    mark: { type: "area", interpolate: "step-after", line: { strokeWidth: 1.5 }, fillOpacity: 0.5 },
    encoding: {
      x: {
        field: "x",
        type: "quantitative",
        scale: { zero: false, nice: false },
        axis: { title: null, tickCount: 5, grid: false },
      },
      y: { field: "y", type: "quantitative", stack: null, axis: null },
      color: {
        field: "which",
        type: "nominal",
        legend: { title: null, symbolType: "square", symbolOpacity: 1 },
        scale: { domain: [believed, failing], range: [palette.main, palette.fail] },
      },
      description: { value: markWords(tip) },
    },
  };
}

/** Density as steps: share over width of each bin, without the empty tails of both. */
function steps(picture: FailurePicture, key: "prior" | "givenFailure"): readonly { x: number; y: number }[] {
  const { edges, prior, givenFailure } = picture;
  const holds = (bin: number): boolean => prior[bin] > leastBelieved || givenFailure[bin] > leastFailing;
  const bins = prior.map((_, bin) => bin);
  const first = bins.find(holds) ?? 0;
  const last = bins.findLast(holds) ?? prior.length - 1;
  const rows = bins.slice(first, last + 1).flatMap((bin) => {
    const width = edges[bin + 1] - edges[bin];
    return width > 1e-12 * Math.max(1, Math.abs(edges[bin])) ? [{ x: edges[bin], y: picture[key][bin] / width }] : [];
  });
  return rows.length === 0 ? [] : [...rows, { x: edges[last + 1], y: 0 }];
}
