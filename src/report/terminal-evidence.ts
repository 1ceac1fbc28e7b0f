import type { EvidenceResult } from "../results-decision.ts";
import type { Display } from "./display.ts";
import { oneIn, probabilityText } from "./number.ts";
import { textTable, wrap } from "./table.ts";

/** What has been seen on site: beliefs before and after side by side, and what it does to the probability. */
export function evidenceText(evidence: EvidenceResult, yearly: boolean, display: Display, width: number): string {
  const rows = evidence.variables.map((one) => [
    one.label,
    display.unit(one.unit),
    display.number(one.prior.mean, one.unit),
    display.number(one.prior.sd, one.unit),
    display.number(one.posterior.mean, one.unit),
    display.number(one.posterior.sd, one.unit),
  ]);
  const table = textTable(
    [
      { heading: "Variable" },
      { heading: "Unit", spare: 1 },
      { heading: "Mean before", align: "right" },
      { heading: "sd", align: "right" },
      { heading: "Mean after", align: "right" },
      { heading: "sd", align: "right" },
    ],
    rows,
    width,
  );
  const sentences = evidenceSentences(evidence, yearly);
  return `${table}\n${sentences.flatMap((sentence) => wrap(sentence, width, "  ")).join("\n")}`;
}

/**
 * The same in sentences, for the terminal and the page.
 *
 * @param yearly something in the study is yearly: the probabilities are of one year
 */
export function evidenceSentences(evidence: EvidenceResult, yearly: boolean): readonly string[] {
  const { priorProbability, probability, chanceOfEvidence, conflicts } = evidence;
  return [
    `What has been seen moves the probability of failure${yearly ? " in one year" : ""} from ${oneIn(priorProbability)} to ${oneIn(probability)}.`,
    ...(chanceOfEvidence === null
      ? []
      : [
          `Before it was seen, the chance of standing all that the wall has stood was ${probabilityText(chanceOfEvidence)}: ${lessonOf(chanceOfEvidence)}.`,
        ]),
    ...conflicts.map((conflict) => `Conflict: ${conflict.message}.`),
  ];
}

function lessonOf(chance: number): string {
  if (chance > 0.9) return "that it stood was to be expected, and teaches little about its strength as a whole";
  if (chance > 0.1) return "that it stood says something about its strength";
  return "that it stood was not to be expected, and says much about its strength, or that the beliefs were too dark";
}

/** Which results follow the evidence, and which the beliefs before it. */
export const beforeAndAfter =
  "With evidence in the study, sampled probabilities and the best estimate follow what is believed after it; the factor at the means, shares of variance, first- and second-order results, hand methods, their drawings and fragility curves describe the beliefs before it.";
