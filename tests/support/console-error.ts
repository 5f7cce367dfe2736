import { afterEach, beforeEach, expect, vi } from "vitest";

let expected: (string | RegExp)[] = [];
let seen: string[] = [];

/**
 * Says that this test is meant to write a matching line with console.error.
 * Any other line fails the test, and so does an announced line that never comes.
 */
export function expectConsoleError(match: string | RegExp): void {
  expected.push(match);
}

const fits = (line: string, match: string | RegExp) =>
  typeof match === "string" ? line.includes(match) : match.test(line);

beforeEach(() => {
  expected = [];
  seen = [];
  vi.spyOn(console, "error").mockImplementation((...parts: unknown[]) => {
    seen.push(
      parts.map((part) => (part instanceof Error ? (part.stack ?? part.message) : String(part))).join(" "),
    );
  });
});

afterEach(() => {
  const unexpected = seen.filter((line) => !expected.some((match) => fits(line, match)));
  const missing = expected.filter((match) => !seen.some((line) => fits(line, match)));
  expect(unexpected, "console.error was called unexpectedly").toEqual([]);
  expect(missing, "an announced console.error never came").toEqual([]);
});
