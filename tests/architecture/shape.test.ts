import { existsSync, readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { fileURLToPath } from "node:url";
import { describe, expect, it } from "vitest";
import { FLOORS, OPEN_DOORS } from "../../floors.config.mjs";

const root = fileURLToPath(new URL("../..", import.meta.url));
const TOP = ["app", "modules", "db", "lib", "public", "docs", "tests", "scripts"];
const NOT_OURS = ["node_modules", "data", "build", "test-results", "playwright-report"];
const DRAWERS = /(^|\/)(utils?|helpers?|common|misc|types)([./]|$)/;
const KEBAB = /^[a-z0-9]+(-[a-z0-9]+)*(\.[a-z0-9]+(-[a-z0-9]+)*)*$/;
/** Next's own ways to write a route: [id], [...rest], (group), @slot, _private. */
const ROUTE = /^([(@_.]*[a-z0-9-]+\)?|\[{1,2}(\.{3})?[a-z][A-Za-z0-9]*\]{1,2})$/;

function filesUnder(folder: string): string[] {
  const start = path.join(root, folder);
  if (!existsSync(start)) return [];
  return readdirSync(start, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => path.relative(root, path.join(entry.parentPath, entry.name)))
    .filter((file) => !file.startsWith("tests/fixtures/"));
}

const sources = ["app", "modules", "db", "lib", "scripts", "tests"].flatMap(filesUnder);
const modules = readdirSync(path.join(root, "modules")).filter(
  (name) => filesUnder(`modules/${name}`).length > 0,
);
const listed = FLOORS.flat();

describe("the shape of the house", () => {
  it("the top level holds the rooms of the map and nothing else", () => {
    const folders = readdirSync(root, { withFileTypes: true })
      .filter((entry) => entry.isDirectory() && !entry.name.startsWith("."))
      .map((entry) => entry.name);
    expect(folders.filter((name) => ![...TOP, ...NOT_OURS].includes(name))).toEqual([]);
  });

  it("every folder of modules has its floor", () => {
    expect(modules.filter((name) => !listed.includes(name))).toEqual([]);
    expect(modules.length).toBeGreaterThan(0);
  });

  it("there are no drawers for whatever fits nowhere", () => {
    expect(sources.filter((file) => DRAWERS.test(file))).toEqual([]);
  });

  it("names are written in kebab-case, a route's parameter as the field it becomes", () => {
    const code = sources.filter((file) => /\.(tsx?|mjs)$/.test(file));
    const odd = code.filter((file) => {
      const parts = file.split("/");
      const name = parts.pop() ?? "";
      return !KEBAB.test(name) || parts.some((part) => !ROUTE.test(part));
    });
    expect(odd).toEqual([]);
    expect(code.length).toBeGreaterThan(40);
  });
});

describe.each(modules)("modules/%s", (name) => {
  const has = (file: string) => existsSync(path.join(root, "modules", name, file));
  const read = (file: string) =>
    has(file) ? readFileSync(path.join(root, "modules", name, file), "utf8") : "";

  it("has a README a newcomer reads in a minute, and a door", () => {
    expect(has("README.md"), "README.md").toBe(true);
    expect(read("README.md").split("\n").length).toBeLessThanOrEqual(40);
    expect(has("index.ts"), "index.ts").toBe(true);
  });

  it("its door never opens in a browser, unless it only computes", () => {
    expect(/^import "server-only";$/m.test(read("index.ts"))).toBe(!OPEN_DOORS.includes(name));
  });

  it("its door names what it exports", () => {
    expect(read("index.ts")).not.toMatch(/^export \*/m);
  });
});
