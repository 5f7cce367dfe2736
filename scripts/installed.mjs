import { spawnSync } from "node:child_process";
import { existsSync, statSync } from "node:fs";
import path from "node:path";
import { fileURLToPath } from "node:url";

export const root = fileURLToPath(new URL("..", import.meta.url));
const OLDEST_NODE = [20, 19];

/** Whether a Node version such as "20.19.1" is new enough. */
export function nodeIsNewEnough(version) {
  const [major = 0, minor = 0] = version.split(".").map(Number);
  const [needMajor, needMinor] = OLDEST_NODE;
  return major > needMajor || (major === needMajor && minor >= needMinor);
}

/** Whether node_modules is missing or older than the lock file. */
export function installIsStale(folder = root) {
  const mark = path.join(folder, "node_modules", ".package-lock.json");
  return (
    !existsSync(mark) || statSync(path.join(folder, "package-lock.json")).mtimeMs > statSync(mark).mtimeMs
  );
}

/** Ends the process, with a sentence, unless this machine's Node will do. */
export function requireNode() {
  if (nodeIsNewEnough(process.versions.node)) return;
  console.error(
    `Stillwell needs Node ${OLDEST_NODE.join(".")} or newer; this is Node ${process.versions.node}.`,
  );
  process.exit(1);
}

/** Installs the packages of the lock file when they are missing or older than it. */
export function ensureInstalled() {
  if (!installIsStale()) return;
  console.log("Installing packages (two to four minutes the first time; SQLite may be compiled) …");
  const { status } = spawnSync("npm", ["ci", "--no-audit", "--no-fund"], {
    cwd: root,
    stdio: ["ignore", "inherit", "inherit"],
    // The build and the tests need what stands under devDependencies too.
    env: { ...process.env, NODE_ENV: "development" },
  });
  if (status !== 0) {
    console.error(
      "The packages could not be installed; the lines above say why. Is the npm registry within reach?",
    );
    process.exit(1);
  }
}
