import { defineConfig } from "vitest/config";

// One built server, one browser at a time: journeys are few and slow.
export default defineConfig({
  test: {
    environment: "node",
    include: ["tests/journeys/**/*.test.ts", "tests/bars/**/*.test.ts"],
    globalSetup: ["tests/setup/journeys-setup.ts"],
    fileParallelism: false,
    testTimeout: 180_000,
    hookTimeout: 180_000,
    teardownTimeout: 30_000,
  },
});
