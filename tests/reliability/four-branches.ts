import type { LimitStates } from "../../src/reliability/limit-states.ts";
import { statesOfMargins } from "./straight-line.ts";

/** Series system of four branches, min{3 + 0.1 (u1 − u2)² ∓ (u1 + u2)/√2; ±(u1 − u2) + k/√2} (Waarts, 2000), as one limit state. */
export function fourBranches(k: number): LimitStates {
  const root = Math.SQRT2;
  return statesOfMargins(2, {
    branches: ([a, b]) => {
      const bent = 3 + 0.1 * (a - b) ** 2;
      return Math.min(bent - (a + b) / root, bent + (a + b) / root, a - b + k / root, b - a + k / root);
    },
  });
}
