export interface StarterAnswers {
  readonly title: string;
  readonly units: "metric" | "us";
  readonly wall: "cantilever" | "gravity";
  /** Stem above the base slab, or the whole of a gravity wall; in the study's own length unit, as all lengths here. */
  readonly height: number;
  /** Highest credible water level behind, above the underside of the base; 0 for dry ground. */
  readonly water: number;
}

/**
 * A study to start from, with sizes that follow rules of thumb (common practice): a cantilever wall's base about 0.6 of the
 * height with a toe of a fifth of that, a gravity wall's foot about 0.6 of its height. Numbers about the ground are invented
 * and say so.
 */
export function starterStudy(answers: StarterAnswers): string {
  const { title, units, wall, height, water } = answers;
  const us = units === "us";
  const length = (value: number): number => Number(value.toFixed(us ? 1 : 2));
  const weight = (metric: number, american: number): number => (us ? american : metric);
  const [metre, unitWeight, stress] = us ? ["ft", "lb/ft3", "lb/ft2"] : ["m", "kN/m3", "kPa"];
  return `# ${us ? "US" : "Metric"} units: plain numbers are ${metre}, ${unitWeight}, ${stress} and degrees. Any number may also carry its unit
# ("2.5 m", "120 lb/ft3") or be a distribution (normal, lognormal, uniform, triangular, range, …).
# The ground below is invented: put in what you know about yours.
title: ${JSON.stringify(title)}
units: ${units}

wall:
${wall === "gravity" ? gravity(height, length, us) : cantilever(height, length, us)}
  unit_weight: ${weight(24, 150)}
  sliding_friction: { ratio: 0.8 }        # friction angle on the base over that of the soil below

soils:
  fill:
    name: Placed fill (invented)
    unit_weight: { normal: { mean: ${weight(19, 120)}, cov: 0.05 } }
    # What an engineer can say about it: lowest, likely and highest credible value.
    friction_angle: { range: { lowest: 30, likely: 34, highest: 38 }, source: judgement (invented) }
  ground:
    name: Natural sand (invented)
    unit_weight: { normal: { mean: ${weight(18.5, 118)}, cov: 0.05 } }
    friction_angle: { normal: { mean: 33, cov: 0.07 }, source: judgement (invented) }

ground:
  behind:
    layers:                               # from the top down; levels are above the underside of the base
      - { soil: fill, bottom: ${length(0.4 * height)} }
      - { soil: ground }
  below: { soil: ground }
  front: { level: ${length(0.2 * height)} }                  # passive resistance is counted only with mobilised: above 0

${waterText(water, length)}
loads:
  surcharge: { pressure: ${weight(10, 200)} }

model:
  factors:                                # how far the formulas themselves can be trusted
    earth_thrust: { lognormal: { mean: 1, sd: 0.1 } }
    bearing_capacity: { lognormal: { mean: 1, sd: 0.15 } }

assessment:
  limit_states: [sliding, overturning, bearing]
  seed: ${JSON.stringify(title)}          # any text; the same seed gives the same numbers
`;
}

type Length = (value: number) => number;

function cantilever(height: number, length: Length, us: boolean): string {
  const total = 1.1 * height;
  const crest = length(us ? 1 : 0.3);
  const foot = Math.max(crest, length(0.1 * height));
  return `  stem: { height: ${length(height)}, crest_width: ${crest}, foot_width: ${foot} }
  base: { toe: ${length(total / 8)}, heel: ${length(0.42 * total)}, thickness: ${foot} }      # leave out for a gravity wall`;
}

function gravity(height: number, length: Length, us: boolean): string {
  const crest = length(Math.max(us ? 1.5 : 0.45, 0.15 * height));
  const foot = length(Math.max(1.2 * crest, 0.6 * height));
  return `  stem: { height: ${length(height)}, crest_width: ${crest}, foot_width: ${foot} }    # no base slab: a gravity wall`;
}

function waterText(highest: number, length: Length): string {
  const level = (from: number, peak: number, to: number): string =>
    `water:\n  behind: { level: { triangular: { from: ${from}, peak: ${length(peak)}, to: ${length(to)} } } }`;
  if (highest > 0) return `${level(0, 0.2 * highest, highest)}   # leave water out for dry ground\n`;
  return "# Dry ground. With water: water: { behind: { level: { triangular: { from: 0, peak: 0.4, to: 2 } } } }\n";
}
