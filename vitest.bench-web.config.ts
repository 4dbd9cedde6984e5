import { defineConfig } from "vitest/config";

// Times of the built product in Chromium: a command of its own, since clocks want a quiet machine.
export default defineConfig({
  test: {
    environment: "node",
    include: ["tests/bench-web/**/*.test.ts"],
    globalSetup: ["tests/setup/journeys-setup.ts"],
    fileParallelism: false,
    testTimeout: 900_000,
    hookTimeout: 180_000,
    teardownTimeout: 30_000,
  },
});
