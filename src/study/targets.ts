/** Published target reliabilities that a study may name. None is a default: which of them holds is for codes and owners. */

export interface NamedTarget {
  readonly name: string;
  readonly reliabilityIndex: number;
  /** Years; absent where the source gives none. */
  readonly period?: number;
  readonly source: string;
  /** The figures were recalled, not read in the publication. */
  readonly fromMemory: boolean;
}

function list(
  source: string,
  fromMemory: boolean,
  rows: readonly (readonly [string, number, number?])[],
): NamedTarget[] {
  return rows.map(([name, reliabilityIndex, period]) => ({
    name,
    reliabilityIndex,
    ...(period !== undefined && { period }),
    source,
    fromMemory,
  }));
}

export const namedTargets: readonly NamedTarget[] = [
  ...list("EN 1990:2002, Table B2", false, [
    ["en1990_rc3_1_year", 5.2, 1],
    ["en1990_rc3_50_years", 4.3, 50],
    ["en1990_rc2_1_year", 4.7, 1],
    ["en1990_rc2_50_years", 3.8, 50],
    ["en1990_rc1_1_year", 4.2, 1],
    ["en1990_rc1_50_years", 3.3, 50],
  ]),
  ...list(
    "JCSS Probabilistic Model Code, part 1, Table 7.1 (ultimate limit states; relative cost of safety and consequences)",
    false,
    [
      ["jcss_cost_large_consequences_minor_1_year", 3.1, 1],
      ["jcss_cost_large_consequences_moderate_1_year", 3.3, 1],
      ["jcss_cost_large_consequences_large_1_year", 3.7, 1],
      ["jcss_cost_normal_consequences_minor_1_year", 3.7, 1],
      ["jcss_cost_normal_consequences_moderate_1_year", 4.2, 1],
      ["jcss_cost_normal_consequences_large_1_year", 4.4, 1],
      ["jcss_cost_small_consequences_minor_1_year", 4.2, 1],
      ["jcss_cost_small_consequences_moderate_1_year", 4.4, 1],
      ["jcss_cost_small_consequences_large_1_year", 4.7, 1],
    ],
  ),
  ...list("ISO 2394:1998, Table E.2, lifetime targets (relative cost of safety and consequences)", true, [
    ["iso2394_cost_high_consequences_small_lifetime", 0],
    ["iso2394_cost_high_consequences_some_lifetime", 1.5],
    ["iso2394_cost_high_consequences_moderate_lifetime", 2.3],
    ["iso2394_cost_high_consequences_great_lifetime", 3.1],
    ["iso2394_cost_moderate_consequences_small_lifetime", 1.3],
    ["iso2394_cost_moderate_consequences_some_lifetime", 2.3],
    ["iso2394_cost_moderate_consequences_moderate_lifetime", 3.1],
    ["iso2394_cost_moderate_consequences_great_lifetime", 3.8],
    ["iso2394_cost_low_consequences_small_lifetime", 2.3],
    ["iso2394_cost_low_consequences_some_lifetime", 3.1],
    ["iso2394_cost_low_consequences_moderate_lifetime", 3.8],
    ["iso2394_cost_low_consequences_great_lifetime", 4.3],
  ]),
  ...list("USACE ETL 1110-2-547 (1995, 1997), Table B-1, expected performance levels", true, [
    ["usace_high", 5],
    ["usace_good", 4],
    ["usace_above_average", 3],
    ["usace_below_average", 2.5],
    ["usace_poor", 2],
    ["usace_unsatisfactory", 1.5],
    ["usace_hazardous", 1],
  ]),
];

export const targetNames: [string, ...string[]] = namedTargets.map((entry) => entry.name) as [string, ...string[]];

export function namedTarget(name: string): NamedTarget | undefined {
  return namedTargets.find((entry) => entry.name === name);
}
