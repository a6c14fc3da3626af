// Browser tests against a server that is already running; `npm test` starts it and sets BASE_URL. For one test while working:
// `node scripts/run.mjs test --only e2e name-of-the-test`.
import { defineConfig } from "@playwright/test";

const baseURL = process.env.BASE_URL;
if (!baseURL) throw new Error("BASE_URL is not set. Run the browser tests with: node scripts/run.mjs test --only e2e");

export default defineConfig({
  testDir: "tests",
  testMatch: "**/*.spec.ts",
  globalSetup: "./tests/e2e/support/bundle-make-shop.ts",
  outputDir: ".data/reports/e2e",
  reporter: [["list"], ["json", { outputFile: ".data/reports/e2e.json" }]],
  // One worker: the tests share one server and one database on what may be a small machine. No retries: a test that fails now and then is broken.
  workers: 1,
  retries: 0,
  timeout: 60_000,
  // Pages ask for news every 5 s, and a loaded machine takes its time.
  expect: { timeout: 15_000 },
  forbidOnly: Boolean(process.env.CI),
  use: {
    baseURL,
    browserName: "chromium",
    locale: "en-GB",
    timezoneId: "UTC",
    trace: "retain-on-failure",
    launchOptions: {
      executablePath: process.env.CHROMIUM || "/usr/bin/chromium",
      // Without a sandbox because Chromium refuses to run as root with one; the only pages it opens are the project's own.
      args: [
        "--no-sandbox",
        "--disable-gpu",
        "--disable-quic",
        "--disable-dev-shm-usage",
        "--no-first-run",
        "--disable-background-networking",
        "--disable-component-update",
        "--disable-sync",
      ],
    },
  },
  projects: [
    { name: "desk", testIgnore: "**/*.phone.spec.ts", use: { viewport: { width: 1280, height: 800 } } },
    {
      name: "phone",
      testMatch: "**/*.phone.spec.ts",
      use: { viewport: { width: 390, height: 844 }, deviceScaleFactor: 3, hasTouch: true, isMobile: true },
    },
  ],
});
