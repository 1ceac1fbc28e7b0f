/** Checks between values: evidence and the decision. */
import { StudyError } from "../errors.ts";
import type { CheckContext } from "./check-context.ts";
import { checkLearnable } from "./check-unknowns.ts";
import { fieldOfPath, fields } from "./fields.ts";
import { distributionMean } from "./moments.ts";
import { isRecord, valueAt } from "./paths.ts";
import { brief } from "./read-number.ts";
import type { UncertainQuantity } from "./study.ts";
import { didYouMean } from "./suggest.ts";

/** Reads the study with some paths changed; used to try options and observed loads. */
export type TryChange = (changes: Readonly<Record<string, unknown>>) => void;

export function checkEvidence(context: CheckContext, tryChange: TryChange): void {
  for (const [i] of context.read.list("evidence").entries()) {
    const path = `evidence.${i}`;
    const raw = valueAt(context.read.tree, path);
    if (!isRecord(raw)) continue;
    if (typeof raw.of === "string" && Array.isArray(raw.results)) checkResults(context, raw, path);
    if (isRecord(raw.survived)) checkSurvival(context, raw.survived, `${path}.survived`, tryChange);
  }
}

function checkResults(context: CheckContext, raw: Record<string, unknown>, path: string): void {
  const quantity = checkLearnable(context, raw.of as string, `${path}.of`, `${path}.error`);
  if (quantity === undefined) return;
  const results = raw.results as unknown[];
  noteDoubleUse(context, quantity, results, path);
  if (quantity.scatter && typeof raw.error === "number") noteSmallError(context, quantity, raw.error, `${path}.error`);
}

/** The same numbers as belief and as evidence would count twice. */
function noteDoubleUse(
  context: CheckContext,
  quantity: UncertainQuantity,
  results: readonly unknown[],
  path: string,
): void {
  const { distribution, scatter } = quantity;
  const same =
    distribution.kind === "measured"
      ? results.filter((one) => typeof one === "number" && distribution.values.includes(one))
      : [];
  if (same.length > 0) {
    context.notice(
      `${path}.results`,
      `${same.join(", ")} also stand among the measured values of this variable: the same tests would count twice`,
    );
  }
  if (scatter && scatter.tests > 1 && scatter.tests === results.length) {
    context.notice(
      `${path}.results`,
      `${results.length} results, and scatter already rests on ${scatter.tests} tests: if they are the same, they count twice`,
    );
  }
}

function noteSmallError(context: CheckContext, quantity: UncertainQuantity, error: number, path: string): void {
  const inherent = quantity.scatter!.inherent * Math.abs(distributionMean(quantity.distribution));
  if (error >= inherent) return;
  context.notice(
    path,
    `${brief(error)} is less than the inherent scatter ${brief(inherent)} of this soil; the error of a result includes it`,
  );
}

function checkSurvival(
  context: CheckContext,
  survived: Record<string, unknown>,
  path: string,
  tryChange: TryChange,
): void {
  const known = Object.keys(survived).filter((name) => knownPath(context, name, `${path}.${name}`));
  if (known.length === Object.keys(survived).length) relay(context, survived, path, tryChange);
}

function knownPath(context: CheckContext, name: string, where: string): boolean {
  if (fieldOfPath(name) !== undefined) return true;
  const patterns = fields.map((field) => field.pattern);
  context.keyProblem(
    where,
    `"${name}" is not the path of a value`,
    didYouMean(name, patterns, "for example water.behind.level"),
  );
  return false;
}

/** Tries the change; what is wrong with the changed study is wrong with the change. */
function relay(context: CheckContext, changes: Record<string, unknown>, path: string, tryChange: TryChange): void {
  if (Object.keys(changes).length === 0) return;
  try {
    tryChange(changes);
  } catch (error) {
    if (!(error instanceof StudyError)) throw error;
    const known = new Set(context.read.findings.problems.map((problem) => `${problem.path}: ${problem.message}`));
    for (const { path: inside, message, hint } of error.problems) {
      if (known.has(`${inside}: ${message}`)) continue; // wrong without the change already
      const cause = Object.keys(changes).find(
        (name) => inside === name || inside.startsWith(`${name}.`) || name.startsWith(`${inside}.`),
      );
      if (cause !== undefined) context.problem(`${path}.${inside === cause ? cause : inside}`, message, hint);
      else context.problem(path, `with this change, ${inside}: ${message}`, hint);
    }
  }
}

export function checkDecision(context: CheckContext, tryChange: TryChange): void {
  const { decision } = context.study;
  if (!decision || context.changed) return;
  checkNames(
    context,
    "options",
    decision.options.map((option) => option.name),
  );
  checkNames(
    context,
    "investigations",
    decision.investigations.map((one) => one.name),
  );
  checkFailureCost(context);
  checkMustMeetTarget(context);
  for (const [i, option] of decision.options.entries()) {
    const path = `decision.options.${i}`;
    if (i === 0 && Object.keys(option.change).length > 0)
      context.notice(path, "the first option is the base case, yet it changes the study");
    relay(context, { ...option.change }, `${path}.change`, tryChange);
  }
  for (const [i] of decision.investigations.entries()) checkInvestigation(context, i);
}

function checkInvestigation(context: CheckContext, i: number): void {
  const path = `decision.investigations.${i}`;
  const listed = Array.isArray(valueAt(context.read.tree, `${path}.informs`));
  for (const [k, informed] of context.study.decision!.investigations[i]!.informs.entries()) {
    const entry = listed ? `${path}.informs.${k}` : path;
    const where = listed ? `${entry}.path` : `${path}.informs`;
    const quantity = checkLearnable(context, informed.path, where, `${entry}.error`);
    if (quantity?.scatter && informed.error !== undefined)
      noteSmallError(context, quantity, informed.error, `${entry}.error`);
  }
}

function checkNames(context: CheckContext, list: string, names: readonly string[]): void {
  for (const [i, name] of names.entries()) {
    if (name !== "" && names.indexOf(name) < i)
      context.problem(
        `decision.${list}.${i}.name`,
        `"${name}" is the name of an earlier one too`,
        "give each a name of its own",
      );
  }
}

/** With costs per limit state, every listed limit state needs one. */
function checkFailureCost({ study, read, problem, notice }: CheckContext): void {
  const path = "decision.failure_cost";
  const raw = valueAt(read.tree, path);
  if (!isRecord(raw)) return;
  for (const name of study.assessment.limitStates) {
    if (raw[name] === undefined)
      problem(path, `gives no cost for ${name}, which is a limit state of this study`, `add ${name}: …`);
  }
  for (const name of Object.keys(raw)) {
    if (!study.assessment.limitStates.some((one) => one === name))
      notice(`${path}.${name}`, "has no effect: the limit state is not listed");
  }
}

function checkMustMeetTarget({ study, problem, notice }: CheckContext): void {
  const { mustMeetTarget, options } = study.decision!;
  const open = options.some((option) => option.alwaysOpen);
  if (!mustMeetTarget) {
    if (open) notice("decision.options", "always_open has no effect without must_meet_target: true");
    return;
  }
  if (!study.assessment.target) problem("decision.must_meet_target", "needs a target", "give assessment.target");
  if (!open)
    problem(
      "decision.options",
      "with must_meet_target, at least one option must be marked always_open: true",
      "mark what can be done whatever is found",
    );
}
