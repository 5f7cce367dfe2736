import { existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { demoSecret, demoState, ensureDemoData, ForeignDataError } from "./demo-data.mjs";

let folder = "";
beforeEach(() => {
  folder = mkdtempSync(path.join(tmpdir(), "demo-data-"));
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));
const put = (name: string) => writeFileSync(path.join(folder, name), "");

describe("the demonstration's data folder", () => {
  it.each([
    ["empty", []],
    ["foreign", ["stillwell.db"]],
    ["foreign", ["letter.txt"]],
    ["half-made", ["demo-begun", "stillwell.db"]],
    ["ready", ["demo-begun", "stillwell.db", "demo-ready"]],
  ])("stands as %s with %j in it", (state, files) => {
    files.forEach(put);
    expect(demoState(folder)).toBe(state);
  });

  it.each([true, false])("leaves what it did not make alone (fresh: %s)", (fresh) => {
    put("stillwell.db");
    expect(() => ensureDemoData(folder, { fresh })).toThrow(ForeignDataError);
    expect(existsSync(path.join(folder, "stillwell.db"))).toBe(true);
  });

  it("keeps the data of a finished demonstration", () => {
    for (const name of ["demo-begun", "stillwell.db", "demo-ready"]) put(name);
    mkdirSync(path.join(folder, "uploads"));
    expect(ensureDemoData(folder, { fresh: false })).toBe("kept");
    expect(existsSync(path.join(folder, "uploads"))).toBe(true);
  });
});

describe("the demonstration's secret", () => {
  it("is the setting where there is one", () => {
    expect(demoSecret(folder, { NODE_ENV: "test", NEXTAUTH_SECRET: "given" })).toBe("given");
  });

  it("is otherwise made at random once, for the owner's eyes alone", () => {
    const env = { NODE_ENV: "test" } as const;
    const secret = demoSecret(folder, env);
    expect(Buffer.from(secret, "base64")).toHaveLength(33);
    expect(demoSecret(folder, env)).toBe(secret);
    expect(readFileSync(path.join(folder, "demo-secret"), "utf8")).toBe(secret);
    expect(statSync(path.join(folder, "demo-secret")).mode & 0o077).toBe(0);
  });
});
