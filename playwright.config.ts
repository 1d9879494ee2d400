import { defineConfig } from "@playwright/test";

const CHROMIUM_FLAGS = [
  // Containers give no user namespace to build the browser's own sandbox from; it only ever opens our pages.
  "--no-sandbox",
  "--disable-gpu",
  "--disable-dev-shm-usage",
  "--disable-quic",
  "--no-first-run",
  "--disable-background-networking",
  "--disable-component-update",
  "--disable-sync",
];

/** Drives the site that tests/support/run.ts started; it starts nothing itself. */
export default defineConfig({
  testDir: "tests/e2e",
  // Lets helpers of the tests load server files, which "server-only" would otherwise refuse.
  tsconfig: "lib/local/tsconfig.json",
  outputDir: ".test/e2e",
  workers: 1,
  retries: 0,
  timeout: 60_000,
  // A locator that finds nothing says so soon, not only when the whole test has run out of time.
  expect: { timeout: 10_000 },
  forbidOnly: Boolean(process.env.CI),
  reporter: [["list"], ["json", { outputFile: process.env.E2E_REPORT ?? ".test/reports/e2e.json" }]],
  use: {
    actionTimeout: 15_000,
    navigationTimeout: 30_000,
    baseURL: process.env.APP_URL ?? "http://localhost:4000",
    browserName: "chromium",
    locale: "en-US",
    timezoneId: "America/Chicago",
    screenshot: "only-on-failure",
    launchOptions: { executablePath: "/usr/bin/chromium", args: CHROMIUM_FLAGS },
  },
});
