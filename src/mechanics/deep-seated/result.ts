import type { Notice } from "../../study/study.ts";
import { factorCap } from "../kernel.ts";
import type { CirclePlace, SlipCircle } from "./circle.ts";
import type { DeepSeatedGround } from "./ground.ts";
import type { Valley } from "./mesh.ts";
import { deepSeatedNotes } from "./notes.ts";
import { momentsAt, type Probe } from "./probe.ts";

export interface DeepSeatedResult {
  /** 0 … the cap; the cap where there is no circle or nothing drives. Without `model.factors.deep_seated`. */
  readonly factor: number;
  /** Moments about the centre of the critical circle, kNm/m; factor = resisting/driving below the cap. 0 without a circle. */
  readonly resisting: number;
  readonly driving: number;
  /** The critical circle; absent where there is none. */
  readonly circle?: Readonly<SlipCircle>;
  /** The same in numbers that carry over to other samples, for deepSeatedNear. */
  readonly place?: CirclePlace;
  readonly notes: readonly Notice[];
  /** Circles tried. */
  readonly evaluations: number;
}

/** The deepest of the valleys as a result. */
export function resultOf(ground: DeepSeatedGround, probe: Probe, valleys: readonly Valley[]): DeepSeatedResult {
  const { evaluations } = probe;
  if (valleys.length === 0) {
    const notes = deepSeatedNotes(ground, probe.limits, undefined);
    return { factor: factorCap, resisting: 0, driving: 0, notes, evaluations };
  }
  const [valley] = valleys;
  const moments = momentsAt(probe, valley.place, valley.factor);
  const [entry, exit, depth] = Array.from(valley.place);
  const circle = { ...probe.circle };
  return {
    factor: valley.factor,
    ...moments,
    circle,
    place: { entry, exit, depth },
    notes: deepSeatedNotes(ground, probe.limits, circle),
    evaluations,
  };
}
