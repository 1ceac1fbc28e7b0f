import type { ReportInput } from "../results.ts";
import { type Display, displayIn } from "./display.ts";
import { escapeHtml } from "./escape.ts";
import type { PageSection } from "./markup.ts";
import { pageScript } from "./page-script.ts";
import { contentPolicy } from "./policy.ts";
import { answerSection } from "./sections/answer.ts";
import { calculationSection } from "./sections/calculation.ts";
import { cautionsSection, colophon, notesSection } from "./sections/closing.ts";
import { computedSection } from "./sections/computed.ts";
import { decisionSection } from "./sections/decision.ts";
import { designSection } from "./sections/design.ts";
import { driversSection } from "./sections/drivers.ts";
import { evidenceSection } from "./sections/evidence.ts";
import { inputsSection } from "./sections/inputs.ts";
import { sizeSection } from "./sections/size.ts";
import { trustSection } from "./sections/trust.ts";
import { wallSection } from "./sections/wall.ts";
import { pageStyle } from "./style.ts";

/** A part of the page; nothing where the study gives it nothing to say. */
export type SectionMaker = (
  input: ReportInput,
  display: Display,
) => PageSection | undefined | Promise<PageSection | undefined>;

/** The page from top to bottom: a new section is a file in sections/ and a line here. */
const sections: readonly SectionMaker[] = [
  answerSection,
  decisionSection,
  evidenceSection,
  wallSection,
  driversSection,
  sizeSection,
  computedSection,
  calculationSection,
  designSection,
  inputsSection,
  trustSection,
  notesSection,
  cautionsSection,
];

/**
 * One page that opens with the answer, works offline, prints, and reads as well with scripts off.
 *
 * Nothing can be fetched and no foreign code can run: the page's own style sheet and script are named by hash in its
 * Content-Security-Policy. Everything that comes from the study is escaped.
 */
export async function htmlReport(input: ReportInput): Promise<string> {
  const display = displayIn(input.study.units);
  const made: PageSection[] = [];
  for (const make of sections) {
    const part = await make(input, display);
    if (part !== undefined) made.push(part);
  }
  const title = escapeHtml(input.study.title);
  const style = pageStyle(input.study.title);
  const policy = await contentPolicy(style, pageScript);
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta http-equiv="Content-Security-Policy" content="${escapeHtml(policy)}">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="generator" content="toehold ${escapeHtml(input.assess.run.version)}">
<title>${title}: stability of a retaining wall</title>
<style>${style}</style>
</head>
<body>
<div class="page">
<a class="skip" href="#answer">Skip to the answer</a>
<header>
<p class="kicker">Stability of a retaining wall, with its probability of failure</p>
<h1>${title}</h1>
${input.study.notes === "" ? "" : `<p class="notes">${escapeHtml(input.study.notes)}</p>`}
</header>
${contents(made)}
<main>
${made.map((part) => part.html).join("\n")}
</main>
${colophon(input)}
</div>
<script>${pageScript}</script>
</body>
</html>
`;
}

function contents(made: readonly PageSection[]): string {
  const items = made.map(({ id, title }) => `<li><a href="#${id}">${escapeHtml(title)}</a></li>`);
  return `<nav class="contents" aria-label="Contents"><ol>${items.join("")}</ol></nav>`;
}
