import type { ReportInput } from "../../results.ts";
import type { EvidenceResult } from "../../results-decision.ts";
import { chartFigure } from "../chart-figure.ts";
import { beliefsChart } from "../charts/beliefs-chart.ts";
import { evidenceChart } from "../charts/evidence-chart.ts";
import type { Display } from "../display.ts";
import { htmlTable, type PageSection, paragraph, section } from "../markup.ts";
import { beforeAndAfter, evidenceSentences } from "../terminal-evidence.ts";

/** What has been seen on site and what it teaches; nothing where the study has no evidence. */
export async function evidenceSection({ assess }: ReportInput, display: Display): Promise<PageSection | undefined> {
  const { evidence } = assess;
  if (evidence === undefined) return undefined;
  const yearly = assess.system.period !== undefined;
  const conflicts = evidence.conflicts.length;
  const sentences = evidenceSentences(evidence, yearly);
  return section(
    "evidence",
    "What has been seen on site",
    ...sentences.map((sentence, k) => paragraph(sentence, k >= sentences.length - conflicts ? "callout" : "")),
    await chartFigure(
      evidenceChart(evidence, yearly),
      "The wider mark is the 95 % interval of the sampling; it says nothing of how sure the beliefs are.",
    ),
    await chartFigure(
      beliefsChart(evidence, display),
      "Bars reach one standard deviation to either side of the mean. An unknown whose bar has not moved was taught nothing.",
    ),
    beliefTable(evidence, display),
    paragraph(beforeAndAfter, "quiet"),
  );
}

function beliefTable({ variables }: EvidenceResult, display: Display): string {
  const rows = variables.map(({ label, unit, prior, posterior }) => [
    label,
    display.quantity(prior.mean, unit),
    display.quantity(prior.sd, unit),
    display.quantity(posterior.mean, unit),
    display.quantity(posterior.sd, unit),
  ]);
  return htmlTable(
    [
      { heading: "Unknown" },
      { heading: "Mean before", numeric: true },
      { heading: "Standard deviation", numeric: true },
      { heading: "Mean after", numeric: true },
      { heading: "Standard deviation", numeric: true },
    ],
    rows,
    { caption: "Of each value itself, what cannot be learned included." },
  );
}
