import path from "node:path";
import { test as base, expect } from "@playwright/test";
import { root } from "../../scripts/installed.mjs";

/** Name of the variable that tells the tests' workers where the server is. */
export const SERVER_URL = "STILLWELL_TEST_URL";

/** Name of the variable that tells them where its data is, to read addresses from. */
export const SERVER_DATA = "STILLWELL_TEST_DATA";

export const DEMO_ROLES = [
  "aquarist",
  "operator",
  "analyst",
  "lead",
  "veterinarian",
  "auditor",
  "admin",
  "reader",
] as const;
export type DemoRole = (typeof DEMO_ROLES)[number];

/** Where the cookies of a signed-in person of this role are kept during a run. */
export function signedInStateFile(role: DemoRole): string {
  return path.join(root, "build", "browser-state", `${role}.json`);
}

type Options = {
  /** Whose session the test begins with; null for a visitor who has not signed in. */
  signedInAs: DemoRole | null;
};
type Fixtures = {
  /** Says that the page is meant to write a matching line with console.error (a refused request does). */
  expectConsoleError: (match: string | RegExp) => void;
  consoleWatch: undefined;
  expectedErrors: (string | RegExp)[];
};

const fits = (line: string, match: string | RegExp) =>
  typeof match === "string" ? line.includes(match) : match.test(line);

/**
 * Playwright's test with the product served, somebody signed in (`test.use({ signedInAs: "lead" })`), and every
 * console.error or uncaught exception that was not announced counted as a failure.
 */
export const test = base.extend<Options & Fixtures>({
  signedInAs: [null, { option: true }],
  baseURL: async ({}, give) => {
    await give(process.env[SERVER_URL]);
  },
  storageState: async ({ signedInAs }, give) => {
    await give(signedInAs === null ? { cookies: [], origins: [] } : signedInStateFile(signedInAs));
  },
  expectedErrors: async ({}, give) => {
    await give([]);
  },
  expectConsoleError: async ({ expectedErrors }, give) => {
    await give((match) => expectedErrors.push(match));
  },
  consoleWatch: [
    async ({ context, expectedErrors }, give) => {
      const seen: string[] = [];
      context.on("console", (message) => {
        if (message.type() === "error") seen.push(`${message.text()} (${message.location().url})`);
      });
      context.on("weberror", (error) => seen.push(`uncaught: ${error.error().message}`));
      await give(undefined);
      const unexpected = seen.filter((line) => !expectedErrors.some((match) => fits(line, match)));
      expect(unexpected, "console.error was called unexpectedly").toEqual([]);
    },
    { auto: true },
  ],
});

export { expect };
