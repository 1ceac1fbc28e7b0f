import type { ReportInput } from "../results.ts";
import { displayIn } from "./display.ts";
import { escapeHtml } from "./escape.ts";
import { answerSection } from "./sections/answer.ts";
import { computedSection } from "./sections/computed.ts";
import { driversSection } from "./sections/drivers.ts";
import { inputsSection } from "./sections/inputs.ts";
import { closingSection, trustSection } from "./sections/trust.ts";
import { wallSection } from "./sections/wall.ts";
import { pageStyle } from "./style.ts";

/**
 * One page that opens with the answer, works offline and prints.
 *
 * The page holds no script and asks for nothing: its Content-Security-Policy allows styles written in it, and nothing else.
 * Everything that comes from the study is escaped.
 */
export async function htmlReport(input: ReportInput): Promise<string> {
  const display = displayIn(input.study.units);
  const sections = [
    await answerSection(input),
    wallSection(input, display),
    await driversSection(input, display),
    await computedSection(input, display),
    inputsSection(input, display),
    trustSection(input),
    closingSection(input),
  ];
  const policy = "default-src 'none'; style-src 'unsafe-inline'; base-uri 'none'; form-action 'none'";
  const title = escapeHtml(input.study.title);
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta http-equiv="Content-Security-Policy" content="${escapeHtml(policy)}">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="generator" content="toehold ${escapeHtml(input.assess.run.version)}">
<title>${title}: stability of a retaining wall</title>
<style>${pageStyle}</style>
</head>
<body>
<header>
<p class="kicker">Stability of a retaining wall, with its probability of failure</p>
<h1>${title}</h1>
${input.study.notes === "" ? "" : `<p class="quiet">${escapeHtml(input.study.notes)}</p>`}
</header>
<main>
${sections.join("\n")}
</main>
</body>
</html>
`;
}
