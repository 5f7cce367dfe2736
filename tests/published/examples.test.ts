import { readdirSync, readFileSync } from "node:fs";
import { join, relative } from "node:path";
import { fileURLToPath, pathToFileURL } from "node:url";
import { describe, expect, it } from "vitest";
import { type Example, examplesIn, explain, matches } from "./example-blocks";

const ROOT = fileURLToPath(new URL("../../", import.meta.url));

/** Files whose functions are pure: both science modules and every module's rules. */
function pureFiles(): string[] {
  const modules = join(ROOT, "modules");
  const folders = readdirSync(modules, { withFileTypes: true })
    .filter((entry) => entry.isDirectory())
    .map(({ name }) => (name === "seawater" || name === "statistics" ? name : join(name, "rules")));
  return folders
    .flatMap((folder) => {
      try {
        return readdirSync(join(modules, folder), { recursive: true, encoding: "utf8" }).map((file) =>
          join(modules, folder, file),
        );
      } catch (error) {
        if ((error as NodeJS.ErrnoException).code === "ENOENT") return [];
        throw error;
      }
    })
    .filter((file) => file.endsWith(".ts") && !file.endsWith(".test.ts"))
    .sort();
}

const load = async (file: string) =>
  (await import(/* @vite-ignore */ pathToFileURL(file).href)) as Record<string, unknown>;

/** What an example may name: the exports of its file and, in a science module, of that module's door. */
async function scopeOf(file: string): Promise<Record<string, unknown>> {
  const science = /^(.*\/modules\/(?:seawater|statistics)\/)/.exec(file)?.[1];
  return { ...(science ? await load(join(science, "index.ts")) : {}), ...(await load(file)) };
}

/** Evaluates an expression with these names in scope. */
function evaluate(expression: string, scope: Record<string, unknown>): unknown {
  const names = Object.keys(scope);
  // The expressions stand in our own source files; a test is the one place where they are run.
  const run = new Function(...names, `"use strict"; return (${expression});`) as (
    ...values: unknown[]
  ) => unknown;
  return run(...names.map((name) => scope[name]));
}

const examples = pureFiles().flatMap((file) =>
  examplesIn(readFileSync(file, "utf8")).map((example): Example & { file: string } => ({ ...example, file })),
);

describe("every @example says what the code does", () => {
  it("finds the examples of both science modules", () => {
    expect(examples.filter(({ file }) => file.includes("/seawater/")).length).toBeGreaterThan(40);
    expect(examples.filter(({ file }) => file.includes("/statistics/")).length).toBeGreaterThan(10);
  });

  it.each(examples.map((example) => ({ ...example, where: relative(ROOT, example.file) })))(
    "$where:$line $text",
    async ({ file, text, expression, expected, malformed }) => {
      expect(malformed, `"${text}" is not of the form: expression // => value`).toBeUndefined();
      const got = evaluate(expression, await scopeOf(file));
      expect(matches(got, expected), explain(got, expected)).toBe(true);
    },
  );
});

describe("the reader of examples", () => {
  it("takes the value after the arrow as it is printed", () => {
    const [example] = examplesIn("/**\n * @example twice(2) // => 4\n */");
    expect(example).toMatchObject({ expression: "twice(2)", expected: "4", line: 2 });
  });

  it("joins an example written over several lines", () => {
    const [example] = examplesIn("/**\n * Text.\n * @example\n * twice({\n *   of: 2,\n * }) // => 4\n */");
    expect(example).toMatchObject({ expression: "twice({ of: 2, })", expected: "4" });
  });

  it("reads several examples of one comment apart", () => {
    expect(examplesIn("/**\n * @example a() // => 1\n * @example b() // => 2\n */")).toHaveLength(2);
  });

  it("calls an example without arrow or without value malformed instead of skipping it", () => {
    expect(examplesIn("/** @example twice(2) // 4 */")[0]?.malformed).toBe(true);
    expect(examplesIn("/** @example twice(2) // => */")[0]?.malformed).toBe(true);
    expect(examplesIn("/** @example // => 4 */")[0]?.malformed).toBe(true);
    expect(examplesIn("/** @example */")[0]?.malformed).toBe(true);
  });

  it("holds a number to the digits that are printed, and no closer", () => {
    expect(matches(7.3961, "7.396")).toBe(true);
    expect(matches(7.3966, "7.396")).toBe(false);
    expect(matches(7.3961, "7")).toBe(false);
    expect(matches(7, "7")).toBe(true);
    expect(matches(2.00004e-9, "2.0000e-9")).toBe(true);
    expect(matches(2.0001e-9, "2.0000e-9")).toBe(false);
    expect(matches(-1.92, "-1.92")).toBe(true);
    expect(matches(Number.NaN, "1.0")).toBe(false);
  });

  it("compares lists and objects part by part, and words exactly", () => {
    expect(matches([3, 2.0004], "[3, 2.000]")).toBe(true);
    expect(matches([3, 2], "[3]")).toBe(false);
    expect(matches({ ok: true, a: 1 }, "{ a: 1, ok: true }")).toBe(true);
    expect(matches({ ok: true, a: 1, b: 2 }, "{ a: 1, ok: true }")).toBe(false);
    expect(matches("watch", '"watch"')).toBe(true);
    expect(matches("out", '"watch"')).toBe(false);
    expect(matches(null, "null")).toBe(true);
    expect(matches(undefined, "null")).toBe(false);
  });
});
