import type { Kernel } from "../../src/mechanics/kernel.ts";
import { prepareWall } from "../../src/mechanics/prepare-wall.ts";
import { type ReadOut, readOut } from "../../src/mechanics/read-out.ts";
import { createWorkspace, type Workspace } from "../../src/mechanics/workspace.ts";
import { readDocument, readStudy } from "../../src/study/read-study.ts";
import type { Study } from "../../src/study/study.ts";

export interface Evaluated extends ReadOut {
  readonly study: Study;
  readonly kernel: Kernel;
  readonly workspace: Workspace;
}

/** A study of certain values (YAML text or tree), run once. Uncertain quantities are refused: this is mechanics alone. */
export function evaluateWall(study: string | object): Evaluated {
  return evaluateStudy(typeof study === "string" ? readStudy(study) : readDocument(study));
}

export function evaluateStudy(study: Study): Evaluated {
  const kernel = prepareWall(study);
  const open = kernel.inputs.find((input) => input.fixed === undefined);
  if (open !== undefined) throw new RangeError(`${open.path} is uncertain`);
  const workspace = createWorkspace(kernel, 1);
  workspace.run(1);
  return { study, kernel, workspace, ...readOut(kernel, workspace.columns) };
}
