import { spawnSync } from "node:child_process";
import { existsSync } from "node:fs";

/** The browser the tests use: CHROMIUM_PATH, or Debian's own. Undefined when there is none. */
export function findBrowser(env = process.env) {
  return [env.CHROMIUM_PATH, "/usr/bin/chromium-headless-shell", "/usr/bin/chromium"].find(
    (file) => file !== undefined && file !== "" && existsSync(file),
  );
}

/** Runs apt-get as root (or by sudo where it asks for no password); answers its exit code. */
export function aptGet(...args) {
  const command = process.getuid?.() === 0 ? ["apt-get", ...args] : ["sudo", "-n", "apt-get", ...args];
  return spawnSync(command[0], command.slice(1), {
    stdio: ["ignore", "inherit", "inherit"],
    env: { ...process.env, DEBIAN_FRONTEND: "noninteractive" },
  }).status;
}

/** Installs Debian's chromium where no browser is found; answers the browser, or undefined when that failed. */
export function ensureBrowser() {
  const found = findBrowser();
  if (found !== undefined) return found;
  console.log("No browser found; installing Debian's chromium-headless-shell …");
  aptGet("update");
  if (aptGet("install", "-y", "--no-install-recommends", "chromium-headless-shell") !== 0) {
    aptGet("install", "-y", "--no-install-recommends", "chromium");
  }
  return findBrowser();
}
