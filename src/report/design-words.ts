/** A check with partial factors in words and rows, for the terminal and the page alike. */
import type { DesignLimitState } from "../mechanics/design-check.ts";
import type { PartialFactors } from "../mechanics/partial-factors.ts";
import type { DesignResult } from "../results-design.ts";
import { limitStateName, limitStateWords } from "./display.ts";
import { threeFigures } from "./number.ts";
import { orList } from "./wording.ts";

/** Limit states with their design results, in the order of the study. */
export function designStates({ limitStates }: DesignResult): readonly (readonly [string, DesignLimitState])[] {
  return Object.entries(limitStates);
}

/** What is compared, what came out, and what it is not. */
export function designSentences(design: DesignResult): readonly string[] {
  const below = designStates(design).filter(([, { ratio }]) => ratio < 1);
  const verdict =
    below.length === 0
      ? "With these factors every ratio is 1 or more."
      : `With these factors the ratio of ${orList(
          below.map(([name]) => limitStateWords[name] ?? name),
          "and",
        )} is below 1.`;
  return [
    `Design resistance over design action, with the uncertain values at ${design.at === "mean" ? "their means" : `“${design.at}”`} before factors. ${verdict}`,
    "The factors are your own; no code's set is built in. A code may also ask for cautious values, other combinations of actions and further checks.",
  ];
}

/** The factors that are not 1, by what they do. */
export function factorSentences({ actions, strength, resistance }: PartialFactors): readonly string[] {
  const list = (named: readonly (readonly [string, number])[]): string => {
    const others = named.filter(([, factor]) => factor !== 1);
    return others.length === 0 ? "all 1" : others.map(([name, factor]) => `${name} ${threeFigures(factor)}`).join(", ");
  };
  return [
    `Actions are multiplied: ${list([
      ["permanent unfavourable", actions.permanentUnfavourable],
      ["permanent favourable", actions.permanentFavourable],
      ["variable", actions.variable],
    ])}.`,
    `Strengths are divided: ${list([
      ["tan φ′", strength.tanFrictionAngle],
      ["cohesion", strength.cohesion],
      ["undrained strength", strength.undrainedStrength],
      ["unit weight", strength.unitWeight],
    ])}.`,
    `Resistances are divided: ${list([
      ["sliding", resistance.sliding],
      ["bearing", resistance.bearing],
      ["passive", resistance.passive],
    ])}.`,
  ];
}

/** Which factor each force took in each limit state; deep-seated failure has no forces of its own. */
export function forceFactorTable(design: DesignResult): {
  readonly headings: readonly string[];
  readonly rows: readonly (readonly string[])[];
} {
  const states = designStates(design).filter(([, { forceFactors }]) => forceFactors.length > 0);
  return {
    headings: states.map(([name]) => limitStateName(name)),
    rows: design.forces.map((force, i) => [
      force.name,
      ...states.map(([, { forceFactors }]) => (forceFactors[i] === 0 ? "left out" : threeFigures(forceFactors[i]))),
    ]),
  };
}
