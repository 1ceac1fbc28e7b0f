/** Schema of evidence and decision. */

import { defaults, limitStateNames } from "./defaults.ts";
import { leaf } from "./distribution-keys.ts";
import { pathText } from "./schema-assessment.ts";
import { about, flag, group } from "./schema-words.ts";
import * as z from "./zod.ts";

const plainNumber = (description: string, example: number): z.ZodType =>
  leaf({ number: "of_path", description, examples: [example] });

export const evidence: z.ZodObject = group("One piece of evidence: results of tests, or survival under loads", {
  results: z
    .array(plainNumber("One result", 34.1))
    .min(1)
    .optional()
    .meta(about("Results of tests on one variable, in its unit", [34.1, 36.0, 33.2])),
  of: pathText.optional(),
  error: plainNumber("Standard deviation of one result about the true mean, soil scatter included", 1.5).optional(),
  transformation: z
    .number()
    .min(0)
    .optional()
    .meta({
      ...about("Error that all the results share, as a share of the mean", 0.05),
      wanted: "a number of at least 0",
    }),
  survived: z
    .record(z.string(), leaf({ number: "of_path", description: "Value it stood under", examples: [2.6] }))
    .optional()
    .meta(about("Values under which the wall stood, by path", { "water.behind.level": 2.6 })),
});

const money = z.number().min(0);
const perLimitState = Object.fromEntries(
  limitStateNames.map((name) => [name, money.optional().meta(about(`Cost of a failure by ${name}`, 900000))]),
);

const tests = z.number().int().min(1);
const testCount = tests.meta({ ...about("Number of tests", 6), wanted: "a whole number of tests from 1" });
const testError = plainNumber(
  "Standard deviation of one result about the true mean, soil scatter included",
  1.5,
).optional();
const testShared = z
  .number()
  .min(0)
  .optional()
  .meta({
    ...about("Error that all the results share, as a share of the mean", 0.05),
    wanted: "a number of at least 0",
  });
const informed = group("One variable an investigation tells about", {
  path: pathText,
  tests: testCount,
  error: testError,
  transformation: testShared,
});

export const decision: z.ZodObject = group("What can be done, what it costs, and what could be investigated first", {
  currency: z
    .string()
    .optional()
    .meta(about("Currency of all costs", "EUR", "")),
  failure_cost: z.union([money, group("Cost of failure by limit state", perLimitState)]).meta({
    ...about("Cost of failure: a number, or one per limit state", 900000),
    wanted: "a cost of at least 0, or one per limit state,",
  }),
  must_meet_target: flag(
    "Options that miss the target are out, but for those marked always_open",
    defaults.mustMeetTarget,
  ),
  options: z
    .array(
      group("One option; the first is the base case", {
        name: z.string().meta(about("Name of the option", "Heel 0.5 m longer")),
        cost: money.meta({ ...about("Price of the option", 21000), wanted: "a cost of at least 0" }),
        change: z
          .record(z.string(), z.unknown())
          .optional()
          .meta(about("What the option changes in the study, by path", { "wall.base.heel": 2.9 })),
        always_open: flag("Stays open even where it misses the target", defaults.alwaysOpen),
      }),
    )
    .min(1)
    .meta(about("What can be done; the first is the base case", [{ name: "Build as drawn", cost: 0 }])),
  investigations: z
    .array(
      group("One investigation: informs a path with tests, or a list of them", {
        name: z.string().meta(about("Name of the investigation", "Six shear-box tests on the sand")),
        cost: money.optional().meta({ ...about("Price of the investigation", 6500), wanted: "a cost of at least 0" }),
        informs: z.union([pathText, z.array(informed).min(1)]).meta({
          ...about("What it tells about: a path, or a list of path and tests", "soils.sand.friction_angle"),
          wanted: "a path, or a list of { path, tests, error },",
        }),
        tests: testCount.optional(),
        error: testError,
        transformation: testShared,
      }),
    )
    .optional()
    .meta(
      about("Investigations that could be bought", [
        { name: "Six shear-box tests", cost: 6500, informs: "soils.sand.friction_angle", tests: 6, error: 1.5 },
      ]),
    ),
});
