import type { JointSpace } from "../probability/marginal.ts";
import type { DesignPoint, DesignPointSearch } from "../reliability/design-points.ts";
import { failureCentres, type MixturePart, mixtureOf, wholeMove } from "../reliability/failure-mixture.ts";
import type { RemadeAt } from "../reliability/first-order.ts";
import type { LimitStates } from "../reliability/limit-states.ts";
import type { FailureEvent } from "../reliability/point-evaluator.ts";
import type { Driver, FailurePicture, FirstOrderResult } from "../results.ts";
import { type DriverMeasures, type RankedDriver, rankDrivers } from "./driver-ranking.ts";
import { weightedFailurePicture } from "./failure-picture.ts";
import { failureSample } from "./failure-sample.ts";
import { type ProbabilityDerivatives, probabilityDerivatives } from "./probability-derivatives.ts";
import { type RankCorrelation, rankCorrelations } from "./rank-correlation.ts";
import { type VarianceIndex, type VarianceIndices, varianceIndices } from "./variance-indices.ts";

export interface StateDrivers {
  /** All measures of every unknown in one table, strongest first. */
  readonly ranking: readonly RankedDriver[];
  readonly varianceIndices: Readonly<Record<string, { readonly first: VarianceIndex; readonly total: VarianceIndex }>>;
  /** What the indices are of, and whether correlation changes their meaning. */
  readonly indicesOf: VarianceIndices["of"];
  readonly correlated: boolean;
  readonly rankCorrelations: Readonly<Record<string, RankCorrelation>>;
  readonly derivatives: readonly ProbabilityDerivatives[];
  readonly failurePicture: readonly FailurePicture[];
}

export interface SystemDrivers {
  readonly derivatives: readonly ProbabilityDerivatives[];
  readonly failurePicture: readonly FailurePicture[];
}

export interface FullDrivers {
  /** One per limit state. */
  readonly states: readonly StateDrivers[];
  readonly system: SystemDrivers;
}

export interface FullDriversInput {
  readonly states: LimitStates;
  readonly space: JointSpace;
  readonly seed: string;
  readonly search: DesignPointSearch;
  /** One per limit state. */
  readonly firstOrder: readonly FirstOrderResult[];
  /** The short tables, one per limit state: shares, adverse ends, shifts from plain sampling. */
  readonly drivers: readonly (readonly Driver[])[];
  readonly remadeAt?: RemadeAt;
  /** Samples for derivatives and failure pictures, per limit state and for the system. */
  readonly samples?: number;
  /** Points of one replicate of the variance indices. */
  readonly points?: number;
}

/** Nearer than this, failures are frequent enough to be drawn plainly. */
const plainUpTo = 1.5;

/**
 * The full set of measures of what drives a wall's failure, for each limit state and the system.
 *
 * Costs samples × (limit states + 1) + 16 × points × (2 + unknowns) + 4096 evaluations, twice the middle term with correlation.
 */
export function fullDrivers(input: FullDriversInput): FullDrivers {
  const { states, space, seed, search, firstOrder, remadeAt, samples = 8192 } = input;
  const indices = varianceIndices(states, space, {
    seed,
    ...(input.points === undefined ? {} : { points: input.points }),
  });
  const ranks = rankCorrelations(states, space, seed);
  const failing = (points: readonly DesignPoint[], event: FailureEvent): SystemDrivers => {
    const sample = failureSample(states, partsFor(points), { seed: `${seed}, ${event}`, samples });
    const own = event === "system" ? undefined : firstOrder[event];
    return {
      derivatives: probabilityDerivatives(space, sample, event, own, remadeAt),
      failurePicture: weightedFailurePicture(space, sample, event),
    };
  };
  return {
    states: states.names.map((_, k): StateDrivers => {
      const found = failing(search.states[k].points, k);
      const { first, total, of, correlated } = indices[k];
      const byPath = <T>(value: (place: number) => T): Readonly<Record<string, T>> =>
        Object.fromEntries(space.unknowns.map(({ path }, place) => [path, value(place)]));
      return {
        ranking: rankDrivers(measuresOf(input, k, indices[k], ranks[k], found.failurePicture)),
        varianceIndices: byPath((place) => ({ first: first[place], total: total[place] })),
        indicesOf: of,
        correlated,
        rankCorrelations: byPath((place) => ranks[k][place]),
        ...found,
      };
    }),
    system: failing(
      search.states.flatMap(({ points }) => points),
      "system",
    ),
  };
}

/** Around the design points where failure is rare; plain where it is not, or where no point is known. */
function partsFor(points: readonly DesignPoint[]): readonly MixturePart[] {
  const nearest = Math.min(...points.map(({ reliabilityIndex }) => reliabilityIndex));
  return Number.isFinite(nearest) && nearest > plainUpTo ? mixtureOf(failureCentres(points), wholeMove) : [];
}

function measuresOf(
  { space, drivers, firstOrder }: FullDriversInput,
  k: number,
  indices: VarianceIndices,
  ranks: readonly RankCorrelation[],
  picture: readonly FailurePicture[],
): readonly DriverMeasures[] {
  const table = new Map(drivers[k].map((driver) => [driver.path, driver]));
  const pictures = new Map(picture.map((one) => [one.path, one]));
  return space.unknowns.map(({ path, marginal, knowledge }, place) => {
    const short = table.get(path);
    const own = pictures.get(path);
    const shift = own === undefined ? null : (own.meanGivenFailure - marginal.mean) / marginal.sd;
    return {
      path,
      adverse: short?.adverse ?? "unclear",
      knowledge,
      share: short?.share ?? null,
      importance: firstOrder[k].importance[path] ?? null,
      firstIndex: indices.first[place].value,
      totalIndex: indices.total[place].value,
      rankCorrelation: ranks[place].value,
      shiftGivenFailure: shift ?? short?.shiftGivenFailure ?? null,
    };
  });
}
