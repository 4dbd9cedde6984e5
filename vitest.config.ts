import { defineConfig } from "vitest/config";

// Vitest prefers this file over vite.config.ts, so the React Router plugin is never loaded in tests.
export default defineConfig({
  test: {
    environment: "node",
    include: ["tests/**/*.test.{ts,tsx}"],
    exclude: ["tests/journeys/**", "tests/bars/**", "tests/bench-web/**", "node_modules/**"],
    globalSetup: ["tests/setup/global-setup.ts"],
    setupFiles: ["tests/setup/fail-on-console-error.ts"],
    testTimeout: 20_000,
    maxWorkers: 2,
  },
});
