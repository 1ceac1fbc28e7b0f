import { defineConfig } from "vitest/config";

export default defineConfig({
  test: { include: ["tests/**/*.test.ts"], exclude: ["tests/browser/**", "tests/bench/**"], testTimeout: 60_000 },
});
