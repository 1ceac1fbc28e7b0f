/** The uncertain values of a study as they are echoed: moments, fractiles, a small picture, where they come from. */

import type { ModelUnknown } from "./model.ts";
import type { JointSpace, Marginal } from "./probability/marginal.ts";
import type { VariableSummary } from "./results.ts";
import type { Study, UncertainQuantity } from "./study/study.ts";
import type { Dimension } from "./study/units.ts";
import { displayUnit } from "./study/units.ts";

export function variableSummaries(
  study: Study,
  unknowns: readonly ModelUnknown[],
  space: JointSpace,
): readonly VariableSummary[] {
  const knowledge = new Map(space.unknowns.map((unknown) => [unknown.path, unknown.knowledge]));
  return unknowns.map(({ path, label, unit, quantity, marginal }) => ({
    path,
    label,
    unit: displayUnit(unit as Dimension, "metric").unit,
    distribution: wordOf(quantity),
    mean: marginal.mean,
    sd: marginal.sd,
    fractile5: marginal.quantile(0.05),
    fractile95: marginal.upperQuantile(0.05),
    knowledge: knowledge.get(path) ?? 1,
    yearly: quantity.yearly,
    ...(study.sources[path] === undefined ? {} : { source: study.sources[path] }),
    density: densityOf(marginal),
    ...extras(quantity),
  }));
}

/** The word of the file: what an engineer wrote, not what it became. */
function wordOf(quantity: UncertainQuantity): string {
  return quantity.range === undefined ? quantity.distribution.kind : "range";
}

function extras(quantity: UncertainQuantity): Partial<VariableSummary> {
  const { distribution } = quantity;
  if (distribution.kind === "measured") return { ticks: distribution.values };
  if (distribution.kind === "truncated_normal") return { parent: { mean: distribution.mean, sd: distribution.sd } };
  return {};
}

/** Density between the 0.1 and 99.9 % fractiles, 81 points; both sides of a jump where the support ends in between. */
function densityOf(marginal: Marginal): { readonly x: readonly number[]; readonly y: readonly number[] } {
  const [low, high] = [marginal.quantile(0.001), marginal.upperQuantile(0.001)];
  const x = Array.from({ length: 81 }, (_, k) => low + ((high - low) * k) / 80);
  return { x, y: x.map((value) => marginal.pdf(value)) };
}
