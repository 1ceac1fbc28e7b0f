import type { SizeResult } from "../results-size.ts";
import type { Study } from "../study/study.ts";
import { capitalised, type Display, displayIn, limitStateWords } from "./display.ts";
import { indexText, oneIn, probabilityText, significant } from "./number.ts";
import { textTable, wrap } from "./table.ts";
import { closing, heading, type TerminalOptions } from "./terminal.ts";

/** `toehold size` for reading: the value that meets the target, then the curve, or a table of indices where two vary. */
export function terminalSize(result: SizeResult, study: Study, options: TerminalOptions): string {
  const display = displayIn(study.units);
  const blocks = [
    [
      heading(result.study, options),
      ...answer(result, display).flatMap((sentence) => wrap(sentence, options.width, "  ")),
    ],
    [result.second === undefined ? curve(result, display, options) : contour(result, display, options)],
    wrap(
      `Sampling around the design points, ${result.run.sampling.evaluations} evaluations in all, seed “${result.seed}”; every point sees the same draws, so the curve is smooth. toehold ${result.run.version}.`,
      options.width,
    ),
    [closing(result.warnings, result.cautions, options)],
  ];
  return `${blocks.map((block) => block.join("\n")).join("\n\n")}\n`;
}

export function answer(result: SizeResult, display: Display): string[] {
  const { target, meetsTargetAt, atTarget } = result;
  if (result.second !== undefined) return [`${result.label} and ${result.second.label.toLowerCase()} vary together.`];
  if (target === undefined) return [`${result.label} varies; the study names no target (assessment.target).`];
  const aim = `the target of ${oneIn(target.probability)} (index ${indexText(target.reliabilityIndex)})`;
  if (meetsTargetAt === null || meetsTargetAt === undefined || atTarget === undefined) {
    const met = result.points.every((point) => point.probability <= target.probability);
    return [
      met
        ? `Every value of the range meets ${aim}.`
        : `No value of the range meets ${aim}; widen the range, or change something else.`,
    ];
  }
  const factors = Object.entries(atTarget.factorAtMean).map(
    ([name, factor]) => `${limitStateWords[name] ?? name} ${significant(factor ?? Number.NaN, 3)}`,
  );
  return [
    `${result.label}: ${display.quantity(meetsTargetAt, result.unit)} meets ${aim}; ${result.meetsTargetSide === "below" ? "lower" : "higher"} values are surer.`,
    `There the factors of safety at the means are: ${factors.join(", ")}. That is what the target amounts to for this wall and this ground.`,
  ];
}

function curve(result: SizeResult, display: Display, { width }: TerminalOptions): string {
  const states = Object.keys(result.points[0]?.factorAtMean ?? {});
  const rows = result.points.map((point) => [
    display.number(point.value, result.unit),
    oneIn(point.probability),
    probabilityText(point.probability),
    indexText(point.reliabilityIndex),
    ...states.map((name) =>
      significant(Object.entries(point.factorAtMean).find(([key]) => key === name)?.[1] ?? Number.NaN, 3),
    ),
  ]);
  return textTable(
    [
      { heading: `${result.label}, ${display.unit(result.unit)}` },
      { heading: "Probability", align: "right" },
      { heading: "as a number", align: "right", spare: 2 },
      { heading: "Index", align: "right" },
      ...states.map((name) => ({
        heading: `F ${capitalised(limitStateWords[name] ?? name)}`,
        align: "right" as const,
        spare: 3,
      })),
    ],
    rows,
    width,
  );
}

/** Indices over two dimensions: the first downwards, the second across. */
function contour(result: SizeResult, display: Display, { width }: TerminalOptions): string {
  const { second } = result;
  if (second === undefined) return "";
  const values = [...new Set(result.points.map((point) => point.value))];
  const across = [...new Set(result.points.map((point) => point.second ?? 0))];
  const index = (value: number, other: number): string =>
    indexText(result.points.find((point) => point.value === value && point.second === other)?.reliabilityIndex ?? null);
  const rows = values.map((value) => [
    display.number(value, result.unit),
    ...across.map((other) => index(value, other)),
  ]);
  const head = `${result.label}, ${display.unit(result.unit)} ↓   ${second.label}, ${display.unit(second.unit)} →`;
  return `Index of reliability\n${head}\n${textTable([{ heading: "" }, ...across.map((other, k) => ({ heading: display.number(other, second.unit), align: "right" as const, spare: k % 2 }))], rows, width)}`;
}
