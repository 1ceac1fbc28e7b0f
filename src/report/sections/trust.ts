import type { ReportInput } from "../../results.ts";
import { escapeHtml } from "../escape.ts";
import { paragraph, section } from "../markup.ts";
import { grouped, threeFigures } from "../number.ts";

/** How far the number can be trusted: what is in it and what is not. */
export function trustSection({ assess, study }: ReportInput): string {
  const { factors } = study.model;
  const uncertain = [
    ["earth thrust", factors.earthThrust],
    ["base resistance", factors.baseResistance],
    ["bearing capacity", factors.bearingCapacity],
  ]
    .filter(([, factor]) => typeof factor !== "number")
    .map(([name]) => name);
  const model =
    uncertain.length === 0
      ? "Model uncertainty is not in it: the formulas were taken as exact, which they are not. A factor on the earth thrust and on the bearing capacity would widen the spread and mostly raise the probability."
      : `Model uncertainty is in it for the ${uncertain.join(" and the ")}: the formulas there carry a factor of their own with a spread.`;
  const { failures } = assess.system.monteCarlo;
  const points = [
    model,
    `The interval tells how well the sampling found the probability of this model (${grouped(failures)} failing samples), not how well the model describes the site.`,
    "A small probability rests on the tails of the distributions, which no handful of tests has seen. Its order of magnitude means more than its digits.",
    "It is for one section. A long wall crosses many, and is likelier to fail somewhere.",
    "Human error in design, building and use is not in it, and is behind many real failures.",
    "Unknowns that were not put in as uncertain were taken as certain.",
  ];
  return section(
    "trust",
    "How far to trust this number",
    `<ul>${points.map((point) => `<li>${escapeHtml(point)}</li>`).join("")}</ul>`,
  );
}

/** Notes, cautions, version and seed. */
export function closingSection({ assess, check }: ReportInput): string {
  const seen = new Set<string>();
  const notes = [...assess.warnings, ...check.warnings].filter(({ path, message }) => {
    const key = `${path} ${message}`;
    if (seen.has(key)) return false;
    seen.add(key);
    return true;
  });
  const list = notes
    .map(
      ({ path, message }) =>
        `<li>${path === "" ? "" : `<code>${escapeHtml(path)}</code>: `}${escapeHtml(message)}</li>`,
    )
    .join("");
  const { run } = assess;
  const seconds = run.sampling.seconds > 0 ? `, ${threeFigures(run.sampling.seconds)} s of sampling` : "";
  return `${notes.length === 0 ? "" : section("notes", "Notes", `<ul>${list}</ul>`)}${section("cautions", "Cautions", `<ul class="cautions">${assess.cautions.map((caution) => `<li>${escapeHtml(caution)}</li>`).join("")}</ul>`)}<footer>${paragraph(`toehold ${run.version} · seed “${assess.seed}” · ${grouped(run.sampling.evaluations)} samples${seconds}${run.complete ? "" : " · stopped before the end"}`)}</footer>`;
}
