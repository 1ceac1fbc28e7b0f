import { columnwise } from "../columnwise.ts";
import type { Slot } from "../kernel.ts";
import type { KernelBuilder } from "../kernel-builder.ts";
import { type PlanePart, pressureAt } from "./earth-pressure.ts";
import { buoyantUnitWeight } from "./layers.ts";

const centroid = (moment: number, force: number): number => (force === 0 ? 0 : moment / force);

/** Lines of the sheet for one stretch of one soil: stress, pressure on both its ends, thrust, height. Nothing here is sampled. */
export function listPartSteps(b: KernelBuilder, part: PlanePart, hasWater: boolean, gradient: Slot): void {
  const { top, bottom, stressTop, stressBottom, thrust, moment, law } = part;
  const { soil } = part.layer;
  const heading = `Earth pressure, ${soil.name}`;
  const where = hasWater ? (part.wet ? "below water: " : "above water: ") : "";
  const unless: readonly [Slot, Slot] = [top, bottom];
  const [pressureTop, pressureBottom] = pressureSlots(b, part);
  const gain = part.wet ? b.formula(`buoyant ${soil.key}`, buoyantUnitWeight, [soil.saturated, gradient]) : soil.moist;
  const ends = { z_top: top, z_bottom: bottom };
  const add = (
    slot: Slot,
    symbol: string,
    text: string,
    formula: string,
    of: Record<string, Slot>,
    unit: string,
    source?: string,
  ): void => {
    b.steps.push({
      heading,
      slot,
      symbol,
      text: `${where}${text}`,
      formula,
      of,
      unit,
      unless,
      ...(source === undefined ? {} : { source }),
    });
  };
  add(
    stressTop,
    "σ′v,top",
    "vertical effective stress at the top of the stretch",
    "surcharge and all that lies above, water taken off",
    {},
    "kPa",
  );
  add(
    stressBottom,
    "σ′v,bottom",
    "vertical effective stress at its bottom",
    `{σ′v,top} + {${part.wet ? "γ′" : "γ"}}·({z_top} − {z_bottom})`,
    { "σ′v,top": stressTop, [part.wet ? "γ′" : "γ"]: gain, ...ends },
    "kPa",
  );
  if (law.kind === "linear") {
    const cut = law.cut === undefined ? "" : " − {2c√K}, not below 0";
    const tied = { K: law.coefficient, ...(law.cut === undefined ? {} : { "2c√K": law.cut }) };
    add(pressureTop, "p_top", "pressure at its top", `{K}·{σ′v,top}${cut}`, { ...tied, "σ′v,top": stressTop }, "kPa");
    add(
      pressureBottom,
      "p_bottom",
      "pressure at its bottom",
      `{K}·{σ′v,bottom}${cut}`,
      { ...tied, "σ′v,bottom": stressBottom },
      "kPa",
    );
    const formula =
      law.cut === undefined
        ? "½·({p_top} + {p_bottom})·({z_top} − {z_bottom})"
        : "area of the positive pressure between {p_top} and {p_bottom} over {z_top} − {z_bottom}";
    add(
      thrust,
      "P",
      "thrust of the stretch",
      formula,
      { p_top: pressureTop, p_bottom: pressureBottom, ...ends },
      "kN/m",
    );
  } else {
    const source = "Mazindrani and Ganjali (1997)";
    const tied = { "c′": law.cohesion, "φ′": law.frictionAngle, β: law.slope };
    add(
      pressureTop,
      "p_top",
      "pressure at its top, along the slope",
      "p({σ′v,top}; {c′}, {φ′}, {β}), not below 0",
      { ...tied, "σ′v,top": stressTop },
      "kPa",
      source,
    );
    add(
      pressureBottom,
      "p_bottom",
      "pressure at its bottom, along the slope",
      "p({σ′v,bottom}; {c′}, {φ′}, {β}), not below 0",
      { ...tied, "σ′v,bottom": stressBottom },
      "kPa",
      source,
    );
    add(thrust, "P", "thrust of the stretch", "∫ p dz from {z_bottom} to {z_top} in closed form", ends, "kN/m", source);
  }
  const height = b.formula("height of the thrust", centroid, [moment, thrust]);
  add(height, "z_P", "height of the thrust above the underside", "centroid of the positive pressure", {}, "m");
}

/** Pressure at the two ends of a stretch, cut at zero: for the sheet alone, so sampling leaves this stage out. */
function pressureSlots(b: KernelBuilder, part: PlanePart): readonly [Slot, Slot] {
  const { law, stressTop, stressBottom } = part;
  const [top, bottom] = [b.slot("pressure at the top"), b.slot("pressure at the bottom")];
  const reads =
    law.kind === "linear"
      ? [law.coefficient, ...(law.cut === undefined ? [] : [law.cut])]
      : [law.cohesion, law.frictionAngle, law.slope];
  b.stage({
    name: "pressure at the ends of a stretch",
    reads: [stressTop, stressBottom, ...reads],
    writes: [top, bottom],
    run(c, count) {
      for (let i = 0; i < count; i++) {
        c[top][i] = Math.max(pressureAt(c, law, c[stressTop][i], i), 0);
        c[bottom][i] = Math.max(pressureAt(c, law, c[stressBottom][i], i), 0);
      }
    },
  });
  return [top, bottom];
}

// Loops written out one by one, so that each is compiled for its own formula.
columnwise(centroid, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = centroid(a[i], b[i]);
});
