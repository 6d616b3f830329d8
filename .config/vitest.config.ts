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
  },
});
