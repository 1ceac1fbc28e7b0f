import type { ReportInput } from "../../results.ts";
import type { Study } from "../../study/study.ts";
import { bullets, type PageSection, section } from "../markup.ts";
import { grouped } from "../number.ts";
import { orList, wallEstimate } from "../wording.ts";

/** How far the number can be trusted: what is in it and what is not. */
export function trustSection({ assess, study }: ReportInput): PageSection {
  const { counted } = wallEstimate(assess);
  const from = counted === undefined ? "" : ` (from ${grouped(counted.failures)} failures seen)`;
  return section(
    "trust",
    "How far to trust this number",
    bullets([
      modelUncertainty(study),
      `The interval tells how well the sampling found the probability of this model${from}, not how well the model describes the site.`,
      "A small probability rests on the tails of the distributions, which no handful of tests has seen. Its order of magnitude means more than its digits.",
      "It is for one section. A long wall crosses many, and is likelier to fail somewhere along its length.",
      "Human error in design, building and use is not in it, and is behind many real failures.",
      "Everything that was not put in as uncertain was taken as certain.",
    ]),
  );
}

function modelUncertainty({ model: { factors }, assessment }: Study): string {
  const named = [
    ["earth thrust", factors.earthThrust],
    ["base resistance", factors.baseResistance],
    ["bearing capacity", factors.bearingCapacity],
    ...(assessment.limitStates.includes("deep_seated") ? [["deep-seated failure", factors.deepSeated] as const] : []),
  ] as const;
  const uncertain = named.flatMap(([name, factor]) => (typeof factor === "number" ? [] : [name]));
  const exact = named.flatMap(([name, factor]) => (typeof factor === "number" ? [name] : []));
  if (uncertain.length === 0)
    return "Model uncertainty is not in it: the formulas were taken as exact, which they are not. Factors on the earth thrust, the base resistance and the bearing capacity would widen the spread and mostly raise the probability.";
  const rest = exact.length === 0 ? "" : ` The ${orList(exact, "and the")} were taken as the formulas give them.`;
  return `Model uncertainty is in it for the ${orList(uncertain, "and the")}: there the formulas carry a factor of their own with a spread.${rest.replace(/were(?= taken)/, exact.length === 1 ? "was" : "were")}`;
}
