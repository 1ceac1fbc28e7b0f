/** Checks between values: the wall's own geometry and the plane the pressure acts on, judged at the means. */
import { type CheckContext, meanOutline } from "./check-context.ts";

/** Lengths that differ by less than this, m, are equal. */
const rounding = 1e-9;

export function checkWall(context: CheckContext): void {
  checkStem(context);
  checkShearKey(context);
  checkSlidingFriction(context);
  checkPlane(context);
}

/** front_run = foot_width − crest_width − back_run may not be negative. */
function checkStem({ study, mean, say, problem }: CheckContext): void {
  const { stem } = study.wall;
  const frontRun = mean(stem.footWidth) - mean(stem.crestWidth) - mean(stem.backRun);
  if (!(frontRun < -rounding)) return;
  const parts = `crest_width ${say(mean(stem.crestWidth), "length")} and back_run ${say(mean(stem.backRun), "length")}`;
  problem(
    "wall.stem.foot_width",
    `${say(mean(stem.footWidth), "length")} is less than ${parts} together: the front face would overhang`,
    `foot_width must be at least ${say(mean(stem.footWidth) - frontRun, "length")}`,
  );
}

function checkShearKey(context: CheckContext): void {
  const { study, mean, say, problem } = context;
  const key = study.wall.shearKey;
  if (!key) return;
  const { baseWidth } = meanOutline(context);
  const end = mean(key.fromToe) + mean(key.width);
  if (!(end > baseWidth + rounding)) return;
  problem(
    "wall.shear_key.from_toe",
    `the shear key ends ${say(end, "length")} from the toe, beyond the base (${say(baseWidth, "length")} wide)`,
    `from_toe + width must be at most ${say(baseWidth, "length")}`,
  );
}

function checkSlidingFriction({ study, problem, notice, read }: CheckContext): void {
  const { slidingFriction } = study.wall;
  const path = "wall.sliding_friction";
  const below = Object.hasOwn(study.soils, study.ground.below.soil) ? study.soils[study.ground.below.soil] : undefined;
  const example = "for example sliding_friction: { ratio: 0.8 }, or { angle: 27 }";
  if (!slidingFriction) {
    if (below?.drainage === "drained" && !read.has(path)) problem(path, "is missing (there is no default)", example);
    return;
  }
  const ways = ["ratio", "angle"].filter((key) => read.has(`${path}.${key}`));
  if (ways.length === 2)
    problem(`${path}.angle`, "ratio and angle are both given; one of them is needed", "keep one of the two");
  if (below?.drainage === "undrained") notice(path, `has no effect: ${below.name} below the base is undrained`);
  else if (ways.length === 0) problem(path, "neither ratio nor angle is given; one of them is needed", example);
}

/** `wall_back` without Coulomb, or with a heel longer than a tenth of h + t, would drop soil and keep its uplift. */
function checkPlane(context: CheckContext): void {
  const { study, say, problem } = context;
  if (study.model.plane !== "wall_back") return;
  const { heel, height } = meanOutline(context);
  if (study.model.earthPressure !== "coulomb") {
    problem(
      "model.plane",
      `wall_back needs earth_pressure: coulomb, and this study has ${study.model.earthPressure}`,
      "leave plane out",
    );
  } else if (heel > height / 10 + rounding) {
    problem(
      "model.plane",
      `wall_back drops the soil over the heel, which is ${say(heel, "length")} long; at most ${say(height / 10, "length")} (a tenth of the wall's height) is allowed`,
      "leave plane out, or write virtual_back",
    );
  }
}
