/** Checks between values: the engine's choices and the assessment. */
import type { CheckContext } from "./check-context.ts";
import { quantitiesOf } from "./quantities.ts";

export function checkModel(context: CheckContext): void {
  checkWallFriction(context);
  checkEccentricity(context);
  checkPeriod(context);
  checkTargetPeriod(context);
}

function checkWallFriction({ study, read, keyProblem, notice }: CheckContext): void {
  const given = read.has("model.wall_friction");
  const { earthPressure, tensionCrack } = study.model;
  if (given && earthPressure !== "coulomb") {
    keyProblem(
      "model.wall_friction",
      `belongs to earth_pressure: coulomb, and this study has ${earthPressure}`,
      "leave it out",
    );
  }
  if (!given && earthPressure === "coulomb")
    notice("model.wall_friction", "is not given: the wall is taken as smooth (0 degrees)");
  if (earthPressure === "at_rest" && tensionCrack === "water")
    notice("model.tension_crack", "has no effect: no crack forms at rest");
}

function checkEccentricity({ study, read, problem, notice }: CheckContext): void {
  const path = "assessment.eccentricity_limit";
  const listed = study.assessment.limitStates.includes("eccentricity");
  if (listed && !read.has(path))
    problem(path, "is missing: the limit state eccentricity needs it", "for example eccentricity_limit: 0.333");
  if (!listed && read.has(path)) notice(path, "has no effect: the limit state eccentricity is not listed");
}

/** `period` is needed when anything is yearly, and not allowed otherwise. */
function checkPeriod({ study, read, problem, keyProblem, notice, changed }: CheckContext): void {
  const path = "assessment.period";
  const yearly = quantitiesOf(study).filter(({ quantity }) => typeof quantity !== "number" && quantity.yearly);
  if (yearly.length > 0 && !read.has(path)) {
    problem(
      path,
      `is missing: ${yearly[0]!.path} is yearly, so the years that are looked ahead must be given`,
      "for example period: 50",
    );
  } else if (yearly.length === 0 && read.has(path)) {
    const message = "nothing in this study is yearly, so its probability is not per year and has no period";
    if (changed) notice(path, message);
    else keyProblem(path, message, "leave period out, or mark a variable as yearly: true");
  }
}

function checkTargetPeriod({ study, read, problem, notice }: CheckContext): void {
  const { period, target } = study.assessment;
  if (target?.period === undefined) return;
  const where = read.has("assessment.target.period") ? "assessment.target.period" : "assessment.target";
  if (period === undefined) {
    if (!read.has("assessment.period"))
      notice(
        where,
        `is for ${years(target.period)}, but nothing in this study is yearly: the probability holds for the ground as it is, not per year`,
      );
  } else if (period !== target.period) {
    problem(
      where,
      `the target is for ${years(target.period)} and the study for ${years(period)}; they must be equal`,
      "give the target for the period of the study",
    );
  }
}

function years(count: number): string {
  return count === 1 ? "1 year" : `${count} years`;
}
