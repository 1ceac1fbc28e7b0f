import { defineConfig } from "vitest/config";

export default defineConfig({
  test: {
    include: ["tests/**/*.test.ts"],
    exclude: ["tests/browser/**", "tests/bench/**"],
    testTimeout: 60_000,
    // A worker per core, and one module cache a worker: with a fresh one for each of 300 files, loading took half the time.
    maxWorkers: 2,
    isolate: false,
  },
});
