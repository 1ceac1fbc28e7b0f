import type { ReportInput } from "../../results.ts";
import type { Notice } from "../../study/study.ts";
import { escapeHtml } from "../escape.ts";
import { bullets, type PageSection, paragraph, section } from "../markup.ts";
import { grouped, threeFigures } from "../number.ts";

/** What the program noticed on the way; nothing where it noticed nothing. */
export function notesSection({ assess, check }: ReportInput): PageSection | undefined {
  const notes = distinct([...assess.warnings, ...check.warnings]);
  if (notes.length === 0) return undefined;
  const items = notes.map(
    ({ path, message }) => `<li>${path === "" ? "" : `<code>${escapeHtml(path)}</code>: `}${escapeHtml(message)}</li>`,
  );
  return section("notes", "Notes", `<ul>${items.join("")}</ul>`);
}

function distinct(notes: readonly Notice[]): readonly Notice[] {
  const seen = new Map(notes.map((note) => [`${note.path} ${note.message}`, note]));
  return [...seen.values()];
}

export function cautionsSection({ assess }: ReportInput): PageSection {
  return section("cautions", "Cautions", bullets(assess.cautions));
}

/** Version, seed and size of the run: what it takes to get the same numbers again. */
export function colophon({ assess: { run, seed } }: ReportInput): string {
  const seconds = run.sampling.seconds > 0 ? ` in ${threeFigures(run.sampling.seconds)} s` : "";
  const parts = [
    `toehold ${run.version}`,
    `seed “${seed}”`,
    `${grouped(run.sampling.evaluations)} samples${seconds}`,
    ...(run.complete ? [] : ["stopped before the end"]),
  ];
  return `<footer>${paragraph(parts.join(" · "))}${paragraph("The same study, seed and version give the same numbers on any computer.")}</footer>`;
}
