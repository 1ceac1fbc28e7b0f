/**
 * The forms a distribution takes in a study file: one table of kinds and their keys. The zod schema, the JSON Schema and
 * the reading of a distribution all come from it.
 */
import * as z from "./zod.ts";

/**
 * What a key of a distribution holds: a `value` of the quantity (with unit, within its range), a `parent` value (with
 * unit, not bound to the range), a `spread` (with unit, above 0), a `positive` or `nonnegative` number, a `share` in
 * (0, 1], a `portion` in [0, 1], a whole `count` from 1, a `length` above 0.
 */
export type KeyType =
  | "value"
  | "parent"
  | "spread"
  | "positive"
  | "nonnegative"
  | "share"
  | "portion"
  | "count"
  | "length";

export interface DistributionKey {
  readonly type: KeyType;
  readonly required: boolean;
  readonly description: string;
  readonly default?: number;
  readonly example: number;
}

export interface DistributionForm {
  readonly description: string;
  readonly keys: Readonly<Record<string, DistributionKey>>;
  /** `as: normal | lognormal` is allowed. */
  readonly as?: boolean;
  /** A `scatter` beside it may stand in place of cov and sd. */
  readonly scatter?: boolean;
}

const need = (type: KeyType, description: string, example: number): DistributionKey => ({
  type,
  required: true,
  description,
  example,
});
const may = (type: KeyType, description: string, example: number, fallback?: number): DistributionKey => ({
  type,
  required: false,
  description,
  example,
  ...(fallback !== undefined && { default: fallback }),
});

const mean = need("value", "Mean", 34);
const sd = may("spread", "Standard deviation", 2.7);
const cov = may("positive", "Coefficient of variation, sd/|mean|, in place of sd", 0.08);
const shift = may("parent", "Shift: the variable is shift + …", 0, 0);
const from = need("value", "Lowest value", 28);
const to = need("value", "Highest value", 42);

export const distributionForms: Readonly<Record<string, DistributionForm>> = {
  normal: { description: "Normal distribution", keys: { mean, sd, cov }, scatter: true },
  lognormal: {
    description: "Lognormal distribution; mean and sd are those of the variable itself, shift included",
    keys: { mean, sd, cov, shift },
    scatter: true,
  },
  truncated_normal: {
    description: "Normal distribution cut at both ends; mean and sd are those of the uncut parent",
    keys: { mean: need("parent", "Mean of the uncut parent", 34), sd, cov, from, to },
    scatter: true,
  },
  uniform: { description: "Uniform distribution", keys: { from, to } },
  triangular: {
    description: "Triangular distribution",
    keys: { from, peak: need("value", "Likeliest value", 34), to },
  },
  beta: { description: "Beta distribution between two bounds", keys: { from, to, mean, sd, cov }, scatter: true },
  gumbel: { description: "Gumbel distribution of largest values", keys: { mean, sd, cov }, scatter: true },
  weibull: {
    description: "Weibull distribution of smallest values",
    keys: { shape: need("positive", "Shape", 1.8), scale: need("spread", "Scale", 1.2), shift },
  },
  gamma: { description: "Gamma distribution", keys: { mean, sd, cov }, scatter: true },
  range: {
    description: "What an engineer can say: the mean is the likely value, sd = (highest - lowest)/width_in_sd",
    keys: {
      lowest: need("value", "Lowest value that is thought possible", 28),
      likely: need("value", "Likeliest value", 34),
      highest: need("value", "Highest value that is thought possible", 39),
      width_in_sd: may(
        "positive",
        "How many standard deviations the range spans (6 takes it as plus and minus three)",
        4,
        4,
      ),
    },
    as: true,
  },
};

/** Kinds that do not fit the table: a list of parts, a list of numbers. */
export const listForms = ["mixture", "measured"] as const;

export const distributionKinds: readonly string[] = [...Object.keys(distributionForms), ...listForms];

/** A value that is there and not empty; what it means is settled by the reader that knows its unit. */
export function leaf(meta: Record<string, unknown>): z.ZodType<unknown> {
  return z.custom<unknown>((value) => value !== undefined && value !== null).meta(meta);
}

function keySchema(key: DistributionKey): z.ZodType<unknown> {
  const schema = leaf({
    number: key.type,
    description: key.description,
    default: key.default,
    examples: [key.example],
  });
  return key.required ? schema : schema.optional();
}

/** Schema of what stands under a kind's name: `{ mean: 34, sd: 2.7 }`. */
export function formSchema(form: DistributionForm): z.ZodObject {
  const shape: Record<string, z.ZodType> = Object.fromEntries(
    Object.entries(form.keys).map(([name, key]) => [name, keySchema(key)]),
  );
  if (form.as) shape.as = shapeChoice.optional();
  return z.strictObject(shape).meta({ description: form.description });
}

export const shapeChoice: z.ZodType<"normal" | "lognormal"> = z
  .enum(["normal", "lognormal"])
  .meta({ description: "Which distribution is fitted", default: "normal", examples: ["lognormal"] });

export const averagingChoice: z.ZodType<"simple" | "exponential" | "gaussian" | "triangular"> = z
  .enum(["simple", "exponential", "gaussian", "triangular"])
  .meta({ description: "Variance function of the averaging", default: "simple", examples: ["simple"] });

/** Keys of `scatter`: coefficients of variation, lengths, and the number of tests. */
export const scatterKeys: Readonly<Record<string, DistributionKey>> = {
  inherent: may("nonnegative", "Coefficient of variation of the soil from point to point", 0.09, 0),
  scale_of_fluctuation: may("length", "Scale of fluctuation along the averaging length", 1.5),
  averaged_over: may("length", "Length of the failure surface that averages the scatter; no reduction without it", 6),
  measurement: may("nonnegative", "Coefficient of variation of the test's error", 0.03, 0),
  transformation: may(
    "nonnegative",
    "Coefficient of variation of the correlation from test result to property",
    0.05,
    0,
  ),
  tests: may("count", "How many tests the mean rests on", 4, 1),
};

export const scatterSchema: z.ZodObject = z
  .strictObject({
    ...Object.fromEntries(Object.entries(scatterKeys).map(([name, key]) => [name, keySchema(key)])),
    averaging: averagingChoice.optional(),
  })
  .meta({ description: "Second-moment make-up of the spread, in place of cov or sd" });

/** Keys that may stand beside a kind in the same object, with their schemas. */
export const besideKeys: Readonly<Record<string, z.ZodType>> = {
  scatter: scatterSchema.optional(),
  source: z
    .string()
    .optional()
    .meta({ description: "Where the value comes from, shown with the input", examples: ["six shear boxes, 2024"] }),
  yearly: z
    .boolean()
    .optional()
    .meta({ description: "The distribution is of one year's largest value", default: false, examples: [true] }),
  knowledge: leaf({
    number: "portion",
    description: "Only with yearly: share of the variance that is lack of knowledge, the same in every year",
    default: 0,
    examples: [0.2],
  }).optional(),
};

/** Keys that stand beside `measured` only. */
export const measuredKeys: Readonly<Record<string, z.ZodType>> = {
  as: shapeChoice.optional(),
  scale_of_fluctuation: keySchema(scatterKeys.scale_of_fluctuation!),
  averaged_over: keySchema(scatterKeys.averaged_over!),
  averaging: averagingChoice.optional(),
};

export const mixturePartSchema: z.ZodObject = z.strictObject({
  share: leaf({ number: "share", description: "Share of this part; the shares sum to 1", examples: [0.9] }),
  of: leaf({
    distribution: true,
    description: "Distribution of this part",
    examples: [{ triangular: { from: 0, peak: 0.4, to: 1 } }],
  }),
});

/** Schema of an uncertain value of one kind as a whole object, for checking keys and for the JSON Schema. */
export function uncertainSchema(kind: string, nested = false): z.ZodObject {
  const name = `${kind} ${nested}`;
  const known = uncertainSchemas.get(name) ?? makeUncertainSchema(kind, nested);
  uncertainSchemas.set(name, known);
  return known;
}

const uncertainSchemas = new Map<string, z.ZodObject>();

function makeUncertainSchema(kind: string, nested: boolean): z.ZodObject {
  const beside = nested ? {} : besideKeys;
  if (kind === "mixture")
    return z.strictObject({
      mixture: z
        .array(mixturePartSchema)
        .meta({ description: "Weighted parts, such as drains working and drains blocked" }),
      ...beside,
    });
  if (kind === "measured") {
    const values = z.array(leaf({ number: "value", description: "A measured value", examples: [33.1] }));
    return z.strictObject({
      measured: values.meta({
        description: "Measured values, at least four; the fit is widened for their number (Student t)",
        examples: [[33.1, 35.4, 31.8, 36.0]],
      }),
      ...measuredKeys,
      ...beside,
    });
  }
  return z.strictObject({ [kind]: formSchema(distributionForms[kind]!), ...beside });
}

/** `{ value: 34, source: … }`. */
export const certainSchema: z.ZodObject = z.strictObject({
  value: leaf({ number: "value", description: "The value", examples: [34] }),
  source: besideKeys.source!,
});
