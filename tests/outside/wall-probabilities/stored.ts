/** Shapes of the stored results. */
import { readFileSync } from "node:fs";
import type { SamplingMethod } from "../../../src/reliability/sampling-estimate.ts";
import type { NamedWall } from "./walls.ts";

export interface Known {
  readonly probability: number;
  readonly standardError: number;
}

interface Counted {
  readonly samples: number;
  readonly failures: number;
}

interface Spread {
  readonly median: number;
  readonly of99in100: number;
  readonly largest: number;
}

export interface Rare {
  readonly cost: readonly {
    readonly wall: NamedWall;
    readonly unknowns: number;
    readonly truth: Known;
    readonly seeds: number;
    readonly evaluations: Spread;
    readonly coefficientOfVariation: Spread;
    readonly seconds: Spread;
    readonly farthestInStandardErrors: number;
    readonly first: readonly (Known & { readonly evaluations: number })[];
  }[];
  readonly drains: {
    readonly wall: NamedWall;
    readonly seeds: number;
    readonly withBothPoints: number;
    readonly first: { readonly least: number; readonly most: number };
    readonly second: { readonly least: number; readonly most: number };
    readonly farthestInStandardErrors: number;
  };
}

export interface BatteryRow {
  readonly wall: NamedWall;
  readonly best: Known & {
    readonly method: SamplingMethod;
    readonly interval: readonly [number, number];
    readonly evaluations: number;
    readonly agrees: boolean;
    readonly doubts: readonly string[];
  };
  readonly sharp: Known;
  readonly counted?: Counted;
  readonly subset?: Known;
}

export interface WallCoverage {
  readonly wall: NamedWall;
  readonly truth: Known;
  readonly counted: Counted;
  readonly methods: readonly {
    readonly method: SamplingMethod;
    readonly seeds: number;
    readonly covered: number;
    readonly tooLow: number;
    readonly tooHigh: number;
    readonly doubted: number;
    /** Of the first seeds. */
    readonly first: readonly Known[];
    readonly meanOverTruth: number;
    readonly meanEvaluations: number;
  }[];
}

export const stored = <T>(name: string): T =>
  JSON.parse(readFileSync(new URL(`${name}.json`, import.meta.url), "utf8")) as T;
