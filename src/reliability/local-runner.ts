import type { BlockCounter } from "./block-tally.ts";
import type { BlockRunner } from "./monte-carlo.ts";

/**
 * Counts blocks in this thread, one when it is asked for, and lets the event loop have a turn after each, so that a stop by the
 * user is noticed.
 */
export function localRunner(counter: BlockCounter): BlockRunner {
  return {
    ahead: 1,
    async tally(block) {
      await new Promise((resolve) => setTimeout(resolve, 0));
      return counter.tally(block);
    },
  };
}
