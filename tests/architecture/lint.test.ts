import { fileURLToPath } from "node:url";
import { ESLint } from "eslint";
import { describe, expect, it } from "vitest";

const root = fileURLToPath(new URL("../..", import.meta.url));
const eslint = new ESLint({ cwd: root });

/** The rules broken by a text, were it the text of a file of the project (the file exists, so that types are known). */
async function broken(file: string, code: string): Promise<(string | null)[]> {
  const [result] = await eslint.lintText(code, { filePath: `${root}/${file}` });
  return (result?.messages ?? []).filter(({ severity }) => severity === 2).map(({ ruleId }) => ruleId);
}

const MODULE = "modules/statistics/index.ts";
const LIB = "lib/problem.ts";

describe("lint refuses", () => {
  it.each([
    ["no-restricted-syntax", MODULE, "export const at = Date.now();\n"],
    ["no-restricted-syntax", MODULE, "export const at = new Date();\n"],
    ["no-restricted-syntax", MODULE, "export const dice = Math.random();\n"],
    ["no-restricted-syntax", MODULE, 'export * from "./permissions";\n'],
    ["no-restricted-syntax", MODULE, "export default 1;\n"],
    ["no-restricted-syntax", MODULE, "export const own = (db: { writer: number }) => db.writer;\n"],
    ["no-restricted-syntax", MODULE, "export const own = ({ writer }: { writer: number }) => writer;\n"],
    ["no-restricted-syntax", LIB, "export default 1;\n"],
    ["no-restricted-properties", MODULE, "export const zone = process.env.TZ;\n"],
    ["no-restricted-properties", LIB, "export const zone = process.env.TZ;\n"],
    ["no-restricted-properties", LIB, "export const { env } = process;\n"],
    ["no-restricted-imports", LIB, 'import { env } from "node:process";\nexport const zone = env.TZ;\n'],
    ["@typescript-eslint/no-explicit-any", LIB, "export const loose = (value: any): unknown => value;\n"],
    [
      "@typescript-eslint/no-floating-promises",
      LIB,
      "const later = async () => 1;\nexport const go = () => {\n  later();\n};\n",
    ],
    [
      "@typescript-eslint/no-misused-promises",
      LIB,
      "const later = async () => true;\nexport const go = () => (later() ? 1 : 2);\n",
    ],
    ["max-lines", LIB, `${"export {};\n".repeat(301)}`],
    [
      "max-lines-per-function",
      LIB,
      `export function long(): number {\n${"  void 0;\n".repeat(60)}  return 1;\n}\n`,
    ],
  ])("%s in %s: %s", async (rule, file, code) => {
    expect(await broken(file, code)).toContain(rule);
  });
});

describe("lint allows", () => {
  it.each([
    ["a given moment in a module", MODULE, "export const at = (ms: number) => new Date(ms);\n"],
    ["a clock in lib, where it is made", "lib/clock.ts", "export const now = () => Date.now();\n"],
    ["settings read in lib/env.ts", "lib/env.ts", "export const zone = process.env.TZ;\n"],
    ["a default export in a tool's config", "next.config.ts", "const config = {};\nexport default config;\n"],
  ])("%s", async (_title, file, code) => {
    expect(await broken(file, code)).toEqual([]);
  });
});
