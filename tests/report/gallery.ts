import { assess } from "../../src/assess.ts";
import { check } from "../../src/check.ts";
import type { ReportInput } from "../../src/results.ts";
import { readDocument } from "../../src/study/read-study.ts";

type Tree = Record<string, unknown>;

const plain: Tree = {
  title: "Gallery wall (invented)",
  wall: {
    stem: { height: 4.5, crest_width: 0.3, foot_width: 0.5 },
    base: { toe: 0.8, heel: 2.4, thickness: 0.5 },
    unit_weight: 24,
    sliding_friction: { ratio: 0.8 },
  },
  soils: {
    fill: { name: "Gravel fill", unit_weight: 19, friction_angle: { normal: { mean: 35, sd: 2.5 } } },
    sand: { name: "Medium sand", unit_weight: 18, friction_angle: { normal: { mean: 32, sd: 2.5 } } },
  },
  ground: {
    behind: { layers: [{ soil: "fill", bottom: 2 }, { soil: "sand" }] },
    below: { soil: "sand" },
    front: { level: 0.9 },
  },
  water: { behind: { level: { triangular: { from: 0, peak: 1.5, to: 3.5 } } }, front: { level: 0.4 } },
  loads: { surcharge: { pressure: 10 } },
  assessment: { seed: "gallery", samples: 6000, precision: 0 },
};

const merged = (...parts: readonly Tree[]): Tree =>
  parts.reduce<Tree>((tree, part) => {
    const out: Tree = { ...tree };
    for (const [key, value] of Object.entries(part)) {
      const before = out[key];
      const both = [before, value].every((side) => typeof side === "object" && side !== null && !Array.isArray(side));
      if (value === undefined) delete out[key];
      else
        out[key] =
          both && !("normal" in (value as Tree)) && !("normal" in (before as Tree))
            ? merged(before as Tree, value as Tree)
            : value;
    }
    return out;
  }, {});

const soil = (k: number): Tree => ({
  name: `Layer ${k} of stiff, thinly bedded, slightly gravelly silty sand`,
  unit_weight: { normal: { mean: 18 + 0.1 * k, sd: 0.8 } },
  friction_angle: { lognormal: { mean: 30 + 0.5 * k, sd: 2 } },
});

/** Studies that a report has been known to look wrong on. */
export const gallery: Readonly<Record<string, Tree>> = {
  plain,
  "no water": merged(plain, { water: undefined }),
  "zero failures": merged(plain, { wall: { base: { heel: 9 } }, water: undefined }),
  "certain failure": merged(plain, { wall: { sliding_friction: { ratio: 0.05 } } }),
  "nothing uncertain": merged(plain, {
    soils: { fill: { friction_angle: 35 }, sand: { friction_angle: 32 } },
    water: { behind: { level: 1.5 } },
  }),
  "US units": {
    ...plain,
    units: "us",
    wall: {
      stem: { height: 15, crest_width: 1, foot_width: 1.5 },
      base: { toe: 2.5, heel: 8, thickness: 1.6 },
      unit_weight: 150,
      sliding_friction: { ratio: 0.8 },
    },
    soils: {
      fill: { unit_weight: 120, friction_angle: { normal: { mean: 35, sd: 2.5 } } },
      sand: { unit_weight: 115, friction_angle: { normal: { mean: 32, sd: 2.5 } } },
    },
    ground: {
      behind: { slope: 10, layers: [{ soil: "fill", bottom: 6 }, { soil: "sand" }] },
      below: { soil: "sand" },
      front: { level: 3 },
    },
    water: { behind: { level: 4 } },
    loads: { surcharge: { pressure: 250 } },
  },
  "twelve layers and twenty-four unknowns": merged(plain, {
    title:
      "A very long title, as they are written when several departments have had their say about the name of a single retaining wall (invented)",
    soils: Object.fromEntries(Array.from({ length: 12 }, (_, k) => [`layer_${k}`, soil(k)])),
    ground: {
      behind: {
        layers: Array.from({ length: 12 }, (_, k) => ({
          soil: `layer_${k}`,
          ...(k < 11 ? { bottom: 4.6 - 0.4 * k } : {}),
        })),
      },
      below: { soil: "layer_11" },
    },
  }),
  "hostile words": merged(plain, {
    title: "<script>alert(\"x\")</script> & 'quotes'",
    notes: "</style><img src=x onerror=alert(1)>",
    soils: {
      fill: {
        name: '"><svg onload=alert(1)>',
        unit_weight: 19,
        friction_angle: { value: 35, source: "<b>bold</b> &amp; {{x}} ${y}" },
      },
    },
  }),
  "key, loads, earthquake and cohesion on a slope": merged(plain, {
    wall: { shear_key: { depth: 0.5, width: 0.4, from_toe: 2 } },
    soils: { fill: { cohesion: 5 } },
    ground: { behind: { slope: 12 }, front: { mobilised: 0.3, ignore_top: 0.3 } },
    loads: {
      strips: [{ pressure: 30, from: 1, width: 2, on_heel: true }],
      lines: [{ force: 20, at: 4 }],
      earthquake: { kh: 0.05, kv: 0.02 },
    },
    model: { tension_crack: "water" },
    assessment: { limit_states: ["sliding", "overturning", "bearing", "eccentricity"], eccentricity_limit: 0.333 },
  }),
  "gravity wall with Coulomb on its back": merged(plain, {
    wall: { stem: { height: 4, crest_width: 0.8, foot_width: 2.2, back_run: 0.9 }, base: undefined },
    model: { earth_pressure: "coulomb", wall_friction: 20 },
    water: { behind: { level: 0.8 }, front: undefined },
  }),
};

export async function reportInput(tree: Tree, signal?: AbortSignal): Promise<ReportInput> {
  const study = readDocument(tree);
  return { study, check: check(study), assess: await assess(study, signal === undefined ? {} : { signal }) };
}
