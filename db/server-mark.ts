import { existsSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import path from "node:path";

/** Which process serves a data folder, as it says itself while it runs. */
const markFile = (dataFolder: string): string => path.join(dataFolder, "server.json");

const isAlive = (pid: number): boolean => {
  try {
    process.kill(pid, 0);
    return true;
  } catch {
    return false;
  }
};

/** The number of the process that serves this data folder; null where none does. */
export function servingProcess(dataFolder: string): number | null {
  const file = markFile(dataFolder);
  if (!existsSync(file)) return null;
  try {
    const { pid } = JSON.parse(readFileSync(file, "utf8")) as { pid: number };
    return isAlive(pid) ? pid : null;
  } catch {
    return null;
  }
}

/** Says that this process serves the folder, until it ends. */
export function markServing(dataFolder: string): void {
  writeFileSync(markFile(dataFolder), JSON.stringify({ pid: process.pid }));
  process.once("exit", () => rmSync(markFile(dataFolder), { force: true }));
}
