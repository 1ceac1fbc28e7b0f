import type { DesignResult } from "../results-design.ts";
import { designSentences, designStates, factorSentences, forceFactorTable } from "./design-words.ts";
import { type Display, limitStateName } from "./display.ts";
import { significant } from "./number.ts";
import { textTable } from "./table.ts";
import { heading, paragraphLines, type TerminalOptions } from "./terminal.ts";

/** What stands beside a limit state: its plain factor of safety and, from an assessment, its probability of failure. */
export interface Beside {
  readonly factorOfSafety: number;
  readonly probability?: string;
}

/** The check with partial factors beside the plain one, block by block. */
export function designText(
  design: DesignResult,
  beside: Readonly<Record<string, Beside | undefined>>,
  display: Display,
  options: TerminalOptions,
): readonly string[] {
  const { headings, rows } = forceFactorTable(design);
  const forces =
    headings.length === 0
      ? []
      : [
          "",
          textTable(
            [
              { heading: "Force, and its factor in" },
              ...headings.map((name) => ({ heading: name, align: "right" as const })),
            ],
            rows,
            options.width,
          ),
        ];
  return [
    heading(`With the partial factors of ${design.file}`, options),
    stateTable(design, beside, display, options),
    "",
    ...paragraphLines([...designSentences(design), ...factorSentences(design.factors)], options),
    ...forces,
  ];
}

function stateTable(
  design: DesignResult,
  beside: Readonly<Record<string, Beside | undefined>>,
  display: Display,
  { width }: TerminalOptions,
): string {
  const likely = Object.values(beside).some((one) => one?.probability !== undefined);
  const rows = designStates(design).map(([name, state]) => [
    limitStateName(name),
    significant(beside[name]?.factorOfSafety ?? Number.NaN, 3),
    significant(state.ratio, 3),
    display.quantity(state.resisting, state.unit),
    display.quantity(state.driving, state.unit),
    ...(likely ? [beside[name]?.probability ?? "–"] : []),
  ]);
  return textTable(
    [
      { heading: "Limit state" },
      { heading: "Plain factor", align: "right" },
      { heading: "Design ratio", align: "right" },
      { heading: "Design resistance", align: "right", spare: 2 },
      { heading: "Design action", align: "right", spare: 2 },
      ...(likely ? [{ heading: "Probability", align: "right" as const }] : []),
    ],
    rows,
    width,
  );
}
