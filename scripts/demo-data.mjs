import { spawnSync } from "node:child_process";
import { randomBytes } from "node:crypto";
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import path from "node:path";
import { root } from "./installed.mjs";

const DATABASE = "stillwell.db";
const BEGUN = "demo-begun";
const READY = "demo-ready";
const SECRET = "demo-secret";

/** A folder with something in it that the demonstration did not make; it is left alone. */
export class ForeignDataError extends Error {}

/** How a data folder stands: nothing there, half made, a finished demonstration, or somebody's own files. */
export function demoState(folder) {
  if (existsSync(path.join(folder, READY))) return "ready";
  if (existsSync(path.join(folder, BEGUN))) return "half-made";
  return existsSync(folder) && readdirSync(folder).length > 0 ? "foreign" : "empty";
}

/** Creates, migrates and fills the database through the product's own commands. Answers whether it worked. */
export function seed(folder) {
  mkdirSync(folder, { recursive: true });
  writeFileSync(path.join(folder, BEGUN), "");
  const { status } = spawnSync(
    process.execPath,
    ["--conditions=react-server", "--import", "tsx", "db/seed/run.ts"],
    {
      cwd: root,
      stdio: ["ignore", "inherit", "inherit"],
      env: { ...process.env, STILLWELL_DATA: folder, NODE_ENV: "development" },
    },
  );
  if (status !== 0) return false;
  writeFileSync(path.join(folder, READY), "");
  return true;
}

/**
 * Sees to it that the folder holds the demonstration's data.
 * @param {string} folder
 * @param {{ fresh: boolean }} choice fresh: throw the demonstration's data away and make it again
 * @returns {"made" | "kept" | "failed"}
 * @throws ForeignDataError when the folder holds files that the demonstration did not make
 */
export function ensureDemoData(folder, { fresh }) {
  const state = demoState(folder);
  if (state === "foreign") {
    throw new ForeignDataError(
      `${folder} holds files that the demonstration did not make, so it is left alone. ` +
        "Set STILLWELL_DATA to another folder for the demonstration.",
    );
  }
  if (state === "ready" && !fresh && existsSync(path.join(folder, DATABASE))) return "kept";
  rmSync(folder, { recursive: true, force: true });
  return seed(folder) ? "made" : "failed";
}

/** The secret that signs the demonstration's sessions: the setting, or one made at random and kept beside the data. */
export function demoSecret(folder, env = process.env) {
  if (env.NEXTAUTH_SECRET) return env.NEXTAUTH_SECRET;
  const file = path.join(folder, SECRET);
  if (!existsSync(file)) writeFileSync(file, randomBytes(33).toString("base64"), { mode: 0o600 });
  return readFileSync(file, "utf8");
}

/** The demonstration's people, as lines of a table. */
export function signInLines() {
  const people = JSON.parse(readFileSync(path.join(root, "db/seed/sign-ins.json"), "utf8"));
  const columns = Object.keys(people[0] ?? {});
  const text = (value) => (Array.isArray(value) ? value.join(", ") : String(value ?? ""));
  const rows = [columns, ...people.map((person) => columns.map((column) => text(person[column])))];
  const widths = columns.map((_, index) => Math.max(...rows.map((row) => row[index].length)));
  return rows.map((row) =>
    row
      .map((cell, index) => cell.padEnd(widths[index]))
      .join("  ")
      .trimEnd(),
  );
}
