import { defineConfig } from "@playwright/test";

/**
 * Browser tests, against the production build that `npm test` serves: BASE_URL says where, DEMO_ACCOUNTS_FILE names the
 * JSON file of the demo accounts, DATABASE_OWNER_URL is the way around its walls. The browser is Debian's.
 */
export default defineConfig({
  testDir: "../tests/browser",
  outputDir: "../test-results",
  workers: 2,
  retries: 0,
  forbidOnly: true,
  use: {
    baseURL: process.env["BASE_URL"],
    trace: "retain-on-failure",
    launchOptions: {
      executablePath: "/usr/bin/chromium",
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
