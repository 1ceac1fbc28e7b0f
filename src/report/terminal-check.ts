import type { CheckResult, SheetLine } from "../results.ts";
import type { Study } from "../study/study.ts";
import { capitalised, type Display, displayIn, limitStateWords } from "./display.ts";
import { significant, threeFigures } from "./number.ts";
import { textTable, wrap } from "./table.ts";
import { closing, heading, type TerminalOptions } from "./terminal.ts";

/** `toehold check` for reading: factors of safety, base, forces, the calculation, notes, cautions. */
export function terminalCheck(result: CheckResult, study: Study, options: TerminalOptions): string {
  const display = displayIn(study.units);
  return [
    heading(result.study, options),
    ...wrap(
      `One calculation, with ${result.at === "mean" ? "every uncertain value at its mean" : `the uncertain values at: ${result.at}`}.`,
      options.width,
    ),
    "",
    factorTable(result, display, options),
    "",
    ...sentences(result, options),
    "",
    heading(
      "Forces per metre run, about the tip of the toe".replace("metre", study.units === "us" ? "foot" : "metre"),
      options,
    ),
    forceTable(result, display, options),
    "",
    heading("Base", options),
    ...baseLines(result, display),
    "",
    heading("Calculation", options),
    sheetText(result.sheet, display, options),
    "",
    closing(result.warnings, result.cautions, options),
    "",
  ].join("\n");
}

function factorTable(result: CheckResult, display: Display, { width }: TerminalOptions): string {
  const rows = Object.entries(result.limitStates).map(([name, state]) => [
    capitalised(limitStateWords[name] ?? name),
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

function sentences(result: CheckResult, { width }: TerminalOptions): string[] {
  const failing = Object.entries(result.limitStates).filter(([, state]) => state.factorOfSafety < 1);
  const lost = result.marks.includes("lost_contact") ? ["The base has lost contact at these values."] : [];
  const words = failing.map(([name]) => limitStateWords[name] ?? name);
  const verdict =
    failing.length === 0
      ? "At these values the calculation finds every factor above 1. That alone says nothing about how sure anyone is: `toehold assess` does."
      : `At these values the wall fails by ${words.join(" and ")}.`;
  return [...lost, verdict].flatMap((sentence) => wrap(sentence, width));
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

function baseLines(result: CheckResult, display: Display): string[] {
  const { base } = result;
  const lines = [
    `Vertical force N′ ${display.quantity(base.vertical, "kN/m")}, driving force E ${display.quantity(base.horizontal, "kN/m")}`,
  ];
  if (base.resultantX !== null && base.eccentricity !== null)
    lines.push(
      `Resultant ${display.quantity(base.resultantX, "m")} from the toe, eccentricity ${display.quantity(base.eccentricity, "m")}, effective width ${display.quantity(base.effectiveWidth, "m")}`,
    );
  if (base.pressureToe !== null && base.pressureHeel !== null)
    lines.push(
      `Pressure under the base ${display.quantity(base.pressureToe, "kPa")} at the toe, ${display.quantity(base.pressureHeel, "kPa")} at the heel`,
    );
  return lines;
}

/** The calculation sheet, block by block: symbol = formula = numbers = result, and what it is. */
export function sheetText(sheet: readonly SheetLine[], display: Display, options: TerminalOptions): string {
  const lines: string[] = [];
  let block = "";
  for (const line of sheet) {
    if (line.heading !== block) {
      block = line.heading;
      lines.push("", `  ${block}`);
    }
    const value = line.unit === "–" ? threeFigures(line.value) : display.quantity(line.value, line.unit);
    const formula = [line.formula, ...(line.substituted === "" ? [] : [line.substituted])].join(" = ");
    const source = line.source === undefined ? "" : ` [${line.source}]`;
    lines.push(...wrap(`    ${line.symbol} = ${formula} = ${value}`, options.width, "        "));
    lines.push(...wrap(`        ${line.text}${source}`, options.width, "        "));
  }
  const units =
    display.units === "us"
      ? ["", "  Numbers put in are in m, kN and kPa; results are shown in the study's units."]
      : [];
  return [...lines, ...units].join("\n");
}
