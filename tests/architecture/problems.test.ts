import { readFileSync } from "node:fs";
import { expect, it } from "vitest";
import { PROBLEMS } from "@/lib/problem";

it("docs/problems.md lists every code with its status and title", () => {
  const page = readFileSync("docs/problems.md", "utf8");
  const rows = Object.entries(PROBLEMS).map(
    ([code, { status, title }]) => `| \`${code}\` | ${status} | ${title} |`,
  );
  expect(rows.filter((row) => !page.includes(row))).toEqual([]);
});
