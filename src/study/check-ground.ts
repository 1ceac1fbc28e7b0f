/** Checks between values: soils, layers, levels and water, judged at the means. */
import { type CheckContext, meanOutline } from "./check-context.ts";
import { isRecord, valueAt } from "./paths.ts";
import type { Layer } from "./study.ts";
import { didYouMean } from "./suggest.ts";

/** Levels that differ by less than this, m, are equal. */
const rounding = 1e-9;

export function checkGround(context: CheckContext): void {
  checkSoils(context);
  checkReferences(context);
  checkBelow(context);
  checkLayers(
    context,
    "ground.behind.layers",
    context.study.ground.behind.layers,
    meanOutline(context).surface,
    "the ground surface",
  );
  checkLayers(
    context,
    "ground.below.layers",
    context.study.ground.below.layers,
    meanOutline(context).underside,
    "the underside of the base",
  );
  checkFront(context);
  checkWater(context);
}

function checkSoils({ study, read, problem, keyProblem, notice }: CheckContext): void {
  const named = valueAt(read.tree, "soils");
  if (isRecord(named) && Object.keys(named).length === 0)
    problem("soils", "names no soil", "for example sand: { unit_weight: 18, friction_angle: 33 }");
  for (const [key, soil] of Object.entries(study.soils)) {
    const path = `soils.${key}`;
    const undrained = soil.drainage === "undrained";
    if (undrained && !read.has(`${path}.undrained_strength`)) {
      problem(
        `${path}.undrained_strength`,
        "is missing: an undrained soil needs it",
        "for example undrained_strength: 60 kPa",
      );
    }
    if (!undrained && read.has(`${path}.undrained_strength`)) {
      keyProblem(
        `${path}.undrained_strength`,
        "stands only beside drainage: undrained",
        "add drainage: undrained, or leave it out",
      );
    }
    if (!undrained && !read.has(`${path}.friction_angle`)) {
      problem(`${path}.friction_angle`, "is missing: a drained soil needs it", "for example friction_angle: 33");
    }
    for (const key of ["friction_angle", "cohesion"]) {
      if (undrained && read.has(`${path}.${key}`)) notice(`${path}.${key}`, "has no effect: the soil is undrained");
    }
    if (study.model.earthPressure !== "at_rest" && read.has(`${path}.overconsolidation_ratio`)) {
      keyProblem(
        `${path}.overconsolidation_ratio`,
        `belongs to earth_pressure: at_rest, and this study has ${study.model.earthPressure}`,
        "leave it out",
      );
    }
  }
}

/** Paths of every place that names a soil, with the name. */
export function soilReferences({
  study,
  read,
}: Pick<CheckContext, "study" | "read">): { path: string; soil: string }[] {
  const layers = (path: string, list: readonly Layer[]): { path: string; soil: string }[] =>
    list.map((layer, i) => ({ path: `${path}.${i}.soil`, soil: layer.soil }));
  return [
    ...layers("ground.behind.layers", study.ground.behind.layers),
    ...layers("ground.below.layers", study.ground.below.layers),
    ...["ground.below.soil", "ground.front.soil"].map((path) => ({ path, soil: read.text(path, "") })),
  ].filter(({ soil }) => soil !== "");
}

function checkReferences(context: CheckContext): void {
  const names = Object.keys(context.study.soils);
  for (const { path, soil } of soilReferences(context)) {
    if (names.includes(soil)) continue;
    const list = names.length > 0 ? `soils of this study: ${names.join(", ")}` : undefined;
    context.problem(path, `"${soil}" is not one of the soils`, didYouMean(soil, names, list));
  }
}

function checkBelow({ study, read, problem, keyProblem, mean, say }: CheckContext): void {
  const path = "ground.below";
  if (read.has(`${path}.soil`) && read.has(`${path}.layers`)) {
    keyProblem(
      `${path}.layers`,
      "soil and layers are both given; one of them is needed",
      "the first of the layers is the soil below the base",
    );
  } else if (isRecord(valueAt(read.tree, path)) && !read.has(`${path}.soil`) && !read.has(`${path}.layers`)) {
    problem(path, "names no soil; soil or layers is needed", "for example below: { soil: sand }");
  }
  if (!read.has(`${path}.firm_level`)) return;
  if (!study.assessment.limitStates.includes("deep_seated")) {
    keyProblem(
      `${path}.firm_level`,
      "belongs to the limit state deep_seated, which this study does not list",
      "leave it out",
    );
  }
  const tip = mean(study.wall.undersideLevel) - (study.wall.shearKey ? mean(study.wall.shearKey.depth) : 0);
  const firm = mean(study.ground.below.firmLevel);
  if (firm >= tip)
    problem(`${path}.firm_level`, `${say(firm, "level")} must be below the base and its key (${say(tip, "level")})`);
}

/** From the top down: every layer but the last has a bottom, below the one above it. */
function checkLayers(
  context: CheckContext,
  path: string,
  layers: readonly Layer[],
  top: number,
  topName: string,
): void {
  const { problem, mean, say, read } = context;
  let above = top;
  let aboveName = topName;
  for (const [i, layer] of layers.entries()) {
    const where = `${path}.${i}.bottom`;
    const last = i === layers.length - 1;
    const given = read.has(where);
    if (!last && !given) problem(where, "is missing: every layer but the last has a bottom", "for example bottom: 2.0");
    if (last && given)
      problem(
        where,
        "the last layer has no bottom: it reaches down as far as is looked",
        "leave bottom out, or add the layer below it",
      );
    if (last || !given) continue;
    const bottom = mean(layer.bottom);
    if (bottom > above + rounding) {
      problem(
        where,
        `${say(bottom, "level")} lies above ${aboveName} (${say(above, "level")}); layers are listed from the top down`,
        levelHint(context, bottom),
      );
    }
    above = bottom;
    aboveName = "the bottom of the layer over it";
  }
}

function checkFront(context: CheckContext): void {
  const { study, mean, say, problem, read } = context;
  const { underside, crest } = meanOutline(context);
  const path = "ground.front.level";
  if (!read.has(path)) return;
  const level = mean(study.ground.front.level);
  if (level < underside - rounding) {
    problem(
      path,
      `${say(level, "level")} is below the underside of the base (${say(underside, "level")})`,
      levelHint(context, level) ?? "the base would hang in the air",
    );
  } else if (level > crest + rounding) {
    problem(
      path,
      `${say(level, "level")} is above the crest of the wall (${say(crest, "level")})`,
      levelHint(context, level),
    );
  }
}

function checkWater(context: CheckContext): void {
  const { study, mean, say, problem, notice } = context;
  const { crest, surface } = meanOutline(context);
  const front = mean(study.water.front?.level);
  if (front > crest + rounding) {
    problem(
      "water.front.level",
      `${say(front, "level")} is above the crest of the wall (${say(crest, "level")})`,
      levelHint(context, front),
    );
  }
  const behind = mean(study.water.behind?.level);
  if (behind > surface + rounding) {
    notice(
      "water.behind.level",
      `mean ${say(behind, "level")} lies above the ground (${say(surface, "level")}) and is taken at the ground`,
    );
  }
}

/** Levels above the base and site levels are easily mixed up. */
function levelHint({ study, read, mean }: CheckContext, level: number): string | undefined {
  const underside = mean(study.wall.undersideLevel);
  if (read.has("wall.underside_level") && underside !== 0)
    return "levels are site levels once wall.underside_level is given";
  return Math.abs(level) > 20
    ? "levels count from the underside of the base; give wall.underside_level to use site levels"
    : undefined;
}
