import { cpSync, existsSync, mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync } from "node:fs";
import path from "node:path";
import { demoState, seed } from "../../scripts/demo-data.mjs";
import { root } from "../../scripts/installed.mjs";
import { hashSources, SEED_SOURCES } from "../../scripts/sources.mjs";

const TEMPLATES = path.join(root, "build", "demo-template");

/** The demonstration's data folder, seeded once for the sources as they are; never served itself, only copied. */
export function demoTemplate(): string {
  const folder = path.join(TEMPLATES, hashSources(SEED_SOURCES).slice(0, 16));
  if (demoState(folder) === "ready") return folder;
  for (const old of existsSync(TEMPLATES) ? readdirSync(TEMPLATES) : []) {
    rmSync(path.join(TEMPLATES, old), { recursive: true, force: true });
  }
  if (!seed(folder)) throw new Error("the demonstration's data could not be made; the lines above say why");
  return folder;
}

/** A fresh copy of the demonstration's data folder, for one run of tests. */
export function copyDemoData(title: string): string {
  const runs = path.join(root, "build", "test-data");
  mkdirSync(runs, { recursive: true });
  for (const old of readdirSync(runs)) clearIfOver(path.join(runs, old));
  const folder = mkdtempSync(path.join(runs, `${title}-`));
  cpSync(demoTemplate(), folder, { recursive: true });
  return folder;
}

/** Removes what an interrupted run left behind: a folder whose server no longer lives. */
function clearIfOver(folder: string): void {
  const pidFile = path.join(folder, "server.pid");
  if (!existsSync(pidFile) || isAlive(Number(readFileSync(pidFile, "utf8")))) return;
  rmSync(folder, { recursive: true, force: true });
}

function isAlive(pid: number): boolean {
  try {
    return process.kill(pid, 0);
  } catch {
    return false;
  }
}

/** A person of the demonstration, as db/seed/sign-ins.json lists them. */
export type DemoPerson = { name: string; email: string; password: string; roles: string[] };

/** Everybody who can sign in to the demonstration. */
export function demoPeople(): DemoPerson[] {
  return JSON.parse(readFileSync(path.join(root, "db", "seed", "sign-ins.json"), "utf8")) as DemoPerson[];
}

/** The person of the demonstration who holds this role, if possible this one alone. */
export function demoPerson(role: string): DemoPerson {
  const holders = demoPeople().filter(({ roles }) => roles.includes(role));
  const person = holders.find(({ roles }) => roles.length === 1) ?? holders[0];
  if (person === undefined) throw new Error(`nobody in db/seed/sign-ins.json holds the role "${role}"`);
  return person;
}
