/** Runs in a worker thread: rebuilds the model from the study, then counts the blocks that it is asked for. */
import { parentPort, workerData } from "node:worker_threads";
import { sampledModel } from "../posterior.ts";
import { type BlockTally, createBlockCounter, type SamplingPlan } from "../reliability/block-tally.ts";
import type { Study } from "../study/study.ts";

/** What a worker is handed when it starts: plain data. */
export interface WorkerTask {
  readonly study: Study;
  readonly plan: SamplingPlan;
}

/** What it says: the tally of a block, or why there is none. */
export type WorkerAnswer =
  | { readonly block: number; readonly tally: BlockTally }
  | { readonly block: number; readonly error: unknown };

const port = parentPort;
if (port === null) throw new Error("this file runs as a worker thread alone");
const { study, plan } = workerData as WorkerTask;
const { states, space, agrees } = sampledModel(study);
const counter = createBlockCounter(states, space, plan, agrees);
port.on("message", (block: number) => {
  port.postMessage(answerTo(block));
});

function answerTo(block: number): WorkerAnswer {
  try {
    return { block, tally: counter.tally(block) };
  } catch (error) {
    return { block, error };
  }
}
