import type { ReportInput } from "../../results.ts";
import { designSentences, designStates, factorSentences, forceFactorTable } from "../design-words.ts";
import { displayIn, limitStateName } from "../display.ts";
import { bullets, htmlTable, type PageSection, paragraph, section } from "../markup.ts";
import { probabilityText, significant } from "../number.ts";

/** The check with the user's partial factors, beside the plain one and the probability; undefined where no factors were given. */
export function designSection({ check, assess, study }: ReportInput): PageSection | undefined {
  const { design } = check;
  if (design === undefined) return undefined;
  const display = displayIn(study.units);
  const states = designStates(design);
  const { headings, rows } = forceFactorTable(design);
  const [what, caveat] = designSentences(design);
  return section(
    "design",
    "With partial factors",
    paragraph(what),
    htmlTable(
      [
        { heading: "Limit state" },
        { heading: "Plain factor of safety", numeric: true },
        { heading: "Design ratio", numeric: true },
        { heading: "Design resistance", numeric: true },
        { heading: "Design action", numeric: true },
        { heading: "Probability of failure", numeric: true },
      ],
      states.map(([name, state]) => {
        const counted = assess.limitStates[name as keyof typeof assess.limitStates]?.monteCarlo;
        return [
          limitStateName(name),
          significant(check.limitStates[name as keyof typeof check.limitStates]?.factorOfSafety ?? Number.NaN, 3),
          significant(state.ratio, 3),
          display.quantity(state.resisting, state.unit),
          display.quantity(state.driving, state.unit),
          counted === undefined ? "–" : counted.failures === 0 ? "none seen" : probabilityText(counted.probability),
        ];
      }),
      { states: states.map(([name]) => name) },
    ),
    bullets(factorSentences(design.factors)),
    headings.length === 0
      ? ""
      : htmlTable(
          [{ heading: "Force, and its factor in" }, ...headings.map((heading) => ({ heading, numeric: true }))],
          rows,
        ),
    paragraph(`Factors from ${design.file}. ${caveat}`, "quiet"),
  );
}
