export interface StarterAnswers {
  readonly title: string;
  /** Stem above the base slab, in the study's own length unit. */
  readonly height: number;
  readonly units: "metric" | "us";
}

/**
 * A study to start from, with sizes that follow rules of thumb for cantilever walls (base about 0.6 of the height, toe an
 * eighth of it; common practice). Numbers about the ground are invented and say so.
 */
export function starterStudy({ title, height, units }: StarterAnswers): string {
  const us = units === "us";
  const round = (value: number): number => Number(value.toFixed(us ? 1 : 2));
  const metre = us ? 3.28084 : 1;
  const weight = (value: number): number => (us ? Number((value * 6.36588).toFixed(0)) : value);
  const pressure = (value: number): number => (us ? Number((value * 20.8854).toFixed(0)) : value);
  const [length, unitWeight, stress] = us ? ["ft", "lb/ft3", "lb/ft2"] : ["m", "kN/m3", "kPa"];
  const total = height * 1.1;
  return `# ${us ? "US" : "Metric"} units: plain numbers are ${length}, ${unitWeight}, ${stress} and degrees. Any number may also carry its unit
# ("2.5 m", "120 lb/ft3") or be a distribution (normal, lognormal, uniform, triangular, range, …): see README.md.
# The ground below is invented: put in what you know about yours.
title: ${JSON.stringify(title)}
units: ${units}

wall:
  stem: { height: ${round(height)}, crest_width: ${round(0.25 * metre)}, foot_width: ${round(0.1 * height)} }
  base: { toe: ${round(total / 8)}, heel: ${round(0.42 * total)}, thickness: ${round(0.1 * height)} }
  unit_weight: ${weight(24)}
  sliding_friction: { ratio: 0.8 }        # friction angle on the base over that of the soil below

soils:
  fill:
    name: Placed fill (invented)
    unit_weight: { normal: { mean: ${weight(19)}, cov: 0.05 } }
    # What an engineer can say about it: lowest, likely and highest credible value.
    friction_angle: { range: { lowest: 30, likely: 34, highest: 38 }, source: "judgement (invented)" }
  ground:
    name: Natural sand (invented)
    unit_weight: { normal: { mean: ${weight(18.5)}, cov: 0.05 } }
    friction_angle: { normal: { mean: 33, cov: 0.07 }, source: "judgement (invented)" }

ground:
  behind:
    layers:                               # from the top down; levels are above the underside of the base
      - { soil: fill, bottom: ${round(0.4 * height)} }
      - { soil: ground }
  below: { soil: ground }
  front: { level: ${round(0.2 * height)} }              # passive resistance is counted only with mobilised: above 0

water:
  behind: { level: { triangular: { from: 0, peak: ${round(0.1 * height)}, to: ${round(0.5 * height)} } } }   # leave water out for dry ground

loads:
  surcharge: { pressure: ${pressure(10)} }

model:
  factors:                                # how far the formulas themselves can be trusted
    earth_thrust: { lognormal: { mean: 1, sd: 0.1 } }
    bearing_capacity: { lognormal: { mean: 1, sd: 0.15 } }

assessment:
  limit_states: [sliding, overturning, bearing]
  seed: ${JSON.stringify(title)}
`;
}
