/** Names of the limit states, and defaults of the keys that are no quantities (those stand in `fields.ts`). */

export const limitStateNames = ["sliding", "overturning", "bearing", "eccentricity", "deep_seated"] as const;

/** Defaults of the keys that are no quantities. */
export const defaults = {
  title: "Untitled study",
  units: "metric",
  drainage: "drained",
  flow: "hydrostatic",
  onHeel: false,
  toeSoil: true,
  inOverturning: false,
  earthPressure: "rankine",
  bearing: "vesic",
  tensionCrack: "dry",
  limitStates: ["sliding", "overturning", "bearing"],
  seed: "toehold",
  samples: 1_000_000,
  precision: 0.05,
  mustMeetTarget: false,
  alwaysOpen: false,
} as const;
