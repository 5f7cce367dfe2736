import { mkdirSync, mkdtempSync, rmSync, utimesSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { installIsStale, nodeIsNewEnough } from "./installed.mjs";

let folder = "";
beforeEach(() => {
  folder = mkdtempSync(path.join(tmpdir(), "installed-"));
});
afterEach(() => rmSync(folder, { recursive: true }));

describe("the version of Node", () => {
  it.each([
    ["18.20.4", false],
    ["20.18.9", false],
    ["20.19.0", true],
    ["20.20.2", true],
    ["22.0.0", true],
  ])("%s will do: %s", (version, enough) => {
    expect(nodeIsNewEnough(version)).toBe(enough);
  });
});

describe("an installation", () => {
  const write = (file: string, atS: number) => {
    mkdirSync(path.dirname(path.join(folder, file)), { recursive: true });
    writeFileSync(path.join(folder, file), "");
    utimesSync(path.join(folder, file), atS, atS);
  };

  it("is needed in a bare clone", () => {
    write("package-lock.json", 1_000);
    expect(installIsStale(folder)).toBe(true);
  });

  it("is needed again when the lock file is newer", () => {
    write("node_modules/.package-lock.json", 1_000);
    write("package-lock.json", 2_000);
    expect(installIsStale(folder)).toBe(true);
  });

  it("is not repeated otherwise", () => {
    write("package-lock.json", 1_000);
    write("node_modules/.package-lock.json", 2_000);
    expect(installIsStale(folder)).toBe(false);
  });
});
