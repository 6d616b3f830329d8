import { fileURLToPath } from "node:url";
import { defineConfig } from "vitest/config";

/** Unit, property and database tests. The application's Vite plugin is left out on purpose: it only works in dev and build. */
export default defineConfig({
  root: fileURLToPath(new URL("..", import.meta.url)),
  test: {
    include: ["tests/**/*.test.ts", "tests/**/*.test.tsx"],
    exclude: ["tests/browser/**"],
    environment: "node",
    passWithNoTests: false,
    // Most files wait for a database half of their time, so that both of two cores are used (the default leaves one free).
    maxWorkers: 2,
    // A busy machine makes a test late, not wrong: these only end what hangs. How fast things are is measured by the benchmarks.
    testTimeout: 30_000,
    hookTimeout: 90_000,
    expect: { poll: { timeout: 15_000 } },
  },
});
