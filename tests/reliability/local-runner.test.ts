import { expect, test } from "vitest";
import { localRunner } from "../../src/reliability/local-runner.ts";

test("a block is counted after the event loop had a turn", async () => {
  const order: string[] = [];
  const runner = localRunner({
    tally(block) {
      order.push(`block ${block}`);
      return { block } as never;
    },
  });
  setTimeout(() => order.push("timer"), 0);
  expect(await runner.tally(4)).toEqual({ block: 4 });
  expect(order).toEqual(["timer", "block 4"]);
  expect(runner.ahead).toBe(1);
});

test("an error in counting reaches the one who asked", async () => {
  const runner = localRunner({
    tally() {
      throw new RangeError("no such block");
    },
  });
  await expect(runner.tally(0)).rejects.toThrow("no such block");
});
