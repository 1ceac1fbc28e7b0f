import type {
  AssessResult,
  CheckResult,
  LimitStateAssessment,
  MonteCarloResult,
  ReportInput,
  VariableSummary,
} from "../../src/results.ts";
import { readDocument } from "../../src/study/read-study.ts";
import { gallery } from "./gallery.ts";

/** Results written by hand, so that a change of the engine moves no frozen chart. All numbers are invented. */

const counts = { slopeUnstable: 0, lostContact: 0, capped: 0, outOfRange: 0 };

const counted = (failures: number, interval: readonly [number, number], index: number | null): MonteCarloResult => ({
  probability: failures / 100_000,
  standardError: Math.sqrt(failures) / 100_000,
  interval,
  failures,
  samples: 100_000,
  reliabilityIndex: index,
  factorMean: 1.8,
  factorSd: 0.35,
  counts,
});

const grid = (low: number, high: number): number[] => Array.from({ length: 9 }, (_, k) => low + ((high - low) * k) / 8);

const variable = (path: string, label: string, unit: string, mean: number, sd: number): VariableSummary => ({
  path,
  label,
  unit,
  distribution: "normal",
  mean,
  sd,
  fractile5: mean - 1.645 * sd,
  fractile95: mean + 1.645 * sd,
  knowledge: 1,
  yearly: false,
  density: { x: grid(mean - 3 * sd, mean + 3 * sd), y: [0, 1, 3, 6, 7, 6, 3, 1, 0] },
});

const angle = "soils.sand.friction_angle";
const level = "water.behind.level";

const pictures = [
  {
    path: angle,
    edges: [24, 28, 32, 36, 40],
    meanGivenFailure: 28.5,
    prior: [0.1, 0.4, 0.4, 0.1],
    givenFailure: [0.5, 0.4, 0.1, 0],
  },
  {
    path: level,
    edges: [0, 1, 2, 3, 4],
    meanGivenFailure: 2.6,
    prior: [0.2, 0.4, 0.3, 0.1],
    givenFailure: [0, 0.1, 0.5, 0.4],
  },
].map((picture) => ({ ...picture, sdGivenFailure: 1, failures: 420 }));

const drivers = [
  { path: angle, share: 0.62, adverse: "low" as const, knowledge: 0.7, shiftGivenFailure: -1.4 },
  { path: level, share: 0.38, adverse: "high" as const, knowledge: 1, shiftGivenFailure: 1.2 },
];

const state = (monteCarlo: MonteCarloResult): LimitStateAssessment => ({
  factorAtMean: 1.8,
  monteCarlo,
  firstOrderSecondMoment: {
    mean: 1.8,
    sd: 0.36,
    reliabilityIndexNormal: 2.22,
    reliabilityIndexLognormal: 2.86,
    probabilityNormal: 0.0132,
    probabilityLognormal: 0.00212,
    contributions: { [angle]: 0.62, [level]: 0.38 },
  },
  drivers,
  tornado: [
    { path: angle, factorAt5: 1.4, factorAt95: 2.4 },
    { path: level, factorAt5: 2.1, factorAt95: 1.5 },
  ],
  failurePicture: pictures,
  histogram: {
    edges: [0.8, 1, 1.2, 1.4, 1.6, 1.8, 2],
    counts: [400, 2000, 10_000, 30_000, 40_000, 17_000],
    below: 20,
    above: 580,
  },
  convergence: [],
});

const assess: AssessResult = {
  study: "Hand-made wall (invented)",
  kind: "assess",
  warnings: [{ path: "", message: "an invented note" }],
  cautions: ["An invented caution."],
  seed: "by-hand",
  variables: [
    variable(angle, "Friction angle of Medium sand", "°", 32, 2.5),
    variable(level, "Water level behind the wall", "m", 1.7, 0.75),
  ],
  limitStates: {
    sliding: state(counted(420, [0.0038, 0.00462], 2.64)),
    overturning: state(counted(0, [0, 3.7e-5], null)),
    bearing: state(counted(31, [0.00021, 0.00044], 3.42)),
  },
  system: {
    monteCarlo: { ...counted(420, [0.0038, 0.00462], 2.64), factorMean: null, factorSd: null },
    bounds: [0.0042, 0.0045],
    drivers: drivers.map((driver) => ({ ...driver, share: null })),
    failurePicture: pictures,
    convergence: [
      { samples: 16_384, probability: 0.0046, interval: [0.0036, 0.0058] },
      { samples: 65_536, probability: 0.0043, interval: [0.0038, 0.0048] },
      { samples: 100_000, probability: 0.0042, interval: [0.0038, 0.00462] },
    ],
  },
  bestEstimate: {
    method: "plain",
    probability: 0.0042,
    standardError: 0.000205,
    interval: [0.0038, 0.00462],
    reliabilityIndex: 2.64,
    evaluations: 100_000,
  },
  target: { probability: 0.000968, reliabilityIndex: 3.1, reason: "invented brief" },
  run: {
    version: "0.0.0",
    seed: "by-hand",
    workers: 1,
    complete: true,
    sampling: { evaluations: 100_000, seconds: 0 },
  },
};

const check: CheckResult = {
  study: "Hand-made wall (invented)",
  kind: "check",
  at: "mean",
  warnings: [],
  cautions: ["An invented caution."],
  values: { [angle]: 32, [level]: 1.7 },
  forces: [
    { name: "Earth", group: "earth", horizontal: 80, vertical: 0, x: 3.7, z: 1.7 },
    { name: "Stem", group: "weight", horizontal: 0, vertical: 43.2, x: 1.1, z: 2.6 },
  ],
  pressure: [
    { z: 5, verticalEffective: 10, horizontal: 2.71, water: 0, loads: 0, soil: "fill" },
    { z: 2, verticalEffective: 67, horizontal: 18.2, water: 0, loads: 0, soil: "fill" },
    { z: 2, verticalEffective: 67, horizontal: 20.6, water: 0, loads: 0, soil: "sand" },
    { z: 0, verticalEffective: 86, horizontal: 26.4, water: 16.7, loads: 0, soil: "sand" },
  ],
  base: {
    vertical: 250,
    horizontal: 90,
    resultantX: 1.6,
    eccentricity: 0.25,
    effectiveWidth: 3.2,
    pressureToe: 95,
    pressureHeel: 40.1,
  },
  limitStates: {
    sliding: { factorOfSafety: 1.8, resisting: 162, driving: 90, unit: "kN/m" },
    bearing: { factorOfSafety: 5.25, resisting: 410, driving: 78.1, unit: "kPa" },
  },
  sheet: [
    {
      heading: "Outline",
      symbol: "B",
      text: "width of the base",
      formula: "toe + foot + heel",
      substituted: "0.8 + 0.5 + 2.4",
      value: 3.7,
      unit: "m",
    },
    {
      heading: "Earth pressure, Fill",
      symbol: "Ka",
      text: "active earth pressure coefficient",
      formula: "tan²(45° − φ/2)",
      substituted: "tan²(45° − 35°/2)",
      value: 0.271,
      unit: "–",
      source: "Rankine (1857)",
    },
    {
      heading: "Earth pressure, Sand",
      symbol: "Ka",
      text: "active earth pressure coefficient",
      formula: "tan²(45° − φ/2)",
      substituted: "tan²(45° − 32°/2)",
      value: 0.307,
      unit: "–",
      source: "Rankine (1857)",
    },
    {
      heading: "Earth pressure, Fill",
      symbol: "p_bottom",
      text: "pressure at its bottom",
      formula: "K·σ′v",
      substituted: "0.271·67",
      value: 18.2,
      unit: "kPa",
    },
  ],
  marks: [],
  section: {
    baseWidth: 3.7,
    toe: 0.8,
    footWidth: 0.5,
    heel: 2.4,
    baseThickness: 0.5,
    stemHeight: 4.5,
    crestWidth: 0.3,
    backRun: 0,
    frontRun: 0.2,
    slope: 0,
    plane: "virtual_back",
    planeTop: 5,
    layers: [
      { soil: "fill", name: "Gravel fill", bottom: 2 },
      { soil: "sand", name: "Medium sand" },
    ],
    below: { soil: "sand", name: "Medium sand" },
    front: { level: 0.9, soil: "sand", name: "Medium sand", ignoreTop: 0, toeSoil: true, passive: false },
    water: { behind: 1.7, front: 0.4, flow: "hydrostatic" },
    surcharge: 10,
    strips: [],
    lines: [],
    undersideLevel: 0,
  },
};

export const handMade: ReportInput = { study: readDocument(gallery.plain), check, assess };
