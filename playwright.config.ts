import { existsSync } from "node:fs";
import { defineConfig } from "@playwright/test";

// Debian's browser: none is downloaded. `npm test` starts the built application and names it here;
// by hand, start it with `npm start` in another terminal.
const executablePath = process.env["CHROMIUM_PATH"] ?? ["/usr/bin/chromium", "/usr/bin/chromium-browser"].find(existsSync);

export default defineConfig({
  testDir: "tests/e2e",
  outputDir: "test-results",
  // A test that passes at the second try has found something.
  retries: 0,
  workers: 2,
  fullyParallel: false,
  timeout: 90_000,
  expect: { timeout: 10_000 },
  forbidOnly: Boolean(process.env["CI"]),
  reporter: [["line"]],
  projects: [
    { name: "pages", testIgnore: /\.alone\.spec\.ts$/ },
    // Tests that kill a process of the product would disturb others: they run after them, one at a time.
    { name: "alone", testMatch: /\.alone\.spec\.ts$/, dependencies: ["pages"], workers: 1 },
  ],
  use: {
    baseURL: process.env["FERRULE_BASE_URL"] ?? "http://127.0.0.1:3000",
    viewport: { width: 1600, height: 1000 },
    locale: "en-US",
    timezoneId: "America/New_York",
    actionTimeout: 15_000,
    screenshot: "only-on-failure",
    trace: "off",
    launchOptions: {
      executablePath,
      args: [
        "--no-sandbox", "--disable-gpu", "--disable-quic", "--no-first-run",
        "--disable-background-networking", "--disable-component-update", "--disable-sync",
      ],
    },
  },
});
