import { cpus } from "node:os";
import { defineConfig } from "@playwright/test";

const quiet = [
  "--disable-gpu",
  "--disable-quic",
  "--no-first-run",
  "--disable-background-networking",
  "--disable-component-update",
  "--disable-sync",
];
/** Chromium refuses its sandbox to root, as in most build containers. */
const sandbox = process.getuid?.() === 0 ? ["--no-sandbox"] : [];

export default defineConfig({
  testDir: "tests/e2e",
  testMatch: "**/*.spec.ts",
  globalSetup: "./tests/e2e/global-setup.ts",
  workers: cpus().length >= 4 ? 2 : 1,
  retries: 0,
  forbidOnly: true,
  timeout: 90_000,
  expect: { timeout: 10_000 },
  reporter: "list",
  outputDir: "test-results",
  use: {
    viewport: { width: 1440, height: 900 },
    timezoneId: "UTC",
    locale: "en-GB",
    actionTimeout: 20_000,
    screenshot: "only-on-failure",
    trace: "off",
    launchOptions: { executablePath: process.env.CHROMIUM_PATH || undefined, args: [...sandbox, ...quiet] },
  },
});
