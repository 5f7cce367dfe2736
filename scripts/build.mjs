import { spawnSync } from "node:child_process";
import { existsSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import path from "node:path";
import { fileURLToPath } from "node:url";
import { root } from "./installed.mjs";
import { BUILD_SOURCES, hashSources } from "./sources.mjs";

const STAMP = path.join(root, ".next", "built-from");

/** Whether .next was built from exactly these sources. */
export function buildIsCurrent() {
  if (!existsSync(STAMP) || !existsSync(path.join(root, ".next", "BUILD_ID"))) return false;
  return readFileSync(STAMP, "utf8") === hashSources(BUILD_SOURCES);
}

/** Builds the product; answers whether it worked. */
export function build() {
  rmSync(STAMP, { force: true });
  const steps = [["node_modules/next/dist/bin/next", "build"]];
  if (existsSync(path.join(root, "scripts/build-reader.mjs"))) steps.push(["scripts/build-reader.mjs"]);
  for (const step of steps) {
    const { status } = spawnSync(process.execPath, step, {
      cwd: root,
      stdio: ["ignore", "inherit", "inherit"],
      env: { ...process.env, NODE_ENV: "production", NEXT_TELEMETRY_DISABLED: "1" },
    });
    if (status !== 0) return false;
  }
  // Taken after the build, which may itself set tsconfig.json in order.
  writeFileSync(STAMP, hashSources(BUILD_SOURCES));
  return true;
}

if (process.argv[1] === fileURLToPath(import.meta.url)) process.exitCode = build() ? 0 : 1;
