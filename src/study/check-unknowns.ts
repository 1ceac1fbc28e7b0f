/** Checks between values: correlations, evidence and investigations name uncertain values of this study. */
import type { CheckContext } from "./check-context.ts";
import { fieldOfPath } from "./fields.ts";
import { isRecord, valueAt } from "./paths.ts";
import { quantitiesOf, quantityAt } from "./quantities.ts";
import type { Correlation, UncertainQuantity } from "./study.ts";
import { didYouMean } from "./suggest.ts";

/** @returns the correlations between uncertain values: one with a certain number has nothing to act on, and a note says so */
export function checkCorrelations(context: CheckContext): readonly Correlation[] {
  const seen = new Map<string, number>();
  return context.study.correlations.filter((correlation, i) =>
    checkPair(context, correlation, `correlations.${i}`, seen, i),
  );
}

function checkPair(
  context: CheckContext,
  { between }: Correlation,
  path: string,
  seen: Map<string, number>,
  i: number,
): boolean {
  const known = between.map((one, k) => one !== "" && checkPath(context, one, `${path}.between.${k}`));
  if (!known.every(Boolean)) return false;
  const [first, second] = between;
  if (first === second) {
    context.problem(`${path}.between`, `${first} is paired with itself`);
    return false;
  }
  const pair = [...between].sort().join(" ");
  const earlier = seen.get(pair);
  if (earlier !== undefined)
    context.problem(path, `this pair already stands in correlations.${earlier}`, "keep one of the two");
  seen.set(pair, i);
  const certain = between.filter((one) => typeof quantityAt(context.study, one) === "number");
  for (const one of certain)
    context.notice(`${path}.between`, `${one} is a certain number, so this correlation has no effect`);
  return certain.length === 0;
}

/** Whether the path names a quantity of the study; a problem with the nearest one where it does not. */
function checkPath({ study, problem, changed }: CheckContext, named: string, where: string): boolean {
  if (quantityAt(study, named) !== undefined) return true;
  if (changed && fieldOfPath(named) !== undefined) return false;
  const paths = quantitiesOf(study).map((entry) => entry.path);
  const field = fieldOfPath(named);
  const otherwise =
    field === undefined
      ? "a variable is named by its path, such as soils.sand.friction_angle"
      : "the study gives no value there";
  problem(where, `"${named}" is not a value of this study`, didYouMean(named, paths, otherwise));
  return false;
}

/**
 * What tests on a path can teach: it must be uncertain, a yearly one must state its knowledge, and the error of a test must
 * be known.
 *
 * @param where path of the text that names the variable
 * @param errorAt path where the error of a test stands or would stand
 */
export function checkLearnable(
  context: CheckContext,
  named: string,
  where: string,
  errorAt: string,
): UncertainQuantity | undefined {
  if (named === "" || !checkPath(context, named, where)) return undefined;
  const quantity = quantityAt(context.study, named)!;
  if (typeof quantity === "number") {
    if (!context.changed && !Number.isNaN(quantity))
      context.problem(where, `${named} is a certain number: a test has nothing to teach`, "give it a distribution");
    return undefined;
  }
  if (quantity.yearly && !statesKnowledge(context, named)) {
    context.problem(
      where,
      `${named} is yearly, and only what its knowledge says can be learned; it states none`,
      `give knowledge beside yearly: true at ${named}`,
    );
  }
  if (!context.read.has(errorAt) && !quantity.scatter) {
    const message = "is missing: the standard deviation of one result about the true mean, soil scatter included";
    context.problem(errorAt, message, "for example error: 1.5; only a variable with scatter does without");
  }
  return quantity;
}

function statesKnowledge({ read }: CheckContext, path: string): boolean {
  const raw = valueAt(read.tree, path);
  return isRecord(raw) && raw.knowledge !== undefined;
}
