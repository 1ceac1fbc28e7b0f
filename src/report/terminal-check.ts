import type { CheckResult, SheetLine } from "../results.ts";
import type { Study } from "../study/study.ts";
import { type Display, displayIn, limitStateName, limitStateWords } from "./display.ts";
import { significant, threeFigures } from "./number.ts";
import { sheetBlocks } from "./sheet-blocks.ts";
import { textTable, wrap } from "./table.ts";
import { closing, heading, leastWidth, paragraphLines, type TerminalOptions, terminalSafe, title } from "./terminal.ts";
import { designText } from "./terminal-design.ts";
import { orList } from "./wording.ts";

/** `toehold check` for reading: factors of safety, base, forces, the calculation, notes, cautions. */
export function terminalCheck(result: CheckResult, study: Study, options: TerminalOptions): string {
  const display = displayIn(study.units);
  const run = study.units === "us" ? "foot" : "metre";
  const blocks = [
    [...title(result.study, options), ...paragraphLines([valuesSentence(result)], options)],
    [factorTable(result, display, options)],
    paragraphLines(verdicts(result), options),
    ...(result.design === undefined ? [] : [designText(result.design, result.limitStates, display, options)]),
    [heading(`Forces per ${run} run, about the tip of the toe`, options), forceTable(result, display, options)],
    [heading("Base", options), ...paragraphLines(baseSentences(result, display), options)],
    [heading("Calculation", options) + sheetText(result.sheet, display, options)],
    [closing(result.warnings, result.cautions, options)],
  ];
  return terminalSafe(`${blocks.map((block) => block.join("\n")).join("\n\n")}\n`);
}

const valuesSentence = ({ at }: CheckResult): string =>
  `One calculation, with ${at === "mean" ? "every uncertain value at its mean" : `the uncertain values at: ${at}`}.`;

function factorTable(result: CheckResult, display: Display, { width }: TerminalOptions): string {
  const rows = Object.entries(result.limitStates).map(([name, state]) => [
    limitStateName(name),
    significant(state.factorOfSafety, 3),
    display.quantity(state.resisting, state.unit),
    display.quantity(state.driving, state.unit),
  ]);
  return textTable(
    [
      { heading: "Limit state" },
      { heading: "Factor of safety", align: "right" },
      { heading: "Resisting", align: "right", spare: 2 },
      { heading: "Driving", align: "right", spare: 1 },
    ],
    rows,
    width,
  );
}

function verdicts(result: CheckResult): readonly string[] {
  const failing = Object.entries(result.limitStates).filter(([, state]) => state.factorOfSafety < 1);
  const lost = result.marks.includes("lost_contact") ? ["The base has lost contact at these values."] : [];
  const steep = result.marks.includes("slope_unstable")
    ? ["The slope behind is steeper than its soil can bear at these values."]
    : [];
  const verdict =
    failing.length === 0
      ? "At these values the calculation finds every factor above 1. That alone says nothing about how sure anyone is: `toehold assess` does."
      : `At these values the wall fails by ${orList(
          failing.map(([name]) => limitStateWords[name] ?? name),
          "and",
        )}.`;
  return [...lost, ...steep, verdict];
}

function forceTable(result: CheckResult, display: Display, { width }: TerminalOptions): string {
  const rows = result.forces.map((force) => [
    force.name,
    display.number(force.horizontal, "kN/m"),
    display.number(force.vertical, "kN/m"),
    display.number(force.x, "m"),
    display.number(force.z, "m"),
  ]);
  return textTable(
    [
      { heading: "Force" },
      { heading: `Horizontal, ${display.unit("kN/m")}`, align: "right" },
      { heading: `Vertical, ${display.unit("kN/m")}`, align: "right" },
      { heading: `x, ${display.unit("m")}`, align: "right", spare: 2 },
      { heading: `z, ${display.unit("m")}`, align: "right", spare: 1 },
    ],
    rows,
    width,
  );
}

/** What arrives at the underside, and how it is spread there. */
export function baseSentences({ base }: CheckResult, display: Display): readonly string[] {
  const place =
    base.resultantX === null || base.eccentricity === null
      ? "The resultant misses the base."
      : `The resultant passes ${display.quantity(base.resultantX, "m")} from the toe: eccentricity ${display.quantity(base.eccentricity, "m")}, effective width ${display.quantity(base.effectiveWidth, "m")}.`;
  const pressures =
    base.pressureToe === null || base.pressureHeel === null
      ? []
      : [
          `Pressure under the toe ${display.quantity(base.pressureToe, "kPa")}, under the heel ${display.quantity(base.pressureHeel, "kPa")}.`,
        ];
  return [
    `On the base act ${display.quantity(base.vertical, "kN/m")} vertically (less the uplift) and ${display.quantity(base.horizontal, "kN/m")} horizontally (without passive resistance).`,
    place,
    ...pressures,
  ];
}

/** The calculation sheet, block by block: symbol = formula = numbers = result, and what it is. */
export function sheetText(sheet: readonly SheetLine[], display: Display, options: TerminalOptions): string {
  const width = Math.max(options.width, leastWidth);
  const lines = sheetBlocks(sheet).flatMap((block) => [
    "",
    ...wrap(`  ${block.heading}`, width, "    "),
    ...block.lines.flatMap((line) => sheetLines(line, display, width)),
  ]);
  const units =
    display.units === "us"
      ? ["", ...wrap("  Numbers put in are in m, kN and kPa; results are in the study's units.", width, "  ")]
      : [];
  return ["", ...lines.slice(1), ...units].join("\n");
}

function sheetLines(line: SheetLine, display: Display, width: number): readonly string[] {
  const value = line.unit === "–" ? threeFigures(line.value) : display.quantity(line.value, line.unit);
  const numbers = line.substituted === "" || line.substituted === line.formula ? "" : ` = ${line.substituted}`;
  const source = line.source === undefined ? "" : ` [${line.source}]`;
  return [
    ...wrap(`    ${line.symbol} = ${line.formula}${numbers} = ${value}`, width, "        "),
    ...wrap(`        ${line.text}${source}`, width, "        "),
  ];
}
