import { availableParallelism } from "node:os";
import { streamBlock } from "../probability/streams.ts";
import type { Study } from "../study/study.ts";

/** A worker takes 30 to 70 ms to start: as long as some hundred thousand samples, so each is given a million or more. */
const samplesPerWorker = 1e6;
/** The search for the deep-seated circle takes as long as this many other evaluations. */
const searchCost = 1000;
/** Each worker is to have this many blocks at least. */
const blocksPerWorker = 4;
/** More would wait for the one thread that merges. */
const mostWorkers = 32;

/** Threads for a run of so many samples, where the user names none: by the size of the work and the cores that are there. */
export function workersFor(study: Study, samples: number, cores: number = availableParallelism()): number {
  const cost = study.assessment.limitStates.includes("deep_seated") ? searchCost : 1;
  const worth = Math.min((samples * cost) / samplesPerWorker, samples / (blocksPerWorker * streamBlock));
  return Math.max(1, Math.min(cores, mostWorkers, Math.floor(worth)));
}
