/**
 * Notes where a value lies outside what has been published, or looks like a slip. Never a refusal: sites differ, and the
 * engineer who knows hers is right. Every range stands here with its source.
 */
import { type CheckContext, meanOutline } from "./check-context.ts";
import { soilReferences } from "./check-ground.ts";
import { distributionMoments } from "./moments.ts";
import { type QuantityEntry, quantitiesOf } from "./quantities.ts";
import { brief } from "./read-number.ts";
import type { Quantity, Soil, UncertainQuantity } from "./study.ts";

export interface PublishedRange {
  /** The last word of the paths it is about. */
  readonly key: string;
  /** Only paths that begin so. */
  readonly under: "soils" | "wall";
  readonly lowest: number;
  readonly highest: number;
  readonly source: string;
}

const jcss = "JCSS Probabilistic Model Code, part 3.7, 2006";

/** Coefficients of variation, as a share. Friction angles are judged as angles. */
export const publishedCovs: readonly PublishedRange[] = [
  {
    key: "unit_weight",
    under: "soils",
    lowest: 0.03,
    highest: 0.1,
    source: `5 to 10 % in ${jcss}; 3 to 7 % in Duncan (2000), Table 1, from memory`,
  },
  {
    key: "saturated_unit_weight",
    under: "soils",
    lowest: 0.03,
    highest: 0.1,
    source: `5 to 10 % in ${jcss}; 3 to 7 % in Duncan (2000), Table 1, from memory`,
  },
  {
    key: "friction_angle",
    under: "soils",
    lowest: 0.02,
    highest: 0.15,
    source:
      "2 to 13 % in Duncan (2000), Table 1, from memory; 5 to 15 % for sand, and up to 50 % for clay, in Cherubini and others, discussion of Phoon and Kulhawy (1999)",
  },
  { key: "cohesion", under: "soils", lowest: 0.1, highest: 0.5, source: `10 to 50 % in ${jcss}` },
  {
    key: "undrained_strength",
    under: "soils",
    lowest: 0.1,
    highest: 0.4,
    source: `10 to 40 % in ${jcss}; 13 to 40 % in Duncan (2000), Table 1, from memory`,
  },
];

/** Means, in house units. tan φ′ from 0.24 to 0.90 is 13.5 to 42.0 degrees. */
export const publishedMeans: readonly PublishedRange[] = [
  {
    key: "unit_weight",
    under: "soils",
    lowest: 13,
    highest: 24,
    source: `${jcss}, from dry sand to boulder clay and soft organic clay`,
  },
  { key: "saturated_unit_weight", under: "soils", lowest: 13, highest: 24, source: `${jcss}` },
  { key: "friction_angle", under: "soils", lowest: 13.5, highest: 42, source: `tan φ′ from 0.24 to 0.90 in ${jcss}` },
  { key: "cohesion", under: "soils", lowest: 0, highest: 30, source: `${jcss}` },
  {
    key: "unit_weight",
    under: "wall",
    lowest: 20,
    highest: 26,
    source:
      "masonry to reinforced concrete: common practice; concrete 24, reinforced 25 in EN 1991-1-1, Table A.1, from memory",
  },
];

export function notePlausibility(context: CheckContext): void {
  for (const entry of quantitiesOf(context.study)) {
    noteRange(context, entry, publishedMeans, entry.quantity, "mean");
    if (typeof entry.quantity === "number") continue;
    noteCov(context, entry, entry.quantity);
    noteUnevenRange(context, entry, entry.quantity);
  }
  noteSlope(context);
  noteSaturated(context);
  noteCorrelations(context);
  noteUnusedSoils(context);
  noteUnusedVariables(context);
  noteIgnoredTop(context);
}

function rangeFor(path: string, ranges: readonly PublishedRange[]): PublishedRange | undefined {
  const keys = path.split(".");
  return ranges.find((range) => range.key === keys.at(-1) && range.under === keys[0]);
}

function noteRange(
  context: CheckContext,
  entry: QuantityEntry,
  ranges: readonly PublishedRange[],
  quantity: Quantity,
  word: string,
): void {
  const range = rangeFor(entry.path, ranges);
  const undrained =
    entry.path.startsWith("soils.") && context.study.soils[entry.path.split(".")[1]!]?.drainage === "undrained";
  if (!range || (undrained && range.key === "friction_angle")) return;
  const value = context.mean(quantity);
  if (!(value < range.lowest || value > range.highest)) return;
  const say = (x: number): string => context.say(x, entry.field.dimension);
  const lead = typeof quantity === "number" ? say(value) : `the ${word} ${say(value)}`;
  const radians = entry.field.dimension === "angle" && value < 1.2 ? "; is it in radians?" : "";
  context.notice(
    entry.path,
    `${lead} lies outside the published ${say(range.lowest)} to ${say(range.highest)} (${range.source})${radians}`,
  );
}

function noteCov(context: CheckContext, { path }: QuantityEntry, quantity: UncertainQuantity): void {
  const range = rangeFor(path, publishedCovs);
  if (!range) return;
  const { mean, sd } = distributionMoments(quantity.distribution);
  const cov = sd / Math.abs(mean);
  if (!(cov < range.lowest - 1e-9 || cov > range.highest + 1e-9)) return;
  context.notice(
    path,
    `the coefficient of variation ${brief(100 * cov)} % lies outside the published ${brief(100 * range.lowest)} to ${brief(100 * range.highest)} % (${range.source})`,
  );
}

function noteUnevenRange(
  { notice, say }: CheckContext,
  { path, field }: QuantityEntry,
  { range }: UncertainQuantity,
): void {
  if (!range) return;
  const [below, above] = [range.likely - range.lowest, range.highest - range.likely];
  if (Math.abs(below - above) <= 1e-6 * (below + above)) return;
  const dimension = field.dimension === "level" ? "length" : field.dimension;
  notice(
    path,
    `the bounds of the range are uneven, ${say(below, dimension)} below and ${say(above, dimension)} above the likely value; the mean is taken at the likely value all the same`,
  );
}

function noteSlope({ study, mean, notice }: CheckContext): void {
  const slope = mean(study.ground.behind.slope);
  if (slope > 0 && slope < 1)
    notice(
      "ground.behind.slope",
      `${brief(slope)} degrees is all but level; a slope is given in degrees, or as "1v:2h"`,
    );
}

/** Three standard deviations between the two keep the chance of a swap below about 1 in 700. */
function noteSaturated({ study, notice, say }: CheckContext): void {
  for (const [key, soil] of Object.entries(study.soils)) {
    const swap = saturatedBelowMoist(soil);
    if (swap === undefined) continue;
    const follows = `leave it out, and it follows unit_weight plus ${say(2, "unit_weight")}`;
    notice(`soils.${key}.saturated_unit_weight`, `${swap} below the moist unit weight; ${follows}`);
  }
}

function saturatedBelowMoist({ unitWeight, saturatedUnitWeight }: Soil): string | undefined {
  if (saturatedUnitWeight === undefined) return undefined;
  const [moist, saturated] = [momentsOf(unitWeight), momentsOf(saturatedUnitWeight)];
  const gap = saturated.mean - moist.mean;
  if (gap < 0) return "lies";
  return gap < 3 * Math.hypot(moist.sd, saturated.sd) ? "can fall" : undefined;
}

function momentsOf(quantity: Quantity): { mean: number; sd: number } {
  return typeof quantity === "number" ? { mean: quantity, sd: 0 } : distributionMoments(quantity.distribution);
}

/** Published coefficients between cohesion and friction angle are negative: a steeper envelope cuts the axis lower. */
function noteCorrelations({ study, notice }: CheckContext): void {
  for (const [i, { between, coefficient }] of study.correlations.entries()) {
    const [one, other] = between.map((path) => path.split("."));
    const keys = [one!.at(-1), other!.at(-1)].sort().join(" ");
    if (one![0] !== "soils" || one![1] !== other![1] || keys !== "cohesion friction_angle") continue;
    if (coefficient >= -0.7 && coefficient <= -0.24) continue;
    notice(
      `correlations.${i}.coefficient`,
      `${coefficient} between cohesion and friction angle lies outside the published -0.7 to -0.24 (Lumb, 1970; Yucemen and others, 1973; Wolff, 1985; as collected by Cherubini, 2000; from memory)`,
    );
  }
}

function noteUnusedSoils(context: CheckContext): void {
  const used = new Set(soilReferences(context).map(({ soil }) => soil));
  for (const key of Object.keys(context.study.soils)) {
    if (!used.has(key)) context.notice(`soils.${key}`, "is named by no layer, so it has no effect");
  }
}

/** Uncertain values that nothing in this study rests on. */
function noteUnusedVariables({ study, notice }: CheckContext): void {
  const lists = (name: string): boolean => study.assessment.limitStates.some((one) => one === name);
  const idle: readonly (readonly [path: string, quantity: Quantity, used: boolean, why: string])[] = [
    ["model.factors.base_resistance", study.model.factors.baseResistance, lists("sliding"), "sliding is not listed"],
    ["model.factors.bearing_capacity", study.model.factors.bearingCapacity, lists("bearing"), "bearing is not listed"],
    ["model.factors.deep_seated", study.model.factors.deepSeated, lists("deep_seated"), "deep_seated is not listed"],
    [
      "ground.front.ignore_top",
      study.ground.front.ignoreTop,
      study.ground.front.mobilised !== 0 || lists("bearing") || lists("deep_seated"),
      "no passive resistance is counted",
    ],
  ];
  for (const [path, quantity, used, why] of idle) {
    if (typeof quantity !== "number" && !used) notice(path, `is uncertain, but has no effect: ${why}`);
  }
}

function noteIgnoredTop(context: CheckContext): void {
  const { study, mean, notice, say } = context;
  const { front } = study.ground;
  if (front.mobilised === 0 || front.level === undefined || study.wall.shearKey) return;
  const depth = mean(front.level) - meanOutline(context).underside;
  if (mean(front.ignoreTop) >= depth) {
    notice(
      "ground.front.mobilised",
      `has no effect: ignore_top takes away all of the ${say(depth, "length")} of ground in front`,
    );
  }
}
