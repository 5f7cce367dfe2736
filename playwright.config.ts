import { defineConfig } from "@playwright/test";
import { findBrowser } from "./scripts/find-browser.mjs";

const isRoot = process.getuid?.() === 0;

export default defineConfig({
  testDir: "./tests/browser",
  testMatch: "**/*.spec.ts",
  outputDir: "./build/browser-results",
  globalSetup: "./tests/browser/global-setup.ts",
  workers: 2,
  retries: 0,
  timeout: 60_000,
  expect: { timeout: 10_000 },
  reporter: [["list"]],
  use: {
    browserName: "chromium",
    launchOptions: {
      executablePath: findBrowser(),
      chromiumSandbox: !isRoot,
      args: isRoot ? ["--no-sandbox"] : [],
    },
    viewport: { width: 1440, height: 900 },
    locale: "en-GB",
    timezoneId: "Europe/London",
    trace: "retain-on-failure",
    screenshot: "only-on-failure",
  },
});
