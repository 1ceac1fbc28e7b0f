/** What an engineer should know about a probability before she signs it. Sentences, never refusals. */
import type { AssessResult } from "./results.ts";
import type { Notice, Study } from "./study/study.ts";

export function assessmentNotes(study: Study, result: AssessResult): readonly Notice[] {
  return [
    ...methodsDisagree(result),
    ...doubtfulEstimate(result),
    ...modelUncertainty(study),
    ...unstableSamples(result),
    ...strays(result),
    ...noFailures(result),
    ...fewAgree(result),
    ...unfinished(result),
    ...groundAsItIs(study),
    ...overturningLast(result),
  ];
}

/** Two independent methods that part by more than chance: the first thing to know. */
function methodsDisagree({ bestEstimate: { method, probability, crossCheck } }: AssessResult): readonly Notice[] {
  if (crossCheck === undefined || crossCheck.agrees) return [];
  return [
    {
      path: "",
      message: `two methods disagree by more than chance: ${method} sampling gives ${probability.toPrecision(3)}, ${crossCheck.method} sampling ${crossCheck.probability.toPrecision(3)}; rely on neither until it is known why (more samples, another seed, --method)`,
    },
  ];
}

function doubtfulEstimate({ bestEstimate: { method, doubts = [] } }: AssessResult): readonly Notice[] {
  if (doubts.length === 0) return [];
  return [{ path: "", message: `the best estimate, by ${method} sampling, is in doubt: ${doubts.join("; ")}` }];
}

/** Published figures that may serve where nothing better is known; JCSS Probabilistic Model Code, 3.7 (2006). */
function modelUncertainty(study: Study): readonly Notice[] {
  const { factors } = study.model;
  const certain = (value: unknown): boolean => typeof value === "number";
  if (!certain(factors.earthThrust) || !certain(factors.baseResistance) || !certain(factors.bearingCapacity)) return [];
  return [
    {
      path: "model.factors",
      message:
        "no model uncertainty is given: the probability takes the formulas as exact. JCSS Probabilistic Model Code, part 3.7 (2006), suggests factors with mean 1.0 and standard deviation 0.10 for the stability of retaining walls, 0.15 for shallow foundations on homogeneous ground and 0.20 otherwise",
    },
  ];
}

function unstableSamples(result: AssessResult): readonly Notice[] {
  const { counts, samples, probabilityAmongStable } = result.system.monteCarlo;
  if (counts.slopeUnstable === 0 || probabilityAmongStable === undefined) return [];
  return [
    {
      path: "ground.behind.slope",
      message: `in ${counts.slopeUnstable} of ${samples} samples the slope is steeper than the soil behind the wall can bear; among the others the probability of failure is ${probabilityAmongStable.toPrecision(3)}`,
    },
  ];
}

/** A sample beyond a physical limit is taken at the limit: shown where that is frequent or matters beside the failures. */
function strays(result: AssessResult): readonly Notice[] {
  const { counts, samples, failures } = result.system.monteCarlo;
  if (counts.outOfRange === 0) return [];
  if (counts.outOfRange <= samples / 1000 && counts.outOfRange <= failures / 100) return [];
  return [
    {
      path: "",
      message: `${counts.outOfRange} of ${samples} samples had a value outside its physical range and were taken at the limit (${failures} samples failed); choose a distribution that ends there`,
    },
  ];
}

function noFailures(result: AssessResult): readonly Notice[] {
  const { failures, samples, interval } = result.system.monteCarlo;
  if (failures > 0 || samples === 0) return [];
  const elsewhere =
    result.bestEstimate.method === "plain" || !(result.bestEstimate.probability > 0)
      ? ""
      : `; the best estimate rests on ${result.bestEstimate.method} sampling`;
  return [
    {
      path: "assessment.samples",
      message: `no failure in ${samples} plain samples: this says only that the probability is below ${interval[1].toPrecision(2)} with 97.5 % confidence, not that the wall cannot fail${elsewhere}`,
    },
  ];
}

/** Plain sampling sees little where the evidence was not to be expected. */
function fewAgree({ evidence, system, bestEstimate }: AssessResult): readonly Notice[] {
  const { samples } = system.monteCarlo;
  if (evidence === undefined || samples >= 1000) return [];
  return [
    {
      path: "evidence",
      message: `only ${samples} plain samples agree with what has been seen: the probabilities of single limit states are hardly known${bestEstimate.method === "plain" ? "" : ", the best estimate is"}`,
    },
  ];
}

function unfinished(result: AssessResult): readonly Notice[] {
  return result.run.complete
    ? []
    : [
        {
          path: "",
          message: `stopped before the end: what is shown rests on the first ${result.run.sampling.evaluations} samples`,
        },
      ];
}

function groundAsItIs(study: Study): readonly Notice[] {
  if (study.assessment.period !== undefined) return [];
  return [
    {
      path: "assessment",
      message: "no value in the study is yearly: the probability holds for the ground as it is, and is not per year",
    },
  ];
}

function overturningLast(result: AssessResult): readonly Notice[] {
  if (result.limitStates.overturning === undefined) return [];
  return [
    {
      path: "assessment.limit_states",
      message: "overturning about the toe by itself normally comes after bearing failure: read the two together",
    },
  ];
}
