/**
 * Blocks counted by worker threads. A block's stream belongs to the block alone and tallies are merged in block order
 * (reliability/monte-carlo.ts), so the result does not depend on the number of workers, nor on which of them was quicker.
 */
import { Worker } from "node:worker_threads";
import type { BlockTally, SamplingPlan } from "../reliability/block-tally.ts";
import type { BlockRunner } from "../reliability/monte-carlo.ts";
import type { Study } from "../study/study.ts";
import type { WorkerAnswer, WorkerTask } from "./block-worker.ts";

/** Blocks in hand for each worker: one that it counts, and some that lie ready while its answer is on the way. */
const blocksPerWorker = 3;

interface Waiting {
  resolve(tally: BlockTally): void;
  reject(error: unknown): void;
}

interface Member {
  readonly worker: Worker;
  readonly waiting: Map<number, Waiting>;
  /** Why it counts no more. */
  ended?: unknown;
}

/**
 * Starts the workers; the caller ends them with `close`, whatever has happened. Blocks that no worker can count any more are
 * rejected, with what the worker ended of.
 *
 * @param workers number of threads, at least 1
 * @param script the worker's file as it was built
 */
export function workerRunner(
  study: Study,
  plan: SamplingPlan,
  workers: number,
  script: URL = new URL("./block-worker.js", import.meta.url),
): Required<BlockRunner> {
  const task: WorkerTask = { study, plan };
  const members = Array.from({ length: workers }, () => startMember(script, task));
  return {
    ahead: blocksPerWorker * workers,
    tally(block) {
      const member = members.reduce((least, other) => (other.waiting.size < least.waiting.size ? other : least));
      return new Promise((resolve, reject) => {
        if (member.ended !== undefined) {
          reject(member.ended);
          return;
        }
        member.waiting.set(block, { resolve, reject });
        member.worker.postMessage(block);
      });
    },
    async close() {
      await Promise.all(members.map(({ worker }) => worker.terminate()));
    },
  };
}

function startMember(script: URL, task: WorkerTask): Member {
  const member: Member = { worker: new Worker(script, { workerData: task }), waiting: new Map() };
  const end = (why: unknown): void => {
    member.ended ??= why;
    for (const { reject } of member.waiting.values()) reject(member.ended);
    member.waiting.clear();
  };
  member.worker.on("message", (answer: WorkerAnswer) => {
    const waiting = member.waiting.get(answer.block);
    member.waiting.delete(answer.block);
    if ("error" in answer) waiting?.reject(answer.error);
    else waiting?.resolve(answer.tally);
  });
  member.worker.on("error", end);
  member.worker.on("exit", (code) => end(new Error(`a worker ended early, with code ${code}`)));
  return member;
}
