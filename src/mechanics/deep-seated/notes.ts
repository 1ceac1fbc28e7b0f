import type { Notice } from "../../study/study.ts";
import type { SlipCircle } from "./circle.ts";
import type { CircleLimits } from "./circle-limits.ts";
import type { DeepSeatedGround } from "./ground.ts";

/** What an engineer should know about a critical circle: where it lies at an end of the search, and what the method leaves out. */
export function deepSeatedNotes(
  ground: DeepSeatedGround,
  limits: CircleLimits,
  circle: Readonly<SlipCircle> | undefined,
): readonly Notice[] {
  const notes: Notice[] = [];
  const add = (path: string, message: string): void => {
    notes.push({ path, message });
  };
  if (ground.behind.layers.some(({ soil }) => soil.cohesion > 0))
    add(
      "ground.behind.layers",
      "deep-seated failure: no tension crack is assumed at the entry, though the ground behind has cohesion",
    );
  if (circle === undefined) {
    add(
      "ground.below.firm_level",
      "deep-seated failure: no circle fits between the base and the firm level, or all have m_α below 0.2: the factor is the cap",
    );
    return notes;
  }
  const near = 1e-3 * limits.height;
  if (circle.entryX > limits.farthestEntry - near)
    add(
      "ground.behind",
      "deep-seated failure: the smallest factor lies at the farthest entry that is tried, 4 wall heights behind the heel; farther circles may give less",
    );
  if (circle.exitX < near - 3 * limits.height)
    add(
      "ground.front",
      "deep-seated failure: the smallest factor lies at the farthest exit that is tried, 3 wall heights in front of the toe; farther circles may give less",
    );
  const lowest = circle.x > circle.exitX ? circle.z - circle.radius : circle.exitZ;
  if (ground.firmLevel === undefined && lowest < limits.levels[limits.levels.length - 1] + near)
    add(
      "ground.below.firm_level",
      "deep-seated failure: the critical circle reaches the firm level that is assumed, one wall height below the underside; deeper circles may give less if the ground is not firm there",
    );
  return notes;
}
