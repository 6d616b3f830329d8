import { defineConfig } from "@playwright/test";

/**
 * Browser tests, against the production build that `npm test` serves: BASE_URL says where, DEMO_ACCOUNTS_FILE names the
 * JSON file of the demo accounts, DATABASE_OWNER_URL is the way around its walls, CHROMIUM is Debian's browser.
 */
export default defineConfig({
  testDir: "../tests/browser",
  outputDir: "../test-results",
  workers: 2,
  // Two browsers, the server and its database share what may be two slow cores: time here says that something hangs, not how fast it is.
  timeout: 90_000,
  expect: { timeout: 15_000 },
  retries: 0,
  forbidOnly: true,
  use: {
    baseURL: process.env["BASE_URL"],
    // It would stand between the pages and what a test answers in the server's place.
    serviceWorkers: "block",
    // `trace: "on"` shows a failure step by step, and costs a third of the time.
    launchOptions: {
      executablePath: process.env["CHROMIUM"],
      args: [
        "--disable-gpu",
        "--disable-background-networking",
        "--disable-component-update",
        "--disable-sync",
        "--no-first-run",
        // Chromium's sandbox does not work for root.
        ...(process.getuid?.() === 0 ? ["--no-sandbox"] : []),
      ],
    },
  },
});
