import { spawnSync } from "node:child_process";
import { aptGet } from "./find-browser.mjs";

const isThere = () => spawnSync("strace", ["-V"], { stdio: "ignore" }).status === 0;

/** Installs Debian's strace where there is none: with it a test counts what is written through to the disk. */
export function ensureStrace() {
  if (isThere()) return true;
  console.log("No strace found; installing Debian's …");
  aptGet("update");
  aptGet("install", "-y", "--no-install-recommends", "strace");
  return isThere();
}
